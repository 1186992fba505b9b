import { useQuery } from "@tanstack/react-query";
import type { GroupInvitation } from "../../../shared/schemas/invitations";
import type { GroupRole } from "../../../shared/schemas/roles";
import { failureSentence } from "../../lib/ApiError";
import { formatDay } from "../../lib/format";
import { Message } from "../../ui/Message";
import { useNotify } from "../../ui/Notices";
import { StateWord } from "../../ui/StateMark";
import { TextButton } from "../../ui/TextButton";
import { WordMenu } from "../../ui/WordMenu";
import { invitationsQuery, useInviteAgain, useRevokeInvitation, useSetInvitedRole } from "./groupQueries";
import { groupRoleOptions } from "./groupRoles";
import { InviteForm } from "./InviteForm";

/** Whom the group has asked in and who has not answered yet; and asking another. For leads. */
export function Invitations({ groupId }: { groupId: string }) {
  const invitations = useQuery(invitationsQuery(groupId));
  return (
    <section className="pt-44" aria-labelledby="invitations-heading">
      <h2 id="invitations-heading" className="pb-12 type-section">
        Invitations
      </h2>
      {invitations.isError && (
        <Message
          state="fault"
          live="polite"
          action={<TextButton onClick={() => void invitations.refetch()}>Try again</TextButton>}
        >
          {failureSentence(invitations.error)}
        </Message>
      )}
      {invitations.data && invitations.data.length > 0 && (
        <ul className="ruled-list" aria-label="Invitations without an answer">
          {invitations.data.map((invitation) => (
            <InvitationLine key={invitation.id} groupId={groupId} invitation={invitation} />
          ))}
        </ul>
      )}
      {invitations.data?.length === 0 && (
        <p className="border-t-[1.5px] border-ink pt-12 type-comment text-ink2">
          Everyone who was invited has answered.
        </p>
      )}
      <InviteForm groupId={groupId} />
    </section>
  );
}

function InvitationLine({ groupId, invitation }: { groupId: string; invitation: GroupInvitation }) {
  const { id, email, role, expiresAt, hasLapsed } = invitation;
  const setRole = useSetInvitedRole(groupId);
  const again = useInviteAgain(groupId);
  const revoke = useRevokeInvitation(groupId);
  const notify = useNotify();
  const tell = (done: string) => ({
    onSuccess: () => notify({ state: "holds", text: done }),
    onError: (error: unknown) => notify({ state: "fault", text: failureSentence(error) }),
  });
  const lapse = formatDay(new Date(expiresAt), new Date());

  return (
    <li className="grid grid-cols-[minmax(0,1fr)_auto] items-baseline gap-x-18 gap-y-2 py-10 mid:grid-cols-[minmax(0,1.5fr)_130px_minmax(0,1fr)_auto]">
      <span className="min-w-0">
        <span className="block font-serif text-[19px]/[26px] [overflow-wrap:anywhere]">{email}</span>
        <StateWord state={hasLapsed ? "remark" : "waits"} className="font-normal">
          {hasLapsed ? "lapsed without an answer" : "no answer yet"}
        </StateWord>
      </span>
      <span className="font-sans text-[15px]/[24px]">
        <WordMenu
          label={`Role of ${email}`}
          value={role}
          options={groupRoleOptions}
          disabled={setRole.isPending}
          onChange={(next: GroupRole) =>
            next !== role && setRole.mutate({ id, role: next }, tell(`${email} is invited as ${next}.`))
          }
        />
      </span>
      <span className="type-meta text-ink2">{hasLapsed ? `lapsed ${lapse}` : `lapses ${lapse}`}</span>
      <span className="flex flex-wrap justify-end gap-x-18">
        <TextButton
          aria-label={`Send again the invitation of ${email}`}
          disabled={again.isPending}
          onClick={() => again.mutate(id, tell(`${email} has a new letter; the old link is void.`))}
        >
          Send again
        </TextButton>
        <TextButton
          aria-label={`Take back the invitation of ${email}`}
          disabled={revoke.isPending}
          onClick={() => revoke.mutate(id, tell(`The invitation of ${email} is taken back.`))}
        >
          Take back
        </TextButton>
      </span>
    </li>
  );
}
