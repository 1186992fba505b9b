/** What is known of a result whatever the notebook: words, formula, inputs, sources, where it holds. */
import type { PhysicalConstant } from "../../physics";
import type { ConventionName } from "./conventions";

/** Cells that another rests on by an entry that names them: escape → column → body. */
export type RelatedKind = "body" | "column" | "escape";

/** One quantity that goes into a formula, and where its value is found. */
export type RecordInput = {
  /** TeX. */
  symbol: string;
  words: string;
  /** Left out of the explanation where the notebook neither gives it nor has a default. */
  isOptional?: true;
} & (
  | { from: "result"; name: string; of?: RelatedKind }
  | { from: "entry"; key: string; of?: RelatedKind }
  | { from: "constant"; constant: PhysicalConstant }
  /** The mass of one particle of the gas that the result speaks of. */
  | { from: "gas" }
  /** Another column of the same row of the same table. */
  | { from: "row"; column: string }
);

export interface ExplanationRecord {
  /** Of its own; the physics function cites it by `@explained`. */
  id: string;
  /**
   * Name of the result, or table and column, `levels.temperature`. GAS stands for any gas, ION for any ion, RESULT for
   * any name that is watched.
   */
  name: string;
  /** In words; GAS, ION and RESULT are put in. */
  words: string;
  /** TeX. */
  symbol: string;
  /** TeX; null where an entry states the result itself. */
  formula: string | null;
  /** Other formulas, by the word or the call that an entry of the cell has. */
  forms?: { entry: string; formulas: Readonly<Record<string, string>> };
  with: readonly RecordInput[];
  /** `folder/file.ts#function` under shared/physics; null where nothing is computed. */
  physics: string | null;
  conventions: readonly ConventionName[];
  /** Keys of `references`. */
  sources: readonly string[];
  /** What the result is trusted for. */
  validity: string | null;
  /** Codes of the notes that say whether it holds here. */
  notes?: readonly string[];
}

export const result = (symbol: string, words: string, name: string, of?: RelatedKind): RecordInput => ({
  symbol,
  words,
  from: "result",
  name,
  of,
});

export const entry = (symbol: string, words: string, key: string, of?: RelatedKind): RecordInput => ({
  symbol,
  words,
  from: "entry",
  key,
  of,
});

export const optional = (input: RecordInput): RecordInput => ({ ...input, isOptional: true });

export const constant = (symbol: string, { name, ...rest }: PhysicalConstant): RecordInput => ({
  symbol,
  words: name,
  from: "constant",
  constant: { name, ...rest },
});

export const row = (symbol: string, words: string, column: string): RecordInput => ({
  symbol,
  words,
  from: "row",
  column,
});

export const particleMass: RecordInput = {
  symbol: "m",
  words: "mass of one particle",
  from: "gas",
};
