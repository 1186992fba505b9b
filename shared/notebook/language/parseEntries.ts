import type { Note, TextRange } from "../result";
import { locateNotes } from "./locateNotes";
import { caution, fault, quoted, remark, type Remedy } from "./notes";
import { languageLimits, plainDigits, readValue, tooDeep } from "./readValue";
import { splitEntries, type Segment } from "./splitEntries";
import type { Entry, ParsedEntries, ValueNode } from "./syntax";

/** Control characters, bidirectional marks, joiners and other characters that do not show. */
const hiddenCharacters =
  /[\u0000-\u0008\u000e-\u001f\u007f-\u0084\u0086-\u009f\u00ad\u061c\u180e\u200b-\u200f\u202a-\u202e\u2060-\u206f\ufeff\ufff9-\ufffb]+/g;
const bidirectional = /[\u061c\u200e\u200f\u202a-\u202e\u2066-\u2069]/;

const codePoint = (text: string): string =>
  `U+${(text.codePointAt(0) ?? 0).toString(16).toUpperCase().padStart(4, "0")}`;

function hiddenMessage(found: string): string {
  return bidirectional.test(found)
    ? `A character that turns the direction of the text (${codePoint(found)}) makes this line read otherwise than it looks. Remove it.`
    : `A character that does not show (${codePoint(found)}) stands here. Remove it.`;
}

const remove = (range: TextRange): Remedy => ({ label: "Remove it", range, replacement: "" });

interface Hidden {
  range: TextRange;
  message: string;
}

function findHidden(text: string): Hidden[] {
  const found: Hidden[] = [];
  for (const match of text.matchAll(hiddenCharacters)) {
    const range = { from: match.index, to: match.index + match[0].length };
    if (range.from === 0 && match[0] === "\ufeff") continue;
    found.push({ range, message: hiddenMessage(match[0]) });
  }
  return found;
}

/** What is unusual about the text as a whole, said once. */
function remarksOnText(text: string): Note[] {
  const notes: Note[] = [];
  if (text.startsWith("\ufeff"))
    notes.push(
      remark(
        "byte_order_mark",
        { from: 0, to: 1 },
        "A byte-order mark stands first and is passed over.",
        remove({ from: 0, to: 1 }),
      ),
    );
  const tab = text.indexOf("\t");
  if (tab >= 0) notes.push(remark("tab", { from: tab, to: tab + 1 }, "Tabs are read as spaces."));
  const carriageReturn = text.indexOf("\r");
  if (carriageReturn >= 0)
    notes.push(
      remark(
        "carriage_return",
        { from: carriageReturn, to: carriageReturn + 1 },
        "Lines end in a carriage return; they are read like any other.",
      ),
    );
  return notes;
}

function keyFault(text: string, segment: Segment): Note | null {
  const range = segment.keyRange;
  const key = text.slice(range.from, range.to);
  if (!segment.hasEquals)
    return fault("no_entry", range, `An entry is written key = value; *${quoted(key)}* has no *=*.`);
  if (key === "")
    return fault("bad_key", { from: range.from, to: range.from + 1 }, "A name must stand before *=*.");
  if (/^[A-Za-z][A-Za-z0-9_]*$/.test(key)) return null;
  const joined = plainDigits(key).replace(/[\s.-]+/g, "_");
  const remedy: Remedy | undefined = /^[A-Za-z][A-Za-z0-9_]*$/.test(joined)
    ? { label: `Change to ${joined}`, range, replacement: joined }
    : undefined;
  const reason = /\s/.test(key)
    ? "A name has no spaces"
    : /^[A-Za-z]/.test(key)
      ? "A name consists of letters from a to z, digits and *_*"
      : "A name begins with a letter from a to z";
  return fault("bad_key", range, `${reason}; *${quoted(key)}* can't stand before *=*.`, remedy);
}

/** The value with spaces in place of remarks and line ends, so that places stay. */
function valueText(text: string, { valueRange, remarks }: Segment): string {
  let plain = "";
  let from = valueRange.from;
  for (const span of remarks) {
    if (span.from < from || span.from >= valueRange.to) continue;
    plain += text.slice(from, span.from) + " ".repeat(Math.min(span.to, valueRange.to) - span.from);
    from = span.to;
  }
  plain += text.slice(from, valueRange.to);
  return plain.replace(/[\n\r\u2028\u2029\u000b\u000c]/g, " ");
}

