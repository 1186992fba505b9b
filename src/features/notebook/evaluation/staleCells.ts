import type { NotebookDocument } from "../../../../shared/notebook/document";
import type { CellEvaluation } from "../../../../shared/notebook/result";

/**
 * Ids of the cells whose shown answer may not be what the text now says: written since, new, standing under a cell
 * that came, went or moved, or resting on one of these.
 */
export function staleCells(
  written: NotebookDocument,
  evaluated: NotebookDocument | null,
  answers: ReadonlyMap<string, CellEvaluation>,
): ReadonlySet<string> {
  if (written === evaluated) return new Set();
  const stale = new Set<string>();
  const staleNames = new Set<string>();
  const before = new Map(evaluated?.cells.map((cell) => [cell.id, cell]));
  let isOrderChanged = false;

  written.cells.forEach((cell, index) => {
    const known = before.get(cell.id);
    if (evaluated?.cells[index]?.id !== cell.id) isOrderChanged = true;
    const isWritten = !known || known.text !== cell.text || known.name !== cell.name;
    const uses = answers.get(cell.id)?.uses ?? [];
    // An order that changed may give a name to a cell that did not see it before.
    if (!isWritten && !isOrderChanged && !uses.some((name) => staleNames.has(firstName(name)))) return;
    if (cell.kind === "prose") return;
    stale.add(cell.id);
    staleNames.add(cell.name);
    if (known) staleNames.add(known.name);
    for (const name of Object.keys(answers.get(cell.id)?.result.values ?? {})) staleNames.add(name);
  });
  return stale;
}

const firstName = (path: string): string => path.split(".", 1)[0]!;
