import { formatFixed, formatNumber, thinSpace } from "./format";
import type { RichText } from "./richText";

/** The middle 68 % of a number's draws, in the number's own unit. */
export interface NumberSpread {
  lower: number;
  upper: number;
}

/** A number and its spread in the same unit, the digits of both ending at the same place. */
export interface FormattedSpread {
  /** "239 ± 26", "(9.9 +6.1 −5.3) × 10²⁵", "4.2 (68 % from 4.6 to 9.1)" */
  whole: RichText;
  /** The spread alone, to stand under its number: "± 26", "+6.1 −5.3 × 10²⁵", "4.6 to 9.1". */
  alone: RichText;
}

/** Two sides that differ by less than a third of the smaller are told as one. */
const likeness = 4 / 3;

const minus = "\u2212";

/** Digits after the point that leave the number two significant ones. */
const decimalsOf = (size: number): number =>
  size > 0 ? Math.min(12, Math.max(0, 1 - Math.floor(Math.log10(size)))) : 0;

/**
 * A number with the middle 68 % of its draws as ±, or as + and − where its two sides differ; as a range where the number
 * stands outside of it, since no ± would tell the truth.
 */
export function formatSpread(value: number, { lower, upper }: NumberSpread): FormattedSpread {
  if (value < lower || value > upper) return asRange(value, { lower, upper });
  const [over, under] = [upper - value, value - lower];
  const largest = Math.max(Math.abs(value), over, under);
  const isPlain = largest === 0 || (largest < 99_999.5 && largest >= 1e-3);
  const exponent = isPlain ? 0 : Number(largest.toExponential(1).split("e")[1]);
  const scale = 10 ** exponent;
  const sides = asSides(over / scale, under / scale);
  const power: RichText = isPlain
    ? []
    : [`${thinSpace}×${thinSpace}10`, { sup: String(exponent).replace("-", minus) }];
  const inside = `${formatFixed(value / scale, sides.decimals)} ${sides.text}`;
  return {
    whole: isPlain ? [inside] : [`(${inside})`, ...power],
    alone: [sides.text, ...power],
  };
}

function asSides(over: number, under: number): { text: string; decimals: number } {
  const [less, more] = [Math.min(over, under), Math.max(over, under)];
  if (more <= less * likeness) {
    const mean = (over + under) / 2;
    const decimals = decimalsOf(mean);
    return { text: `±${thinSpace}${formatFixed(mean, decimals)}`, decimals };
  }
  const decimals = decimalsOf(less > 0 ? less : more);
  return { text: `+${formatFixed(over, decimals)} ${minus}${formatFixed(under, decimals)}`, decimals };
}

function asRange(value: number, { lower, upper }: NumberSpread): FormattedSpread {
  const range: RichText = [...formatNumber(lower), " to ", ...formatNumber(upper)];
  return {
    whole: [...formatNumber(value), ` (68${thinSpace}% from `, ...range, ")"],
    alone: range,
  };
}
