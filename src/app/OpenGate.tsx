import { useQuery } from "@tanstack/react-query";
import { Outlet } from "react-router-dom";
import { sessionQuery } from "../lib/session";
import { Opening } from "../ui/Opening";
import { SessionGate } from "./SessionGate";

/** Lets everyone through to pages that are open to strangers; for who is signed in the session is kept as elsewhere. */
export function OpenGate() {
  const session = useQuery(sessionQuery);
  // Asked again by a part of the page after a failure, it is pending once more: the page must not go for that.
  if (session.isPending && session.errorUpdateCount === 0) return <Opening what="Tenuity" />;
  return session.data?.user ? <SessionGate /> : <Outlet />;
}
