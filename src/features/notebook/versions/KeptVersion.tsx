import { useQuery } from "@tanstack/react-query";
import { useMemo, useState } from "react";
import { Link } from "react-router-dom";
import type { NotebookResponse } from "../../../../shared/schemas/notebooks";
import type { VersionResponse } from "../../../../shared/schemas/versions";
import { formatTime, formatDay, type UnitSystem } from "../../../lib/format";
import { Message } from "../../../ui/Message";
import { ProblemPage } from "../../../ui/ProblemPage";
import { CommentsDesk } from "../comments/CommentsDesk";
import { readingCommands } from "../cells/readingCommands";
import { useEvaluation } from "../evaluation/useEvaluation";
import { useNotebookNotes } from "../evaluation/useNotebookNotes";
import { versionQuery } from "../notebookQueries";
import { Article } from "../page/Article";
import { NotebookBar } from "../page/NotebookBar";
import { PlainBar } from "../page/PlainBar";
import { NotebookSkeleton } from "../page/NotebookSkeleton";
import { RestoreVersion } from "./RestoreVersion";
import { withKeptResults } from "./withKeptResults";

interface KeptVersionProps {
  notebook: NotebookResponse;
  number: number;
}

/** A kept version, to be read: the text and the results as they were kept. */
export function KeptVersion({ notebook, number }: KeptVersionProps) {
  const version = useQuery(versionQuery(notebook.id, number));
  if (version.isPending) return <NotebookSkeleton />;
  if (!version.data) {
    return (
      <div className="notebook">
        <PlainBar title={notebook.title} />
        <ProblemPage error={version.error} onRetry={() => void version.refetch()} />
      </div>
    );
  }
  return <VersionDesk notebook={notebook} version={version.data} />;
}

function VersionDesk({ notebook, version }: { notebook: NotebookResponse; version: VersionResponse }) {
  const [unitSystem, setUnitSystem] = useState<UnitSystem>(version.document.unitSystem);
  const document = useMemo(() => ({ ...version.document, unitSystem }), [version.document, unitSystem]);
  const computed = useEvaluation(`${notebook.id} version ${version.number}`, document);
  const live = useMemo(
    () => withKeptResults(computed, document, version.result),
    [computed, document, version.result],
  );
  const notes = useNotebookNotes(document, live);
  const isOtherEngine = computed.evaluated !== null && computed.evaluated.engine !== version.engine;
  const keptAt = new Date(version.keptAt);

  return (
    <div className="notebook">
      <title>{`${document.title}, version ${version.number} · Tenuity`}</title>
      <NotebookBar
        title={document.title || "Untitled"}
        about={
          <>
            <b>version {version.number}</b>, kept {formatDay(keptAt, new Date())} {formatTime(keptAt)} by{" "}
            {version.keptBy.name}
          </>
        }
        status={null}
        unitSystem={unitSystem}
        onUnitSystem={setUnitSystem}
        acts={
          <>
            {notebook.abilities.restoreVersion && (
              <RestoreVersion notebook={notebook} number={version.number} />
            )}
            <Link className="flex-none no-underline" to={`/notebooks/${notebook.id}/versions`}>
              Versions
            </Link>
            <Link className="flex-none no-underline" to={`/notebooks/${notebook.id}`}>
              The draft
            </Link>
          </>
        }
      />
      <CommentsDesk notebook={notebook} version={version.number} cells={document.cells}>
        <Article
          document={document}
          live={live}
          tasks={null}
          notes={notes}
          unitSystem={unitSystem}
          kicker={[
            `Version ${version.number}`,
            `engine ${version.engine}`,
            `hash ${version.contentHash.slice(0, 12)}`,
          ]}
          edit={null}
          newCellId={null}
          commands={readingCommands}
        >
          <div className="version-message">
            <p>{version.message}</p>
            <p className="version-hash" title="SHA-256 of title, cells and engine">
              {version.contentHash}
            </p>
          </div>
          {isOtherEngine && (
            <Message state="remark" className="mt-18">
              Numbers and tables stand as engine {version.engine} gave them; figures are drawn by engine{" "}
              {computed.evaluated?.engine}.
            </Message>
          )}
        </Article>
      </CommentsDesk>
    </div>
  );
}
