import { useQuery } from "@tanstack/react-query";
import { Link } from "react-router-dom";
import { formatWhen } from "../../lib/format";
import { AltitudeRule } from "../../ui/AltitudeRule";
import { Opening } from "../../ui/Opening";
import { Page } from "../../ui/Page";
import { ProblemPage } from "../../ui/ProblemPage";
import { queueQuery } from "./vettingQueries";

/** Versions that wait for the lead, longest waiting first. */
export function VettingQueue() {
  const queue = useQuery(queueQuery);
  if (queue.isPending) return <Opening what="the requests" />;
  if (!queue.data) return <ProblemPage error={queue.error} onRetry={() => void queue.refetch()} />;
  const now = new Date();
  return (
    <Page title="Vetting" width={880}>
      <div className="pt-44 pb-28">
        <AltitudeRule width={880} />
        <h1 className="type-display">Vetting</h1>
      </div>
      {queue.data.length === 0 ? (
        <p className="max-w-[34em]">
          Nothing waits for you. A version comes here when its owner or a co-author asks for it to be vetted.
        </p>
      ) : (
        <ul className="ruled-list" aria-label="Versions to be vetted, longest waiting first">
          {queue.data.map((one) => (
            <li key={one.id} className="py-14">
              <Link to={`/vetting/${one.id}`} className="font-serif text-[20px]/[28px]">
                {one.title || "Untitled"}
              </Link>
              <p className="type-label text-ink3">
                version {one.versionNumber}, of {one.owner.name}; would become {one.wouldBecome}; asked for by{" "}
                {one.requestedBy.name} {formatWhen(new Date(one.requestedAt), now)}
              </p>
            </li>
          ))}
        </ul>
      )}
    </Page>
  );
}
