import { useQuery } from "@tanstack/react-query";
import { lazy, Suspense, useMemo, useState } from "react";
import { Route, Routes, useParams } from "react-router-dom";
import type { NotebookResponse } from "../../../shared/schemas/notebooks";
import { useAccount } from "../../lib/session";
import { ApiError } from "../../lib/ApiError";
import { fetchPart } from "../../lib/fetchPart";
import { CautionFooter } from "../../ui/CautionFooter";
import { Opening } from "../../ui/Opening";
import { ProblemPage } from "../../ui/ProblemPage";
import { LiveContext } from "./live/liveContext";
import { useLive } from "./live/useLive";
import { NotebookDesk } from "./NotebookDesk";
import { lookIntervals, notebookQuery } from "./notebookQueries";
import { NotebookSkeleton } from "./page/NotebookSkeleton";
import { PlainBar } from "./page/PlainBar";
import { KeptVersion } from "./versions/KeptVersion";
import { VersionList } from "./versions/VersionList";
import "./notebook.css";

const ComparePage = lazy(async () => {
  const file = await fetchPart(() => import("./compare/ComparePage"));
  return { default: file.ComparePage };
});

/** A notebook, the list of its versions, one of them, or two compared, as the rest of the address says. */
export function NotebookPage() {
  const { notebookId = "" } = useParams();
  const account = useAccount();
  const [isLive, setLive] = useState(false);
  const notebook = useQuery({
    ...notebookQuery(notebookId),
    refetchInterval: isLive ? lookIntervals.live : lookIntervals.alone,
  });
  const person = useMemo(
    () => ({ id: account?.id ?? "", name: account?.name ?? "" }),
    [account?.id, account?.name],
  );

  const live = useLive({
    notebookId: notebook.data ? notebookId : null,
    ownId: person.id,
    onConnected: setLive,
  });

  if (notebook.isPending) return <NotebookSkeleton />;
  // Taken away while it was open: what is unsaved stays kept in this browser.
  const isTaken = notebook.error instanceof ApiError && notebook.error.status === 404;
  if (!notebook.data || isTaken) {
    return <NotebookProblem error={notebook.error} onRetry={() => void notebook.refetch()} />;
  }
  return (
    <LiveContext value={live}>
      <Routes>
        <Route index element={<NotebookDesk key={notebookId} notebook={notebook.data} person={person} />} />
        <Route path="versions" element={<VersionList notebook={notebook.data} />} />
        <Route
          path="compare"
          element={
            <Suspense fallback={<Opening what="the comparison" />}>
              <ComparePage notebook={notebook.data} />
            </Suspense>
          }
        />
        <Route path="versions/:number" element={<VersionAt notebook={notebook.data} />} />
        <Route path="*" element={<NotebookProblem error={noSuchPage} />} />
      </Routes>
    </LiveContext>
  );
}

const noSuchPage = new ApiError({
  status: 404,
  code: "not_found",
  message: "There is no page at this address.",
});

function VersionAt({ notebook }: { notebook: NotebookResponse }) {
  const { number = "" } = useParams();
  if (!/^[1-9]\d{0,8}$/.test(number)) return <NotebookProblem error={noSuchPage} />;
  return <KeptVersion key={number} notebook={notebook} number={Number(number)} />;
}

function NotebookProblem({ error, onRetry }: { error: unknown; onRetry?: () => void }) {
  const account = useAccount();
  return (
    <div className="notebook">
      <PlainBar />
      <ProblemPage error={error} onRetry={onRetry} email={account?.email} />
      <CautionFooter className="mx-auto w-full max-w-[1180px] px-18 pb-64 wide:px-28" />
    </div>
  );
}
