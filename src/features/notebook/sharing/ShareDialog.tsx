import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import type { NotebookResponse } from "../../../../shared/schemas/notebooks";
import type { ShareRole } from "../../../../shared/schemas/roles";
import type { SharesResponse } from "../../../../shared/schemas/shares";
import { failureSentence } from "../../../lib/ApiError";
import { formatCount, formatDay } from "../../../lib/format";
import { useAccount } from "../../../lib/session";
import { Button } from "../../../ui/Button";
import { Dialog } from "../../../ui/Dialog";
import { Message } from "../../../ui/Message";
import { useNotify } from "../../../ui/Notices";
import { StateMark } from "../../../ui/StateMark";
import { TextButton } from "../../../ui/TextButton";
import { HandOverNotebook } from "./HandOverNotebook";
import { ShareForm } from "./ShareForm";
import { ShareLine } from "./ShareLine";
import {
  sharesQuery,
  useInviteAgain,
  useRevokeInvitation,
  useSetGroupShare,
  useSetInvitedRole,
  useSetShareRole,
  useTakeBackShare,
} from "./sharingQueries";

interface ShareDialogProps {
  notebook: NotebookResponse;
  onClose: () => void;
  /** Called once the person has given up their own share. */
  onLeft: () => void;
}

/** Who may see a notebook, for everyone who may; what can be changed about it, for its owner. */
export function ShareDialog({ notebook, onClose, onLeft }: ShareDialogProps) {
  const shares = useQuery(sharesQuery(notebook.id));
  const [isHandingOver, setHandingOver] = useState(false);
  return (
    <Dialog open onOpenChange={(open) => !open && onClose()} title="Who may see it" width={735}>
      {shares.isPending && (
        <p role="status" className="pt-18 type-meta text-ink2">
          Reading who may see it…
        </p>
      )}
      {shares.isError && (
        <Message
          state="fault"
          live="assertive"
          className="mt-18"
          action={<TextButton onClick={() => void shares.refetch()}>Try again</TextButton>}
        >
          {failureSentence(shares.error)}
        </Message>
      )}
      {shares.data &&
        (isHandingOver ? (
          <HandOverNotebook
            notebookId={notebook.id}
            people={shares.data.people}
            isInGroup={shares.data.group !== null}
            onDone={() => setHandingOver(false)}
          />
        ) : (
          <>
            <ShareList
              notebook={notebook}
              shares={shares.data}
              onLeft={onLeft}
              onHandOver={() => setHandingOver(true)}
            />
            {notebook.abilities.share && <ShareForm notebookId={notebook.id} />}
            <div className="pt-18 text-right">
              <Button onClick={onClose}>Close</Button>
            </div>
          </>
        ))}
    </Dialog>
  );
}

interface ShareListProps {
  notebook: NotebookResponse;
  shares: SharesResponse;
  onLeft: () => void;
  onHandOver: () => void;
}

function ShareList({ notebook, shares, onLeft, onHandOver }: ShareListProps) {
  const { id, abilities } = notebook;
  const { owner, people, invitations, group } = shares;
  const account = useAccount();
  const notify = useNotify();
  const setRole = useSetShareRole(id);
  const takeBack = useTakeBackShare(id);
  const setInvitedRole = useSetInvitedRole(id);
  const again = useInviteAgain(id);
  const revoke = useRevokeInvitation(id);
  const setGroupShare = useSetGroupShare(id);
  const now = new Date();
  const tell = (done: string) => ({
    onSuccess: () => notify({ state: "holds", text: done }),
    onError: (error: unknown) => notify({ state: "fault", text: failureSentence(error) }),
  });
  const onDay = (at: string): string => formatDay(new Date(at), now);

  return (
    <ul className="ruled-list mt-12" aria-label="Who may see it">
      <ShareLine
        name={owner.name}
        about={owner.id === account?.id ? "you" : "its owner"}
        role="owner"
        onRole={null}
        acts={abilities.handOver && <TextButton onClick={onHandOver}>Hand over</TextButton>}
      />
      {people.map(({ user, role, since, groupRole }) => {
        const isSelf = user.id === account?.id;
        return (
          <ShareLine
            key={user.id}
            name={user.name}
            about={`${isSelf ? "you" : groupRole && group ? `${groupRole} in ${group.name}` : "in person"}, since ${onDay(since)}`}
            role={role}
            onRole={
              abilities.share
                ? (next) =>
                    setRole.mutate({ userId: user.id, role: next }, tell(`${user.name} is now ${next}.`))
                : null
            }
            acts={
              isSelf && abilities.leave ? (
                <TextButton
                  disabled={takeBack.isPending}
                  onClick={() =>
                    takeBack.mutate(user.id, {
                      onSuccess: onLeft,
                      onError: (error) => notify({ state: "fault", text: failureSentence(error) }),
                    })
                  }
                >
                  Give up
                </TextButton>
              ) : abilities.share ? (
                <TextButton
                  aria-label={`Take back from ${user.name}`}
                  disabled={takeBack.isPending}
                  onClick={() => takeBack.mutate(user.id, tell(`${user.name} no longer sees it in person.`))}
                >
                  Take back
                </TextButton>
              ) : null
            }
          />
        );
      })}
      {invitations.map(({ id: invitationId, email, role, invitedAt, expiresAt, hasLapsed }) => (
        <ShareLine
          key={invitationId}
          name={email}
          about={
            <span className="flex items-baseline gap-6">
              <StateMark state={hasLapsed ? "remark" : "waits"} className="translate-y-1" />
              <span className={hasLapsed ? "" : "text-dusk"}>
                {hasLapsed
                  ? `invited on ${onDay(invitedAt)}, lapsed without an answer`
                  : `invited on ${onDay(invitedAt)}, no answer yet; lapses on ${onDay(expiresAt)}`}
              </span>
            </span>
          }
          role={role}
          onRole={(next) =>
            setInvitedRole.mutate({ invitationId, role: next }, tell(`${email} is invited as ${next}.`))
          }
          acts={
            <>
              <TextButton
                aria-label={`Send again the invitation of ${email}`}
                disabled={again.isPending}
                onClick={() =>
                  again.mutate(invitationId, tell(`${email} has a new letter; the old link is void.`))
                }
              >
                Send again
              </TextButton>
              <TextButton
                aria-label={`Take back the invitation of ${email}`}
                disabled={revoke.isPending}
                onClick={() => revoke.mutate(invitationId, tell(`The invitation of ${email} is taken back.`))}
              >
                Take back
              </TextButton>
            </>
          }
        />
      ))}
      {group && (
        <ShareLine
          name={`Everyone in ${group.name}`}
          about={`${formatCount(group.people, "person", "people")}${group.guests > 0 ? `, ${formatCount(group.guests, "guest")} among them, who read at most` : ""}`}
          role={group.role}
          onRole={
            abilities.share
              ? (next: ShareRole) => setGroupShare.mutate(next, tell(`The group has it, as ${next}.`))
              : null
          }
          acts={
            abilities.share &&
            (group.role === null ? (
              <TextButton
                disabled={setGroupShare.isPending}
                onClick={() => setGroupShare.mutate("reader", tell("The group may read it."))}
              >
                Share with all
              </TextButton>
            ) : (
              <TextButton
                aria-label={`Take back from everyone in ${group.name}`}
                disabled={setGroupShare.isPending}
                onClick={() => setGroupShare.mutate(null, tell("The group no longer sees it."))}
              >
                Take back
              </TextButton>
            ))
          }
        />
      )}
    </ul>
  );
}
