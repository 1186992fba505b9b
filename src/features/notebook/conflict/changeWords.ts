import type { NotebookDocument } from "../../../../shared/notebook/document";
import type { SettledChange } from "../draft/mergeDocuments";

const longest = 6;

/** "T_quiet in given, eddy in dayside and the title": what changed, in words for a sentence. */
export function changeWords(changes: readonly SettledChange[], document: NotebookDocument): string {
  const names = new Map(document.cells.map(({ id, kind, name }) => [id, name || kind]));
  const words = changes.slice(0, longest).map(({ cellId, label }) => {
    if (cellId === null) return `the ${label}`;
    const cell = names.get(cellId) ?? "a cell that is gone";
    return label === "cell" || label === "text" ? cell : `${label} in ${cell}`;
  });
  const rest = changes.length - longest;
  if (rest > 0) words.push(`${rest} more`);
  return words.length < 2
    ? words.join("")
    : `${words.slice(0, -1).join(", ")} and ${words[words.length - 1]}`;
}
