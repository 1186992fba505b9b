import { use } from "react";
import type { Cell } from "../../../../shared/notebook/document";
import type { PresentPerson } from "../../../../shared/schemas/live";
import { formatCount } from "../../../lib/format";
import { cellTitle } from "../cells/cellTitle";
import { LiveContext } from "./liveContext";

interface HereNowProps {
  cells: readonly Cell[];
}

/** In the bar: who else has the notebook open, and at which cell. */
export function HereNow({ cells }: HereNowProps) {
  const { others } = use(LiveContext);
  const [first, ...rest] = others;
  if (!first) return null;
  const cell = cellOf(first, cells);
  return (
    <span className="here-now">
      <b>{first.person.name}</b>
      {cell && (
        <>
          {" "}
          at <i>{cell.name || cell.kind}</i>
        </>
      )}
      {rest.length > 0 && ` and ${formatCount(rest.length, "other")}`}
    </span>
  );
}

/** In the margin: the same as a sentence for each, said aloud as people come and go. */
export function HereSentences({ cells }: HereNowProps) {
  const { others } = use(LiveContext);
  return (
    <div className={others.length > 0 ? "here-sentence" : undefined} role="status">
      {others.map((other) => {
        const cell = cellOf(other, cells);
        return (
          <p key={other.person.id}>
            {other.person.name} has this notebook open{cell && `, at ${lowered(cellTitle(cell))}`}.
          </p>
        );
      })}
    </div>
  );
}

const cellOf = ({ cellId }: PresentPerson, cells: readonly Cell[]): Cell | undefined =>
  cells.find(({ id }) => id === cellId);

const lowered = (words: string): string => words[0]!.toLowerCase() + words.slice(1);
