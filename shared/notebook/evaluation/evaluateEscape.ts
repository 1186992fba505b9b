import type { GasEscape, PhysicsNote } from "../../physics";
import { checkName } from "./checkName";
import { columnProfiles, columnStrip, exobaseValues } from "./columnResults";
import { crossoverValues, energyLimitValues, limitValues, windValues } from "./escapeLimits";
import { boundValues, gasValues } from "./escapeValues";
import type { ColumnModel } from "./models";
import { requireEntries, sayWhichCentresAct, type OpenCell } from "./openCell";
import { readCellEntry } from "./readEntries";
import { criterionWords, readConvention, readGases, type EscapeConvention } from "./readEscape";
import { measured } from "./resultValue";
import { solveEscape, type EscapeSolution } from "./solveEscape";
import { quantityKinds } from "../language/dimensions";
import { formatQuantity } from "../language/formatQuantity";
import type { CellResult } from "../result";
import type { CellAnswer } from "./cellAnswer";

type Solved = Extract<EscapeSolution, { found: true }>;

export function evaluateEscape(cell: OpenCell): CellAnswer {
  checkName(cell, cell.name);
  requireEntries(cell);
  const source = readCellEntry(cell, "column");
  const convention = readConvention(cell, source);
  const gases = (source && readGases(cell, source)) ?? [];
  sayWhichCentresAct(cell);
  if (!source || !convention) return { gases };

  const { coupling, criterion } = convention;
  const convened = { gases, convention: { coupling, criterion: criterionWords(criterion) } };
  const solution = solveEscape(cell, source, convention);
  if (!solution.found) return { ...convened, values: valuesWithoutExobase(cell, source, solution) };
  const { exobase, notes, coupled } = solution;
  for (const note of [...exobase.notes, ...notes]) sayOf(cell, note);
  sayWhatBandLacks(cell, exobase);
  return {
    ...convened,
    ...(coupled && !cell.isDraw ? { column: drawnColumn(cell, solution.source) } : {}),
    values: {
      ...exobaseValues(exobase.level, exobase.lower, exobase.upper),
      ...escapeValues(cell, solution, gases, convention),
    },
    model: { kind: "escape", source: solution.source, exobase: exobase.level, coupled },
  };
}

function drawnColumn(cell: OpenCell, { column }: ColumnModel): NonNullable<CellAnswer["column"]> {
  const { node } = cell.entry("column")!;
  const name = node.type === "name" ? node.path : "";
  return { profiles: columnProfiles(column), strip: columnStrip(name, column) };
}

/** Why there is no exobase, where the gas is too loosely bound to have one and flows off as a wind. */
const windReasons: readonly string[] = ["runaway", "base_unbound", "turn"];

/** What can be said where no exobase exists: the fault, and the mass rates that need none. */
function valuesWithoutExobase(
  cell: OpenCell,
  source: ColumnModel,
  { reason, message }: { reason: string; message: string },
): CellResult["values"] {
  const isWind = windReasons.includes(reason);
  const { column } = source;
  const { temperature } = column.levelAt(column.topAltitude);
  const winds = windValues(cell, source, temperature);
  const wind = winds.wind_mass_rate?.value;
  const shown = (value: number, kind: "temperature" | "massRate") =>
    formatQuantity(value, quantityKinds[kind].dimension, { unitSystem: cell.unitSystem, digits: 3 });
  const instead =
    isWind && typeof wind === "number"
      ? ` An isothermal wind from the base at ${shown(temperature, "temperature")} would carry ${shown(wind, "massRate")}.`
      : "";
  cell.say("fault", `no_exobase_${reason}`, `No exobase. ${message}${instead}`, cell.entry("column"));
  return { ...(isWind ? { regime: { value: "wind" } } : {}), ...energyLimitValues(source), ...winds };
}

function sayOf(cell: OpenCell, { level, code, message }: PhysicsNote): void {
  cell.say(level, code, message, cell.entry("column"));
}

/** The ends of the fuzzy band that the column does not reach. */
function sayWhatBandLacks(
  cell: OpenCell,
  { lower, upper }: { lower: number | null; upper: number | null },
): void {
  if (lower === null) {
    const message =
      "The Knudsen number is above 0.1 at the base already, so the band round the exobase has no lower end.";
    cell.say("remark", "no_lower_end", message, cell.entry("column"));
  }
  if (upper === null) {
    const message =
      "The Knudsen number stays below 10 up to the top, so the band round the exobase has no upper end.";
    cell.say("remark", "no_upper_end", message, cell.entry("column"));
  }
}

function escapeValues(
  cell: OpenCell,
  { source, exobase, escape, leaving }: Solved,
  gases: readonly string[],
  { coupling, corrections }: EscapeConvention,
): CellResult["values"] {
  const { level } = exobase;
  for (const note of escape.notes) sayOf(cell, note);
  const values: CellResult["values"] = {
    "exobase.escape_speed": measured(escape.escapeSpeed, "m s^-1"),
    bulk_escape_parameter: measured(escape.bulkEscapeParameter, "1"),
    regime: { value: escape.regime },
  };
  const isWind = escape.regime === "wind";
  const asked = gases.map((formula) => leaving.find((gas) => gas.formula === formula)!);
  const limits = isWind ? {} : limitValues(cell, source, level, asked, coupling);
  for (const leavingGas of asked) {
    const { formula, index } = leavingGas;
    const gas = escape.gases[index];
    const density = level.numberDensities[index];
    Object.assign(values, isWind ? boundValues(gas, density) : gasValues(gas, density, leavingGas));
    Object.assign(values, limits[formula]);
    if (!isWind) sayOfGas(cell, gas, corrections[formula]);
  }
  return {
    ...values,
    ...energyLimitValues(source),
    ...(isWind ? {} : crossoverValues(cell, source, leaving)),
    ...windValues(cell, source, level.temperature),
  };
}

/** A gas whose departure from the Jeans rate is given is not told of published ones. */
function sayOfGas(cell: OpenCell, { notes }: GasEscape, factor: number | undefined): void {
  for (const note of notes) {
    if (factor === undefined || note.code !== "jeans_correction_range") sayOf(cell, note);
  }
}
