/** What a cell's text is made of, with the place of every part. Ranges are UTF-16 offsets in the cell's text. */
import type { Note, TextRange } from "../result";

/** One `key = value` of a cell. */
export interface Entry {
  key: string;
  keyRange: TextRange;
  /** From the first to the last character of the value; remarks beside it are left out. */
  valueRange: TextRange;
  /** Key and value. */
  range: TextRange;
  /** First and last line, from 1. */
  line: number;
  endLine: number;
  /** What follows `#` on the entry's lines, joined: its source. */
  remark: string | null;
  node: ValueNode;
}

export interface ParsedEntries {
  entries: Entry[];
  notes: Note[];
}

export type ValueNode =
  | NumberNode
  | NameNode
  | MeasuredNode
  | NegativeNode
  | SumNode
  | ProductNode
  | PowerNode
  | CallNode
  | UncertainNode
  | VariationNode
  | ListNode
  | BrokenNode;

/** Decimal digits and power of ten apart, so that a unit's power of ten joins before the number is rounded. */
export interface NumberNode {
  type: "number";
  /** Such as "1.5" */
  digits: string;
  powerOfTen: number;
  range: TextRange;
}

/** A name, a dotted path, a choice word, a constant or a gas; whoever reads it decides. */
export interface NameNode {
  type: "name";
  /** Subscript digits already made digits. */
  path: string;
  range: TextRange;
}

/** Something followed by a unit: `80 km`, `(80 + 5) km`. */
export interface MeasuredNode {
  type: "measured";
  operand: ValueNode;
  unit: UnitNode;
  range: TextRange;
}

export interface UnitNode {
  factors: UnitFactor[];
  /** As written: "cm^2/s". */
  text: string;
  range: TextRange;
}

export interface UnitFactor {
  symbol: string;
  /** Negative under a `/`. */
  exponent: number;
  range: TextRange;
}

export interface NegativeNode {
  type: "negative";
  operand: ValueNode;
  range: TextRange;
}

export interface SumNode {
  type: "sum";
  terms: { sign: 1 | -1; node: ValueNode }[];
  range: TextRange;
}

export interface ProductNode {
  type: "product";
  factors: { operation: "times" | "over"; node: ValueNode }[];
  range: TextRange;
}

export interface PowerNode {
  type: "power";
  base: ValueNode;
  exponent: ValueNode;
  range: TextRange;
}

/** `name(…)`: a function such as `sqrt`, or a form such as `bates`. */
export interface CallNode {
  type: "call";
  name: string;
  nameRange: TextRange;
  items: ItemNode[];
  range: TextRange;
}

/** `240 ± 30 K`, `between 180 and 350 K`, `2.5e5 /cm^3 within factor 2`. */
export interface UncertainNode {
  type: "uncertain";
  form: "plus_minus" | "between" | "factor";
  /** Centre, lower end or median. */
  first: ValueNode;
  /** Deviation, upper end or factor. */
  second: ValueNode;
  /** Names this draw within its cell: the entry's key, then argument or gas: `temperature.exosphere`. */
  path: string;
  range: TextRange;
}

/** `T_quiet from 180 K to 350 K in 40 steps`. */
export interface VariationNode {
  type: "variation";
  subject: ValueNode;
  first: ValueNode;
  last: ValueNode;
  steps: ValueNode;
  range: TextRange;
}

/** `CO2: rest, N2: 2.7 %` or `100 km, 200 km`. One item without a label is not a list. */
export interface ListNode {
  type: "list";
  items: ItemNode[];
  range: TextRange;
}

/** An item of a list or call: `value`, `label: value` or `name = value`. */
export interface ItemNode {
  name: { text: string; range: TextRange } | null;
  label: ValueNode | null;
  value: ValueNode;
  range: TextRange;
}

/** What could not be read; a note already says why, so whoever meets it says nothing more. */
export interface BrokenNode {
  type: "broken";
  range: TextRange;
}
