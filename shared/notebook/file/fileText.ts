/** The characters of a notebook file: what is put right, what is kept and said, what cannot be kept. */
import type { Note } from "../result";

/** More containers than this inside one another on one line are no prose that anyone wrote. */
const deepestNesting = 100;

const nested = new RegExp(`^(?:[ \\t]*(?:[-+*>]|\\d{1,9}[.)])[ \\t]?){${deepestNesting}}`, "m");
const indentedFar = /^[ \t]{400,}(?:[-+*>]|\d{1,9}[.)])/m;

export interface FileText {
  /** Without byte-order mark, all line ends LF. */
  text: string;
  notes: Note[];
}

/** Puts line ends right and says what else the characters of a file are. Notes carry lines of the file. */
export function fileText(raw: string): FileText {
  const notes: Note[] = [];
  const hasMark = raw.startsWith("\uFEFF");
  const unmarked = hasMark ? raw.slice(1) : raw;
  const text = unmarked.replace(/\r\n?/g, "\n");

  if (hasMark) {
    notes.push(remark("byte_order_mark", "The file begins with a byte-order mark; it is left out.", 1));
  }
  if (text !== unmarked) {
    notes.push(remark("line_ends", "Line ends are CRLF or CR; they are read as LF.", lineAt(unmarked, /\r/)));
  }
  noteEach(text, /\t/, (line, count) =>
    notes.push(
      remark("tabs", `${lines(count)} with tabs, first line ${line}; they are kept as they are.`, line),
    ),
  );
  noteEach(text, /[\u200E\u200F\u061C\u202A-\u202E\u2066-\u2069]/, (line, count) =>
    notes.push({
      level: "caution",
      code: "bidirectional_characters",
      message: `${lines(count)} with characters that turn the direction of writing, first line ${line}. They are kept, and can make text look different from what it is.`,
      line,
    }),
  );
  noteEach(text, /[^\P{Cc}\t\n\0]/u, (line, count) =>
    notes.push({
      level: "caution",
      code: "control_characters",
      message: `${lines(count)} with control characters, first line ${line}. They are kept; take them out if they are not meant.`,
      line,
    }),
  );
  noteEach(text, /\0|\p{Surrogate}/u, (line, count) =>
    notes.push({
      level: "fault",
      code: "broken_characters",
      message: `${lines(count)} with a null or broken character, first line ${line}. Such a file is no text; save it as UTF-8.`,
      line,
    }),
  );
  for (const pattern of [nested, indentedFar]) {
    const found = pattern.exec(text);
    if (found) {
      notes.push({
        level: "fault",
        code: "nested_too_deep",
        message: `Lists or quotations are nested over ${deepestNesting} deep. Take some levels out.`,
        line: lineAt(text, pattern),
      });
    }
  }
  return { text, notes };
}

function remark(code: string, message: string, line: number): Note {
  return { level: "remark", code, message, line };
}

function lines(count: number): string {
  return count === 1 ? "One line" : `${count} lines`;
}

function noteEach(text: string, pattern: RegExp, say: (line: number, count: number) => void): void {
  if (!pattern.test(text)) return;
  const hits = text.split("\n").flatMap((line, index) => (pattern.test(line) ? [index + 1] : []));
  say(hits[0]!, hits.length);
}

/** From 1; the line on which the pattern is first found. */
function lineAt(text: string, pattern: RegExp): number {
  const before = text.slice(0, text.search(pattern));
  return before.split(/\r\n?|\n/).length;
}
