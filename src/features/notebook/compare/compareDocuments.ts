import type { Cell, NotebookDocument } from "../../../../shared/notebook/document";
import { entryBlocks } from "../draft/entryBlocks";
import { mergeKeyed } from "../draft/mergeKeyed";

/** One thing that two states of a notebook have differently; null where a state does not have it. */
export interface Difference {
  /** Key of an entry, or "text", "name", "title", … */
  label: string;
  older: string | null;
  newer: string | null;
}

export interface CellDifference {
  id: string;
  kind: Cell["kind"];
  name: string;
  change: "changed" | "new" | "gone";
  differences: Difference[];
  /** Entries that both states have alike. */
  same: number;
}

export interface DocumentComparison {
  /** Of the notebook itself: title, authors, headline, units, order of its cells. */
  fields: Difference[];
  /** In the order of the newer state; what is gone stands where it was. */
  cells: CellDifference[];
  /** Cells that both states have alike. */
  sameCells: number;
}

/** What differs between two states of a notebook, or between a notebook and one that came from it. */
export function compareDocuments(older: NotebookDocument, newer: NotebookDocument): DocumentComparison {
  const before = withIdsOf(newer, older);
  const olderCells = byId(before);
  const members = mergeKeyed({ base: olderCells, mine: byId(newer), theirs: olderCells }, isSameCell);
  const cells = members
    .filter(({ change }) => change !== "none")
    .map(({ base, mine }) => compareCells(base, mine));
  return { fields: compareFields(before, newer), cells, sameCells: members.length - cells.length };
}

/** Cells of a file that was read anew have ids of their own; then kind and name tell which is which. */
function withIdsOf(newer: NotebookDocument, older: NotebookDocument): NotebookDocument {
  const known = new Set(newer.cells.map(({ id }) => id));
  if (older.cells.some(({ id }) => known.has(id))) return older;
  const cells = older.cells.map((cell) => {
    const twin = newer.cells.find(({ kind, name }) => kind === cell.kind && name === cell.name);
    return twin ? { ...cell, id: twin.id } : cell;
  });
  return { ...older, cells };
}

function compareCells(older: Cell | undefined, newer: Cell | undefined): CellDifference {
  const { id, kind, name } = (newer ?? older)!;
  const all = (cell: Cell) => [...blocksOf(cell).keys()].length;
  if (!older) return { id, kind, name, change: "new", differences: [], same: all(newer!) };
  if (!newer) return { id, kind, name, change: "gone", differences: [], same: all(older) };
  const differences = [
    ...difference("kind", older.kind, newer.kind),
    ...difference("name", older.name, newer.name),
  ];
  if (kind === "prose") {
    return {
      id,
      kind,
      name,
      change: "changed",
      differences: [...differences, ...difference("text", older.text, newer.text)],
      same: 0,
    };
  }
  const [before, after] = [blocksOf(older), blocksOf(newer)];
  const blocks = mergeKeyed({ base: before, mine: after, theirs: before }, (one, other) => one === other);
  const changed = blocks.filter(({ change }) => change !== "none");
  return {
    id,
    kind,
    name,
    change: "changed",
    differences: [
      ...differences,
      ...changed.map(({ key, base, mine }) => ({ label: key, older: base ?? null, newer: mine ?? null })),
    ],
    same: blocks.length - changed.length,
  };
}

/** What is written of each entry, by its key. */
function blocksOf({ kind, text }: Cell): Map<string, string> {
  if (kind === "prose") return new Map([["text", text]]);
  return new Map(entryBlocks(text).map(({ id, text: block }) => [id, block.trim()]));
}

function compareFields(older: NotebookDocument, newer: NotebookDocument): Difference[] {
  const kept = new Set(newer.cells.map(({ id }) => id));
  const known = new Set(older.cells.map(({ id }) => id));
  const order = ({ cells }: NotebookDocument) =>
    cells
      .filter(({ id }) => kept.has(id) && known.has(id))
      .map(({ kind, name }) => name || kind)
      .join(", ");
  const isMoved = inOrder(older, known, kept) !== inOrder(newer, known, kept);
  return [
    ...difference("title", older.title, newer.title),
    ...difference("authors", older.authors.join(", "), newer.authors.join(", ")),
    ...difference("headline", older.headline.join(", "), newer.headline.join(", ")),
    ...difference("unit system", older.unitSystem, newer.unitSystem),
    ...(isMoved ? difference("order", order(older), order(newer)) : []),
  ];
}

const inOrder = ({ cells }: NotebookDocument, known: Set<string>, kept: Set<string>): string =>
  cells
    .map(({ id }) => id)
    .filter((id) => known.has(id) && kept.has(id))
    .join(" ");

const difference = (label: string, older: string, newer: string): Difference[] =>
  older === newer ? [] : [{ label, older: older || null, newer: newer || null }];

const byId = ({ cells }: NotebookDocument): Map<string, Cell> =>
  new Map(cells.map((cell) => [cell.id, cell]));

const isSameCell = (one: Cell, other: Cell): boolean =>
  one.kind === other.kind && one.name === other.name && one.text.trimEnd() === other.text.trimEnd();
