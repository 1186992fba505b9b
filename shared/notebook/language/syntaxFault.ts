/** Says in plain words why a value can't be read, on the very characters. */
import type { Note, TextRange } from "../result";
import { fault, quoted, type Remedy } from "./notes";

const word = /[\p{L}\p{N}_.₀-₉]+/uy;
const operators = "+-−*/^×·⋅±";

function wordAt(text: string, at: number): string {
  word.lastIndex = at;
  const found = word.exec(text)?.[0];
  return found ?? String.fromCodePoint(text.codePointAt(at) ?? 32);
}

const insert = (at: number, text: string, label: string): Remedy => ({
  label,
  range: { from: at, to: at },
  replacement: text,
});

/** Characters that people write and that mean nothing here. */
const strangers: Readonly<Record<string, string>> = {
  "[": "Lists take no square brackets; write the items with commas between.",
  "]": "Lists take no square brackets; write the items with commas between.",
  "{": "Braces mean nothing here; brackets are round.",
  "}": "Braces mean nothing here; brackets are round.",
  ";": "A semicolon means nothing here. Items are parted by commas, entries by lines.",
  "=": "A second *=* stands in one entry. Each entry has a line of its own.",
  "~": "*~* means nothing here. An uncertain value is written 240 ± 30 K.",
  "<": "Comparisons mean nothing here. A range is written between 180 and 350 K.",
  ">": "Comparisons mean nothing here. A range is written between 180 and 350 K.",
  "∓": "Write ± for an uncertain value.",
  "÷": "Write / to divide.",
  "\\": "A backslash means nothing here; TeX belongs in prose.",
  $: "TeX belongs in prose, not in an entry.",
  "|": "For an absolute value write abs(…).",
  ":": "A colon stands between a gas and its amount, or an altitude and its value: CO2: rest.",
  '"': "There are no strings here; write names plainly.",
  "'": "There are no strings here; write names plainly.",
};

/**
 * @param text   what was parsed, spaces in place of remarks
 * @param at     where reading failed, in `text`
 * @param shift  added to places to give those of the cell
 */
export function syntaxFault(text: string, at: number, shift: number): Note {
  const rest = text.slice(at);
  const here = at + (rest.length - rest.trimStart().length);
  const before = text.slice(0, at).trimEnd();
  const previous = before.slice(-1);
  const place = (from: number, to: number): TextRange => ({ from: from + shift, to: to + shift });

  if (here >= text.length) {
    const from = Math.max(0, before.length - 1);
    if (previous !== "" && operators.includes(previous))
      return fault("unfinished", place(from, before.length), `A number or a name must follow *${previous}*.`);
    return fault(
      "unfinished",
      place(from, Math.max(before.length, from)),
      previous === "" ? "A value is missing." : `The entry breaks off after *${quoted(lastWord(before))}*.`,
    );
  }

  const found = wordAt(text, here);
  const range = place(here, here + found.length);
  const stranger = strangers[found];
  if (stranger !== undefined) return fault("unexpected", range, stranger);
  if (found === ",") {
    const message = /[,(]$/.test(before) || before === "" ? "Nothing stands before this comma." : undefined;
    if (message) return fault("unexpected", range, message);
  }
  if (found === ")") {
    if (previous !== "" && operators.includes(previous))
      return fault(
        "unfinished",
        range,
        `A number or a name must stand between *${previous}* and the bracket.`,
      );
    return fault("unexpected", range, "Something is missing before this bracket.");
  }
  if (operators.includes(found)) {
    const message =
      previous !== "" && operators.includes(previous)
        ? `*${found}* can't follow *${previous}*; a number or a name must stand between.`
        : previous === "" || previous === "(" || previous === ","
          ? `A number or a name must stand before *${found}*.`
          : `*${found}* can't stand here.`;
    return fault("unexpected", range, message);
  }
  if (found === "within" || found === "and" || found === "between")
    return fault(
      "unexpected",
      range,
      `*${found}* belongs to an uncertain value: between 180 and 350 K, or 2.5e5 /cm^3 within factor 2.`,
    );
  if (/[\p{L}\p{N}_)%²³¹⁰⁴-⁹]/u.test(previous) && /^[\p{L}\p{N}_.(]/u.test(found)) {
    if (/^[ \t]*=/.test(text.slice(here + found.length)))
      return fault(
        "missing_comma",
        range,
        `A comma is missing before *${found}*.`,
        insert(before.length + shift, ",", "Put a comma"),
      );
    return fault(
      "side_by_side",
      range,
      sideBySide(before, found),
      remedyForThousands(before, found, here, shift),
    );
  }
  if (found.length === 1 && !/[\p{L}\p{N}]/u.test(found))
    return fault("unexpected", range, `*${found}* means nothing here.`);
  return fault("unexpected", range, `*${quoted(found)}* can't stand here.`);
}

const lastWord = (text: string): string => /[\p{L}\p{N}_.₀-₉%]+$/u.exec(text)?.[0] ?? text.slice(-1);

function sideBySide(before: string, found: string): string {
  const first = quoted(lastWord(before));
  if (/^\d/.test(found) && /\d$/.test(before))
    return `Two numbers stand side by side, ${first} and ${quoted(found)}. Put an operator between, or a comma in a list; thousands may be parted by a thin space.`;
  return `Nothing joins *${first}* and *${quoted(found)}*. Write * to multiply, or a comma between items.`;
}

/** "12 000": thousands parted by an ordinary space. */
function remedyForThousands(before: string, found: string, here: number, shift: number): Remedy | undefined {
  if (!/^\d{3}$/.test(found) || !/(^|[^\d.])\d{1,3}$/.test(before)) return undefined;
  return {
    label: "Join the digits",
    range: { from: before.length + shift, to: here + shift },
    replacement: "",
  };
}
