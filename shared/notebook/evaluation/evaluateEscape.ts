import { thermalEscape, type ColumnLevel, type GasEscape, type PhysicsNote } from "../../physics";
import { checkName } from "./checkName";
import { exobaseValues } from "./columnResults";
import type { ColumnModel } from "./models";
import { requireEntries, type OpenCell } from "./openCell";
import { readCellEntry, readEntry } from "./readEntries";
import { measured } from "./resultValue";
import { changeTo } from "../language/notes";
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
  if (!source || !isCouplingSaid || !isCriterionKnown) return { gases: gases ?? [] };

  const { exobase } = source.column;
  if (!exobase.found) {
    cell.say("fault", `no_exobase_${exobase.reason}`, `No exobase. ${exobase.message}`, cell.entry("column"));
    return { gases: gases ?? [] };
  }
  for (const note of exobase.notes) sayOf(cell, note);
  sayWhatBandLacks(cell, exobase);
  const { values, notes } = escapeValues(source, exobase.level, gases ?? []);
  for (const note of notes) sayOf(cell, note);
  return {
    gases: gases ?? [],
    values: { ...exobaseValues(exobase.level, exobase.lower, exobase.upper), ...values },
  };
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
  { column, body }: ColumnModel,
  level: ColumnLevel,
  gases: readonly string[],
): { values: CellResult["values"]; notes: PhysicsNote[] } {
  const all = column.input.gases;
  const escape = thermalEscape({
    gravitationalParameter: body.gravitationalParameter,
    radius: level.radius,
    temperature: level.temperature,
    meanMass: level.meanMass,
    hillRadius: body.hillRadius,
    gases: gases.map((formula) => {
      const index = all.findIndex((gas) => gas.formula === formula);
      return { formula, mass: all[index].mass, logNumberDensity: level.logNumberDensities[index] };
    }),
  });
  const values: CellResult["values"] = {
    "exobase.escape_speed": measured(escape.escapeSpeed, "m s^-1"),
    bulk_escape_parameter: measured(escape.bulkEscapeParameter, "1"),
    regime: { value: escape.regime },
  };
  for (const gas of escape.gases) {
    const index = all.findIndex(({ formula }) => formula === gas.formula);
    Object.assign(values, gasValues(gas, level.numberDensities[index]));
  }
  return { values, notes: [...escape.notes, ...escape.gases.flatMap(({ notes }) => notes)] };
}

function gasValues(gas: GasEscape, numberDensity: number): CellResult["values"] {
  const { formula } = gas;
  return {
    [`${formula}.number_density`]: measured(numberDensity === 0 ? null : numberDensity, "m^-3"),
    [`${formula}.escape_parameter`]: measured(gas.escapeParameter, "1"),
    [`${formula}.thermal_speed`]: measured(gas.thermalSpeed, "m s^-1"),
    [`${formula}.effusion_velocity`]: measured(gas.effusionVelocity, "m s^-1"),
    [`${formula}.log10_effusion_velocity`]: measured(gas.log10EffusionVelocity, "1"),
    [`${formula}.jeans_flux`]: measured(gas.jeansFlux, "m^-2 s^-1"),
    [`${formula}.log10_jeans_flux`]: measured(gas.log10JeansFlux, "1"),
    [`${formula}.rate`]: measured(gas.rate, "s^-1"),
    [`${formula}.log10_rate`]: measured(gas.log10Rate, "1"),
    [`${formula}.mass_rate`]: measured(gas.massRate, "kg s^-1"),
  };
}
