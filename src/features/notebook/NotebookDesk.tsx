import { lazy, Suspense, useCallback, useMemo, useState } from "react";
import { useNavigate } from "react-router-dom";
import type { NotebookResponse } from "../../../shared/schemas/notebooks";
import type { Person } from "../../../shared/schemas/people";
import type { UnitSystem } from "../../lib/format";
import { Button } from "../../ui/Button";
import { useCellCommands } from "./cells/useCellCommands";
import { CommentsDesk } from "./comments/CommentsDesk";
import { ConflictPanel } from "./conflict/ConflictPanel";
import { JoinedMessage } from "./conflict/JoinedMessage";
import { useNotebookDraft } from "./draft/useNotebookDraft";
import { useEvaluation } from "./evaluation/useEvaluation";
import { useLongTasks } from "./evaluation/useLongTasks";
import { useNotebookNotes } from "./evaluation/useNotebookNotes";
import { HereNow } from "./live/HereNow";
import { Article } from "./page/Article";
import { MoreMenu } from "./page/MoreMenu";
import { NotebookBar } from "./page/NotebookBar";
import { resultNames } from "./page/resultNames";
import { SaveStatus } from "./page/SaveStatus";
import { useDeskKeys } from "./page/useDeskKeys";
import { visibleTo } from "./page/visibleTo";
import { KeepVersion } from "./versions/KeepVersion";

const ShareDialog = lazy(() =>
  import("./sharing/ShareDialog").then((file) => ({ default: file.ShareDialog })),
);

interface NotebookDeskProps {
  notebook: NotebookResponse;
  person: Person;
}

/** The notebook being read or written: its draft, what the draft gives, and where it stands with the server. */
export function NotebookDesk({ notebook, person }: NotebookDeskProps) {
  const navigate = useNavigate();
  const canEdit = notebook.abilities.edit;
  const { draft, merge, saveState, isKept, edit, undo, redo, flush, settling } = useNotebookDraft({
    notebook,
    person,
    canEdit,
  });
  const [isKeeping, setKeeping] = useState(false);
  const [isSharing, setSharing] = useState(false);
  const [readersUnits, setReadersUnits] = useState<UnitSystem | null>(null);
  const written = merge?.document ?? draft.document;
  const unitSystem = readersUnits ?? written.unitSystem;
  const document = useMemo(
    () => (written.unitSystem === unitSystem ? written : { ...written, unitSystem }),
    [written, unitSystem],
  );

  const live = useEvaluation(notebook.id, document);
  const tasks = useLongTasks(notebook.id, live);
  const notes = useNotebookNotes(document, live);
  const { commands, newCellId } = useCellCommands(draft.document, edit);
  const isEditable = canEdit && merge === null;
  useDeskKeys(isEditable ? { undo, redo } : null);

  const handleUnitSystem = useCallback(
    (system: UnitSystem) => {
      if (isEditable) edit({ type: "changeUnitSystem", unitSystem: system });
      else setReadersUnits(system);
    },
    [isEditable, edit],
  );
  const toSettle = new Set(merge?.conflicts.map(({ cellId }) => cellId)).size;
  const { lastVersion } = notebook;
  const kicker = [
    "Notebook",
    `draft, revision ${draft.agreed.revision}`,
    lastVersion === null ? "not yet kept as a version" : `last kept as version ${lastVersion}`,
    ...(live.evaluated ? [`engine ${live.evaluated.engine}`] : []),
  ];

  return (
    <div className="notebook">
      <title>{`${document.title || "Untitled"} · Tenuity`}</title>
      <NotebookBar
        title={document.title || "Untitled"}
        about={visibleTo(notebook, person)}
        others={<HereNow cells={document.cells} />}
        status={
          canEdit ? (
            <SaveStatus
              state={saveState}
              savedAt={draft.agreed.savedAt}
              toSettle={toSettle}
              isKept={isKept}
            />
          ) : (
            <span className="save-status">
              {notebook.isArchived ? "archived, to be read" : "you may read it"}
            </span>
          )
        }
        unitSystem={unitSystem}
        onUnitSystem={handleUnitSystem}
        acts={
          <>
            {notebook.abilities.keepVersion && (
              <Button
                tone="main"
                size="small"
                className="notebook-bar-keep"
                disabled={!isEditable}
                onClick={() => setKeeping(true)}
              >
                Keep a version
              </Button>
            )}
            {notebook.abilities.share && (
              <Button size="small" className="notebook-bar-share" onClick={() => setSharing(true)}>
                Share
              </Button>
            )}
            <MoreMenu
              onShares={() => setSharing(true)}
              notebook={notebook}
              document={document}
              onDeleted={() => void navigate("/notebooks")}
              unitSystem={unitSystem}
              onUnitSystem={handleUnitSystem}
              headline={
                isEditable
                  ? {
                      names: () => resultNames(live.evaluated?.cells),
                      onChange: (headline) => edit({ type: "changeHeadline", headline }, "Headline changed"),
                    }
                  : null
              }
              onKeep={notebook.abilities.keepVersion && isEditable ? () => setKeeping(true) : null}
            />
          </>
        }
      />
      <Suspense>
        {isSharing && (
          <ShareDialog
            notebook={notebook}
            onClose={() => setSharing(false)}
            onLeft={() => void navigate("/notebooks")}
          />
        )}
      </Suspense>
      <KeepVersion
        notebookId={notebook.id}
        flush={flush}
        faults={notes.count("fault")}
        isOpen={isKeeping}
        onOpenChange={setKeeping}
      />
      <CommentsDesk notebook={notebook} version={null} cells={document.cells} flush={flush}>
        <Article
          document={document}
          live={live}
          tasks={tasks}
          notes={notes}
          unitSystem={unitSystem}
          kicker={kicker}
          edit={isEditable ? edit : null}
          newCellId={newCellId}
          commands={commands}
        >
          {draft.joined && (
            <JoinedMessage joined={draft.joined} document={document} onDismiss={settling.dismissJoined} />
          )}
          {merge && draft.theirs && (
            <ConflictPanel
              merge={merge}
              mine={draft.document}
              theirs={draft.theirs}
              agreedRevision={draft.agreed.revision}
              chosen={live.evaluated?.document === document ? live.evaluated.headline : []}
              unitSystem={unitSystem}
              choices={draft.choices}
              settling={settling}
            />
          )}
        </Article>
      </CommentsDesk>
    </div>
  );
}
