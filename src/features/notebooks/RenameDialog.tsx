import { useState } from "react";
import { renameNotebookBody, type NotebookListItem } from "../../../shared/schemas/notebooks";
import { failureSentence } from "../../lib/ApiError";
import { Button } from "../../ui/Button";
import { Dialog, DialogActions } from "../../ui/Dialog";
import { Field } from "../../ui/Field";
import { useRenameNotebook } from "./notebooksQueries";

/** Gives a notebook another title. */
export function RenameDialog({ notebook, onClose }: { notebook: NotebookListItem; onClose: () => void }) {
  const [title, setTitle] = useState(notebook.title);
  const [complaint, setComplaint] = useState<string>();
  const rename = useRenameNotebook();

  function handleSubmit(event: React.FormEvent) {
    event.preventDefault();
    const parsed = renameNotebookBody.safeParse({ title });
    if (!parsed.success) {
      setComplaint(parsed.error.issues[0]?.message);
      return;
    }
    rename.mutate({ id: notebook.id, title: parsed.data.title }, { onSuccess: onClose });
  }

  return (
    <Dialog open onOpenChange={(open) => !open && onClose()} title="Rename the notebook">
      <form onSubmit={handleSubmit} noValidate className="pt-18">
        <Field
          label="Title"
          autoFocus
          value={title}
          onChange={(event) => {
            setTitle(event.target.value);
            setComplaint(undefined);
            if (rename.isError) rename.reset();
          }}
          fault={complaint ?? (rename.isError ? failureSentence(rename.error) : undefined)}
        />
        <DialogActions>
          <Button tone="main" type="submit" busy={rename.isPending}>
            Rename
          </Button>
          <Button onClick={onClose}>Leave it</Button>
        </DialogActions>
      </form>
    </Dialog>
  );
}
