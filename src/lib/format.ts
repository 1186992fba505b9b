import type { NotebookDocument } from "../../shared/notebook/document";
import { atomicMass, elementaryCharge } from "../../shared/physics";
import { plainText, type RichText } from "./richText";

export type UnitSystem = NotebookDocument["unitSystem"];

/** Narrow no-break space: in thousands and round the × of a power. */
export const thinSpace = "\u202f";
/** Before a unit and between its factors, where the narrow one would run "m s" together into "ms". */
export const unitSpace = "\u00a0";
const minus = "\u2212";

const trueMinus = (text: string): string => text.replace(/-/g, minus);

/** "4 943.20": thousands apart, true minus. */
export function formatFixed(value: number, decimals = 0): string {
  const [whole = "", fraction] = value.toFixed(decimals).split(".");
  const grouped = whole.replace(/\B(?=(\d{3})+(?!\d))/g, thinSpace);
  return trueMinus(fraction ? `${grouped}.${fraction}` : grouped);
}

/** 10ˣ for a magnitude given by its decimal logarithm. */
export function formatPower(log10: number, decimals = 1): RichText {
  return ["10", { sup: trueMinus(log10.toFixed(decimals)) }];
}

function formatScientific(value: number, digits: number): RichText {
  const [mantissa = "", exponent = ""] = value.toExponential(Math.max(0, digits - 1)).split("e");
  return [`${trueMinus(mantissa)}${thinSpace}×${thinSpace}10`, { sup: trueMinus(exponent.replace("+", "")) }];
}

/**
 * A number with so many significant digits. From a thousandth up to a hundred thousand it is written out,
 * with all digits before the point; beyond, as a power of ten.
 */
export function formatNumber(value: number, digits = 3): RichText {
  if (value === 0) return ["0"];
  const size = Math.abs(value);
  if (size >= 99_999.5 || size < 1e-3) return formatScientific(value, digits);
  const exponent = Number(size.toExponential(digits - 1).split("e")[1]);
  return [formatFixed(value, Math.max(0, digits - 1 - exponent))];
}

/** Magnitudes below this are written 10ˣ: their digits mean nothing, their size does. */
export const smallestWritten = 1e-6;

/** A magnitude that may be carried by its logarithm alone, as fluxes below 1e-300 are. */
export function formatMagnitude(value: number | null, log10: number | null, digits = 3): RichText {
  if (value !== null && (value === 0 || Math.abs(value) >= smallestWritten))
    return formatNumber(value, digits);
  if (log10 !== null) return formatPower(log10);
  return value === null ? ["–"] : formatPower(Math.log10(Math.abs(value)));
}

export function formatPercent(fraction: number, digits = 2): RichText {
  return [...formatNumber(fraction * 100, digits), `${thinSpace}%`];
}

/** "m^-2 s^-1" as set: m⁻² s⁻¹. Nothing for a pure number. */
export function formatUnit(unit: string): RichText {
  if (unit === "1" || unit === "") return [];
  const pieces: (string | { sup: string })[] = [];
  for (const [index, factor] of unit.split(" ").entries()) {
    const [symbol = "", exponent] = factor.split("^");
    pieces.push(index === 0 ? symbol : `${unitSpace}${symbol}`);
    if (exponent) pieces.push({ sup: trueMinus(exponent) });
  }
  return pieces;
}

/** How a quantity is shown: shown = SI value × factor. */
export interface DisplayScale {
  factor: number;
  unit: string;
}

