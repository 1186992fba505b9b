import { Fragment, useCallback, useDeferredValue, useMemo } from "react";
import type { Cell, NotebookDocument } from "../../../../shared/notebook/document";
import type { CellEvaluation } from "../../../../shared/notebook/result";
import type { ColumnCorona } from "../../../lib/columnCorona";
import type { UnitSystem } from "../../../lib/format";
import type { LetteredNote } from "../../../ui/tables/tableProps";
import { cellTitle } from "../cells/cellTitle";
import { CellView } from "../cells/CellView";
import { columnCoronae } from "../cells/columnCoronae";
import { drawnColumn } from "../cells/drawnColumn";
import { CellThreads } from "../comments/CellThreads";
import { InsertCell } from "../cells/InsertCell";
import { useNotebookNames } from "../cells/notebookNames";
import { useCellDrag } from "../cells/useCellDrag";
import type { CellCommands } from "../cells/useCellCommands";
import type { LiveEvaluation } from "../evaluation/useEvaluation";
import type { TaskStates } from "../evaluation/useLongTasks";
import { numberResults } from "./numberResults";

interface SheetProps {
  document: NotebookDocument;
  live: LiveEvaluation;
  tasks: TaskStates | null;
  notesOf: (cellId: string) => readonly LetteredNote[];
  unitSystem: UnitSystem;
  isEditable: boolean;
  newCellId: string | null;
  commands: CellCommands;
}

/** The cells, set like an article, with a caret between each two where another may be put. */
export function Sheet({
  document,
  live,
  tasks,
  notesOf,
  unitSystem,
  isEditable,
  newCellId,
  commands,
}: SheetProps) {
  const { late } = live;
  // Columns, which have the figures, follow a key first; the other cells come right after them.
  const evaluated = useDeferredValue(live.evaluated);
  const surroundings = useNotebookNames(document, evaluated?.cells);
  const cellIds = useMemo(() => document.cells.map((cell) => cell.id), [document.cells]);
  const { drag, begin } = useCellDrag(cellIds, commands);
  const numbers = useMemo(() => numberResults(document, evaluated?.cells), [document, evaluated]);
  const handleDragStart = useCallback((id: string, event: React.PointerEvent) => begin(id, event), [begin]);
  const columnGases = (evaluation: CellEvaluation | undefined) => gasesOfColumn(evaluation, evaluated?.cells);

  return (
    <div className="sheet-cells">
      {isEditable && document.cells.length > 0 && (
        <InsertCell index={0} afterId={null} place="at the top" isLast={false} commands={commands} />
      )}
      {document.cells.map((cell, index) => {
        const answered = cell.kind === "column" ? live.evaluated : evaluated;
        const evaluation = answered?.cells.get(cell.id);
        return (
          <Fragment key={cell.id}>
            {drag?.gap === index && <DropLine />}
            <CellView
              cell={cell}
              evaluation={evaluation}
              readText={answered?.texts.get(cell.id)}
              columnGases={columnGases(evaluation)}
              coronae={
                cell.kind === "column" ? columnCoronae(cell.name, answered?.cells ?? noCells) : noCoronae
              }
              drawn={cell.kind === "column" ? drawnColumn(evaluation, answered?.cells ?? noCells) : null}
              notes={notesOf(cell.id)}
              isLate={late.has(cell.id)}
              task={tasks?.get(cell.id)}
              unitSystem={unitSystem}
              figureNumber={numbers.get(cell.id)?.figure ?? 1}
              tableNumber={numbers.get(cell.id)?.table ?? 1}
              isEditable={isEditable}
              isNew={cell.id === newCellId}
              surroundings={surroundings}
              commands={commands}
              onDragStart={handleDragStart}
            />
            <CellThreads cell={cell} />
            {isEditable && (
              <InsertCell
                index={index + 1}
                afterId={cell.id}
                place={`after ${placeWords(cell)}`}
                isLast={index === document.cells.length - 1}
                commands={commands}
              />
            )}
          </Fragment>
        );
      })}
      {drag?.gap === document.cells.length && <DropLine />}
    </div>
  );
}

/** Where a dragged cell would land. */
function DropLine() {
  return <div className="drop-line" aria-hidden="true" />;
}

const placeWords = (cell: Cell): string => (cell.kind === "prose" ? "this prose" : cellTitle(cell));

const noCoronae: readonly ColumnCorona[] = [];
const noCells: ReadonlyMap<string, CellEvaluation> = new Map();

/** Gases of the column that a cell rests on, itself or by way of others, so that it gives them the same colours. */
function gasesOfColumn(
  evaluation: CellEvaluation | undefined,
  cells: ReadonlyMap<string, CellEvaluation> | undefined,
): readonly string[] | undefined {
  if (!evaluation || !cells || evaluation.result.kind === "column") return undefined;
  const uses = new Set(evaluation.uses.map(cellName));
  for (const other of [...cells.values()].reverse()) {
    if (!uses.has(other.result.name)) continue;
    if (other.result.kind === "column") return other.gases;
    for (const name of other.uses) uses.add(cellName(name));
  }
  return undefined;
}

const cellName = (path: string): string => path.split(".", 1)[0]!;
