import { cellParser } from "../../../../shared/notebook/language/parser";
import type { NotebookDocument } from "../../../../shared/notebook/document";
import type { DocumentEdit } from "../../../../shared/notebook/editDocument";

/** The edit that renames a cell and every mention of it in the entries of other cells, and in the headline. */
export function renamingEdit(
  document: NotebookDocument,
  id: string,
  name: string,
): { edit: DocumentEdit; mentions: number } {
  const renamed = document.cells.find((cell) => cell.id === id);
  const edits: DocumentEdit[] = [{ type: "renameCell", id, name }];
  let mentions = 0;
  if (!renamed || renamed.name === "" || name === "" || renamed.kind === "gas" || renamed.kind === "prose") {
    return { edit: edits[0]!, mentions };
  }
  // A name that two cells bear says nothing of which one is meant.
  if (document.cells.filter((cell) => cell.name === renamed.name).length > 1)
    return { edit: edits[0]!, mentions };

  for (const cell of document.cells) {
    if (cell.kind === "prose") continue;
    const places = mentionsOf(renamed.name, cell.text);
    if (places.length === 0) continue;
    mentions += places.length;
    let text = cell.text;
    for (const from of places.toReversed())
      text = text.slice(0, from) + name + text.slice(from + renamed.name.length);
    edits.push({ type: "changeText", id: cell.id, text });
  }
  const follow = (path: string): string =>
    path.split(".", 1)[0] === renamed.name ? name + path.slice(renamed.name.length) : path;
  const headline = document.headline.map(follow);
  if (headline.some((path, index) => path !== document.headline[index])) {
    edits.push({ type: "changeHeadline", headline });
  }
  return { edit: edits.length === 1 ? edits[0]! : { type: "several", edits }, mentions };
}

/** Offsets at which a text names a cell: as a value, or at the head of a dotted path. */
function mentionsOf(name: string, text: string): number[] {
  const places: number[] = [];
  cellParser.parse(text).iterate({
    enter(node) {
      if (node.name !== "Name") return;
      const path = text.slice(node.from, node.to);
      if (path === name || path.startsWith(`${name}.`)) places.push(node.from);
    },
  });
  return places;
}
