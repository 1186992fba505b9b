import { findGas } from "../../../../shared/physics";

export interface NotePart {
  text: string;
  /** How it is set: a word of the cell language, or digits that stand low in the formula of a gas. */
  setting: "plain" | "code" | "low";
}

/** A note's message as pieces: what stands between asterisks are words of the language, digits of gases stand low. */
export function noteParts(message: string): NotePart[] {
  return message
    .split(/\*([^*\n]+)\*/)
    .flatMap((text, index): NotePart[] => (index % 2 === 1 ? [{ text, setting: "code" }] : gasParts(text)))
    .filter(({ text }) => text !== "");
}

/** Formulas of gases with their digits apart. */
export function gasParts(text: string): NotePart[] {
  return text.split(/\b((?:[A-Z][a-z]?\d*)+)\b/).flatMap((word, index): NotePart[] => {
    if (index % 2 === 0 || !/\d/.test(word) || !findGas(word)) return [{ text: word, setting: "plain" }];
    return word.split(/(\d+)/).map((part, at) => ({ text: part, setting: at % 2 === 1 ? "low" : "plain" }));
  });
}

/** The complaint, which is the first sentence or what comes before a semicolon, and the rest. */
export function complaintAndRest(message: string): [string, string] {
  const end = /(?<!\b[A-Z]|\bal)[.;](?=\s)/.exec(message);
  if (!end) return [message, ""];
  return [message.slice(0, end.index + 1), message.slice(end.index + 1).trim()];
}
