import { useQuery, useQueryClient } from "@tanstack/react-query";
import { Navigate, useNavigate } from "react-router-dom";
import type { SessionResponse } from "../../shared/schemas/session";
import { CreateAccountPage } from "../features/account/CreateAccountPage";
import { sessionQuery } from "../lib/session";

/** Creating an account; who is signed in already has no use for it. */
export default function CreateAccountRoute() {
  const queryClient = useQueryClient();
  const navigate = useNavigate();
  const user = useQuery(sessionQuery).data?.user;
  if (user) return <Navigate to="/notebooks" replace />;

  function handleSignedIn(session: SessionResponse) {
    queryClient.setQueryData(sessionQuery.queryKey, session);
    void navigate("/notebooks", { replace: true });
  }
  return <CreateAccountPage onSignedIn={handleSignedIn} />;
}
