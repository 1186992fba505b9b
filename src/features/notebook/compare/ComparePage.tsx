import { useQuery } from "@tanstack/react-query";
import { useMemo, useState } from "react";
import { Link, useSearchParams } from "react-router-dom";
import type { CellEvaluation, DrawnColumn } from "../../../../shared/notebook/result";
import type { NotebookResponse } from "../../../../shared/schemas/notebooks";
import type { VersionSummary } from "../../../../shared/schemas/versions";
import { formatDay, type UnitSystem } from "../../../lib/format";
import { CautionFooter } from "../../../ui/CautionFooter";
import { Message } from "../../../ui/Message";
import { Opening } from "../../../ui/Opening";
import { ComparisonFigure } from "../../../ui/plots/ComparisonFigure";
import { ProblemPage } from "../../../ui/ProblemPage";
import { HalvedStrip } from "../../../ui/strip/HalvedStrip";
import { TextButton } from "../../../ui/TextButton";
import { TwoWay } from "../../../ui/TwoWay";
import { WordMenu } from "../../../ui/WordMenu";
import { drawnColumn } from "../cells/drawnColumn";
import { versionsQuery } from "../notebookQueries";
import { PlainBar } from "../page/PlainBar";
import { useMediaQuery } from "../page/useMediaQuery";
import { RestoreVersion } from "../versions/RestoreVersion";
import { compareDocuments } from "./compareDocuments";
import { ComparedEntries } from "./ComparedEntries";
import { ComparedResults } from "./ComparedResults";
import { compareResults } from "./compareResults";
import { capital, entrySentence, resultSentence } from "./comparisonWords";
import { useCompared, type Compared, type StateName } from "./useCompared";
import "./compare.css";

/** Two states of a notebook side by side: what is written, what it gives, and its curves. */
export function ComparePage({ notebook }: { notebook: NotebookResponse }) {
  const versions = useQuery(versionsQuery(notebook.id));
  const title = notebook.title || "Untitled";
  return (
    <div className="notebook">
      <title>{`${title}, compared · Tenuity`}</title>
      {versions.isPending && (
        <>
          <PlainBar title={title} />
          <Opening what="the versions" />
        </>
      )}
      {versions.isError && (
        <>
          <PlainBar title={title} />
          <ProblemPage error={versions.error} onRetry={() => void versions.refetch()} />
        </>
      )}
      {versions.data && <CompareDesk notebook={notebook} versions={versions.data} />}
    </div>
  );
}

const readState = (text: string | null, versions: readonly VersionSummary[]): StateName | null => {
  if (text === "draft") return "draft";
  const number = Number(text);
  return versions.some((version) => version.number === number) ? number : null;
};

const nameOf = (state: StateName): string => (state === "draft" ? "the draft" : `version ${state}`);
const headOf = (state: StateName): string => (state === "draft" ? "draft" : String(state));

function CompareDesk({
  notebook,
  versions,
}: {
  notebook: NotebookResponse;
  versions: readonly VersionSummary[];
}) {
  const [query, setQuery] = useSearchParams();
  const last = versions[0]?.number;
  const newer = readState(query.get("newer"), versions) ?? "draft";
  const older =
    readState(query.get("older"), versions) ??
    versions.find(({ number }) => number !== newer)?.number ??
    last ??
    "draft";
  const [unitSystem, setUnitSystem] = useState<UnitSystem>(notebook.document.unitSystem);
  const before = useCompared(notebook, older, unitSystem);
  const after = useCompared(notebook, newer, unitSystem);
  const choose = (of: { older?: StateName; newer?: StateName }) =>
    setQuery({ older: String(of.older ?? older), newer: String(of.newer ?? newer) }, { replace: true });
  const failed = [before, after].find(({ error }) => error);

  return (
    <>
      <PlainBar title={notebook.title || "Untitled"}>
        <TwoWay
          label="Unit system"
          value={unitSystem}
          options={[
            { value: "SI", label: "SI" },
            { value: "cgs", label: "cgs" },
          ]}
          onChange={setUnitSystem}
        />
        {notebook.abilities.restoreVersion && older !== "draft" && (
          <RestoreVersion notebook={notebook} number={older} />
        )}
        <Link className="flex-none no-underline" to={`/notebooks/${notebook.id}/versions`}>
          Versions
        </Link>
        <Link className="flex-none no-underline" to={`/notebooks/${notebook.id}`}>
          The draft
        </Link>
      </PlainBar>
      {versions.length === 0 ? (
        <main id="page" tabIndex={-1} className="compare-sheet">
          <h1 className="visually-hidden">Compared</h1>
          <p className="compare-none">
            There is nothing to compare yet: no version has been kept. A version is kept from the bar of the
            notebook.
          </p>
        </main>
      ) : failed ? (
        <ProblemPage error={failed.error} onRetry={failed.retry} />
      ) : (
        <Compare
          before={before}
          after={after}
          older={older}
          newer={newer}
          unitSystem={unitSystem}
          head={
            <CompareHead
              notebook={notebook}
              versions={versions}
              older={older}
              newer={newer}
              onChoose={choose}
            />
          }
        />
      )}
    </>
  );
}

