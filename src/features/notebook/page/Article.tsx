import { use, useDeferredValue } from "react";
import type { NotebookDocument } from "../../../../shared/notebook/document";
import type { DocumentEdit } from "../../../../shared/notebook/editDocument";
import type { UnitSystem } from "../../../lib/format";
import { CautionFooter } from "../../../ui/CautionFooter";
import { Message } from "../../../ui/Message";
import type { CellCommands } from "../cells/useCellCommands";
import type { LiveEvaluation } from "../evaluation/useEvaluation";
import type { TaskStates } from "../evaluation/useLongTasks";
import type { NotebookNotes } from "../evaluation/useNotebookNotes";
import { GoneThreads } from "../comments/CellThreads";
import { CommentsContext } from "../comments/commentsContext";
import { MarginThreads } from "../comments/MarginThreads";
import { ExplainDesk } from "../explain/ExplainDesk";
import { HereSentences } from "../live/HereNow";
import { LiveContext } from "../live/liveContext";
import { EmptySheet } from "./EmptySheet";
import { Headline } from "./Headline";
import { NotesList } from "./NotesList";
import { Sheet } from "./Sheet";
import { SheetHead } from "./SheetHead";
import { StripPane } from "./StripPane";
import { useColumnInView } from "./useColumnInView";
import { useDrawnStrip } from "./useDrawnStrip";

interface ArticleProps {
  document: NotebookDocument;
  live: LiveEvaluation;
  /** null where nothing is computed that takes long: a kept version has its answers. */
  tasks: TaskStates | null;
  notes: NotebookNotes;
  unitSystem: UnitSystem;
  kicker: readonly string[];
  /** null where it can only be read. */
  edit: ((edit: DocumentEdit, words?: string) => void) | null;
  newCellId: string | null;
  commands: CellCommands;
  /** What stands between the head and the cells. */
  children?: React.ReactNode;
}

/** The notebook as it is set: the strip at the left edge, the sheet, and the margin. */
export function Article({
  document,
  live,
  tasks,
  notes,
  unitSystem,
  kicker,
  edit,
  newCellId,
  commands,
  children,
}: ArticleProps) {
  const { late, failure } = live;
  // Figures follow a key first; what stands round the sheet comes right after them.
  const evaluated = useDeferredValue(live.evaluated);
  const columnId = useColumnInView(document, evaluated?.cells);
  const comments = use(CommentsContext);
  const { moveTo } = use(LiveContext);
  const hasThreads = comments !== null && (comments.threads.length > 0 || comments.writingOn !== null);
  const { strip, spread } = useDrawnStrip(columnId, evaluated?.cells);

  return (
    <ExplainDesk document={document} live={live} unitSystem={unitSystem}>
      <div className="notebook-grid">
        <StripPane
          strip={strip}
          exobaseSpread={spread}
          unitSystem={unitSystem}
          isVoid={columnId !== null && late.has(columnId)}
        />
        <main id="page" className="notebook-sheet" tabIndex={-1}>
          <SheetHead document={document} kicker={kicker} edit={edit}>
            {evaluated && (
              <Headline items={evaluated.headline} unitSystem={unitSystem} isLate={late.size > 0} />
            )}
          </SheetHead>
          <aside className="margin" aria-label="Margin" data-threads={hasThreads || undefined}>
            <HereSentences cells={document.cells} />
            <NotesList notes={notes.listed} />
            <MarginThreads cells={document.cells} />
          </aside>
          <div className="sheet-body" onFocus={(event) => moveTo(cellIdAround(event.target))}>
            {failure && (
              <Message state="fault" live="assertive">
                The notebook could not be computed: {failure} What is written is safe; change it, or load the
                page again.
              </Message>
            )}
            {children}
            {document.cells.length === 0 && <EmptySheet commands={edit && commands} />}
            <Sheet
              document={document}
              live={live}
              tasks={tasks}
              notesOf={notes.of}
              unitSystem={unitSystem}
              isEditable={edit !== null}
              newCellId={newCellId}
              commands={commands}
            />
            <GoneThreads />
            <CautionFooter className="pt-64 pb-64" />
          </div>
        </main>
      </div>
    </ExplainDesk>
  );
}

/** The cell that holds an element. */
function cellIdAround(element: Element): string | null {
  return element.closest(".cell")?.id.replace(/^cell-/, "") ?? null;
}
