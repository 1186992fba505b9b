import type { Cell, CellKind, NotebookDocument } from "../../../../shared/notebook/document";
import { cellSchemas } from "../../../../shared/notebook/cellSchemas";
import type { EntrySchema } from "../../../../shared/notebook/kinds/cellSchema";

/** Names that a new cell takes, numbered where they are taken. A gas cell is named by its formula, which only its writer knows. */
const names: Record<CellKind, string> = {
  prose: "",
  values: "given",
  body: "planet",
  gas: "",
  column: "air",
  escape: "leak",
  corona: "halo",
  nonthermal: "hot",
  sweep: "across",
  spread: "sure",
  loss: "lost",
};

/** A cell to be inserted at a place: the needed entries as an example gives them, with the cells above that it most likely rests on. */
export function newCell(kind: CellKind, document: NotebookDocument, index: number): Cell {
  const above = document.cells.slice(0, index).reverse();
  const nearest = (of: CellKind): string => above.find((cell) => cell.kind === of)?.name ?? "";
  const lines = neededEntries(kind).map((entry) =>
    entry.form === "cell" && entry.names ? `${entry.key} = ${nearest(entry.names)}` : entry.example,
  );
  return { id: crypto.randomUUID(), kind, name: freeName(names[kind], document), text: lines.join("\n") };
}

/** Of entries that need company, the first stands for the others. */
function neededEntries(kind: CellKind): EntrySchema[] {
  const answered = new Set<string>();
  return cellSchemas[kind].entries.filter(({ key, needed, oneOf }) => {
    if (needed === false || answered.has(key)) return false;
    oneOf?.forEach((other) => answered.add(other));
    answered.add(key);
    return true;
  });
}

function freeName(wanted: string, document: NotebookDocument): string {
  if (wanted === "") return "";
  const taken = new Set(document.cells.map((cell) => cell.name));
  let name = wanted;
  for (let count = 2; taken.has(name); count += 1) name = `${wanted}_${count}`;
  return name;
}
