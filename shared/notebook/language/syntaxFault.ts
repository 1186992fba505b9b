/** Says in plain words why a value can't be read, on the very characters. */
import type { Note, TextRange } from "../result";
import { changeTo, fault, quoted, type Remedy } from "./notes";
import { functionNames } from "./reservedWord";

const word = /[\p{L}\p{N}_.₀-₉]+/uy;
const operators = "+-−*/^×·⋅±";

function wordAt(text: string, at: number): string {
  word.lastIndex = at;
  const found = word.exec(text)?.[0];
  return found ?? String.fromCodePoint(text.codePointAt(at) ?? 32);
}

/** A word in a message; a star is left bare, since stars mark words. */
const marked = (text: string): string => (text.includes("*") ? text : `*${quoted(text)}*`);

const lastWord = (text: string): string => /[\p{L}\p{N}_.₀-₉%]+$/u.exec(text)?.[0] ?? text.slice(-1);

/** Words of a sweep, and how it is written. */
const variationWords = new Set(["from", "to", "in", "steps"]);
const variationForm = "What is varied is written T_quiet from 180 K to 350 K in 40 steps.";

/** Characters that people write and that mean nothing here. */
const strangers: Readonly<Record<string, string>> = {
  "[": "Lists take no square brackets; write the items with commas between.",
  "]": "Lists take no square brackets; write the items with commas between.",
  "{": "Braces mean nothing here; brackets are round.",
  "}": "Braces mean nothing here; brackets are round.",
  ";": "A semicolon means nothing here. Items are parted by commas, entries by lines.",
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
  "“": "There are no strings here; write names plainly.",
};

interface Place {
  text: string;
  /** First character that can't stand where it does. */
  at: number;
  /** Added to places to give those of the cell. */
  shift: number;
  /** What stands before it, without spaces at the end, and its last character. */
  before: string;
  previous: string;
}

const rangeAt = ({ shift }: Place, from: number, to: number): TextRange => ({
  from: from + shift,
  to: to + shift,
});

/**
 * @param text   what was parsed, spaces in place of remarks
 * @param at     where reading stopped, in `text`
 * @param shift  added to places to give those of the cell
 */
export function syntaxFault(text: string, at: number, shift: number): Note {
  const rest = text.slice(at);
  const here = at + (rest.length - rest.trimStart().length);
  const before = text.slice(0, at).trimEnd();
  const place: Place = { text, at: here, shift, before, previous: before.slice(-1) };
  if (here >= text.length) return unfinished(place);

  const found = wordAt(text, here);
  const range = rangeAt(place, here, here + found.length);
  const stranger = strangers[found];
  if (stranger !== undefined) return fault("unexpected", range, stranger);
  if (found === "=") return secondEquals(place, range);
  if (found === ",") return fault("unexpected", range, "Nothing stands before this comma.");
  if (found === ")") return closedTooEarly(place, range);
  if (operators.includes(found)) return misplacedOperator(place, found, range);
  if (/[\p{L}\p{N}_)%²³¹⁰⁴-⁹]/u.test(place.previous) && /^[\p{L}\p{N}_.(]/u.test(found))
    return sideBySide(place, found, range);
  if (found.length === 1 && !/[\p{L}\p{N}]/u.test(found))
    return fault("unexpected", range, `*${found}* means nothing here.`);
  return fault("unexpected", range, `*${quoted(found)}* can't stand here.`);
}

function unfinished(place: Place): Note {
  const { before, previous } = place;
  const last = rangeAt(place, Math.max(0, before.length - 1), before.length);
  if (previous === "") return fault("unfinished", last, "A value is missing.");
  if (operators.includes(previous))
    return fault("unfinished", last, `A number or a name must follow ${marked(previous)}.`);
  if (/\bbetween\b(?!.*\band\b)/s.test(before))
    return fault("unfinished", last, "The upper end is missing: between 180 and 350 K.");
  if (/\bwithin$/.test(before))
    return fault("unfinished", last, "A factor is missing: 2.5e5 /cm^3 within factor 2.");
  const end = `The entry breaks off after ${marked(lastWord(before))}.`;
  return fault("unfinished", last, /\sfrom\s/.test(before) ? `${end} ${variationForm}` : end);
}

