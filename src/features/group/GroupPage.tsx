import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { formatCount, formatDay } from "../../lib/format";
import { useAccount } from "../../lib/session";
import { AltitudeRule } from "../../ui/AltitudeRule";
import { Opening } from "../../ui/Opening";
import { Page } from "../../ui/Page";
import { ProblemPage } from "../../ui/ProblemPage";
import { TextButton } from "../../ui/TextButton";
import { AuditTrail } from "./AuditTrail";
import { groupQuery } from "./groupQueries";
import { groupRoleOptions } from "./groupRoles";
import { Invitations } from "./Invitations";
import { MemberList } from "./MemberList";
import { RenameGroupDialog } from "./RenameGroupDialog";

/** One group: who is in it, by which role, and what each role may do. */
export function GroupPage({ groupId }: { groupId: string }) {
  const group = useQuery(groupQuery(groupId));
  const account = useAccount();
  const [isRenaming, setRenaming] = useState(false);
  if (group.isPending) return <Opening what="the group" />;
  if (group.isError) {
    return <ProblemPage error={group.error} onRetry={() => void group.refetch()} email={account?.email} />;
  }

  const { name, code, memberList, foundedAt, abilities } = group.data;
  const people = formatCount(memberList.length, "member");
  return (
    <Page title={name} width={1125}>
      <AltitudeRule width={1125} className="mt-44 wide:mt-52" />
      <div className="flex flex-wrap items-center gap-x-28 gap-y-8 pt-28">
        <p className="type-code text-[44px]/[46px] wide:text-[72px]/[74px]">{code}</p>
        <div>
          <h1 className="type-display">{name}</h1>
          <p className="pt-4 text-ink2 italic">
            {people[0]?.toUpperCase()}
            {people.slice(1)}, founded {formatDay(new Date(foundedAt), new Date())}
            {abilities.rename && (
              <TextButton className="ml-12 not-italic" onClick={() => setRenaming(true)}>
                Rename
              </TextButton>
            )}
          </p>
        </div>
      </div>
      <div className="grid gap-x-60 gap-y-44 pt-44 margin:grid-cols-[minmax(0,1fr)_264px]">
        <div>
          <h2 className="pb-12 type-section">Members</h2>
          <MemberList group={group.data} />
          {abilities.invite && <Invitations groupId={groupId} />}
          {abilities.seeAudit && <AuditTrail groupId={groupId} members={memberList} />}
        </div>
        <aside className="margin:pt-40" aria-label="About roles">
          <div className="border-t-[1.5px] border-ink pt-12">
            <h2 className="pb-8 font-sans text-[13px]/[18px] font-semibold">What each role may do</h2>
            <dl>
              {groupRoleOptions.map((role) => (
                <div key={role.value} className="pb-8">
                  <dt className="font-sans text-[13px]/[18px] font-semibold">{role.label}</dt>
                  <dd className="type-comment text-ink2">{role.hint}</dd>
                </div>
              ))}
            </dl>
          </div>
          <div className="mt-8 border-t border-rule pt-12">
            <h2 className="pb-4 font-sans text-[13px]/[18px] font-semibold">The code</h2>
            <p className="type-comment text-ink2">{code} names the group and doesn’t change.</p>
          </div>
        </aside>
      </div>
      {isRenaming && <RenameGroupDialog groupId={groupId} name={name} onClose={() => setRenaming(false)} />}
    </Page>
  );
}
