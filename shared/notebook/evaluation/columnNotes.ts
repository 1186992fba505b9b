/** What is said beside the entries and results of a column that was solved. */
import type { Column, HomopauseOutcome, PhysicsNote } from "../../physics";
import { quantityKinds } from "../language/dimensions";
import { formatPlainNumber, formatQuantity, thinSpace } from "../language/formatQuantity";
import { inWords } from "../language/notes";
import type { OpenCell } from "./openCell";
import { understandConstant } from "./readEntries";

/** What the entries come to: the gas that makes up the rest, the span of temperatures, where mixing is capped. */
export function sayWhatColumnMeans(cell: OpenCell, column: Column, rest: string | null): void {
  const { input, topAltitude } = column;
  const kilometres = (altitude: number) =>
    formatQuantity(altitude, quantityKinds.length.dimension, { unitSystem: cell.unitSystem });

  const restGas = input.gases.find(({ formula }) => formula === rest);
  if (restGas) {
    const percent = formatPlainNumber(restGas.moleFraction * 100, 3);
    cell.understand(cell.entry("gases")!, `${restGas.formula} ${percent}${thinSpace}%`);
  }
  if (input.temperature.kind === "constant") {
    understandConstant(cell, "temperature");
  } else {
    const temperatures = column.profilesAt(
      Float64Array.from({ length: 65 }, altitudeOf(column, 64)),
    ).temperature;
    const [lowest, highest] = [Math.min(...temperatures), Math.max(...temperatures)];
    const span = `${formatPlainNumber(lowest, 3)} to ${formatPlainNumber(highest, 3)}${thinSpace}K`;
    cell.understand(cell.entry("temperature")!, span);
  }
  const top = cell.entry("top");
  if (!top) cell.actByDefault("top", { note: `${kilometres(topAltitude)} here` });
  else if (input.top === "auto") cell.understand(top, kilometres(topAltitude));
  sayWhereEddyIsCapped(cell, column, kilometres);
}

function altitudeOf({ input, topAltitude }: Column, last: number): (_: unknown, index: number) => number {
  const { baseAltitude } = input;
  return (_, index) =>
    index === last ? topAltitude : baseAltitude + ((topAltitude - baseAltitude) * index) / last;
}

function sayWhereEddyIsCapped(
  cell: OpenCell,
  column: Column,
  kilometres: (altitude: number) => string,
): void {
  const { eddy, baseAltitude } = column.input;
  const entry = cell.entry("eddy");
  if (eddy.kind === "constant") understandConstant(cell, "eddy");
  if (!entry || eddy.kind !== "power" || eddy.ceiling === null) return;
  const isCapped = (altitude: number) =>
    column.levelAt(altitude).eddyCoefficient >= eddy.ceiling! * (1 - 1e-9);
  if (!isCapped(column.topAltitude)) {
    cell.understand(entry, "stays below its ceiling");
    return;
  }
  let [below, above] = [baseAltitude, column.topAltitude];
  for (let step = 0; step < 40; step += 1) {
    const middle = (below + above) / 2;
    if (isCapped(middle)) above = middle;
    else below = middle;
  }
  cell.understand(entry, `meets its ceiling at ${kilometres(Math.round(above / 1000) * 1000 || above)}`);
}

/** What the column does not have, and what its solver had to say. */
export function sayWhatColumnLacks(cell: OpenCell, column: Column): void {
  for (const note of column.notes) sayPhysicsNote(cell, note);
  sayMissingHomopauses(cell, column);
  const { exobase } = column;
  if (exobase.found) return;
  const isImpossible = exobase.reason === "base_above_exobase" || exobase.reason === "base_unbound";
  const key = {
    base_above_exobase: cell.entry("pressure") ? "pressure" : "number_density",
    base_unbound: "temperature",
    runaway: "temperature",
    top_below_exobase: "top",
  }[exobase.reason];
  const coupled =
    exobase.reason === "runaway"
      ? " An escape cell may still find an exobase: what escapes thins the light gases, which the column at rest does not know."
      : "";
  cell.say(
    isImpossible ? "fault" : "caution",
    exobase.reason,
    `${exobase.message}${coupled}`,
    cell.entry(key) ?? cell.entry("gases"),
  );
}

/** The entry that a note of the solver speaks of. */
function sayPhysicsNote(cell: OpenCell, { level, code, message }: PhysicsNote): void {
  const key = code.startsWith("temperature") ? "temperature" : code === "column_cut_short" ? "top" : "eddy";
  cell.say(level, code, message, cell.entry(key));
}

type Reason = Extract<HomopauseOutcome, { found: false }>["reason"];

const reasons: Readonly<Record<Reason, string>> = {
  no_eddy_mixing: "without eddy mixing each gas stands on its own scale height from the base up",
  mixed_throughout: "eddy mixing prevails up to the top",
  separated_throughout: "diffusion prevails from the base up",
  single_gas: "there is no other gas to part from",
};

function sayMissingHomopauses(cell: OpenCell, { input, homopauses }: Column): void {
  for (const reason of Object.keys(reasons) as Reason[]) {
    const without = input.gases.filter((_, index) => {
      const homopause = homopauses[index];
      return !homopause.found && homopause.reason === reason;
    });
    if (without.length === 0) continue;
    const formulas = inWords(
      without.map(({ formula }) => formula),
      "and",
    );
    cell.say(
      "remark",
      "no_homopause",
      `No homopause of ${formulas}: ${reasons[reason]}.`,
      cell.entry("eddy"),
    );
  }
}
