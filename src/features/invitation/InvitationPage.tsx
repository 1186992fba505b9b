import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import { Link, useNavigate } from "react-router-dom";
import { acceptedInvitation, type InvitationResponse } from "../../../shared/schemas/invitations";
import type { Account } from "../../../shared/schemas/session";
import { ApiError, failureSentence } from "../../lib/ApiError";
import { api } from "../../lib/api";
import { formatDay } from "../../lib/format";
import { Button } from "../../ui/Button";
import { LinkButton } from "../../ui/LinkButton";
import { Message } from "../../ui/Message";
import { Opening } from "../../ui/Opening";
import { ProblemPage } from "../../ui/ProblemPage";
import { StatePage } from "../../ui/StatePage";
import { invitationQuery } from "./invitationQueries";

interface InvitationPageProps {
  token: string;
  /** Who is signed in; null where nobody is. */
  account: Account | null;
}

/** What the link of an invitation offers, and taking it. */
export function InvitationPage({ token, account }: InvitationPageProps) {
  const invitation = useQuery(invitationQuery(token));
  if (invitation.isPending) return <Opening what="the invitation" />;
  if (invitation.isError) {
    const { error } = invitation;
    if (!(error instanceof ApiError) || error.isOffline || error.status >= 500)
      return <ProblemPage error={error} onRetry={() => void invitation.refetch()} />;
    return (
      <StatePage title="This invitation is not open" ways={<Link to="/notebooks">Notebooks</Link>}>
        <p>{failureSentence(error)}</p>
      </StatePage>
    );
  }
  return <OpenInvitation token={token} account={account} invitation={invitation.data} />;
}

function OpenInvitation({
  token,
  account,
  invitation,
}: InvitationPageProps & { invitation: InvitationResponse }) {
  const { to, name, role, email, invitedBy, expiresAt } = invitation;
  const queryClient = useQueryClient();
  const navigate = useNavigate();
  const accept = useMutation({
    mutationFn: () => api.post("/invitations/accept", { token }, acceptedInvitation),
    onSuccess: async (accepted) => {
      await queryClient.invalidateQueries({ queryKey: ["groups"] });
      await queryClient.invalidateQueries({ queryKey: ["notebooks"] });
      void navigate(accepted.to === "group" ? `/groups/${accepted.id}` : `/notebooks/${accepted.id}`, {
        replace: true,
      });
    },
  });
  const isForThem = account?.email === email;

  return (
    <StatePage
      title={to === "group" ? `Join ${name}` : name}
      ways={
        account === null ? (
          <>
            <LinkButton tone="main" to={`/accounts/new#${token}`}>
              Create an account
            </LinkButton>
            <Link to={`/invitation/open#${token}`}>I have an account</Link>
          </>
        ) : isForThem ? (
          <>
            <Button tone="main" busy={accept.isPending} onClick={() => accept.mutate()}>
              Accept
            </Button>
            <Link to="/notebooks">Not now</Link>
          </>
        ) : (
          <Link to="/notebooks">Notebooks</Link>
        )
      }
    >
      <p>
        {to === "group"
          ? `${invitedBy} invites you to the group, as a ${role}.`
          : `${invitedBy} shares this notebook with you, as a ${role}.`}
      </p>
      <p className="pt-8 type-meta text-ink2">
        For {email}; good once, until {formatDay(new Date(expiresAt), new Date())}.
      </p>
      {account !== null && !isForThem && (
        <Message state="caution" className="mt-18">
          You are signed in as {account.email}. Sign out and open the link again with {email}, or ask{" "}
          {invitedBy} to invite your address.
        </Message>
      )}
      {accept.isError && (
        <Message state="fault" live="assertive" className="mt-18">
          {failureSentence(accept.error)}
        </Message>
      )}
    </StatePage>
  );
}
