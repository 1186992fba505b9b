import { formatCount } from "../../../lib/format";
import { cellTitle } from "../cells/cellTitle";
import { entryValue } from "../conflict/entryValue";
import { MarkedText } from "../conflict/MarkedText";
import { capital } from "./comparisonWords";
import type { CellDifference, Difference, DocumentComparison } from "./compareDocuments";

/** What is written differently, cell by cell: names down the middle, the older state left of them, the newer right. */
export function ComparedEntries({ comparison }: { comparison: DocumentComparison }) {
  const { fields, cells, sameCells } = comparison;
  if (fields.length === 0 && cells.length === 0) {
    return <p className="compare-none">Every cell says the same in both.</p>;
  }
  return (
    <>
      {fields.length > 0 && (
        <section className="compare-cell" aria-label="The notebook itself">
          <h3 className="compare-cell-name">the notebook itself</h3>
          {fields.map((difference) => (
            <ComparedEntry key={difference.label} difference={difference} />
          ))}
        </section>
      )}
      {cells.map((cell) => (
        <ComparedCell key={cell.id} cell={cell} />
      ))}
      {sameCells > 0 && (
        <p className="compare-same">
          {capital(formatCount(sameCells, "cell says", "cells say"))} the same in both.
        </p>
      )}
    </>
  );
}

function ComparedCell({ cell }: { cell: CellDifference }) {
  const { change, differences, same, kind } = cell;
  return (
    <section className="compare-cell" aria-label={cellTitle(cell)}>
      <h3 className="compare-cell-name">
        <span className="type-kind text-ink2">{kind}</span> <i>{cell.name}</i>
      </h3>
      {differences.map((difference) => (
        <ComparedEntry key={difference.label} difference={difference} />
      ))}
      {change !== "changed" && <WholeCell cell={cell} />}
      {change === "changed" && same > 0 && (
        <p className="compare-same">{formatCount(same, "entry", "entries")} the same</p>
      )}
    </section>
  );
}

/** A cell that only one state has. */
function WholeCell({ cell: { change, kind, same } }: { cell: CellDifference }) {
  const what = kind === "prose" ? "" : `, ${formatCount(same, "entry", "entries")}`;
  const missing = <i className="conflict-nothing">no such cell</i>;
  const isNew = change === "new";
  return (
    <div className="compare-entry">
      <div className="compare-side" data-side="theirs">
        {isNew ? missing : <Whole words={`cell gone${what}`} />}
      </div>
      <span />
      <div className="compare-side">{isNew ? <Whole words={`new cell${what}`} /> : missing}</div>
    </div>
  );
}

const Whole = ({ words }: { words: string }) => (
  <code className="conflict-text">
    <mark>{words}</mark>
  </code>
);

function ComparedEntry({ difference: { label, older, newer } }: { difference: Difference }) {
  const [before, after] = [entryValue(older, label), entryValue(newer, label)];
  return (
    <div className="compare-entry">
      <div className="compare-side" data-side="theirs">
        <Side text={before} other={after} />
      </div>
      <span className="conflict-label">{label}</span>
      <div className="compare-side">
        <Side text={after} other={before} />
      </div>
    </div>
  );
}

function Side({ text, other }: { text: string | null; other: string | null }) {
  if (text === null) return <i className="conflict-nothing">no such entry</i>;
  return <MarkedText text={text} other={other ?? ""} />;
}
