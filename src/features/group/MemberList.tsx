import { useState } from "react";
import { useNavigate } from "react-router-dom";
import type { GroupMember, GroupResponse } from "../../../shared/schemas/groups";
import type { GroupRole } from "../../../shared/schemas/roles";
import { failureSentence } from "../../lib/ApiError";
import { formatDay } from "../../lib/format";
import { useAccount } from "../../lib/session";
import { Button } from "../../ui/Button";
import { Dialog, DialogActions } from "../../ui/Dialog";
import { useNotify } from "../../ui/Notices";
import { TextButton } from "../../ui/TextButton";
import { WordMenu } from "../../ui/WordMenu";
import { useRemoveMember, useSetMemberRole } from "./groupQueries";
import { groupRoleOptions } from "./groupRoles";

/** Who is in a group. Roles are words to exchange for those who may set them. */
export function MemberList({ group }: { group: GroupResponse }) {
  const account = useAccount();
  const [leaving, setLeaving] = useState<GroupMember | null>(null);
  const leads = group.memberList.filter((member) => member.role === "lead").length;

  return (
    <>
      <ul className="ruled-list">
        {group.memberList.map((member) => (
          <MemberLine
            key={member.user.id}
            group={group}
            member={member}
            isSelf={member.user.id === account?.id}
            isLastLead={member.role === "lead" && leads === 1}
            onRemove={() => setLeaving(member)}
          />
        ))}
      </ul>
      {leaving && (
        <RemoveDialog
          group={group}
          member={leaving}
          isSelf={leaving.user.id === account?.id}
          onClose={() => setLeaving(null)}
        />
      )}
    </>
  );
}

interface MemberLineProps {
  group: GroupResponse;
  member: GroupMember;
  isSelf: boolean;
  /** A group keeps at least one lead. */
  isLastLead: boolean;
  onRemove: () => void;
}

function MemberLine({ group, member, isSelf, isLastLead, onRemove }: MemberLineProps) {
  const setRole = useSetMemberRole(group.id);
  const notify = useNotify();
  const { user, role, joinedAt } = member;
  const canRemove = isSelf ? group.abilities.leave : group.abilities.removeMember;

  function handleRole(next: GroupRole) {
    if (next === role) return;
    setRole.mutate(
      { userId: user.id, role: next },
      {
        onSuccess: () =>
          notify({
            state: "holds",
            text: `${user.name} is now ${next}.`,
            action: { label: "Put back", run: () => setRole.mutate({ userId: user.id, role }) },
          }),
        onError: (error) =>
          notify({ state: "fault", text: `${user.name} stays ${role}. ${failureSentence(error)}` }),
      },
    );
  }

  return (
    <li className="grid grid-cols-[minmax(0,1fr)_auto] items-baseline gap-x-18 py-10 mid:grid-cols-[minmax(0,1.6fr)_130px_minmax(0,1fr)_140px]">
      <span className="font-serif text-[19px]/[26px]">
        {user.name}
        {isSelf && <span className="type-meta text-ink3"> you</span>}
      </span>
      <span className="font-sans text-[15px]/[24px]">
        {group.abilities.setRole && !isLastLead ? (
          <WordMenu
            label={`Role of ${user.name}`}
            value={role}
            options={groupRoleOptions}
            onChange={handleRole}
            disabled={setRole.isPending}
          />
        ) : (
          role
        )}
      </span>
      <span className="type-meta text-ink2">since {formatDay(new Date(joinedAt), new Date())}</span>
      <span className="text-right">
        {canRemove && !isLastLead && (
          <TextButton onClick={onRemove} aria-label={isSelf ? "Leave the group" : `Remove ${user.name}`}>
            {isSelf ? "Leave" : "Remove"}
          </TextButton>
        )}
        {isLastLead && <span className="type-meta text-ink3">the last lead stays</span>}
      </span>
    </li>
  );
}

interface RemoveDialogProps {
  group: GroupResponse;
  member: GroupMember;
  isSelf: boolean;
  onClose: () => void;
}

function RemoveDialog({ group, member, isSelf, onClose }: RemoveDialogProps) {
  const remove = useRemoveMember(group.id);
  const notify = useNotify();
  const navigate = useNavigate();
  const { user } = member;

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
          ? "You no longer see what is shared with the group. Notebooks you own stay yours. Only a lead can add you again."
          : `${user.name} no longer sees what is shared with the group. Their notebooks stay theirs. You can add them again.`
      }
    >
      {remove.isError && (
        <p role="alert" className="pt-12 type-meta text-redline">
          {failureSentence(remove.error)}
        </p>
      )}
      <DialogActions>
        <Button tone="fault" onClick={handleRemove} busy={remove.isPending}>
          {isSelf ? "Leave the group" : "Remove from the group"}
        </Button>
        <Button onClick={onClose}>Keep</Button>
      </DialogActions>
    </Dialog>
  );
}
