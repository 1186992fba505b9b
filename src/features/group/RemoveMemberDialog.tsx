import { useQuery } from "@tanstack/react-query";
import { useNavigate } from "react-router-dom";
import type { GroupMember, GroupResponse } from "../../../shared/schemas/groups";
import { failureSentence } from "../../lib/ApiError";
import { formatCount } from "../../lib/format";
import { useAccount } from "../../lib/session";
import { Button } from "../../ui/Button";
import { Dialog, DialogActions } from "../../ui/Dialog";
import { useNotify } from "../../ui/Notices";
import { memberNotebooksQuery, useRemoveMember } from "./groupQueries";

interface RemoveMemberDialogProps {
  group: GroupResponse;
  member: GroupMember;
  isSelf: boolean;
  onClose: () => void;
}

/** Asks before someone leaves or is removed, and says what becomes of their notebooks. */
export function RemoveMemberDialog({ group, member, isSelf, onClose }: RemoveMemberDialogProps) {
  const account = useAccount();
  const remove = useRemoveMember(group.id);
  const notify = useNotify();
  const navigate = useNavigate();
  const { user } = member;
  const left = useQuery(memberNotebooksQuery(group.id, user.id));

  function handleRemove() {
    remove.mutate(user.id, {
      onSuccess: () => {
        notify({
          state: "holds",
          text: isSelf ? `You have left ${group.name}.` : `${user.name} was removed.`,
        });
        onClose();
        if (isSelf) void navigate("/groups");
      },
    });
  }

  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={isSelf ? `Leave ${group.name}` : `Remove ${user.name}`}
      description={
        isSelf
          ? "You no longer see what is shared with the group. Only a lead can invite you again."
          : `${user.name} no longer sees what is shared with the group. You can invite them again.`
      }
    >
      <p role="status" className="pt-12 type-text">
        {left.isPending && "Counting the notebooks that stay…"}
        {left.isError && `The notebooks that stay could not be counted. ${failureSentence(left.error)}`}
        {left.data && notebooksSentence(left.data, isSelf ? null : user.name, account?.id)}
      </p>
      {remove.isError && (
        <p role="alert" className="pt-12 type-meta text-redline">
          {failureSentence(remove.error)}
        </p>
      )}
      <DialogActions>
        <Button tone="fault" onClick={handleRemove} busy={remove.isPending} disabled={!left.data}>
          {isSelf ? "Leave the group" : "Remove from the group"}
        </Button>
        <Button onClick={onClose}>Keep</Button>
      </DialogActions>
    </Dialog>
  );
}

/** `whose` is null for oneself. */
function notebooksSentence(
  { notebooks, goTo }: { notebooks: number; goTo: { id: string; name: string } },
  whose: string | null,
  selfId: string | undefined,
): string {
  const owner = whose ?? "You";
  if (notebooks === 0) return `${owner} ${whose ? "has" : "have"} no notebooks in the group.`;
  const heir = goTo.id === selfId ? "you" : goTo.name;
  const count = formatCount(notebooks, "notebook");
  const verb = notebooks === 1 ? "stays and becomes" : "stay and become";
  const advice = whose ? "" : " Move those you want to keep to your own shelf first.";
  return `${whose ? `${whose}’s` : "Your"} ${count} in the group, private drafts too, ${verb} ${heir === "you" ? "yours" : `${heir}’s`}.${advice}`;
}
