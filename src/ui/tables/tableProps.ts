import type { ReactNode } from "react";
import type { CellEvaluation, CellResult, Note } from "../../../shared/notebook/result";
import type { UnitSystem } from "../../lib/format";
import type { RichText } from "../../lib/richText";

/** A note with the letter that marks its number, its line under the table and its line in the margin. */
export interface LetteredNote {
  note: Note;
  /** null for remarks, which have none. */
  letter: string | null;
}

export interface EscapeTableProps {
  /** An escape cell. */
  result: CellResult;
  /** Its gases, in the order written. */
  gases: readonly string[];
  /** What its numbers rest on. */
  convention?: CellEvaluation["convention"];
  /** Gases of the column it rests on, so that colours and dashes agree with the figures. */
  columnGases?: readonly string[];
  unitSystem: UnitSystem;
  /** Number of the table in the notebook, from 1. */
  number: number;
  /** After "Table 1."; the table has its own words where this is left out. */
  caption?: ReactNode;
  /** Notes of this cell; those that stand under an entry in the editor are left out here. */
  notes?: readonly LetteredNote[];
  /** Called with a note whose remedy the reader wants. */
  onRemedy?: (note: Note) => void;
}

export interface ValueListProps {
  result: CellResult;
  unitSystem: UnitSystem;
  /** Values to show, in this order; all that are known for the kind where left out. */
  names?: readonly string[];
  /** In place of the usual words, by name. */
  labels?: Readonly<Record<string, RichText>>;
  /** Small and without a rule, under a table. */
  isQuiet?: boolean;
}

/** A column of a table of levels: what it shows, its head, its unit in SI. */
export interface LevelColumn {
  key: string;
  head: RichText;
  unit: string;
}

export interface LevelsTableProps {
  /** A column cell whose `levels` table is shown. */
  result: CellResult;
  gases: readonly string[];
  /** In place of those of a column cell, before the densities of its gases. */
  columns?: readonly LevelColumn[];
  unitSystem: UnitSystem;
  /** The figures beside it show the column as what escapes leaves it, which these levels do not. */
  isAtRest?: boolean;
  number: number;
  caption?: ReactNode;
}
