import { useState } from "react";
import { useNavigate } from "react-router-dom";
import type { NotebookResponse } from "../../../../shared/schemas/notebooks";
import { failureSentence } from "../../../lib/ApiError";
import { Button } from "../../../ui/Button";
import { Dialog, DialogActions } from "../../../ui/Dialog";
import { Message } from "../../../ui/Message";
import { useNotify } from "../../../ui/Notices";
import { TextButton } from "../../../ui/TextButton";
import { useRestoreVersion } from "../notebookQueries";

interface RestoreVersionProps {
  notebook: NotebookResponse;
  number: number;
}

/** Puts the text of a version into the draft, as a new revision; versions stay as they are. */
export function RestoreVersion({ notebook, number }: RestoreVersionProps) {
  const [isAsking, setAsking] = useState(false);
  const restore = useRestoreVersion(notebook.id);
  const navigate = useNavigate();
  const notify = useNotify();

  const handleRestore = () =>
    restore.mutate(
      { number, revision: notebook.revision },
      {
        onSuccess: () => {
          notify({ state: "holds", text: `The draft is as in version ${number}.` });
          void navigate(`/notebooks/${notebook.id}`);
        },
      },
    );

  return (
    <>
      <Button size="small" className="flex-none" onClick={() => setAsking(true)}>
        Restore
      </Button>
      <Dialog
        open={isAsking}
        onOpenChange={setAsking}
        title={`Restore version ${number}`}
        description="Its text becomes the draft, as a new revision. What the draft says now is replaced; keep a version of it first if it is still wanted."
      >
        {restore.isError && (
          <Message state="fault" live="assertive" className="mt-18">
            {failureSentence(restore.error)}
          </Message>
        )}
        <DialogActions>
          <Button tone="main" busy={restore.isPending} onClick={handleRestore}>
            Restore
          </Button>
          <TextButton onClick={() => setAsking(false)}>Leave the draft</TextButton>
        </DialogActions>
      </Dialog>
    </>
  );
}