/** `bates(base = 140 K exosphere = 240 K)`, or a second `=` in an entry. */
function secondEquals(place: Place, range: TextRange): Note {
  const name = /[A-Za-z][A-Za-z0-9_]*$/.exec(place.before)?.[0];
  const earlier = name === undefined ? "" : place.before.slice(0, -name.length).trimEnd();
  const isOpen = earlier.split("(").length > earlier.split(")").length;
  if (name === undefined || !isOpen || /[(,]$/.test(earlier))
    return fault("unexpected", range, "A second *=* stands in one entry. Each entry has a line of its own.");
  const from = place.before.length - name.length;
  const end = earlier.length + place.shift;
  return fault(
    "missing_comma",
    rangeAt(place, from, place.before.length),
    `A comma is missing before *${name}*.`,
    {
      label: "Put a comma",
      range: { from: end, to: end },
      replacement: ",",
    },
  );
}

function closedTooEarly({ previous }: Place, range: TextRange): Note {
  const message =
    previous !== "" && operators.includes(previous)
      ? `A number or a name must stand between ${marked(previous)} and the bracket.`
      : "Something is missing before this bracket.";
  return fault("unfinished", range, message);
}

function misplacedOperator({ previous }: Place, found: string, range: TextRange): Note {
  const message =
    previous !== "" && operators.includes(previous)
      ? `A number or a name must stand between ${marked(previous)} and ${marked(found)}.`
      : previous === "" || previous === "(" || previous === ","
        ? `A number or a name must stand before ${marked(found)}.`
        : `${marked(found)} can't stand here.`;
  return fault("unexpected", range, message);
}

/** Two values with nothing between. */
function sideBySide(place: Place, found: string, range: TextRange): Note {
  const { before, text, at } = place;
  const first = lastWord(before);
  if (first === "within")
    return fault("unexpected", range, "*within* is followed by *factor*: 2.5e5 /cm^3 within factor 2.");
  if (found === "within" || found === "and" || found === "between")
    return fault(
      "unexpected",
      range,
      `*${found}* belongs to an uncertain value: between 180 and 350 K, or 2.5e5 /cm^3 within factor 2.`,
    );
  if (first === "steps") {
    const end = before.length + place.shift;
    const remedy = { label: "Put a comma", range: { from: end, to: end }, replacement: "," };
    return fault("missing_comma", range, `A comma is missing before *${found}*.`, remedy);
  }
  if (variationWords.has(found) || /\sfrom\s/.test(before))
    return fault("unexpected", range, `*${quoted(found)}* can't stand here. ${variationForm}`);
  if (/^[ \t]*=/.test(text.slice(at + found.length))) {
    const end = before.length + place.shift;
    const remedy = { label: "Put a comma", range: { from: end, to: end }, replacement: "," };
    return fault("missing_comma", range, `A comma is missing before *${found}*.`, remedy);
  }
  if (/^\d/.test(found) && /(^|[\d\s).])x$/.test(before)) {
    const sign = rangeAt(place, before.length - 1, before.length);
    return fault("times_sign", sign, "The letter x does not multiply. Write ×.", changeTo(sign, "×"));
  }
  if (/\d$/.test(before) && /^\.\d/.test(found))
    return fault(
      "side_by_side",
      range,
      "A number has one decimal point; thousands may be parted by a thin space.",
    );
  if (/^\d/.test(found) && /\d$/.test(before)) return twoNumbers(place, first, found, range);
  if (found === "(" && (functionNames as readonly string[]).includes(first)) {
    const name = rangeAt(place, before.length - first.length, before.length);
    return fault("side_by_side", name, `A multiplication sign is missing before *${first}*.`, {
      label: "Multiply",
      range: { from: name.from, to: name.from },
      replacement: "* ",
    });
  }
  const message = `Nothing joins ${marked(first)} and ${marked(found)}. A sign such as × or / is missing, or a comma between items.`;
  return fault("side_by_side", range, message);
}

/** Two numbers; `12 000`, with an ordinary space, is most likely one. */
function twoNumbers(place: Place, first: string, found: string, range: TextRange): Note {
  const { before, at, shift } = place;
  const isOne = /^\d{3}$/.test(found) && /(^|[^\d.])\d{1,3}$/.test(before);
  const remedy: Remedy | undefined = isOne
    ? { label: "Join the digits", range: { from: before.length + shift, to: at + shift }, replacement: "" }
    : undefined;
  const message = `Two numbers stand side by side, ${quoted(first)} and ${quoted(found)}. A sign or a comma is missing; thousands may be parted by a thin space.`;
  return fault("side_by_side", range, message, remedy);
}
