/** The block `notebook` of a file: format, unit system, headline, authors. */
import type { CautionAnswer, NotebookDocument } from "../document";
import { cautionAnswerSchema, documentLimits } from "../document";
import type { Note } from "../result";

export type Header = Pick<NotebookDocument, "unitSystem" | "headline" | "authors" | "answers">;

const keys = ["format", "unit_system", "headline", "authors", "answer"] as const;

/** The lines inside the fence. What stands at its default is left out. */
export function writeHeader({ unitSystem, headline, authors, answers = [] }: Header): string {
  const lines = ["format = 1"];
  if (unitSystem !== "SI") lines.push(`unit_system = ${unitSystem}`);
  if (headline.length > 0) lines.push(`headline = ${writeList(headline)}`);
  if (authors.length > 0) lines.push(`authors = ${writeList(authors)}`);
  for (const { cell, code, entry, numbers, sentence } of answers)
    lines.push(`answer = ${writeList([cell || none, code, entry || none, numbers.join(" ") || none, sentence])}`);
  return lines.join("\n");
}

/** Stands where an answer's cell has no name, its caution no entry or no numbers. */
const none = "-";

/** `answer = cell, code, entry, numbers, sentence`; null where it has another form. */
function readAnswer(values: readonly string[]): CautionAnswer | null {
  if (values.length !== 5) return null;
  const [cell, code, entry, written, sentence] = values.map((value) => (value === none ? "" : value));
  const numbers = written === "" ? [] : written.split(" ").map(Number);
  const answer = cautionAnswerSchema.safeParse({ cell, code, entry, numbers, sentence });
  return answer.success ? answer.data : null;
}

/**
 * Reads what `writeHeader` writes, and what a person would: `#` begins a remark, a list goes on over the next line
 * after a comma, `\` takes the next character as it is.
 *
 * @param firstLine line of the file on which `text` begins
 */
export function readHeader(text: string, firstLine: number): { header: Header; notes: Note[] } {
  const header: Header = { unitSystem: "SI", headline: [], authors: [] };
  const notes: Note[] = [];
  const seen = new Set<string>();
  const fault = (line: number, code: string, message: string) =>
    notes.push({ level: "fault", code, message, line });

  for (const { line, text: statement } of statements(text, firstLine)) {
    const parts = /^([^=]*)=(.*)$/s.exec(statement);
    if (!parts) {
      fault(line, "no_entry", `"${statement.trim()}" is no entry; write key = value.`);
      continue;
    }
    const key = parts[1]!.trim();
    const values = readList(parts[2]!);
    if (seen.has(key) && key !== "answer") fault(line, "key_twice", `${key} stands twice in the block notebook; keep one.`);
    seen.add(key);

    if (key === "format") {
      if (values.join() !== "1") fault(line, "format", formatMessage(values.join(", ")));
    } else if (key === "unit_system") {
      if (values[0] === "SI" || values[0] === "cgs") header.unitSystem = values[0];
      else fault(line, "unit_system", "unit_system is SI or cgs.");
    } else if (key === "headline") {
      header.headline = limited(values, documentLimits.headlineItems, documentLimits.headlineLength);
      if (header.headline.length < values.length) {
        fault(line, "headline", `headline takes up to ${documentLimits.headlineItems} names of results.`);
      }
    } else if (key === "authors") {
      header.authors = limited(values, documentLimits.authors, documentLimits.authorLength);
      if (header.authors.length < values.length) {
        fault(
          line,
          "authors",
          `authors takes up to ${documentLimits.authors} names of up to ${documentLimits.authorLength} characters.`,
        );
      }
    } else if (key === "answer") {
      const answer = readAnswer(values);
      if (answer) header.answers = [...(header.answers ?? []), answer];
      else fault(line, "answer", "An answer to a caution is written answer = cell, code, entry, numbers, sentence.");
    } else {
      fault(line, "unknown_key", `No entry ${key} in the block notebook; it takes ${keys.join(", ")}.`);
    }
  }
  if (!seen.has("format")) {
    fault(firstLine, "format", "The block notebook says no format; write format = 1 on its first line.");
  }
  return { header, notes };
}

function formatMessage(given: string): string {
  return `This file has format ${given || "nothing"}; this version of Tenuity reads format 1.`;
}

function limited(values: string[], most: number, longest: number): string[] {
  return values.filter((value) => value.length <= longest).slice(0, most);
}

function writeList(values: string[]): string {
  return values.map((value) => value.replace(/[\\,#]/g, "\\$&").replace(/^ | $/g, "\\ ")).join(", ");
}

/** Splits at commas; trims; drops empty members; takes an escaped character as it is. */
function readList(text: string): string[] {
  const members = text.match(/(?:\\.|[^\\,])+/gsu) ?? [];
  return members
    .map((member) => member.replace(/^[ \t\n]+/, "").replace(/^((?:\\.|[^\\])*?)[ \t\n]*$/su, "$1"))
    .map((member) => member.replace(/\\(.)/gsu, "$1"))
    .filter((member) => member !== "");
}

/** Lines without remarks, joined where a line ends in a comma. */
function statements(text: string, firstLine: number): { line: number; text: string }[] {
  const found: { line: number; text: string }[] = [];
  let goesOn = false;
  text.split("\n").forEach((raw, index) => {
    const bare = /^(?:\\.|[^\\#])*/u.exec(raw)![0];
    if (/^[ \t]*$/.test(bare)) return;
    if (goesOn) found.at(-1)!.text += bare;
    else found.push({ line: firstLine + index, text: bare });
    goesOn = /(?<!\\),[ \t]*$/.test(bare);
  });
  return found;
}
