import { findGas } from "../../shared/physics";
import { formatGas } from "./format";
import type { RichText } from "./richText";

/** A note's message as set: words of the cell language, between asterisks, in their own type; digits of gases low. */
export function formatMessage(message: string): RichText {
  return message.split(/\*([^*\n]+)\*/).flatMap((text, index): RichText => {
    if (index % 2 === 1) return [{ code: text }];
    return text
      .split(/\b((?:[A-Z][a-z]?\d*)+)\b/)
      .flatMap((word, at): RichText => (at % 2 === 1 && findGas(word) ? formatGas(word) : [word]));
  });
}
