import { answerKey } from "../../../../shared/notebook/cautionAnswers";
import type { CautionAnswer, Cell, NotebookDocument } from "../../../../shared/notebook/document";
import { entryBlocks, joinBlocks, type EntryBlock } from "./entryBlocks";
import { mergeKeyed, type MergedMember } from "./mergeKeyed";

export type Side = "mine" | "theirs";

/** One thing that both sides changed differently. */
export interface Conflict {
  /** Stable while both sides stay as they are. */
  id: string;
  /** null where the notebook itself is meant. */
  cellId: string | null;
  /** What it is about: the key of an entry, or "name", "text", "cell", "title", … */
  label: string;
  /** Each state as it would be written; null where that side has no such thing. */
  base: string | null;
  mine: string | null;
  theirs: string | null;
}

/** A change that needed no choice. */
export interface SettledChange {
  cellId: string | null;
  label: string;
  side: Side;
}

export interface DocumentMerge {
  /** What stands, with the choices made so far; where none was made, mine. */
  document: NotebookDocument;
  conflicts: Conflict[];
  settled: SettledChange[];
}

interface Sides {
  base: NotebookDocument;
  mine: NotebookDocument;
  theirs: NotebookDocument;
}

/**
 * Brings two changed states of a document together. What only one side changed goes in by itself, entry by entry;
 * what both changed differently becomes a conflict, and stands as chosen. Nothing of either side is dropped unsaid.
 */
export function mergeDocuments(
  { base, mine, theirs }: Sides,
  choices: Record<string, Side> = {},
): DocumentMerge {
  const conflicts: Conflict[] = [];
  const settled: SettledChange[] = [];

  /** What stands of one thing that may have changed on either side. */
  function stands<T>(
    { key, change, ...member }: MergedMember<T>,
    about: { cellId: string | null; label: string; write: (value: T) => string },
  ): T | undefined {
    if (change === "mine" || change === "theirs") {
      settled.push({ cellId: about.cellId, label: about.label, side: change });
      return member[change];
    }
    if (change !== "both") return member.mine;
    const written = (value: T | undefined): string | null =>
      value === undefined ? null : about.write(value);
    const id = `${about.cellId ?? ""}/${key}`;
    conflicts.push({
      id,
      cellId: about.cellId,
      label: about.label,
      base: written(member.base),
      mine: written(member.mine),
      theirs: written(member.theirs),
    });
    return member[choices[id] ?? "mine"];
  }

  function field<T>(cellId: string | null, label: string, states: { base: T; mine: T; theirs: T }): T {
    // The colon keeps a cell's name apart from an entry `name`.
    const key = `:${label}`;
    const [member] = mergeKeyed(
      {
        base: new Map([[key, states.base]]),
        mine: new Map([[key, states.mine]]),
        theirs: new Map([[key, states.theirs]]),
      },
      isEqual,
    );
    const write = (value: T): string => (Array.isArray(value) ? value.join(", ") : String(value));
    return stands(member!, { cellId, label, write }) ?? states.mine;
  }

  function mergeText(cell: Cell, before: Cell, here: Cell, there: Cell): string {
    if (cell.kind === "prose") {
      return field(cell.id, "text", { base: before.text, mine: here.text, theirs: there.text });
    }
    const blocks = mergeKeyed(
      { base: keyed(before.text), mine: keyed(here.text), theirs: keyed(there.text) },
      (one, other) => one.text.trimEnd() === other.text.trimEnd(),
    );
    const standing = blocks.map((member) =>
      stands(member, { cellId: cell.id, label: member.key, write: (block) => block.text.trimEnd() }),
    );
    return joinBlocks(standing.filter((block) => block !== undefined));
  }

  function mergeCell(member: MergedMember<Cell>): Cell | undefined {
    const { base: before, mine: here, theirs: there, key } = member;
    if (member.change !== "both" || !here || !there) {
      const label = "cell";
      return stands(member, { cellId: key, label, write: (cell) => `${cell.name}\n${cell.text}`.trim() });
    }
    // Ids are made at random, so two sides that both have a cell had it from one state.
    const origin = before ?? here;
    const name = field(key, "name", { base: origin.name, mine: here.name, theirs: there.name });
    return { ...here, name, text: mergeText(here, origin, here, there) };
  }

  const cells = mergeKeyed({ base: byId(base), mine: byId(mine), theirs: byId(theirs) }, isSameCell)
    .map(mergeCell)
    .filter((cell) => cell !== undefined);
  const answers = mergeKeyed(
    { base: answersOf(base), mine: answersOf(mine), theirs: answersOf(theirs) },
    isSameAnswer,
  )
    .map((member) => stands(member, { cellId: null, label: "answer to a caution", write: ({ sentence }) => sentence }))
    .filter((answer) => answer !== undefined);
  const of = <Key extends keyof NotebookDocument>(key: Key) => ({
    base: base[key],
    mine: mine[key],
    theirs: theirs[key],
  });
  const document: NotebookDocument = {
    format: mine.format,
    title: field(null, "title", of("title")),
    unitSystem: field(null, "unit system", of("unitSystem")),
    headline: field(null, "headline", of("headline")),
    authors: field(null, "authors", of("authors")),
    cells,
    ...(answers.length === 0 ? {} : { answers }),
  };
  return { document, conflicts, settled };
}

function answersOf({ answers = [] }: NotebookDocument): Map<string, CautionAnswer> {
  return new Map(answers.map((answer) => [answerKey(answer), answer]));
}

function isSameAnswer(one: CautionAnswer, other: CautionAnswer): boolean {
  return one.sentence === other.sentence && isEqual(one.numbers, other.numbers);
}

function byId(document: NotebookDocument): Map<string, Cell> {
  return new Map(document.cells.map((cell) => [cell.id, cell]));
}

function keyed(text: string): Map<string, EntryBlock> {
  return new Map(entryBlocks(text).map((block) => [block.id, block]));
}

function isSameCell(one: Cell, other: Cell): boolean {
  return one === other || (one.kind === other.kind && one.name === other.name && one.text === other.text);
}

/** Equal plain values, or lists of them. */
function isEqual<T>(one: T, other: T): boolean {
  if (Array.isArray(one) && Array.isArray(other)) {
    return one.length === other.length && one.every((value, index) => value === other[index]);
  }
  return one === other;
}

/** Whether two documents say the same; cells that are the same object are not compared again. */
export function isSameDocument(one: NotebookDocument, other: NotebookDocument): boolean {
  return (
    one === other ||
    (one.title === other.title &&
      one.unitSystem === other.unitSystem &&
      isEqual(one.headline, other.headline) &&
      isEqual(one.authors, other.authors) &&
      JSON.stringify(one.answers ?? []) === JSON.stringify(other.answers ?? []) &&
      one.cells.length === other.cells.length &&
      one.cells.every(
        (cell, index) => cell.id === other.cells[index]!.id && isSameCell(cell, other.cells[index]!),
      ))
  );
}
