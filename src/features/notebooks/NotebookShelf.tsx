import { useMemo } from "react";
import type { NotebookListItem } from "../../../shared/schemas/notebooks";
import { formatCount } from "../../lib/format";
import { StripShelf } from "../../ui/strip/StripShelf";
import type { ShelfBody } from "../../ui/strip/stripProps";
import { bodyName } from "./notebookSentences";

/** The airs of a list, one a body: that of the first notebook with a strip, counted with the others of that body. */
export function shelfBodies(notebooks: readonly NotebookListItem[]): ShelfBody[] {
  const byBody = new Map<string, { first: NotebookListItem; count: number }>();
  for (const notebook of notebooks) {
    const body = notebook.summary?.bodies[0];
    if (body === undefined || !notebook.summary?.strip) continue;
    const known = byBody.get(body);
    if (known) known.count += 1;
    else byBody.set(body, { first: notebook, count: 1 });
  }
  return [...byBody].map(([body, { first, count }]) => ({
    id: `${first.id} ${body}`,
    body: bodyName(body),
    note: formatCount(count, "notebook"),
    strip: first.summary!.strip!,
  }));
}

interface NotebookShelfProps {
  notebooks: readonly NotebookListItem[];
  className?: string;
}

/** All bodies of the list on one scale. One alone has nothing to be compared with and is left to its line. */
export function NotebookShelf({ notebooks, className }: NotebookShelfProps) {
  const bodies = useMemo(() => shelfBodies(notebooks), [notebooks]);
  if (bodies.length < 2) return null;
  return (
    <div className={className}>
      <StripShelf bodies={bodies} />
    </div>
  );
}
