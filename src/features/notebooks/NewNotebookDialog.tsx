import { useState } from "react";
import { useNavigate } from "react-router-dom";
import type { GroupSummary } from "../../../shared/schemas/groups";
import { createNotebookBody } from "../../../shared/schemas/notebooks";
import { ApiError, failureSentence } from "../../lib/ApiError";
import { Button } from "../../ui/Button";
import { Dialog, DialogActions } from "../../ui/Dialog";
import { Field } from "../../ui/Field";
import { Message } from "../../ui/Message";
import { RadioLine } from "../../ui/RadioLine";
import { useCreateNotebook } from "./notebooksQueries";
import { outlineDocument } from "./outlineDocument";
import { ownShelf, WhereField } from "./WhereField";

export type Beginning = "outline" | "empty";

const beginnings: readonly { value: Beginning; label: string }[] = [
  { value: "outline", label: "an outline" },
  { value: "empty", label: "nothing" },
];

interface NewNotebookDialogProps {
  groups: readonly GroupSummary[];
  beginning: Beginning;
  onClose: () => void;
}

/** Asks what a notebook is called, what it begins with and where it stands; then opens it. */
export function NewNotebookDialog({ groups, beginning: first, onClose }: NewNotebookDialogProps) {
  const [title, setTitle] = useState("");
  const [beginning, setBeginning] = useState(first);
  const [where, setWhere] = useState<string>(ownShelf);
  const [complaint, setComplaint] = useState<string>();
  const create = useCreateNotebook();
  const navigate = useNavigate();

  function handleSubmit(event: React.FormEvent) {
    event.preventDefault();
    const parsed = createNotebookBody.safeParse({
      title,
      groupId: where === ownShelf ? null : where,
      document: beginning === "outline" && title.trim() ? outlineDocument(title.trim(), newId) : undefined,
    });
    if (!parsed.success) {
      setComplaint(parsed.error.issues[0]?.message);
      return;
    }
    create.mutate(parsed.data, { onSuccess: ({ id }) => void navigate(`/notebooks/${id}`) });
  }

  const titleFault = create.error instanceof ApiError ? create.error.issueAt("title") : undefined;
  return (
    <Dialog open onOpenChange={(open) => !open && onClose()} title="New notebook">
      <form onSubmit={handleSubmit} noValidate className="grid gap-18 pt-18">
        {create.isError && !titleFault && (
          <Message state="fault" live="assertive">
            {failureSentence(create.error)}
          </Message>
        )}
        <Field
          label="Title"
          autoFocus
          value={title}
          placeholder="Escape of hydrogen from …"
          onChange={(event) => {
            setTitle(event.target.value);
            setComplaint(undefined);
          }}
          fault={complaint ?? titleFault}
        />
        <div>
          <div className="pb-3 type-label text-ink2">It begins with</div>
          <RadioLine label="It begins with" value={beginning} options={beginnings} onChange={setBeginning} />
          <p className="pt-4 type-label text-ink3">
            {beginning === "outline"
              ? "A body, the air over it and what escapes, with numbers to replace by your own."
              : "A title, then cells one by one."}
          </p>
        </div>
        <WhereField groups={groups} value={where} onChange={setWhere} />
        <DialogActions>
          <Button tone="main" type="submit" busy={create.isPending}>
            Begin
          </Button>
          <Button onClick={onClose}>Leave it</Button>
        </DialogActions>
      </form>
    </Dialog>
  );
}

function newId(): string {
  return crypto.randomUUID();
}
