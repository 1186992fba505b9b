import { useState } from "react";
import { failureSentence } from "../../../lib/ApiError";
import { formatCount } from "../../../lib/format";
import { Button } from "../../../ui/Button";
import { Dialog, DialogActions } from "../../../ui/Dialog";
import { Field } from "../../../ui/Field";
import { Message } from "../../../ui/Message";
import { useNotify } from "../../../ui/Notices";
import { TextButton } from "../../../ui/TextButton";
import { useKeepVersion } from "../notebookQueries";

interface KeepVersionProps {
  notebookId: string;
  /** Saves what waits; null where it could not be saved. */
  flush: () => Promise<number | null>;
  /** How many faults the draft has now. */
  faults: number;
  isOpen: boolean;
  onOpenChange: (isOpen: boolean) => void;
}

const unsaved =
  "The draft could not be saved, so no version can be kept of it yet. It is kept in this browser meanwhile.";

/** Keeps the draft as it is as a numbered version, with a message that says what it is. */
export function KeepVersion({ notebookId, flush, faults, isOpen, onOpenChange }: KeepVersionProps) {
  const [message, setMessage] = useState("");
  const [fault, setFault] = useState<string | null>(null);
  const [isBusy, setBusy] = useState(false);
  const keep = useKeepVersion(notebookId);
  const notify = useNotify();

  async function handleKeep(event: React.FormEvent): Promise<void> {
    event.preventDefault();
    if (message.trim() === "") {
      setFault("A message is needed: say what this version is.");
      return;
    }
    setBusy(true);
    setFault(null);
    try {
      const revision = await flush();
      if (revision === null) {
        setFault(unsaved);
        return;
      }
      const version = await keep.mutateAsync({ message: message.trim(), revision });
      onOpenChange(false);
      setMessage("");
      notify({ state: "holds", text: `Kept as version ${version.number}.` });
    } catch (error) {
      setFault(failureSentence(error));
    } finally {
      setBusy(false);
    }
  }

  return (
    <Dialog
      open={isOpen}
      onOpenChange={onOpenChange}
      title="Keep a version"
      description="A version never changes: it keeps the text, its results and the engine that computed them."
    >
      <form onSubmit={(event) => void handleKeep(event)} className="pt-18">
        <Field
          label="What this version is"
          value={message}
          maxLength={1000}
          autoFocus
          fault={fault ?? undefined}
          onChange={(event) => setMessage(event.target.value)}
        />
        {faults > 0 && (
          <Message state="caution" className="mt-18">
            The draft has {formatCount(faults, "fault")}. It is kept as it is.
          </Message>
        )}
        <DialogActions>
          <Button type="submit" tone="main" busy={isBusy}>
            Keep a version
          </Button>
          <TextButton onClick={() => onOpenChange(false)}>Not now</TextButton>
        </DialogActions>
      </form>
    </Dialog>
  );
}
