import { findGas } from "../../../../shared/physics";
import { formatGas } from "../../../lib/format";
import type { RichText } from "../../../lib/richText";

const superscripts = "⁰¹²³⁴⁵⁶⁷⁸⁹⁻⁺";
const digits = "0123456789−+";

/** "n = 1.84×10²⁰ m⁻³" as it is set: the fonts lack some raised digits, so exponents are raised by style. */
export function formatUnderstood(text: string): RichText {
  return text.split(/([⁰¹²³⁴⁵⁶⁷⁸⁹⁻⁺]+|\^[-−+]?[\d.]+)/).flatMap((piece, index): RichText => {
    if (index % 2 === 1) return [{ sup: plainExponent(piece) }];
    return piece
      .split(/^([A-Za-z])(?=\s=)/)
      .flatMap((part, at): RichText => (at % 2 === 1 ? [{ italic: part }] : withGases(part)));
  });
}

function plainExponent(exponent: string): string {
  return [...exponent.replace("^", "").replace("-", "−")]
    .map((character) => digits[superscripts.indexOf(character)] ?? character)
    .join("");
}

function withGases(text: string): RichText {
  return text
    .split(/\b(?=[A-Za-z]*\d)((?:[A-Z][a-z]?\d*)+)\b/)
    .flatMap((word, at): RichText => (at % 2 === 1 && findGas(word) ? formatGas(word) : [word]))
    .filter((word) => word !== "");
}
