import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { Link, useNavigate } from "react-router-dom";
import type { CellPlace } from "../../../shared/notebook/addHandbookCell";
import { failureSentence } from "../../lib/ApiError";
import { useAccount } from "../../lib/session";
import { Button } from "../../ui/Button";
import { Dialog, DialogActions } from "../../ui/Dialog";
import { Message } from "../../ui/Message";
import { useNotify } from "../../ui/Notices";
import { RadioLine } from "../../ui/RadioLine";
import type { TableRow } from "./handbookTable";
import { CellRefused, usePutHandbookCell, writableNotebooksQuery } from "./handbookQueries";
import { NotebookChoice } from "./NotebookChoice";

const places: readonly { value: CellPlace; label: string }[] = [
  { value: "end", label: "at the end" },
  { value: "aboveColumns", label: "above the first column" },
];

/** Shows a row as a cell, to be put into a notebook that one may write in, or to be copied. */
export function PutDialog({ row, onClose }: { row: TableRow; onClose: () => void }) {
  const account = useAccount();
  const notify = useNotify();
  const navigate = useNavigate();
  const forms = row.forms ?? [];
  const [formLabel, setFormLabel] = useState(forms[0]?.label ?? "");
  const [place, setPlace] = useState<CellPlace>("end");
  const [chosenId, setChosenId] = useState<string | null>(null);
  const [copied, setCopied] = useState<string | null>(null);
  const notebooks = useQuery({ ...writableNotebooksQuery, enabled: account !== null });
  const put = usePutHandbookCell();

  const choices = (forms.find(({ label }) => label === formLabel) ?? forms[0])?.choices ?? [];
  const cell = choices[0];
  if (!cell) return null;
  const isGas = cell.kind === "gas";
  const notebook = notebooks.data?.find(({ id }) => id === chosenId) ?? notebooks.data?.[0];

  function handleSubmit(event: React.FormEvent) {
    event.preventDefault();
    if (!notebook || put.isPending) return;
    put.mutate(
      { notebookId: notebook.id, choices, place: isGas ? place : "end" },
      {
        onSuccess: (added) => {
          onClose();
          notify({
            state: "holds",
            text: `The ${added.kind} cell ${added.name} stands in “${notebook.title}”.`,
            action: { label: "Open it", run: () => void navigate(`/notebooks/${notebook.id}`) },
          });
        },
      },
    );
  }

  async function handleCopy() {
    try {
      await navigator.clipboard.writeText(cell!.text);
      setCopied("Copied.");
    } catch {
      setCopied("The browser did not let the entries be copied. Mark them above and copy from there.");
    }
  }

  return (
    <Dialog open onOpenChange={(open) => !open && onClose()} title="Put into a notebook" width={640}>
      <form onSubmit={handleSubmit} className="grid gap-18 pt-18">
        {forms.length > 1 && (
          <RadioLine
            label="How it is written"
            value={formLabel}
            options={forms.map(({ label }) => ({ value: label, label }))}
            onChange={setFormLabel}
          />
        )}
        <div className="min-w-0">
          <p className="pb-4">
            <span className="type-kind">{cell.kind}</span> <span className="type-cell-name">{cell.name}</span>
          </p>
          <pre
            tabIndex={0}
            aria-label="Entries of the cell"
            className="max-h-[26vh] overflow-auto bg-sunk px-12 py-8 font-mono text-[13px]/[21px]"
          >
            {cell.text}
          </pre>
        </div>
        {account && (
          <NotebookChoice
            notebooks={notebooks}
            value={notebook?.id ?? ""}
            onChange={(id) => {
              setChosenId(id);
              put.reset();
            }}
          />
        )}
        {account && isGas && notebook && (
          <div>
            <div className="pb-3 type-label text-ink2">Where it stands</div>
            <RadioLine label="Where it stands" value={place} options={places} onChange={setPlace} />
            <p className="pt-4 type-label text-ink3">
              {place === "end"
                ? "A gas cell acts in the columns below it: in none there is now."
                : "It then acts in every column of the notebook, instead of the handbook."}
            </p>
          </div>
        )}
        {!account && (
          <p className="type-meta text-ink2">
            <Link to="/notebooks">Sign in</Link> to put it into a notebook of yours, or copy the entries.
          </p>
        )}
        {put.isError && (
          <Message state="fault" live="assertive">
            {put.error instanceof CellRefused ? put.error.message : failureSentence(put.error)}
          </Message>
        )}
        <DialogActions>
          {account && (
            <Button tone="main" type="submit" busy={put.isPending} disabled={!notebook}>
              Put it in
            </Button>
          )}
          <Button onClick={() => void handleCopy()}>Copy the entries</Button>
          <Button onClick={onClose}>Leave it</Button>
          <span role="status" className="type-label text-ink2">
            {copied}
          </span>
        </DialogActions>
      </form>
    </Dialog>
  );
}
