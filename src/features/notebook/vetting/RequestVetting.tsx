import { useState } from "react";
import type { NotebookResponse } from "../../../../shared/schemas/notebooks";
import { openLicences } from "../../../../shared/schemas/licences";
import { failureSentence } from "../../../lib/ApiError";
import { Button } from "../../../ui/Button";
import { Dialog, DialogActions } from "../../../ui/Dialog";
import { Field } from "../../../ui/Field";
import { Message } from "../../../ui/Message";
import { useNotify } from "../../../ui/Notices";
import { TextArea } from "../../../ui/TextArea";
import { TextButton } from "../../../ui/TextButton";
import { useRequestVetting } from "./vettingRequests";

interface RequestVettingProps {
  notebook: NotebookResponse;
  number: number;
}

/** Puts a kept version before the group's lead, with what would be published. */
export function RequestVetting({ notebook, number }: RequestVettingProps) {
  const [isOpen, setOpen] = useState(false);
  return (
    <>
      <TextButton aria-label={`Ask for version ${number} to be vetted`} onClick={() => setOpen(true)}>
        Ask for vetting
      </TextButton>
      {isOpen && <RequestDialog notebook={notebook} number={number} onClose={() => setOpen(false)} />}
    </>
  );
}

function RequestDialog({ notebook, number, onClose }: RequestVettingProps & { onClose: () => void }) {
  const { authors } = notebook.document;
  const [message, setMessage] = useState("");
  const [summary, setSummary] = useState("");
  const [written, setWritten] = useState((authors.length > 0 ? authors : [notebook.owner.name]).join("\n"));
  const [licence, setLicence] = useState<string>(openLicences[0]);
  const [edition, setEdition] = useState("");
  const ask = useRequestVetting(notebook.id);
  const notify = useNotify();

  const handleSubmit = (event: React.FormEvent) => {
    event.preventDefault();
    const named = written
      .split("\n")
      .map((name) => name.trim())
      .filter((name) => name !== "");
    const editionOf = edition.trim() === "" ? null : Number(edition);
    ask.mutate(
      { number, body: { message, summary, authors: named, licence, editionOf } },
      {
        onSuccess: () => {
          notify({ state: "holds", text: "The lead has been asked." });
          onClose();
        },
      },
    );
  };

  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Ask for version ${number} to be vetted`}
      description="The lead sees this version, not the draft. Approved, it is published as a reference of the group and never changes."
    >
      <form onSubmit={handleSubmit} className="flex flex-col gap-14 pt-18">
        <TextArea label="Message to the lead" required rows={3} maxLength={4000} value={message} onChange={(event) => setMessage(event.target.value)} />
        <TextArea label="Summary, as it is published" required rows={3} maxLength={4000} value={summary} onChange={(event) => setSummary(event.target.value)} />
        <TextArea label="Authors in order, one a line" required rows={3} value={written} onChange={(event) => setWritten(event.target.value)} />
        <Field
          label="Licence"
          required
          maxLength={200}
          list="open-licences"
          value={licence}
          hint="An open licence, or words of your own."
          onChange={(event) => setLicence(event.target.value)}
        />
        <datalist id="open-licences">
          {openLicences.map((one) => (
            <option key={one} value={one} />
          ))}
        </datalist>
        <Field
          label={`New edition of ${notebook.group?.code ?? "reference"} number`}
          inputMode="numeric"
          pattern="[1-9][0-9]*"
          value={edition}
          hint="Leave it empty for a new reference."
          onChange={(event) => setEdition(event.target.value)}
        />
        {ask.isError && (
          <Message state="fault" live="assertive">
            {failureSentence(ask.error)}
          </Message>
        )}
        <DialogActions>
          <Button type="submit" tone="main" busy={ask.isPending}>
            Ask for vetting
          </Button>
          <TextButton onClick={onClose}>Not now</TextButton>
        </DialogActions>
      </form>
    </Dialog>
  );
}
