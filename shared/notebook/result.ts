/** What a notebook answers: the same from the page, the server and the command line. SI only. */
import type { CellKind } from "./document";
import type { Strip } from "./summary";

export type NoteLevel = "remark" | "caution" | "fault";
export type CellStatus = "fine" | "caution" | "fault";

/** Half-open span of UTF-16 offsets in the text of one cell. */
export interface TextRange {
  from: number;
  to: number;
}

export interface Note {
  level: NoteLevel;
  /** Stable, snake_case. */
  code: string;
  /** Names the thing, the reason and the remedy, in plain words. */
  message: string;
  /** Key of the entry it speaks of. */
  entry?: string;
  /** From 1, in the cell's text. */
  line?: number;
  range?: TextRange;
  /** A change that is sure to be meant. */
  remedy?: { label: string; range: TextRange; replacement: string };
}

export interface ResultValue {
  /** null where the magnitude is below 1e-300 and its `log10_…` twin carries it; a string for a choice. */
  value: number | string | null;
  /** SI, such as "m^-2 s^-1"; "1" for a pure number; absent for a choice. */
  unit?: string;
  /** Only where a spread cell watches it and has been computed. */
  spread?: ResultSpread;
}

/** Quantiles of a watched result in its own unit; null below 1e-300. */
export interface ResultSpread {
  median: number | null;
  /** 16 and 84 %. */
  lower: number | null;
  upper: number | null;
  q2_5: number | null;
  q97_5: number | null;
  /** Name of the spread cell. */
  cell: string;
  /** The work was stopped before all draws were done. */
  isPartial?: true;
}

export type ResultRow = Record<string, number | string | null>;

export interface CellResult {
  kind: CellKind;
  name: string;
  status: CellStatus;
  values: Record<string, ResultValue>;
  tables: Record<string, ResultRow[]>;
  /** Columns of equal length against `altitude`. */
  profiles?: Record<string, number[]>;
  notes: Note[];
}

export interface ResultDocument {
  engine: string;
  title: string;
  cells: CellResult[];
}

/** What was understood of an entry, said only where it adds something to what is written. */
export interface Understood {
  entry: string;
  /** Line on which the entry ends, from 1. */
  line: number;
  /** Where the expression ends, before any remark. */
  offset: number;
  text: string;
}

/** One cell as the page needs it: its result and how its text was read. */
export interface CellEvaluation {
  id: string;
  result: CellResult;
  understood: Understood[];
  /** Entries left out that act: `criterion = bulk`, and in `note` what that means here. */
  defaults: { key: string; text: string; note?: string }[];
  /** Names of the cells above that this one uses. */
  uses: string[];
  /** Gases in the order written, for a column or an escape cell. */
  gases: string[];
  /** Of a column. */
  strip?: Strip;
  /** Of an escape cell: what its numbers rest on, in a few words. */
  convention?: { coupling: "coupled" | "open"; criterion: string };
  /** Of an escape cell that is solved with its flux: its column as what escapes leaves it. */
  column?: DrawnColumn;
  /** Of a corona cell. */
  corona?: CoronaBeginning;
  /** Of a nonthermal cell: "O2+". */
  ion?: string;
  /** Of a loss cell. */
  lightHistory?: LightHistory;
}

/** What figure and strip of a column are drawn from. */
export interface DrawnColumn {
  /** Columns of equal length against `altitude`. */
  profiles: Record<string, number[]>;
  strip: Strip;
}

/** How a corona begins at its exobase. */
export interface CoronaBeginning {
  /** s: 0 none of the satellite orbits filled, 1 all. */
  satellites: number;
  /** λ at the exobase. */
  escapeParameter: number;
  /** ½[1 + P(3/2, λ)]: density of the corona over that of the column, at the exobase. */
  share: number;
}

/** What a loss follows back in time. Ages in s. */
export interface LightHistory {
  now: number;
  /** Up to this age the light is as strong as it ever was; null where it never is. */
  saturation: number | null;
}

export interface Evaluation {
  engine: string;
  title: string;
  cells: CellEvaluation[];
}
