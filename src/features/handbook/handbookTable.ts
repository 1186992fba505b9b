import type { HandbookCell } from "../../../shared/notebook/handbookCells";
import { handbookGases, type Provenance } from "../../../shared/physics";
import type { UnitSystem } from "../../lib/format";
import type { RichText } from "../../lib/richText";

/** What is shown, as the sentence over the tables and the address say it. */
export const sectionIds = [
  "bodies",
  "gases",
  "collisions",
  "corrections",
  "recombination",
  "constants",
] as const;
export type SectionId = (typeof sectionIds)[number];

/** How well a row is founded; told by a shape and a word. */
export interface Standing {
  shape: "filled" | "half" | "hollow";
  word: string;
}

export interface TableValue {
  /** SI; text for a name or a state; null where nothing is known. */
  value: number | string | null;
  /** One standard uncertainty, SI. */
  uncertainty?: number;
  /** SI, where each row of the column has its own; it stands after the number. */
  unit?: string;
  /** Text as it is set, where it is more than its letters. */
  rich?: RichText;
  /** Where this number comes from, if not from the source of its whole row. */
  sources?: readonly Sourcing[];
}

/** A source, and where it is recorded how the number was taken from it. */
export type Sourcing = Pick<Provenance, "source" | "note"> & { mark?: Provenance["mark"] };

/** How the numbers of a column are told: shown = SI value × 10^shift, or over `per` where the unit is no power of ten. */
export interface ColumnScale {
  shift?: number;
  per?: number;
  unit: string;
}

export interface TableColumn {
  key: string;
  head: RichText;
  /** SI, "m^3 s^-2"; "1" for a pure number, "" for text. */
  unit: string;
  /** Where the unit shown is not the one of the system. */
  scale?: ColumnScale | Record<UnitSystem, ColumnScale>;
  /** Most significant digits shown; every digit stands in the files. */
  digits: number;
  /** Fewest, so that numbers of one column end alike. */
  leastDigits?: number;
}

export interface TableRow {
  key: string;
  /** Its name as plain words: "H in CO2". */
  name: string;
  head: RichText;
  /** Drawn with the line of this gas. */
  gas?: string;
  /** Stands under the row that acts, as another answer to the same question. */
  isAlternative?: boolean;
  /** Whether a column uses it; left out where that is no question. */
  acts?: boolean;
  /** What a search looks in besides the name. */
  words: string;
  values: Readonly<Record<string, TableValue>>;
  standing?: Standing;
  /** Of the row as a whole. */
  sources?: readonly Sourcing[];
  /** The ways to write it as a cell; none where it is no cell. */
  forms?: readonly { label: string; choices: readonly HandbookCell[] }[];
}

export interface HandbookTable {
  /** Names its files. */
  id: string;
  caption: string;
  rowHead: string;
  columns: readonly TableColumn[];
  rows: readonly TableRow[];
}

export interface HandbookSection {
  id: SectionId;
  title: string;
  /** What the numbers are and when they act. */
  about: RichText;
  tables: readonly HandbookTable[];
}

/** Case and accents do not count. */
const searchable = (text: string): string => text.normalize("NFKD").replace(/\p{M}/gu, "").toLowerCase();

const formulas = new Set(handbookGases.map(({ formula }) => formula.toLowerCase()));

/** Rows in which every word asked for begins a word; a formula finds only itself: "H" not "He". */
export function findRows(rows: readonly TableRow[], query: string): readonly TableRow[] {
  const asked = searchable(query).split(/\s+/).filter(Boolean);
  if (asked.length === 0) return rows;
  return rows.filter((row) => {
    const words = searchable(`${row.name} ${row.words}`).split(/[\s,;()]+/);
    return asked.every((start) =>
      words.some((word) => (formulas.has(start) ? word === start : word.startsWith(start))),
    );
  });
}

/** Every provenance that a row rests on, in the order of its columns. */
export function rowSources({ columns }: Pick<HandbookTable, "columns">, row: TableRow): Sourcing[] {
  return [...columns.flatMap(({ key }) => row.values[key]?.sources ?? []), ...(row.sources ?? [])];
}