function remarkText(text: string, segment: Segment): string | null {
  const parts = segment.remarks
    .map((span) => text.slice(span.from + 1, span.to).trim())
    .filter((part) => part !== "");
  return parts.length > 0 ? parts.join(" ") : null;
}

function readSegment(
  text: string,
  segment: Segment,
  key: string,
  hidden: readonly Hidden[],
): { node: ValueNode; notes: Note[] } {
  const range = segment.valueRange;
  const whole = { from: segment.keyRange.from, to: range.to };
  const broken = (note: Note) => ({ node: { type: "broken", range } as const, notes: [note] });
  const [firstHidden] = hidden;
  if (firstHidden)
    return broken(
      fault("hidden_character", firstHidden.range, firstHidden.message, remove(firstHidden.range)),
    );
  if (range.from >= range.to)
    return broken(
      fault(
        "no_value",
        segment.keyRange,
        `*${key}* has no value. Write one after *=*, or take the line away.`,
      ),
    );
  const length = whole.to - whole.from;
  if (length > languageLimits.entryLength)
    return broken(
      fault(
        "too_long",
        segment.keyRange,
        `*${key}* has ${length} characters; an entry has 10,000 at most. Put long tables in a file.`,
      ),
    );
  if (segment.deepest > languageLimits.depth) return broken(tooDeep(range));
  if (segment.unopened !== null)
    return broken(
      fault(
        "bracket",
        { from: segment.unopened, to: segment.unopened + 1 },
        "This bracket closes nothing.",
        remove({ from: segment.unopened, to: segment.unopened + 1 }),
      ),
    );
  if (segment.unclosed !== null)
    return broken(
      fault(
        "bracket",
        { from: segment.unclosed, to: segment.unclosed + 1 },
        "This bracket is not closed. Write *)* where it ends.",
      ),
    );
  if (segment.trailingComma) {
    const comma = { from: range.to - 1, to: range.to };
    return broken(
      fault("trailing_comma", comma, "Nothing follows the comma.", {
        label: "Remove the comma",
        range: comma,
        replacement: "",
      }),
    );
  }
  return readValue(valueText(text, segment), range.from, key);
}

/**
 * Entries of a cell in the order written, and what is wrong with them, each on its own characters. An entry that
 * can't be read has a broken node and a note; a key met twice keeps its first value. Takes any text and never throws.
 */
export function parseEntries(text: string): ParsedEntries {
  const entries: Entry[] = [];
  const notes: Note[] = remarksOnText(text);
  const seen = new Map<string, number>();
  const hidden = findHidden(text);
  let nextHidden = 0;

  for (const segment of splitEntries(text)) {
    const end = Math.max(segment.valueRange.to, segment.keyRange.to);
    const inside: Hidden[] = [];
    for (; nextHidden < hidden.length && hidden[nextHidden].range.from < end; nextHidden += 1) {
      const { range, message } = hidden[nextHidden];
      const inRemark =
        range.from < segment.keyRange.from ||
        segment.remarks.some((span) => range.from >= span.from && range.from < span.to);
      if (inRemark) notes.push(caution("hidden_character", range, message, remove(range)));
      else inside.push(hidden[nextHidden]);
    }

    const badKey = keyFault(text, segment);
    if (badKey) {
      const [first] = inside;
      notes.push(first ? fault("hidden_character", first.range, first.message, remove(first.range)) : badKey);
      continue;
    }
    const key = text.slice(segment.keyRange.from, segment.keyRange.to);
    const firstLine = seen.get(key);
    if (firstLine !== undefined) {
      notes.push({
        ...fault(
          "duplicate_key",
          segment.keyRange,
          `*${key}* stands twice; line ${firstLine} already gives it. Keep one.`,
        ),
        entry: key,
      });
      continue;
    }
    seen.set(key, segment.line);
    const read = readSegment(text, segment, key, inside);
    notes.push(...read.notes.map((note) => ({ ...note, entry: key })));
    entries.push({
      key,
      keyRange: segment.keyRange,
      valueRange: segment.valueRange,
      range: { from: segment.keyRange.from, to: end },
      line: segment.line,
      endLine: segment.endLine,
      remark: remarkText(text, segment),
      node: read.node,
    });
  }
  for (; nextHidden < hidden.length; nextHidden += 1) {
    const { range, message } = hidden[nextHidden];
    notes.push(caution("hidden_character", range, message, remove(range)));
  }
  return { entries, notes: locateNotes(notes, text, entries) };
}
