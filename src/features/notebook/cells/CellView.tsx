import { memo, useCallback, useId, useMemo, useRef } from "react";
import type { Cell } from "../../../../shared/notebook/document";
import type { CellEvaluation, Note } from "../../../../shared/notebook/result";
import type { ColumnCorona } from "../../../lib/columnCorona";
import type { UnitSystem } from "../../../lib/format";
import type { LetteredNote } from "../../../ui/tables/tableProps";
import type { TaskState } from "../evaluation/createTaskQueue";
import type { NotebookNames } from "./notebookNames";
import { CellHead } from "./CellHead";
import { CellNotes } from "./CellNotes";
import { CellResults } from "./CellResults";
import { cellTitle } from "./cellTitle";
import { DefaultsLine } from "./DefaultsLine";
import type { ShownColumn } from "./drawnColumn";
import { EntriesEditor } from "./EntriesEditor";
import { ProseCell } from "./ProseCell";
import type { CellCommands } from "./useCellCommands";
import { useNearScreen } from "./useNearScreen";
import { worstNotes } from "./worstNotes";

export interface CellViewProps {
  cell: Cell;
  /** The last answer; undefined until there is one. */
  evaluation: CellEvaluation | undefined;
  /** The text it speaks of. */
  readText: string | undefined;
  /** Gases of the column that the cell rests on, where it names gases. */
  columnGases: readonly string[] | undefined;
  /** Coronae that rest on a column cell. */
  coronae: readonly ColumnCorona[];
  /** Of a column: what its figures show. */
  drawn: ShownColumn | null;
  notes: readonly LetteredNote[];
  /** The answer shown may not be what the text says now. */
  isLate: boolean;
  /** The sweep or spread that the cell asks for, where it is not answered in full. */
  task: TaskState | undefined;
  unitSystem: UnitSystem;
  figureNumber: number;
  tableNumber: number;
  isEditable: boolean;
  isNew: boolean;
  /** Names and gases known in the notebook. */
  surroundings: NotebookNames;
  commands: CellCommands;
  onDragStart: (id: string, event: React.PointerEvent) => void;
}

const noNotes: readonly Note[] = [];

/** One cell: its head, what is written, how it was understood, what it gives. */
export const CellView = memo(function CellView(props: CellViewProps) {
  const { cell, evaluation, isEditable, isNew, surroundings, commands, onDragStart } = props;
  const titleId = useId();
  const section = useRef<HTMLElement>(null);
  const isNear = useNearScreen(section);
  const gases = useSame(evaluation?.gases ?? []);
  const names = useMemo(() => ({ ...surroundings, gases }), [surroundings, gases]);
  const completion = useMemo(
    () => ({ kind: cell.kind, ownName: cell.name, cells: surroundings.cells, names: surroundings.names }),
    [cell.kind, cell.name, surroundings],
  );
  const result = evaluation?.result;
  const isProse = cell.kind === "prose";

  const applyRemedy = useCallback(
    ({ remedy }: Note) => {
      if (remedy) commands.replace(cell.id, remedy.range, remedy.replacement);
    },
    [cell.id, commands],
  );
  const onRemedy = isEditable ? applyRemedy : undefined;

  const handleKeyDown = (event: React.KeyboardEvent) => {
    if (event.target !== event.currentTarget || !isEditable) return;
    if (event.key === "Enter") enterCell(event.currentTarget as HTMLElement);
    else if (event.altKey && event.key === "ArrowUp") commands.move(cell.id, -1);
    else if (event.altKey && event.key === "ArrowDown") commands.move(cell.id, 1);
    else if (event.key === "Delete" || event.key === "Backspace") commands.remove(cell.id);
    else return;
    event.preventDefault();
  };

  return (
    <section
      ref={section}
      id={`cell-${cell.id}`}
      className={isProse ? "cell cell-prose" : "cell"}
      tabIndex={-1}
      aria-labelledby={isProse ? undefined : titleId}
      aria-label={isProse && cell.name !== "" ? `Prose ${cell.name}` : undefined}
      onKeyDown={handleKeyDown}
    >
      {isProse ? (
        <ProseCell
          cell={cell}
          isEditable={isEditable}
          isNew={isNew}
          commands={commands}
          onDragStart={(event) => onDragStart(cell.id, event)}
        />
      ) : (
        <>
          <CellHead
            cell={cell}
            titleId={titleId}
            worst={props.isLate || !result ? null : worstNotes(result.notes)}
            isEditable={isEditable}
            commands={commands}
            onDragStart={(event) => onDragStart(cell.id, event)}
          />
          {isNear || isNew ? (
            <EntriesEditor
              cellId={cell.id}
              label={`Entries of ${cellTitle(cell)}`}
              text={cell.text}
              readText={props.readText}
              understood={evaluation?.understood ?? []}
              notes={result?.notes ?? noNotes}
              isEditable={isEditable}
              names={names}
              completion={completion}
              commands={commands}
              autoFocus={isNew && cell.name !== ""}
            />
          ) : (
            <pre className="entries entries-waiting">{cell.text}</pre>
          )}
          {evaluation && <DefaultsLine defaults={evaluation.defaults} />}
          <CellResults {...props} isNear={isNear} onRemedy={onRemedy} />
          <CellNotes notes={props.notes} cell={cell} task={props.task} onRemedy={onRemedy} />
        </>
      )}
    </section>
  );
});

/** From the cell into its text. */
function enterCell(section: HTMLElement): void {
  const inside = section.querySelector<HTMLElement>(".cm-content, [data-write]");
  if (inside?.matches("[data-write]")) inside.click();
  else inside?.focus();
}

/** The same list for as long as it says the same. */
function useSame(list: readonly string[]): readonly string[] {
  const key = list.join(" ");
  // eslint-disable-next-line react-hooks/exhaustive-deps -- the key stands for the list
  return useMemo(() => list, [key]);
}
