/** What the grammar can't say by itself: where an entry ends, and which signs belong to a unit. */
import { ContextTracker, ExternalTokenizer, type InputStream } from "@lezer/lr";
import {
  Charge,
  Close,
  Comma,
  Join,
  Open,
  Over,
  Per,
  Remark,
  continuation,
  newline,
  space,
} from "./cells.generated.terms.js";
import { isReservedUnit } from "./units";

interface EntryContext {
  depth: number;
  /** The last token was a comma or an opening bracket, so a named argument may follow. */
  expectsItem: boolean;
  lastIsComma: boolean;
}

const skipped = new Set([Remark, continuation, space]);
const atStart: EntryContext = { depth: 0, expectsItem: false, lastIsComma: false };

/** Open brackets and a comma at the end of a line: what decides whether the entry goes on. */
export const entryContext = new ContextTracker<EntryContext>({
  start: atStart,
  shift(context, term) {
    if (skipped.has(term)) return context;
    if (term === newline) return atStart;
    if (term === Open) return { depth: context.depth + 1, expectsItem: true, lastIsComma: false };
    if (term === Comma) return { depth: context.depth, expectsItem: true, lastIsComma: true };
    const depth = term === Close ? Math.max(0, context.depth - 1) : context.depth;
    if (depth === context.depth && !context.expectsItem) return context;
    return { depth, expectsItem: false, lastIsComma: false };
  },
  hash: ({ depth, expectsItem, lastIsComma }) => depth * 4 + (expectsItem ? 2 : 0) + (lastIsComma ? 1 : 0),
});

const slash = 47;
const percent = 37;
const openBracket = 40;
/** `*`, `×`, `·` and the dot operator. */
const timesSigns = new Set([42, 0xd7, 0xb7, 0x22c5]);

const isLineEnd = (code: number): boolean => code === 10 || code === 13 || code === 0x2028 || code === 0x2029;
const isSpace = (code: number): boolean =>
  code === 32 || code === 9 || code === 0xa0 || code === 0x2009 || code === 0x202f;
const isNameCharacter = (code: number): boolean =>
  (code >= 97 && code <= 122) ||
  (code >= 65 && code <= 90) ||
  (code >= 48 && code <= 57) ||
  code === 95 ||
  code === 0xb5 ||
  code === 0x3bc ||
  code === 0xc5;

/** Whether `name =` stands at the offset: the beginning of an entry, or of a named argument. */
function beginsEntry(input: InputStream, offset: number): boolean {
  let at = offset;
  while (isSpace(input.peek(at))) at += 1;
  const nameStart = at;
  while (isNameCharacter(input.peek(at))) at += 1;
  if (at === nameStart) return false;
  while (isSpace(input.peek(at))) at += 1;
  return input.peek(at) === 61;
}

/** A line end closes the entry, unless a bracket is open or the line ends in a comma and no entry begins below. */
export const lineEnds = new ExternalTokenizer((input, stack) => {
  if (!isLineEnd(input.next)) return;
  const length = input.next === 13 && input.peek(1) === 10 ? 2 : 1;
  const { depth, expectsItem, lastIsComma } = stack.context as EntryContext;
  const mayGoOn = depth > 0 || lastIsComma;
  const named = mayGoOn && beginsEntry(input, length);
  const goesOn = mayGoOn && (!named || (depth > 0 && expectsItem));
  input.acceptToken(goesOn ? continuation : newline, length);
});

/** The word at an offset; empty where it is called, since `min(` is the function and `/min` the minute. */
function unitWordAt(input: InputStream, offset: number): string {
  if (input.peek(offset) === percent) return "%";
  let at = offset;
  let name = "";
  while (name.length < 32 && isNameCharacter(input.peek(at))) {
    name += String.fromCharCode(input.peek(at));
    at += 1;
  }
  return input.peek(at) === openBracket ? "" : name;
}

/**
 * A slash followed by a unit, or by a bracket that begins with one, is the unit's; so is a multiplication sign.
 * Units are no names, so nothing else can be meant.
 */
export const unitSigns = new ExternalTokenizer((input) => {
  const isSlash = input.next === slash;
  if (!isSlash && !timesSigns.has(input.next)) return;
  let at = 1;
  while (isSpace(input.peek(at))) at += 1;
  if (isSlash && input.peek(at) === openBracket) {
    at += 1;
    while (isSpace(input.peek(at))) at += 1;
  }
  const isUnit = isReservedUnit(unitWordAt(input, at));
  if (isSlash) input.acceptToken(isUnit ? Per : Over, 1);
  else if (isUnit) input.acceptToken(Join, 1);
});

/** `+`, and the raised one that comes with pasted formulas. */
const plusSigns = new Set([43, 0x207a]);
const hash = 35;
/** What may follow an ion: a comma, a closing bracket, a colon, a remark. */
const endsItem = new Set([44, 41, 58, hash]);

const isSubscript = (code: number): boolean => code >= 0x2080 && code <= 0x2089;

/** `O2+`: the plus sign stands right behind the name and joins it to nothing. */
export const ionCharge = new ExternalTokenizer((input) => {
  const before = input.peek(-1);
  if (!plusSigns.has(input.next) || !(isNameCharacter(before) || isSubscript(before))) return;
  let at = 1;
  while (isSpace(input.peek(at))) at += 1;
  const code = input.peek(at);
  if (code < 0 || isLineEnd(code) || endsItem.has(code)) input.acceptToken(Charge, 1);
});
