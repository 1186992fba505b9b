import type { ColumnLevel, GasEscape, PhysicsNote } from "../../physics";
import { checkName } from "./checkName";
import { exobaseValues } from "./columnResults";
import { crossoverValues, energyLimitValues, limitValues, windValues } from "./escapeLimits";
import { boundValues, escapeFrom, gasValues, leavingGases, type Corrections } from "./escapeValues";
import type { ColumnModel } from "./models";
import { requireEntries, sayWhichCentresAct, type OpenCell } from "./openCell";
import { readCellEntry, readEntry } from "./readEntries";
import { measured } from "./resultValue";
import { quantityKinds } from "../language/dimensions";
import { formatQuantity } from "../language/formatQuantity";
import { changeTo } from "../language/notes";
import { readGasFactors } from "../language/readGasFactors";
import { readGasNames } from "../language/readGasName";
import type { CellResult } from "../result";
import type { CellAnswer } from "./cellAnswer";

export function evaluateEscape(cell: OpenCell): CellAnswer {
  checkName(cell, cell.name);
  requireEntries(cell, ["coupling"]);
  const source = readCellEntry(cell, "column");
  const isCouplingSaid = readCoupling(cell);
  const isCriterionKnown = readCriterion(cell);
  const gases = source ? readGases(cell, source) : undefined;
  const corrections = source ? readCorrections(cell, source) : undefined;
  sayWhichCentresAct(cell);
  if (!source || !isCouplingSaid || !isCriterionKnown || !corrections) return { gases: gases ?? [] };

  const { exobase } = source.column;
  if (!exobase.found) return { gases: gases ?? [], values: valuesWithoutExobase(cell, source, exobase) };
  for (const note of exobase.notes) sayOf(cell, note);
  sayWhatBandLacks(cell, exobase);
  const { lower, upper, level } = exobase;
  return {
    gases: gases ?? [],
    values: {
      ...exobaseValues(level, lower, upper),
      ...escapeValues(cell, source, level, gases ?? [], corrections),
    },
    model: { kind: "escape", source, exobase: level },
  };
}

/** What can be said where no exobase exists: the fault, and the mass rates that need none. */
function valuesWithoutExobase(
  cell: OpenCell,
  source: ColumnModel,
  { reason, message }: { reason: string; message: string },
): CellResult["values"] {
  const isWind = reason === "runaway" || reason === "base_unbound";
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

/** The convention changes every rate, so it is written out; what is not computed is not silently taken for what is. */
function readCoupling(cell: OpenCell): boolean {
  if (cell.entry("coupling")) return readOnlyChoice(cell, "coupling", "open", openMeans);
  const { length } = cell.text;
  const isFreshLine = length === 0 || cell.text.endsWith("\n");
  const remedy = {
    label: "Write coupling = open",
    range: { from: length, to: length },
    replacement: `${isFreshLine ? "" : "\n"}coupling = open`,
  };
  cell.say(
    "fault",
    "missing_coupling",
    `The entry *coupling* is missing. Write coupling = open: ${openMeans}.`,
    undefined,
    remedy,
  );
  return false;
}

const openMeans =
  "the column is solved without a flux and the Jeans flux evaluated after, so that what diffusion can supply does not limit it";

function readCriterion(cell: OpenCell): boolean {
  if (cell.entry("criterion")) {
    return readOnlyChoice(
      cell,
      "criterion",
      "bulk",
      "the mean free path of the mixture equals its scale height",
    );
  }
  cell.actByDefault("criterion");
  return true;
}

/** An entry that has one choice so far; anything else is told what that choice means. */
function readOnlyChoice(cell: OpenCell, key: string, choice: string, meaning: string): boolean {
  const { node, valueRange } = cell.entry(key)!;
  if (node.type === "broken") return false;
  if (node.type === "name" && node.path === choice) return true;
  const message = `The ${key} computed here is *${choice}*: ${meaning}. Write ${key} = ${choice}.`;
  cell.say("fault", "choice", message, valueRange, changeTo(valueRange, choice));
  return false;
}

/** Gases to answer for, in the order written; undefined if the list has a fault. */
function readGases(cell: OpenCell, { column }: ColumnModel): string[] | undefined {
  const all = column.input.gases.map(({ formula }) => formula);
  if (cell.entry("gases")) {
    return readEntry(cell, "gases", (node) => readGasNames(node, all))?.map(({ formula }) => formula);
  }
  cell.actByDefault("gases", { text: `gases = ${all.join(", ")}` });
  return all;
}

/** Factors on Jeans rates by formula; undefined if the list has a fault. */
function readCorrections(cell: OpenCell, { column }: ColumnModel): Corrections | undefined {
  if (!cell.entry("correction")) return {};
  const all = column.input.gases.map(({ formula }) => formula);
  const factors = readEntry(cell, "correction", (node) => readGasFactors(node, all, cell.surroundings));
  return factors && Object.fromEntries(factors.map(({ formula, value }) => [formula, value.value]));
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
  source: ColumnModel,
  level: ColumnLevel,
  gases: readonly string[],
  corrections: Corrections,
): CellResult["values"] {
  const escape = escapeFrom(source, level);
  const leaving = leavingGases(escape, corrections);
  for (const note of escape.notes) sayOf(cell, note);
  const values: CellResult["values"] = {
    "exobase.escape_speed": measured(escape.escapeSpeed, "m s^-1"),
    bulk_escape_parameter: measured(escape.bulkEscapeParameter, "1"),
    regime: { value: escape.regime },
  };
  const isWind = escape.regime === "wind";
  const asked = gases.map((formula) => leaving.find((gas) => gas.formula === formula)!);
  const limits = isWind ? {} : limitValues(cell, source, level, asked);
  for (const { formula, index } of asked) {
    const gas = escape.gases[index];
    const density = level.numberDensities[index];
    const factor = corrections[formula];
    Object.assign(values, isWind ? boundValues(gas, density) : gasValues(gas, density, factor));
    Object.assign(values, limits[formula]);
    if (!isWind) sayOfGas(cell, gas, factor);
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
