/** By which convention an escape cell answers: exobase, coupling, factors on the Jeans rate. */
import type { ExobaseCriterion } from "../../physics";
import { changeTo } from "../language/notes";
import { readChoice } from "../language/readChoice";
import { readGasFactors } from "../language/readGasFactors";
import { readGasName, readGasNames } from "../language/readGasName";
import type { ColumnModel } from "./models";
import type { OpenCell } from "./openCell";
import { readEntry } from "./readEntries";

/** Factors on the Jeans rate by formula; a gas that is not named has none. */
export type Corrections = Readonly<Record<string, number>>;

const couplings = ["coupled", "open"] as const;

export interface EscapeConvention {
  coupling: (typeof couplings)[number];
  criterion: ExobaseCriterion;
  corrections: Corrections;
}

/** undefined where an entry has a fault. */
export function readConvention(
  cell: OpenCell,
  source: ColumnModel | undefined,
): EscapeConvention | undefined {
  const all = source?.column.input.gases.map(({ formula }) => formula);
  const criterion = readCriterion(cell, all);
  const coupling = readWord(cell, "coupling", couplings, "coupled");
  const corrections = all && readCorrections(cell, all);
  return coupling && criterion && corrections && { coupling, criterion, corrections };
}

/** Gases to answer for, in the order written; undefined if the list has a fault. */
export function readGases(cell: OpenCell, { column }: ColumnModel): string[] | undefined {
  const all = column.input.gases.map(({ formula }) => formula);
  if (cell.entry("gases")) {
    return readEntry(cell, "gases", (node) => readGasNames(node, all))?.map(({ formula }) => formula);
  }
  cell.actByDefault("gases", { text: `gases = ${all.join(", ")}` });
  return all;
}

function readWord<Word extends string>(
  cell: OpenCell,
  key: string,
  words: readonly Word[],
  standard: Word,
): Word | undefined {
  if (cell.entry(key)) return readEntry(cell, key, (node) => readChoice(node, words, key));
  cell.actByDefault(key);
  return standard;
}

const criteria = ["bulk", "gas", "simple", "unit_depth"] as const;

function readCriterion(cell: OpenCell, gases: readonly string[] | undefined): ExobaseCriterion | undefined {
  const kind = readWord(cell, "criterion", criteria, "bulk");
  const entry = cell.entry("gas");
  if (kind !== "gas") {
    if (kind && entry) {
      const message = `*gas* acts only with criterion = gas; here the criterion is ${kind}.`;
      const criterion = cell.entry("criterion");
      const remedy = criterion && changeTo(criterion.valueRange, "gas");
      cell.say("remark", "gas_without_criterion", message, entry, remedy);
    }
    return kind && { kind };
  }
  if (!entry) {
    const message = `With criterion = gas the entry *gas* names the gas whose mean free path counts. Write, for example, gas = ${gases?.[0] ?? "O"}.`;
    cell.say("fault", "missing_key", message, cell.entry("criterion"));
    return undefined;
  }
  if (!gases) return undefined;
  const formula = readEntry(cell, "gas", (node) => readGasName(node, gases));
  return formula === undefined ? undefined : { kind, formula };
}

function readCorrections(cell: OpenCell, gases: readonly string[]): Corrections | undefined {
  if (!cell.entry("correction")) return {};
  const factors = readEntry(cell, "correction", (node) => readGasFactors(node, gases, cell.surroundings));
  return factors && Object.fromEntries(factors.map(({ formula, value }) => [formula, value.value]));
}

/** In a few words, as it stands beside a number: "bulk, l = H". */
export function criterionWords(criterion: ExobaseCriterion): string {
  switch (criterion.kind) {
    case "bulk":
      return "bulk, l = H";
    case "gas":
      return `l = H of ${criterion.formula}`;
    case "simple":
      return "simple, l = H without √2";
    case "unit_depth":
      return "unit depth";
  }
}
