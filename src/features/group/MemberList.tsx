import { useState } from "react";
import type { GroupMember, GroupResponse } from "../../../shared/schemas/groups";
import type { GroupRole } from "../../../shared/schemas/roles";
import { failureSentence } from "../../lib/ApiError";
import { formatDay } from "../../lib/format";
import { useAccount } from "../../lib/session";
import { useNotify } from "../../ui/Notices";
import { TextButton } from "../../ui/TextButton";
import { WordMenu } from "../../ui/WordMenu";
import { useSetMemberRole } from "./groupQueries";
import { groupRoleOptions } from "./groupRoles";
import { HandOverLeadDialog } from "./HandOverLeadDialog";
import { RemoveMemberDialog } from "./RemoveMemberDialog";

/** Who is in a group. Roles are words to exchange for those who may set them. */
export function MemberList({ group }: { group: GroupResponse }) {
  const account = useAccount();
  const [leaving, setLeaving] = useState<GroupMember | null>(null);
  const [isHandingOver, setHandingOver] = useState(false);
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
            onHandOver={() => setHandingOver(true)}
          />
        ))}
      </ul>
      {isHandingOver && <HandOverLeadDialog group={group} onClose={() => setHandingOver(false)} />}
      {leaving && (
        <RemoveMemberDialog
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
  onHandOver: () => void;
}

function MemberLine({ group, member, isSelf, isLastLead, onRemove, onHandOver }: MemberLineProps) {
  const setRole = useSetMemberRole(group.id);
  const notify = useNotify();
  const { user, role, joinedAt } = member;
  const canHandOver = isSelf && group.abilities.handOver && group.memberList.length > 1;
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
    <li className="grid grid-cols-[minmax(0,1fr)_auto] items-baseline gap-x-18 gap-y-8 py-10 mid:grid-cols-[minmax(0,1.6fr)_130px_minmax(0,1fr)_140px]">
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
      <span className="flex flex-wrap justify-end gap-x-12 gap-y-4 text-right">
        {canHandOver && <TextButton onClick={onHandOver}>Hand over</TextButton>}
        {canRemove && !isLastLead && (
          <TextButton onClick={onRemove} aria-label={isSelf ? "Leave the group" : `Remove ${user.name}`}>
            {isSelf ? "Leave" : "Remove"}
          </TextButton>
        )}
        {isLastLead && !canHandOver && <span className="type-meta text-ink3">the last lead stays</span>}
      </span>
    </li>
  );
}
