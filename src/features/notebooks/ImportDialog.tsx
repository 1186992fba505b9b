import { useState } from "react";
import { useNavigate } from "react-router-dom";
import type { GroupSummary } from "../../../shared/schemas/groups";
import { ApiError, failureSentence } from "../../lib/ApiError";
import { formatCount } from "../../lib/format";
import { Button } from "../../ui/Button";
import { Dialog, DialogActions } from "../../ui/Dialog";
import { useNotify } from "../../ui/Notices";
import { StateMark } from "../../ui/StateMark";
import { FileDrop } from "./FileDrop";
import { useImportNotebook } from "./notebooksQueries";
import { readNotebookText } from "./readNotebookText";
import { ownShelf, WhereField } from "./WhereField";

interface ImportDialogProps {
  groups: readonly GroupSummary[];
  /** A file that was dropped on the page. */
  file: File | null;
  onClose: () => void;
}

/** Makes a notebook of one Markdown file. A bad file names its lines, and nothing of it is taken. */
export function ImportDialog({ groups, file: dropped, onClose }: ImportDialogProps) {
  const [file, setFile] = useState<File | null>(dropped);
  const [where, setWhere] = useState<string>(ownShelf);
  const [unreadable, setUnreadable] = useState<string>();
  const importNotebook = useImportNotebook();
  const navigate = useNavigate();
  const notify = useNotify();

  function handleFile(next: File) {
    setFile(next);
    setUnreadable(undefined);
    importNotebook.reset();
  }

  async function handleSubmit(event: React.FormEvent) {
    event.preventDefault();
    if (!file) {
      setUnreadable("Choose a file first, or drop one here.");
      return;
    }
    const reading = await readNotebookText(file);
    if (!reading.ok) {
      setUnreadable(reading.message);
      return;
    }
    importNotebook.mutate(
      { text: reading.text, groupId: where === ownShelf ? null : where },
      {
        onSuccess: ({ id, notes }) => {
          if (notes.length > 0) notify({ state: "remark", text: noticed(notes) });
          void navigate(`/notebooks/${id}`);
        },
      },
    );
  }

  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="Import a Markdown file"
      description="One that was exported from a notebook, or written by hand in the same form."
      width={600}
    >
      <form onSubmit={(event) => void handleSubmit(event)} className="grid gap-18 pt-18">
        <FileDrop file={file} onFile={handleFile} />
        {(unreadable ?? importNotebook.error) && (
          <ImportComplaints
            fileName={file?.name ?? ""}
            message={unreadable ?? failureSentence(importNotebook.error)}
            error={unreadable ? null : importNotebook.error}
          />
        )}
        <WhereField groups={groups} value={where} onChange={setWhere} />
        <DialogActions>
          <Button tone="main" type="submit" busy={importNotebook.isPending}>
            Import
          </Button>
          <Button onClick={onClose}>Leave it</Button>
        </DialogActions>
      </form>
    </Dialog>
  );
}

/** The first thing noticed while a file was read, and how many more there are. */
function noticed(notes: readonly { message: string; line?: number }[]): string {
  const [first] = notes;
  const where = first?.line === undefined ? "" : `Line ${first.line}: `;
  const more = notes.length > 1 ? ` And ${formatCount(notes.length - 1, "more remark")}.` : "";
  return `${where}${first?.message ?? ""}${more}`;
}

interface ImportComplaintsProps {
  fileName: string;
  message: string;
  error: unknown;
}

function ImportComplaints({ fileName, message, error }: ImportComplaintsProps) {
  const issues = error instanceof ApiError ? error.issues : [];
  return (
    <div role="alert" className="border-y border-t-ink border-b-rule py-10">
      <p className="flex items-baseline gap-12 font-sans text-[14.5px]/[22px]">
        <StateMark state="fault" className="translate-y-1" />
        <span>{issues.length > 0 ? `${fileName} was not imported, nor any part of it:` : message}</span>
      </p>
      {issues.length > 0 && (
        <ul className="max-h-[34vh] overflow-y-auto pt-6">
          {issues.map((issue, index) => (
            <li key={index} className="grid grid-cols-[76px_minmax(0,1fr)] gap-x-12 py-3 type-meta">
              <span className="font-mono text-[13px]/[20px] text-redline">{issue.path}</span>
              <span>{issue.message}</span>
            </li>
          ))}
        </ul>
      )}
    </div>
  );
}
