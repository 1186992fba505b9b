import { useId, useState } from "react";
import { documentLimits } from "../../../../shared/notebook/document";
import { Button } from "../../../ui/Button";
import { Dialog, DialogActions } from "../../../ui/Dialog";
import { Field } from "../../../ui/Field";
import { TextButton } from "../../../ui/TextButton";

interface HeadlineDialogProps {
  headline: readonly string[];
  /** Names of results that can be shown: `leak.exobase.altitude`. */
  names: readonly string[];
  onChange: (headline: string[]) => void;
  onClose: () => void;
}

const places = ["First", "Second", "Third"] as const;

/** Which results stand under the title. Left empty, the first escape cell says. */
export function HeadlineDialog({ headline, names, onChange, onClose }: HeadlineDialogProps) {
  const [written, setWritten] = useState(() => places.map((_, index) => headline[index] ?? ""));
  const [isAsked, setAsked] = useState(false);
  const listId = useId();
  const faultOf = (name: string): string | undefined =>
    isAsked && name.trim() !== "" && !names.includes(name.trim()) ? "No result of this name." : undefined;

  function handleSubmit(event: React.FormEvent): void {
    event.preventDefault();
    setAsked(true);
    const wanted = written.map((name) => name.trim()).filter((name) => name !== "");
    if (wanted.some((name) => !names.includes(name))) return;
    onChange(wanted);
    onClose();
  }

  return (
    <Dialog
      open
      onOpenChange={(open) => open || onClose()}
      title="Headline"
      description="Up to three results under the title. Left empty: the exobase of the first escape cell, and the gas that leaves fastest."
    >
      <form onSubmit={handleSubmit} className="grid gap-12 pt-18">
        <datalist id={listId}>
          {names.map((name) => (
            <option key={name} value={name} />
          ))}
        </datalist>
        {places.map((place, index) => (
          <Field
            key={place}
            label={`${place} result`}
            value={written[index]}
            list={listId}
            maxLength={documentLimits.headlineLength}
            spellCheck={false}
            autoCapitalize="off"
            className="font-mono"
            fault={faultOf(written[index]!)}
            onChange={(event) => setWritten(written.with(index, event.target.value))}
          />
        ))}
        <DialogActions>
          <Button type="submit" tone="main">
            Show these
          </Button>
          <TextButton onClick={onClose}>Leave it</TextButton>
        </DialogActions>
      </form>
    </Dialog>
  );
}
