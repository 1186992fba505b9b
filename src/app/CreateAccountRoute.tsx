import { useQuery, useQueryClient } from "@tanstack/react-query";
import { Navigate, useLocation, useNavigate } from "react-router-dom";
import type { SessionResponse } from "../../shared/schemas/session";
import { CreateAccountPage } from "../features/account/CreateAccountPage";
import { invitationQuery } from "../features/invitation/invitationQueries";
import { sessionQuery } from "../lib/session";
import { Opening } from "../ui/Opening";

/** Creating an account, by an invitation or without; who is signed in already has no use for it. */
export default function CreateAccountRoute() {
  const queryClient = useQueryClient();
  const navigate = useNavigate();
  const token = useLocation().hash.slice(1);
  const invitation = useQuery({ ...invitationQuery(token), enabled: token !== "" });
  const user = useQuery(sessionQuery).data?.user;
  if (user) return <Navigate to={token ? `/invitation#${token}` : "/notebooks"} replace />;
  if (token && invitation.isPending) return <Opening what="the invitation" />;

  function handleSignedIn(session: SessionResponse) {
    queryClient.setQueryData(sessionQuery.queryKey, session);
    void navigate("/notebooks", { replace: true });
  }
  return (
    <CreateAccountPage
      onSignedIn={handleSignedIn}
      invitation={invitation.data ? { token, ...invitation.data } : null}
    />
  );
}
