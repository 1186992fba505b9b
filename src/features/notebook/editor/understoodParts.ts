import { gasParts } from "../cells/noteParts";

export interface UnderstoodPart {
  text: string;
  setting: "plain" | "raised" | "low" | "symbol";
}

const superscripts = "⁰¹²³⁴⁵⁶⁷⁸⁹⁻⁺";
const digits = "0123456789−+";

/** "n = 1.84×10²⁰ m⁻³" as it is set: the fonts lack some raised digits, so exponents are raised by style. */
export function understoodParts(text: string): UnderstoodPart[] {
  return text
    .split(/([⁰¹²³⁴⁵⁶⁷⁸⁹⁻⁺]+|\^[-−+]?[\d.]+)/)
    .flatMap((piece, index): UnderstoodPart[] => {
      if (index % 2 === 1) return [{ text: plainExponent(piece), setting: "raised" }];
      return piece.split(/^([A-Za-z])(?=\s=)/).flatMap((part, at): UnderstoodPart[] =>
        at % 2 === 1
          ? [{ text: part, setting: "symbol" }]
          : gasParts(part).map(({ text: word, setting }) => ({
              text: word,
              setting: setting === "low" ? "low" : "plain",
            })),
      );
    })
    .filter((part) => part.text !== "");
}

function plainExponent(exponent: string): string {
  return [...exponent.replace("^", "").replace("-", "−")]
    .map((character) => digits[superscripts.indexOf(character)] ?? character)
    .join("");
}