interface CompareHeadProps {
  notebook: NotebookResponse;
  versions: readonly VersionSummary[];
  older: StateName;
  newer: StateName;
  onChoose: (of: { older?: StateName; newer?: StateName }) => void;
}

/** Which two: each a word that can be exchanged, with when and why it was kept. */
function CompareHead({ notebook, versions, older, newer, onChoose }: CompareHeadProps) {
  const options = [
    { value: "draft", label: "The draft" },
    ...versions.map(({ number, message }) => ({
      value: String(number),
      label: `Version ${number}`,
      hint: message,
    })),
  ];
  const about = (state: StateName) => {
    if (state === "draft")
      return (
        <>
          <span>revision {notebook.revision}</span>
        </>
      );
    const version = versions.find(({ number }) => number === state)!;
    return (
      <>
        <span>
          {formatDay(new Date(version.keptAt), new Date())}, {version.keptBy.name}
        </span>
        <i>“{version.message}”</i>
      </>
    );
  };
  const toState = (value: string): StateName => (value === "draft" ? "draft" : Number(value));
  return (
    <div className="compare-head">
      <h1 className="visually-hidden">
        {`${notebook.title || "Untitled"}: ${nameOf(older)} and ${nameOf(newer)} compared`}
      </h1>
      <div className="compare-state" data-side="older">
        <WordMenu
          label="The older"
          value={String(older)}
          options={options}
          onChange={(value) => onChoose({ older: toState(value) })}
        />
        {about(older)}
      </div>
      <TextButton aria-label="Exchange the two" onClick={() => onChoose({ older: newer, newer: older })}>
        exchange
      </TextButton>
      <div className="compare-state">
        <WordMenu
          label="The newer"
          value={String(newer)}
          options={options}
          onChange={(value) => onChoose({ newer: toState(value) })}
        />
        {about(newer)}
      </div>
    </div>
  );
}

interface CompareProps {
  before: Compared;
  after: Compared;
  older: StateName;
  newer: StateName;
  unitSystem: UnitSystem;
  head: React.ReactNode;
}

function Compare({ before, after, older, newer, unitSystem, head }: CompareProps) {
  const isWide = useMediaQuery("(min-width: 1000px)");
  const written = useMemo(
    () => before.document && after.document && compareDocuments(before.document, after.document),
    [before.document, after.document],
  );
  const isComputed = before.cells.length > 0 && after.cells.length > 0;
  const given = useMemo(
    () => (isComputed ? compareResults(before.cells, after.cells) : null),
    [isComputed, before.cells, after.cells],
  );
  const columns = useMemo(() => columnPairs(before.cells, after.cells), [before.cells, after.cells]);
  const failure = before.failure ?? after.failure;
  const [first] = columns;

  return (
    <div className="notebook-grid">
      <aside className="strip-pane" aria-label="Altitude strip" data-print="never">
        {isWide && first && (
          <HalvedStrip
            older={first.older.strip}
            newer={first.newer.strip}
            heads={[headOf(older), headOf(newer)]}
          />
        )}
      </aside>
      <main id="page" className="compare-sheet" tabIndex={-1}>
        {head}
        {!written ? (
          <Opening what="the two states" />
        ) : (
          <>
            <p className="compare-sentence">
              {given && resultSentence(before.cells, after.cells)} {entrySentence(written)}
            </p>
            <h2 className="compare-title">Entries</h2>
            <ComparedEntries comparison={written} />
            <h2 className="compare-title">Results</h2>
            {failure ? (
              <Message state="fault" live="assertive">
                One of the two could not be computed: {failure} Load the page again.
              </Message>
            ) : given ? (
              <ComparedResults
                comparison={given}
                olderName={capital(nameOf(older))}
                newerName={capital(nameOf(newer))}
                unitSystem={unitSystem}
              />
            ) : (
              <p className="compare-none" role="status">
                Computing
              </p>
            )}
            {columns.length > 0 && <h2 className="compare-title">Curves</h2>}
            {columns.map((pair, index) => (
              <ComparisonFigure
                key={pair.newer.strip.column}
                {...pair}
                olderName={nameOf(older)}
                newerName={nameOf(newer)}
                unitSystem={unitSystem}
                number={index + 1}
              />
            ))}
            {before.engine !== null && after.engine !== null && (
              <p className="compare-engines">
                {before.engine === after.engine
                  ? `Both computed with engine ${after.engine}.`
                  : `${capital(nameOf(older))} computed with engine ${before.engine}, ${nameOf(newer)} with engine ${after.engine}; curves are drawn by the engine of this page.`}
              </p>
            )}
          </>
        )}
        <CautionFooter className="pt-44 pb-64" />
      </main>
    </div>
  );
}

interface ColumnPair {
  older: DrawnColumn;
  newer: DrawnColumn;
}

/** Columns that both states have and could compute, by name. */
function columnPairs(before: readonly CellEvaluation[], after: readonly CellEvaluation[]): ColumnPair[] {
  const byId = (cells: readonly CellEvaluation[]) => new Map(cells.map((cell) => [cell.id, cell]));
  return after.flatMap((cell) => {
    const twin = before.find(({ result }) => result.kind === "column" && result.name === cell.result.name);
    const [older, newer] = [drawnColumn(twin, byId(before)), drawnColumn(cell, byId(after))];
    return older && newer ? [{ older, newer }] : [];
  });
}