const cgsScales: Record<string, DisplayScale> = {
  m: { factor: 100, unit: "cm" },
  "m^-3": { factor: 1e-6, unit: "cm^-3" },
  "m^-2": { factor: 1e-4, unit: "cm^-2" },
  "m^-2 s^-1": { factor: 1e-4, unit: "cm^-2 s^-1" },
  "m s^-1": { factor: 100, unit: "cm s^-1" },
  "m s^-2": { factor: 100, unit: "cm s^-2" },
  "m^2 s^-1": { factor: 1e4, unit: "cm^2 s^-1" },
  "m^3 s^-2": { factor: 1e6, unit: "cm^3 s^-2" },
  "m^2": { factor: 1e4, unit: "cm^2" },
  kg: { factor: 1000, unit: "g" },
  "kg s^-1": { factor: 1000, unit: "g s^-1" },
  "kg m^-3": { factor: 1e-3, unit: "g cm^-3" },
  Pa: { factor: 10, unit: "µbar" },
  "W m^-2": { factor: 1000, unit: "erg cm^-2 s^-1" },
  J: { factor: 1e7, unit: "erg" },
};

/** From here lengths and speeds are told in km and km s⁻¹, in SI and in cgs alike. */
const kilometresFrom: Record<string, number> = { m: 1000, "m s^-1": 1000 };
/** Bare numbers of seconds are hard to read: from a minute they are told in larger units. */
const julianYear = 31_557_600;
const timeScales: readonly [number, string, number][] = [
  [julianYear / 10, "yr", julianYear],
  [86_400, "d", 86_400],
  [3600, "h", 3600],
  [60, "min", 60],
];

/** Masses and energies below these are of single particles, told in u and eV in both systems. */
const particleScales: Readonly<Record<string, { below: number; scale: DisplayScale }>> = {
  kg: { below: 1e-20, scale: { factor: 1 / atomicMass.value, unit: "u" } },
  J: { below: 1e-10, scale: { factor: 1 / elementaryCharge.value, unit: "eV" } },
};
/** From here energies of particles are told in keV, J. */
const kiloelectronvolts = 1e4 * elementaryCharge.value;

/**
 * Unit in which a magnitude is shown.
 *
 * @param unit       SI, as results carry it: "m^-2 s^-1"
 * @param magnitude  SI; decides between m and km, s and yr. A column of a table gives its largest.
 */
export function displayScale(unit: string, system: UnitSystem, magnitude: number): DisplayScale {
  const size = Math.abs(magnitude);
  const kilo = kilometresFrom[unit];
  if (kilo !== undefined && size >= kilo) return { factor: 1e-3, unit: `k${unit}` };
  const particle = particleScales[unit];
  if (particle && size > 0 && size < particle.below) {
    const { factor } = particle.scale;
    return unit === "J" && size >= kiloelectronvolts
      ? { factor: factor / 1000, unit: "keV" }
      : particle.scale;
  }
  if (unit === "s") {
    const larger = timeScales.find(([from]) => size >= from);
    if (larger) return { factor: 1 / larger[2], unit: larger[1] };
  }
  return (system === "cgs" ? cgsScales[unit] : undefined) ?? { factor: 1, unit };
}

/** Altitudes and radii: km in both systems, whatever their size. */
export const kilometreScale: DisplayScale = { factor: 1e-3, unit: "km" };

/** The scale of a result by its name: altitudes and radii always in km, everything else by unit and size. */
export function resultScale(name: string, unit: string, system: UnitSystem, magnitude: number): DisplayScale {
  const isHeight = /(^|[._])(altitude|radius|lower|upper)$/.test(name);
  return unit === "m" && isHeight ? kilometreScale : displayScale(unit, system, magnitude);
}

export interface Quantity {
  /** SI; null where only the logarithm is known. */
  value: number | null;
  log10?: number | null;
  unit: string;
}

export interface FormattedQuantity {
  number: RichText;
  unit: RichText;
}

/** What flows off may lie beyond sight, so that only its size says something; any other number keeps its digits. */
const isOfEscape = (unit: string): boolean => / ?s\^-1$/.test(unit);

