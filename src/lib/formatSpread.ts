import {
  displayScale,
  formatFixed,
  formatNumber,
  formatQuantity,
  thinSpace,
  unitSpace,
  type DisplayScale,
  type FormattedQuantity,
  type Quantity,
  type UnitSystem,
} from "./format";
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
  /** The whole is not much longer than the number. */
  isShort: boolean;
}

/** Two sides that differ by less than a third of the smaller are told as one. */
const likeness = 4 / 3;

const minus = "\u2212";

/** Digits after the point that leave a number so many significant ones. */
const decimalsOf = (size: number, digits: number): number =>
  size > 0 ? Math.min(12, Math.max(0, digits - 1 - Math.floor(Math.log10(size)))) : 0;

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
    isShort: isPlain,
  };
}

function asSides(over: number, under: number): { text: string; decimals: number } {
  const [less, more] = [Math.min(over, under), Math.max(over, under)];
  if (more <= less * likeness) {
    const mean = (over + under) / 2;
    const decimals = decimalsOf(mean, 2);
    return { text: `±${thinSpace}${formatFixed(mean, decimals)}`, decimals };
  }
  const decimals = Math.max(decimalsOf(more, 2), decimalsOf(less, 1));
  return {
    text: `+${formatFixed(over, decimals)}${unitSpace}${minus}${formatFixed(under, decimals)}`,
    decimals,
  };
}

function asRange(value: number, { lower, upper }: NumberSpread): FormattedSpread {
  const range: RichText = [...formatNumber(lower), " to ", ...formatNumber(upper)];
  return {
    whole: [...formatNumber(value), ` (68${thinSpace}% from `, ...range, ")"],
    alone: range,
    isShort: false,
  };
}

/** Its ends as numbers; null where a result has none, or an end is too small to have a value. */
export function numberSpread(
  spread: { lower: number | null; upper: number | null } | undefined,
): NumberSpread | null {
  if (!spread || spread.lower === null || spread.upper === null) return null;
  return { lower: spread.lower, upper: spread.upper };
}

/** A quantity with its spread, where it has one. */
export function formatUncertain(
  quantity: Quantity,
  spread: NumberSpread | null,
  system: UnitSystem,
  options: { digits?: number; scale?: DisplayScale } = {},
): FormattedQuantity {
  const plain = formatQuantity(quantity, system, options);
  if (spread === null || quantity.value === null) return plain;
  const { factor } = options.scale ?? displayScale(quantity.unit, system, quantity.value);
  return { ...plain, number: formatSpread(quantity.value * factor, scaleSpread(spread, factor)).whole };
}

export const scaleSpread = ({ lower, upper }: NumberSpread, factor: number): NumberSpread => ({
  lower: lower * factor,
  upper: upper * factor,
});
