/** Notes about a place in a cell's text. Line and entry are filled in by `locateNotes`. */
import type { Note, TextRange } from "../result";

export type Remedy = NonNullable<Note["remedy"]>;

export function fault(code: string, range: TextRange, message: string, remedy?: Remedy): Note {
  return { level: "fault", code, message, range, ...(remedy ? { remedy } : {}) };
}

export function caution(code: string, range: TextRange, message: string, remedy?: Remedy): Note {
  return { level: "caution", code, message, range, ...(remedy ? { remedy } : {}) };
}

export function remark(code: string, range: TextRange, message: string, remedy?: Remedy): Note {
  return { level: "remark", code, message, range, ...(remedy ? { remedy } : {}) };
}

/** "Change to *levels*" over the characters that are wrong. */
export const changeTo = (range: TextRange, replacement: string): Remedy => ({
  label: `Change to ${replacement}`,
  range,
  replacement,
});

/** "bulk, gas or simple" */
export function inWords(words: readonly string[], conjunction = "or"): string {
  if (words.length < 2) return words.join("");
  return `${words.slice(0, -1).join(", ")} ${conjunction} ${words[words.length - 1]}`;
}

/** The text between two places, short enough for a message. */
export function quoted(text: string): string {
  const flat = text.replace(/\s+/g, " ").trim();
  return flat.length > 40 ? `${flat.slice(0, 38)}…` : flat;
}