/** Number and unit apart, since a unit is set smaller. */
export function formatQuantity(
  { value, log10 = null, unit }: Quantity,
  system: UnitSystem,
  { digits = 3, scale }: { digits?: number; scale?: DisplayScale } = {},
): FormattedQuantity {
  const shown = scale ?? displayScale(unit, system, value ?? 0);
  const shownLog10 = log10 === null ? null : log10 + Math.log10(shown.factor);
  const shownValue = value === null ? null : value * shown.factor;
  const number =
    shownValue !== null && !isOfEscape(unit)
      ? formatNumber(shownValue, digits)
      : formatMagnitude(shownValue, shownLog10, digits);
  return { number, unit: formatUnit(shown.unit) };
}

/** Number, space, unit. */
export function quantityRich(quantity: FormattedQuantity): RichText {
  return quantity.unit.length > 0 ? [...quantity.number, unitSpace, ...quantity.unit] : quantity.number;
}

export function quantityText(quantity: FormattedQuantity): string {
  return plainText(quantityRich(quantity));
}

/** "239 km" from metres: tens of metres below 10 km, whole kilometres above. */
export function formatKilometres(metres: number): string {
  const kilometres = metres / 1000;
  return formatFixed(kilometres, Math.abs(kilometres) < 10 ? 2 : 0);
}

/** CO₂: digits of a formula as subscripts, since the fonts have no such characters. */
export function formatGas(formula: string): RichText {
  return formula
    .split(/(\d+)/)
    .filter((part) => part !== "")
    .map((part) => (/^\d+$/.test(part) ? { sub: part } : part));
}

/** O₂⁺ from "O2+". */
export const formatIon = (ion: string): RichText => [...formatGas(ion.replace(/\+$/, "")), { sup: "+" }];

const durations: readonly [number, string][] = [
  [1e9 * julianYear, "billion years"],
  [1e6 * julianYear, "million years"],
  [julianYear, "year"],
  [86_400, "day"],
  [3600, "hour"],
  [60, "minute"],
  [1, "second"],
];

/** A time in words: "615 years", "2.3 billion years", "under a second". */
export function formatDuration(seconds: number): string {
  if (seconds < 1) return "under a second";
  if (seconds >= 1000 * 1e9 * julianYear)
    return `${plainText(formatPower(Math.log10(seconds / julianYear)))} years`;
  const [size, name] = durations.find(([from]) => seconds >= from)!;
  const count = plainText(formatNumber(seconds / size, 2));
  const isPlural = !name.endsWith("s") && count !== "1.0";
  return `${count.replace(/^1\.0$/, "1")}${name.includes(" ") ? " " : thinSpace}${name}${isPlural ? "s" : ""}`;
}

const smallCounts = [
  "no",
  "one",
  "two",
  "three",
  "four",
  "five",
  "six",
  "seven",
  "eight",
  "nine",
  "ten",
  "eleven",
  "twelve",
];

/** "one fault", "two cautions", "13 remarks": in words to twelve, figures elsewhere. */
export function formatCount(count: number, singular: string, plural = `${singular}s`): string {
  return `${smallCounts[count] ?? formatFixed(count)} ${count === 1 ? singular : plural}`;
}

const months = [
  "January",
  "February",
  "March",
  "April",
  "May",
  "June",
  "July",
  "August",
  "September",
  "October",
  "November",
  "December",
];

/** "10:42", in the reader's time zone. */
export function formatTime(date: Date): string {
  return `${String(date.getHours()).padStart(2, "0")}:${String(date.getMinutes()).padStart(2, "0")}`;
}

/** "28 November", with the year where it is another than now's. */
export function formatDay(date: Date, now: Date): string {
  const day = `${date.getDate()} ${months[date.getMonth()]}`;
  return date.getFullYear() === now.getFullYear() ? day : `${day} ${date.getFullYear()}`;
}

/** "today 10:42", "yesterday", "28 November": how lists tell when something last changed. */
export function formatWhen(date: Date, now: Date): string {
  const midnight = (at: Date) => new Date(at.getFullYear(), at.getMonth(), at.getDate()).getTime();
  const days = Math.round((midnight(now) - midnight(date)) / 86_400_000);
  if (days === 0) return `today ${formatTime(date)}`;
  if (days === 1) return "yesterday";
  return formatDay(date, now);
}
