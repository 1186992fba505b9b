/** Numbers of an explanation as they are set. */
import type { Explanation } from "../../../../shared/notebook/explanations/explain";
import type { ExplainedInput } from "../../../../shared/notebook/explanations/resolveInput";
import {
  formatFixed,
  formatNumber,
  formatQuantity,
  formatUnit,
  quantityRich,
  resultScale,
  thinSpace,
  unitSpace,
  type UnitSystem,
} from "../../../lib/format";
import { plainText, type RichText } from "../../../lib/richText";

/** Last word of a name, by which altitudes are told from other lengths. */
const lastWord = (name: string | null): string => name?.slice(name.lastIndexOf(".") + 1) ?? "";

function set(
  {
    value,
    log10,
    unit,
    name,
  }: { value: number | null; log10: number | null; unit: string; name: string | null },
  unitSystem: UnitSystem,
  digits = 3,
): RichText {
  const scale = resultScale(lastWord(name), unit, unitSystem, value ?? 0);
  const quantity = formatQuantity({ value, log10, unit }, unitSystem, { scale, digits });
  // Masses and constants are small without being beyond sight: their digits mean something.
  const isPlain = value !== null && log10 === null;
  return quantityRich(
    isPlain ? { ...quantity, number: formatNumber(value * scale.factor, digits) } : quantity,
  );
}

export function explainedValue(explanation: Explanation, unitSystem: UnitSystem): RichText {
  const { value } = explanation;
  return typeof value === "string" ? [value.replace(/_/g, " ")] : set({ ...explanation, value }, unitSystem);
}

export const inputValue = (input: ExplainedInput, unitSystem: UnitSystem): RichText =>
  set(input, unitSystem, 4);

/** "68 % from 2.09 to 7.09 m, by how_sure"; null without a spread. */
export function explainedRange(
  { spread, value, unit, name }: Explanation,
  unitSystem: UnitSystem,
): string | null {
  if (!spread || spread.lower === null || spread.upper === null || typeof value === "string") return null;
  const scale = resultScale(lastWord(name), unit, unitSystem, value ?? spread.upper);
  const at = (quantile: number) => formatQuantity({ value: quantile, unit }, unitSystem, { scale });
  const from = plainText(at(spread.lower).number);
  const to = plainText(quantityRich(at(spread.upper)));
  const partial = spread.isPartial ? ", of the draws done so far" : "";
  return `68${unitSpace}% from ${from} to ${to}, by ${spread.cell}${partial}`;
}

/** Every digit in SI, with the logarithm where the result has one; null for a word. */
export function fullValue({ value, log10, unit }: Explanation): { text: RichText; copied: string } | null {
  if (typeof value === "string") return null;
  const logarithm: RichText = log10 === null ? [] : ["log", { sub: "10" }, ` ${formatFixed(log10, 6)}`];
  if (value === null) return log10 === null ? null : { text: logarithm, copied: String(log10) };
  const number = [...everyDigit(value), ...(unit === "1" ? [] : [unitSpace, ...formatUnit(unit)])];
  return { text: log10 === null ? number : [...number, "; ", ...logarithm], copied: String(value) };
}

function everyDigit(value: number): RichText {
  const trueMinus = (text: string) => text.replace("-", "\u2212");
  const [mantissa = "", power] = String(value).split("e");
  return power === undefined
    ? [trueMinus(mantissa)]
    : [`${trueMinus(mantissa)}${thinSpace}×${thinSpace}10`, { sup: trueMinus(power.replace("+", "")) }];
}
