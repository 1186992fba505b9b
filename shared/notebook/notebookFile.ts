/** A notebook as one Markdown file, to the character save line ends; see the docs on the cell language. */
import { cellKinds, documentLimits, type Cell, type CellKind, type NotebookDocument } from "./document";
import { fileBlocks, type FileBlock } from "./file/blocks";
import { fileText } from "./file/fileText";
import { readHeader, writeHeader } from "./file/header";
import { decodeLabel, decodeTitle, encodeLabel, encodeTitle } from "./file/labels";
import { nearestName } from "./language/nearestName";
import type { Note } from "./result";

export type NotebookFileReading =
  | {
      ok: true;
      document: NotebookDocument;
      /** Remarks and cautions, each with its line in the file. */
      notes: Note[];
      /** By cell id, the line of the file on which the cell's text begins. */
      textLines: Record<string, number>;
    }
  | { ok: false; notes: Note[] };

/** The file of a document. `readNotebookFile` gives the same document back, save ids and CR line ends. */
export function writeNotebookFile(document: NotebookDocument): string {
  const blocks = [`# ${encodeTitle(document.title)}`, fence("notebook", writeHeader(document))];
  return [...blocks, ...document.cells.map(writeCell)].join("\n\n") + "\n";
}

function writeCell(cell: Cell): string {
  const text = cell.text.replace(/\r\n?/g, "\n");
  const label = encodeLabel(cell.name);
  if (cell.kind === "prose") {
    const plain = text === "" ? proseComment(label) : `${proseComment(label)}\n\n${text}`;
    if (staysProse(plain, text)) return plain;
  }
  return fence(label === "" ? cell.kind : `${cell.kind} ${label}`, text);
}

function proseComment(label: string): string {
  return label === "" ? "<!-- prose -->" : `<!-- prose ${label} -->`;
}

