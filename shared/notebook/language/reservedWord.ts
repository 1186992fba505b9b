/** Which words can't be names, and what a name looks like. */
import { isReservedUnit } from "./units";

export const functionNames = ["sqrt", "exp", "ln", "log10", "min", "max", "abs"] as const;
export type FunctionName = (typeof functionNames)[number];

export const constantNames = ["pi", "k_B", "G", "N_A"] as const;
export type ConstantName = (typeof constantNames)[number];

/** Words of uncertain values, lists and choices, and the forms that look like functions. */
const languageWords: ReadonlySet<string> = new Set([
  "between",
  "and",
  "within",
  "factor",
  "rest",
  "auto",
  "from",
  "to",
  "in",
  "steps",
  "bulk",
  "simple",
  "unit_depth",
  "coupled",
  "open",
  "bates",
  "points",
  "power",
  "table",
  "column",
  "binary",
  "handbook",
  "ref",
]);

/** What the word already is, with its article, or null where it is free for a name. Gases are for the caller to check. */
export function reservedWord(name: string): string | null {
  if ((functionNames as readonly string[]).includes(name) && name !== "min") return "a function";
  if ((constantNames as readonly string[]).includes(name)) return "a constant";
  if (isReservedUnit(name)) return "a unit";
  return languageWords.has(name) ? "a word of the language" : null;
}

export const longestName = 64;

/** Why the word can't be a name, in a sentence; null where it can. */
export function nameFault(name: string): string | null {
  if (name === "") return "A name is missing.";
  if (!/^[A-Za-z]/.test(name)) return "A name begins with a letter from a to z.";
  if (!/^[A-Za-z][A-Za-z0-9_]*$/.test(name))
    return "A name consists of letters from a to z, digits and *_*; nothing else.";
  if (name.length > longestName) return `A name has ${longestName} characters at most.`;
  const reserved = reservedWord(name);
  return reserved === null ? null : `*${name}* is ${reserved}, so it can't be a name.`;
}
