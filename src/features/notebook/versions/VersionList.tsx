import { useQuery } from "@tanstack/react-query";
import { Link } from "react-router-dom";
import type { NotebookResponse } from "../../../../shared/schemas/notebooks";
import type { VersionSummary } from "../../../../shared/schemas/versions";
import { formatTime, formatWhen } from "../../../lib/format";
import { failureSentence } from "../../../lib/ApiError";
import { AltitudeRule } from "../../../ui/AltitudeRule";
import { Message } from "../../../ui/Message";
import { Page } from "../../../ui/Page";
import { TextButton } from "../../../ui/TextButton";
import { versionsQuery } from "../notebookQueries";
import { PlainBar } from "../page/PlainBar";
import { RequestVetting } from "../vetting/RequestVetting";
import { VettingStanding } from "../vetting/VettingStanding";
import { RestoreVersion } from "./RestoreVersion";

/** The kept versions of a notebook, the newest first. */
export function VersionList({ notebook }: { notebook: NotebookResponse }) {
  const versions = useQuery(versionsQuery(notebook.id));
  const title = notebook.title || "Untitled";

  return (
    <div className="notebook">
      <PlainBar title={title}>
        <Link className="flex-none no-underline" to={`/notebooks/${notebook.id}`}>
          The draft
        </Link>
      </PlainBar>
      <Page title={`Versions of ${title}`} width={880}>
        <div className="pt-44 pb-28">
          <AltitudeRule width={880} />
          <p className="kicker">
            <span>Versions</span>
            <span>the draft is at revision {notebook.revision}</span>
          </p>
          <h1 className="type-display">{title}</h1>
        </div>
        <VettingStanding notebook={notebook} />
        {versions.isError && (
          <Message
            state="fault"
            live="assertive"
            action={<TextButton onClick={() => void versions.refetch()}>Try again</TextButton>}
          >
            {failureSentence(versions.error)}
          </Message>
        )}
        {versions.isPending && <p className="type-meta text-ink3">Opening the versions</p>}
        {versions.data?.length === 0 && (
          <p className="max-w-[34em]">
            No version has been kept yet. A version holds the text, its results and the engine that computed
            them, and never changes; it is kept from the bar of the notebook.
          </p>
        )}
        {versions.data && versions.data.length > 0 && (
          <ol className="ruled-list versions">
            {versions.data.map((version) => (
              <VersionLine key={version.number} notebook={notebook} version={version} />
            ))}
          </ol>
        )}
      </Page>
    </div>
  );
}

function VersionLine({ notebook, version }: { notebook: NotebookResponse; version: VersionSummary }) {
  const address = `/notebooks/${notebook.id}/versions/${version.number}`;
  const keptAt = new Date(version.keptAt);
  const when = formatWhen(keptAt, new Date());
  return (
    <li>
      <span className="versions-number" aria-hidden="true">
        {version.number}
      </span>
      <div className="min-w-0">
        <p className="versions-message">{version.message}</p>
        <p className="type-label text-ink3">
          {when.startsWith("today") ? when : `${when} ${formatTime(keptAt)}`}, by {version.keptBy.name};
          engine {version.engine}; hash{" "}
          <span className="font-mono" title={version.contentHash}>
            {version.contentHash.slice(0, 12)}
          </span>
        </p>
      </div>
      <span className="versions-acts">
        <Link to={address} aria-label={`Open version ${version.number}`}>
          Open
        </Link>
        <Link
          to={`/notebooks/${notebook.id}/compare?older=${version.number}&newer=draft`}
          aria-label={`Compare version ${version.number} with the draft`}
        >
          Compare
        </Link>
        {notebook.abilities.requestVetting && notebook.group && (
          <RequestVetting notebook={notebook} number={version.number} />
        )}
        {notebook.abilities.restoreVersion && <RestoreVersion notebook={notebook} number={version.number} />}
      </span>
    </li>
  );
}