/** A fence longer than any inside. */
function fence(info: string, text: string): string {
  const longest = Math.max(2, ...[...text.matchAll(/`+/g)].map((run) => run[0].length));
  const marks = "`".repeat(longest + 1);
  return text === "" ? `${marks}${info}\n${marks}` : `${marks}${info}\n${text}\n${marks}`;
}

/** Whether Markdown written bare comes back as the same one cell: nothing in it opens a cell or stays open. */
function staysProse(written: string, text: string): boolean {
  if (!/^[ \t]*(?:```|~~~|<)/m.test(text)) return true;
  const cells = cellsOf(`${written}\n\n${fence("values", "")}\n`, 0, []);
  return cells.length === 2 && cells[0]!.kind === "prose" && cells[0]!.text === text;
}

/**
 * The document of a file, or the reasons why it is none, each with its line. Nothing is half-read.
 *
 * @param newId gives each cell an id that no other cell has
 */
export function readNotebookFile(raw: string, newId: () => string): NotebookFileReading {
  const tooLong = raw.length > documentLimits.documentLength + 100_000;
  if (tooLong) {
    const most = documentLimits.documentLength;
    return failed([
      fault("too_long", `A notebook holds at most ${most} characters; this file has ${raw.length}.`, 1),
    ]);
  }
  const { text, notes } = fileText(raw);
  if (notes.some(({ level }) => level === "fault")) return failed(notes);

  const [heading, block] = fileBlocks(text);
  if (heading?.type !== "title" || block?.type !== "fence" || block.word !== "notebook") {
    return failed([...notes, notANotebook(text, heading, block)]);
  }
  const { header, notes: headerNotes } = readHeader(block.text, block.textLine);
  const title = decodeTitle(heading.markdown);
  notes.push(...headerNotes, ...unclosed(block));
  if (title.length > documentLimits.titleLength) {
    notes.push(fault("title_too_long", `A title has at most ${documentLimits.titleLength} characters.`, 1));
  }

  const textLines: Record<string, number> = {};
  const cells = cellsOf(text, block.to, notes).map(({ textLine, ...cell }): Cell => {
    const id = newId();
    textLines[id] = textLine;
    return { id, ...cell };
  });
  if (cells.length > documentLimits.cells) {
    const line = textLines[cells[documentLimits.cells]!.id]!;
    notes.push(
      fault(
        "too_many_cells",
        `A notebook holds at most ${documentLimits.cells} cells; this one has ${cells.length}.`,
        line,
      ),
    );
  }
  if (notes.some(({ level }) => level === "fault")) return failed(notes);
  return { ok: true, document: { format: 1, title, ...header, cells }, notes, textLines };
}

function failed(notes: Note[]): NotebookFileReading {
  return { ok: false, notes: notes.toSorted((a, b) => (a.line ?? 0) - (b.line ?? 0)) };
}

function fault(code: string, message: string, line: number): Note {
  return { level: "fault", code, message, line };
}

function notANotebook(text: string, heading: FileBlock | undefined, block: FileBlock | undefined): Note {
  if (heading?.type !== "title") {
    const line = heading ? lineOf(text, heading.from) : 1;
    return fault(
      "no_title",
      "This is no notebook file: it does not begin with a title. Write # and the title first.",
      line,
    );
  }
  const line = block ? lineOf(text, block.from) : lineOf(text, text.length);
  return fault(
    "no_notebook_block",
    "This is no notebook file: a fenced block notebook with format = 1 must follow the title.",
    line,
  );
}

interface ReadCell extends Omit<Cell, "id"> {
  textLine: number;
}

/** The cells from an offset on. Notes are added for what is doubtful or broken in them. */
function cellsOf(text: string, from: number, notes: Note[]): ReadCell[] {
  const cells: ReadCell[] = [];
  let prose: { name: string | null; from: number } = { name: null, from };

  const endProse = (to: number, isLast: boolean) => {
    const cell = readProse(text, prose, to, isLast);
    if (cell) cells.push(cell);
  };
  for (const block of fileBlocks(text)) {
    if (block.from < from) continue;
    if (block.type === "proseComment") {
      endProse(block.from, false);
      prose = { name: decodeLabel(block.label), from: block.to };
    } else if (block.type === "fence" && isKind(block.word)) {
      endProse(block.from - columnOf(text, block.from), false);
      prose = { name: null, from: block.to };
      cells.push({
        kind: block.word,
        name: decodeLabel(block.label),
        text: block.text,
        textLine: block.textLine,
      });
      notes.push(...unclosed(block));
    } else if (block.type === "fence") {
      notes.push(...likelyKind(block));
    }
  }
  endProse(text.length, true);
  for (const { name, text: cellText, textLine } of cells) {
    if (name.length > documentLimits.nameLength) {
      notes.push(
        fault("name_too_long", `A name has at most ${documentLimits.nameLength} characters.`, textLine),
      );
    }
    if (cellText.length > documentLimits.cellLength) {
      notes.push(
        fault("cell_too_long", `A cell has at most ${documentLimits.cellLength} characters.`, textLine),
      );
    }
  }
  return cells;
}

/**
 * Prose between two blocks: one blank line at each end belongs to the file. Without a comment that opens it, blank
 * lines alone are no cell.
 */
function readProse(
  text: string,
  prose: { name: string | null; from: number },
  to: number,
  isLast: boolean,
): ReadCell | null {
  const between = text.slice(prose.from, to);
  if (prose.name === null && between.trim() === "") return null;
  const [lead] = prose.name === null ? /^\s*\n|/.exec(between)! : /^\n{0,2}/.exec(between)!;
  const ended = between.replace(isLast ? /\n$/ : /\n{1,2}$/, "");
  return {
    kind: "prose",
    name: prose.name ?? "",
    text: ended.slice(lead.length),
    textLine: lineOf(text, prose.from + Math.min(lead.length, between.length)),
  };
}

function isKind(word: string): word is CellKind {
  return (cellKinds as readonly string[]).includes(word);
}

function unclosed(block: FileBlock): Note[] {
  if (block.type !== "fence" || block.isClosed) return [];
  const line = block.textLine - 1;
  return [
    fault("unclosed_block", `The block ${block.word} that begins on line ${line} is never closed.`, line),
  ];
}

function likelyKind(block: FileBlock & { type: "fence" }): Note[] {
  const nearest = block.label === "" ? undefined : nearestName(block.word, cellKinds);
  if (nearest === undefined) return [];
  const message = `${block.word} is no kind of cell; the block is read as prose. The nearest kind is ${nearest}.`;
  return [{ level: "remark", code: "unknown_kind", message, line: block.textLine - 1 }];
}

function lineOf(text: string, offset: number): number {
  let line = 1;
  for (let at = text.indexOf("\n"); at >= 0 && at < offset; at = text.indexOf("\n", at + 1)) line += 1;
  return line;
}

function columnOf(text: string, offset: number): number {
  return offset - (text.lastIndexOf("\n", offset - 1) + 1);
}
