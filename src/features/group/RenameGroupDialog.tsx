import { useState } from "react";
import { renameGroupBody } from "../../../shared/schemas/groups";
import { failureSentence } from "../../lib/ApiError";
import { Button } from "../../ui/Button";
import { Dialog, DialogActions } from "../../ui/Dialog";
import { Field } from "../../ui/Field";
import { useRenameGroup } from "./groupQueries";

interface RenameGroupDialogProps {
  groupId: string;
  name: string;
  onClose: () => void;
}

/** Gives a group another name. */
export function RenameGroupDialog({ groupId, name: before, onClose }: RenameGroupDialogProps) {
  const [name, setName] = useState(before);
  const [complaint, setComplaint] = useState<string>();
  const rename = useRenameGroup(groupId);

  function handleSubmit(event: React.FormEvent) {
    event.preventDefault();
    const parsed = renameGroupBody.safeParse({ name });
    if (!parsed.success) {
      setComplaint(parsed.error.issues[0]?.message);
      return;
    }
    rename.mutate(parsed.data.name, { onSuccess: onClose });
  }

  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="Rename the group"
      description="The code stays: it names the group where the name is not written out."
    >
      <form onSubmit={handleSubmit} noValidate className="pt-18">
        <Field
          label="Name"
          autoFocus
          maxLength={120}
          value={name}
          onChange={(event) => {
            setName(event.target.value);
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
