import { useQuery } from "@tanstack/react-query";
import { useLocation } from "react-router-dom";
import { InvitationPage } from "../features/invitation/InvitationPage";
import { sessionQuery } from "../lib/session";
import { Opening } from "../ui/Opening";
import { PageFrame } from "../ui/PageFrame";
import { ProblemPage } from "../ui/ProblemPage";

/** The link of an invitation. Its token stands after the #, which no browser sends: it comes into no log. */
export default function InvitationRoute() {
  const token = useLocation().hash.slice(1);
  const session = useQuery(sessionQuery);
  return (
    <PageFrame places={[]}>
      {session.isPending && <Opening what="the invitation" />}
      {session.isError && <ProblemPage error={session.error} onRetry={() => void session.refetch()} />}
      {session.data && <InvitationPage key={token} token={token} account={session.data.user} />}
    </PageFrame>
  );
}
