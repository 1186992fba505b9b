import { useQuery, useQueryClient } from "@tanstack/react-query";
import { lazy, useCallback, useEffect, useRef, useState } from "react";
import { Outlet } from "react-router-dom";
import type { Account, SessionResponse } from "../../shared/schemas/session";
import { whenSignedOut } from "../lib/api";
import { sessionQuery } from "../lib/session";
import { Opening } from "../ui/Opening";
import { PageFrame } from "../ui/PageFrame";
import { ProblemPage } from "../ui/ProblemPage";

const SignInPage = lazy(() =>
  import("../features/account/SignInPage").then(({ SignInPage: page }) => ({ default: page })),
);

/**
 * Lets a page through to those who are signed in and shows the sign-in in its place to others, at the same address.
 * A session that ends while a page is open puts the sign-in over that page and keeps it, with all that is written in
 * it; requests made meanwhile wait, and are sent once the same person is back.
 */
export function SessionGate() {
  const queryClient = useQueryClient();
  const session = useQuery(sessionQuery);
  const [endedFor, setEndedFor] = useState<Account | null>(null);
  const waiting = useRef<((isBack: boolean) => void)[]>([]);

  const settle = useCallback((isBack: boolean) => {
    for (const answer of waiting.current.splice(0)) answer(isBack);
    setEndedFor(null);
  }, []);

  useEffect(
    function askOnExpiry() {
      whenSignedOut(() => {
        const user = queryClient.getQueryData(sessionQuery.queryKey)?.user;
        if (!user) return Promise.resolve(false);
        setEndedFor(user);
        return new Promise((resolve) => waiting.current.push(resolve));
      });
      return () => whenSignedOut(null);
    },
    [queryClient],
  );

  const handleSignedIn = useCallback(
    (next: SessionResponse) => {
      const before = queryClient.getQueryData(sessionQuery.queryKey)?.user;
      const isBack = before ? before.id === next.user?.id : false;
      if (!isBack) {
        // Another person: nothing of the last one may be seen, nor sent in the new one's name.
        settle(false);
        queryClient.removeQueries({ predicate: (query) => query.queryKey[0] !== "session" });
      }
      queryClient.setQueryData(sessionQuery.queryKey, next);
      if (isBack) settle(true);
    },
    [queryClient, settle],
  );

  if (session.isPending) return <Opening what="Tenuity" />;
  if (session.isError) {
    return (
      <PageFrame places={[]}>
        <ProblemPage error={session.error} onRetry={() => void session.refetch()} />
      </PageFrame>
    );
  }
  if (!session.data.user) return <SignInPage demo={session.data.demo} onSignedIn={handleSignedIn} />;
  return (
    <>
      <div
        className="contents"
        inert={endedFor !== null}
        hidden={endedFor !== null}
        key={session.data.user.id}
      >
        <Outlet />
      </div>
      {endedFor && <SignInPage demo={session.data.demo} ended={endedFor} onSignedIn={handleSignedIn} />}
    </>
  );
}
