import { useQuery } from "@tanstack/react-query";
import { Link, useParams } from "react-router-dom";
import { formatTime, formatWhen } from "../../../lib/format";
import { useAccount } from "../../../lib/session";
import { AltitudeRule } from "../../../ui/AltitudeRule";
import { Opening } from "../../../ui/Opening";
import { Page } from "../../../ui/Page";
import { ProblemPage } from "../../../ui/ProblemPage";
import { notebookQuery, versionsQuery } from "../notebookQueries";
import { RestoreVersion } from "./RestoreVersion";
import "../notebook.css";

/** The kept versions of a notebook, the newest first. */
export function VersionsPage() {
  const { notebookId = "" } = useParams();
  const account = useAccount();
  const notebook = useQuery(notebookQuery(notebookId));
  const versions = useQuery(versionsQuery(notebookId));

  if (!notebook.data || !versions.data) {
    const error = notebook.error ?? versions.error;
    if (!error) return <Opening what="the versions" />;
    return <ProblemPage error={error} email={account?.email} onRetry={() => void versions.refetch()} />;
  }
  const { title, abilities } = notebook.data;
  const now = new Date();

  return (
    <Page title={`Versions of ${title}`} width={960}>
      <div className="pt-44 pb-28">
        <AltitudeRule width={960} />
        <p className="kicker">
          <span>Versions</span>
          <Link to={`/notebooks/${notebookId}`}>The draft, revision {notebook.data.revision}</Link>
        </p>
        <h1 className="type-display">{title}</h1>
      </div>
      {versions.data.length === 0 ? (
        <p className="max-w-[34em]">
          No version has been kept yet. A version holds the text, its results and the engine that computed
          them, and never changes; it is kept from the bar of the notebook.
        </p>
      ) : (
        <ol className="ruled-list versions">
          {versions.data.map((version) => (
            <li key={version.number}>
              <Link to={`/notebooks/${notebookId}/versions/${version.number}`} className="versions-number">
                {version.number}
              </Link>
              <div className="min-w-0">
                <p className="versions-message">{version.message}</p>
                <p className="type-label text-ink3">
                  {formatWhen(new Date(version.keptAt), now)}, {formatTime(new Date(version.keptAt))}, by{" "}
                  {version.keptBy.name}; engine {version.engine}; hash{" "}
                  <span className="font-mono" title={version.contentHash}>
                    {version.contentHash.slice(0, 12)}
                  </span>
                </p>
              </div>
              <span className="versions-acts">
                <Link to={`/notebooks/${notebookId}/versions/${version.number}`}>Open</Link>
                {abilities.restoreVersion && (
                  <RestoreVersion notebook={notebook.data} number={version.number} />
                )}
              </span>
            </li>
          ))}
        </ol>
      )}
    </Page>
  );
}
