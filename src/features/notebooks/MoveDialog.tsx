import { useState } from "react";
import type { GroupSummary } from "../../../shared/schemas/groups";
import type { NotebookListItem } from "../../../shared/schemas/notebooks";
import { failureSentence } from "../../lib/ApiError";
import { Button } from "../../ui/Button";
import { Dialog, DialogActions } from "../../ui/Dialog";
import { useNotify } from "../../ui/Notices";
import { useMoveNotebook } from "./notebooksQueries";
import { ownShelf, WhereField } from "./WhereField";

interface MoveDialogProps {
  notebook: NotebookListItem;
  groups: readonly GroupSummary[];
  onClose: () => void;
}

/** Moves a notebook between one's own shelf and the groups in which one may write. */
export function MoveDialog({ notebook, groups, onClose }: MoveDialogProps) {
  const here = notebook.group?.id ?? ownShelf;
  const [where, setWhere] = useState(here);
  const move = useMoveNotebook();
  const notify = useNotify();
  const hasChoice = groups.some((group) => group.abilities.createNotebook) || notebook.group !== null;

  function handleSubmit(event: React.FormEvent) {
    event.preventDefault();
    const groupId = where === ownShelf ? null : where;
    move.mutate(
      { id: notebook.id, groupId },
      {
        onSuccess: () => {
          const place = groups.find((group) => group.id === groupId)?.name ?? "your own shelf";
          notify({ state: "holds", text: `“${notebook.title}” stands in ${place} now.` });
          onClose();
        },
      },
    );
  }

  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="Move the notebook"
      description={
        notebook.group
          ? `${notebook.group.name} no longer sees it as a group; whom it is shared with in person keep it.`
          : "Whom it is shared with in person keep it."
      }
    >
      <form onSubmit={handleSubmit} className="pt-18">
        {hasChoice ? (
          <WhereField groups={groups} value={where} onChange={setWhere} />
        ) : (
          <p className="type-text">You write in no group yet, so there is nowhere else to move it.</p>
        )}
        {move.isError && (
          <p role="alert" className="pt-12 type-meta text-redline">
            {failureSentence(move.error)}
          </p>
        )}
        <DialogActions>
          {hasChoice && (
            <Button tone="main" type="submit" busy={move.isPending} disabled={where === here}>
              Move
            </Button>
          )}
          <Button onClick={onClose}>Leave it</Button>
        </DialogActions>
      </form>
    </Dialog>
  );
}
