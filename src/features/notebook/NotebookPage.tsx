import { useQuery } from "@tanstack/react-query";
import { useMemo } from "react";
import { Link, useParams } from "react-router-dom";
import { useAccount } from "../../lib/session";
import { CautionFooter } from "../../ui/CautionFooter";
import { Mark } from "../../ui/Mark";
import { ProblemPage } from "../../ui/ProblemPage";
import { NotebookDesk } from "./NotebookDesk";
import { notebookQuery } from "./notebookQueries";
import { NotebookSkeleton } from "./page/NotebookSkeleton";
import { KeptVersion } from "./versions/KeptVersion";
import "./notebook.css";

/** A notebook, or one of its kept versions where the address names one. */
export function NotebookPage() {
  const { notebookId = "", number } = useParams();
  const account = useAccount();
  const notebook = useQuery(notebookQuery(notebookId));
  const person = useMemo(() => ({ id: account?.id ?? "", name: account?.name ?? "" }), [account]);

  if (notebook.isPending) return <NotebookSkeleton />;
  if (!notebook.data) {
    return (
      <div className="notebook">
        <header className="notebook-bar">
          <Link to="/notebooks" aria-label="All notebooks">
            <Mark size={28} />
          </Link>
        </header>
        <ProblemPage error={notebook.error} onRetry={() => void notebook.refetch()} email={account?.email} />
        <CautionFooter className="mx-auto w-full max-w-[1180px] px-18 pb-64 wide:px-28" />
      </div>
    );
  }
  if (number !== undefined) {
    return <KeptVersion key={`${notebookId} ${number}`} notebook={notebook.data} number={Number(number)} />;
  }
  return <NotebookDesk key={notebookId} notebook={notebook.data} person={person} />;
}
