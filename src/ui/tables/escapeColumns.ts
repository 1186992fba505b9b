import type { CellResult } from "../../../shared/notebook/result";
import {
  displayScale,
  formatFixed,
  formatMagnitude,
  formatPercent,
  formatPower,
  formatUnit,
  smallestWritten,
  thinSpace,
  type DisplayScale,
  type UnitSystem,
} from "../../lib/format";
import { formatSpread, numberSpread, scaleSpread, type NumberSpread } from "../../lib/formatSpread";
import type { RichText } from "../../lib/richText";

export interface EscapeColumn {
  /** The name after the gas: "jeans_flux". */
  key: string;
  /** Over the column, and beside the row where the table is turned. */
  head: RichText;
  label: RichText;
  /** Left out where a page-wide table would have too many columns. */
  isSpare?: boolean;
}

/** In the order of the table. */
export const escapeColumns: readonly EscapeColumn[] = [
  { key: "escape_parameter", head: [{ italic: "λ" }], label: ["Escape parameter ", { italic: "λ" }] },
  { key: "number_density", head: [{ italic: "n" }, { sub: "c" }], label: ["Density at exobase"] },
  { key: "thermal_speed", head: ["Thermal speed"], label: ["Thermal speed"], isSpare: true },
  { key: "effusion_velocity", head: ["Effusion velocity"], label: ["Effusion velocity"], isSpare: true },
  { key: "jeans_flux", head: ["Jeans flux"], label: ["Jeans flux"] },
  { key: "rate", head: ["Rate"], label: ["Rate"] },
  { key: "diffusion_limit", head: ["Diffusion limit"], label: ["Diffusion limit"] },
  { key: "supply_fraction", head: ["Share of limit"], label: ["Share of limit"] },
  { key: "depletion_time", head: ["Depletion time"], label: ["Depletion time"] },
];

export interface EscapeAnswer {
  value: number | null;
  log10: number | null;
  unit: string;
  spread: NumberSpread | null;
}

export function escapeAnswer(result: CellResult, gas: string, key: string): EscapeAnswer | null {
  const answer = result.values[`${gas}.${key}`];
  if (!answer || typeof answer.value === "string") return null;
  const twin = result.values[`${gas}.log10_${key}`]?.value;
  return {
    value: answer.value,
    log10: typeof twin === "number" ? twin : null,
    unit: answer.unit ?? "1",
    spread: numberSpread(answer.spread),
  };
}

/** Columns that at least one gas has an answer for; no more than fit where the table stands across the page. */
export function shownColumns(result: CellResult, gases: readonly string[], most: number): EscapeColumn[] {
  const answered = escapeColumns.filter(({ key }) => gases.some((gas) => escapeAnswer(result, gas, key)));
  return answered.length <= most ? answered : answered.filter(({ isSpare }) => !isSpare);
}

/** One unit for a whole column, by its largest magnitude. */
export function columnScale(
  result: CellResult,
  gases: readonly string[],
  key: string,
  unitSystem: UnitSystem,
): DisplayScale {
  const answers = gases.flatMap((gas) => escapeAnswer(result, gas, key) ?? []);
  const unit = answers[0]?.unit ?? "1";
  return displayScale(unit, unitSystem, Math.max(0, ...answers.map(({ value }) => Math.abs(value ?? 0))));
}

/** As set under the head: "m⁻² s⁻¹". */
export const scaleUnit = ({ unit }: DisplayScale): RichText => formatUnit(unit);

/** Times are told in years far beyond the age of anything; past this only the power says something. */
const longestTime = 1e12;

/** One number of the table. */
export function escapeNumber(
  answer: EscapeAnswer | null,
  key: string,
  scale: DisplayScale,
  digits: number,
): RichText {
  if (answer === null) return ["–"];
  const { value, log10 } = answer;
  if (key === "escape_parameter" && value !== null) return [formatFixed(value, value < 100 ? 2 : 1)];
  if (key === "supply_fraction" && value !== null && value >= 0.001) return formatPercent(value);
  if (key === "depletion_time" && value !== null && value * scale.factor > longestTime)
    return formatPower(Math.log10(value * scale.factor));
  return formatMagnitude(
    value === null ? null : value * scale.factor,
    log10 === null ? null : log10 + Math.log10(scale.factor),
    digits,
  );
}

/** How far one number of the table may be off, to stand under it; null where no spread watches it. */
export function escapeSpread(
  { value, spread }: EscapeAnswer,
  key: string,
  { factor }: DisplayScale,
): RichText | null {
  if (value === null || spread === null) return null;
  if (key === "supply_fraction")
    return [...formatSpread(value * 100, scaleSpread(spread, 100)).alone, `${thinSpace}%`];
  const [number, ends] = [value * factor, scaleSpread(spread, factor)];
  if (Math.abs(number) >= smallestWritten) return formatSpread(number, ends).alone;
  return [...formatMagnitude(ends.lower, null), " to ", ...formatMagnitude(ends.upper, null)];
}
