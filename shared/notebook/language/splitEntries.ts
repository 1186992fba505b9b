/** Finds where the entries of a cell begin and end, so that a slip in one leaves the others alone. One pass, linear. */
import type { TextRange } from "../result";

/** The raw span of one entry, or of a line that is none. */
export interface Segment {
  /** What stands before the first `=`, or the whole line where there is no `=`. */
  keyRange: TextRange;
  hasEquals: boolean;
  /** From the first to the last character of the value; empty right after `=` where nothing follows. */
  valueRange: TextRange;
  /** First and last line, from 1. */
  line: number;
  endLine: number;
  remarks: TextRange[];
  /** The innermost bracket left open, and the first closed without having been opened. */
  unclosed: number | null;
  unopened: number | null;
  deepest: number;
  /** The value ends in a comma with nothing after it. */
  trailingComma: boolean;
}

const hash = 35;
const openBracket = 40;
const closeBracket = 41;
const comma = 44;

const lineEnd = /\r\n|[\n\r\u2028\u2029]/g;
const spaces = /[ \t\u000b\u000c\u00a0\u1680\u2000-\u200a\u202f\u205f\u3000\ufeff]*/y;
const named = /[\p{L}\p{M}_][\p{L}\p{M}\p{N}_]*[ \t\u00a0\u2009\u202f]*=/uy;

/** Lines without their ends. A range of the text, from 0. */
export function linesOf(text: string): TextRange[] {
  const lines: TextRange[] = [];
  let from = 0;
  for (const match of text.matchAll(lineEnd)) {
    lines.push({ from, to: match.index });
    from = match.index + match[0].length;
  }
  lines.push({ from, to: text.length });
  return lines;
}

function afterSpaces(text: string, from: number): number {
  spaces.lastIndex = from;
  spaces.exec(text);
  return spaces.lastIndex;
}

function beginsWithName(text: string, from: number): boolean {
  named.lastIndex = from;
  return named.test(text);
}

const isSpaceCode = (code: number): boolean =>
  code === 32 ||
  (code >= 9 && code <= 12) ||
  code === 0xa0 ||
  (code >= 0x2000 && code <= 0x200a) ||
  code === 0x202f;

interface ValueScan {
  open: number[];
  deepest: number;
  unopened: number | null;
  /** Code and place of the last character that is neither space nor remark. */
  last: number;
  lastAt: number;
  remarks: TextRange[];
}

function scanLine(text: string, from: number, to: number, scan: ValueScan): void {
  for (let at = from; at < to; at += 1) {
    const code = text.charCodeAt(at);
    if (code === hash) {
      scan.remarks.push({ from: at, to });
      return;
    }
    if (isSpaceCode(code)) continue;
    if (code === openBracket) {
      scan.open.push(at);
      scan.deepest = Math.max(scan.deepest, scan.open.length);
    } else if (code === closeBracket && scan.open.pop() === undefined) {
      scan.unopened ??= at;
    }
    scan.last = code;
    scan.lastAt = at;
  }
}

/** Whether the entry goes on over a line that begins at `from`. */
function goesOn(text: string, from: number, scan: ValueScan): boolean {
  const isOpen = scan.open.length > 0;
  if (!isOpen && scan.last !== comma) return false;
  if (!beginsWithName(text, from)) return true;
  // `name =` is an argument only inside a bracket, after a comma or the bracket itself; else a new entry.
  return isOpen && (scan.last === comma || scan.last === openBracket);
}

export function splitEntries(text: string): Segment[] {
  const lines = linesOf(text);
  const segments: Segment[] = [];
  for (let index = 0; index < lines.length; index += 1) {
    const first = lines[index];
    const from = afterSpaces(text, first.from);
    if (from >= first.to || text.charCodeAt(from) === hash) continue;

    const remarkAt = text.slice(from, first.to).indexOf("#");
    const codeEnd = remarkAt < 0 ? first.to : from + remarkAt;
    const equals = text.slice(from, codeEnd).indexOf("=");
    const line = index + 1;
    if (equals < 0) {
      const to = from + text.slice(from, codeEnd).trimEnd().length;
      segments.push({
        keyRange: { from, to },
        hasEquals: false,
        valueRange: { from: to, to },
        line,
        endLine: line,
        remarks: [],
        unclosed: null,
        unopened: null,
        deepest: 0,
        trailingComma: false,
      });
      continue;
    }

    const afterEquals = from + equals + 1;
    const scan: ValueScan = {
      open: [],
      deepest: 0,
      unopened: null,
      last: 0,
      lastAt: afterEquals - 1,
      remarks: [],
    };
    scanLine(text, afterEquals, first.to, scan);
    let endIndex = index;
    for (let next = index + 1; next < lines.length; next += 1) {
      const start = afterSpaces(text, lines[next].from);
      if (!goesOn(text, start, scan)) break;
      const lastBefore = scan.lastAt;
      scanLine(text, lines[next].from, lines[next].to, scan);
      if (scan.lastAt > lastBefore) endIndex = next;
      else if (scan.open.length === 0 && scan.remarks[scan.remarks.length - 1]?.to !== lines[next].to) break;
    }
    const to = scan.lastAt + 1;
    segments.push({
      keyRange: { from, to: from + text.slice(from, from + equals).trimEnd().length },
      hasEquals: true,
      valueRange: { from: Math.min(afterSpaces(text, afterEquals), to), to },
      line,
      endLine: endIndex + 1,
      remarks: scan.remarks.filter((remark) => remark.from <= lines[endIndex].to),
      unclosed: scan.open.length > 0 ? scan.open[scan.open.length - 1] : null,
      unopened: scan.unopened,
      deepest: scan.deepest,
      trailingComma: scan.last === comma && scan.open.length === 0,
    });
    index = endIndex;
  }
  return segments;
}
