import type { CellEvaluation, Note } from "../../../../../shared/notebook/result";
import type { ColumnCorona } from "../../../../lib/columnCorona";
import type { UnitSystem } from "../../../../lib/format";
import type { ShownColumn } from "../drawnColumn";
import type { LetteredNote } from "../../../../ui/tables/tableProps";

/** What the answer of a cell of any kind is drawn from. */
export interface AnswerProps {
  /** The last answer that there was. */
  evaluation: CellEvaluation;
  /** Of a column: what its figures show. */
  drawn: ShownColumn | null;
  /** Gases of the column that the cell rests on, where it names gases. */
  columnGases: readonly string[] | undefined;
  /** Coronae that rest on a column cell. */
  coronae: readonly ColumnCorona[];
  notes: readonly LetteredNote[];
  unitSystem: UnitSystem;
  /** Numbers of the first figure and of the first table of this cell. */
  figureNumber: number;
  tableNumber: number;
  /** Figures are made when the cell first comes near the screen. */
  isNear: boolean;
  /** null where the notebook can only be read. */
  onRemedy: ((note: Note) => void) | undefined;
}
