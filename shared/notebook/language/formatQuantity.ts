/** Quantities in words of a line: thin no-break spaces, true minus, powers of ten with superscripts. */
import { quantityKinds, type Dimension } from "./dimensions";
import { baseUnitText } from "./dimensionWords";
import { isDimensionless, sameDimension } from "./measure";

export type UnitSystem = "SI" | "cgs";

/** Narrow no-break space: in thousands and before units. */
export const thinSpace = "\u202f";
const trueMinus = (text: string): string => text.replace("-", "−");

const superscripts = "⁰¹²³⁴⁵⁶⁷⁸⁹";
const superscript = (exponent: number | string): string =>
  String(exponent).replace(/[-\d.]/g, (sign) =>
    sign === "-" ? "⁻" : sign === "." ? "·" : superscripts[Number(sign)],
  );

/** Power of ten of the first digit, after rounding to so many digits. */
export const leadingPower = (value: number, digits = 1): number =>
  Number(value.toExponential(digits - 1).split("e")[1]);

/** "4 943.2": thousands apart, true minus. */
export function formatFixed(value: number, decimals: number): string {
  const [whole, fraction] = value.toFixed(decimals).split(".");
  const grouped = whole.replace(/\B(?=(\d{3})+(?!\d))/g, thinSpace);
  return trueMinus(fraction === undefined ? grouped : `${grouped}.${fraction}`);
}

/** Written out from a thousandth to a million, beyond as a power of ten; no zeros at the end of a fraction. */
export function formatPlainNumber(value: number, digits = 4): string {
  if (value === 0) return "0";
  const tens = leadingPower(value, digits);
  const trimmed = (text: string): string => (text.includes(".") ? text.replace(/\.?0+$/, "") : text);
  if (tens >= 6 || tens < -3) {
    const mantissa = trimmed(value.toExponential(digits - 1).split("e")[0]);
    return `${trueMinus(mantissa)}×10${superscript(tens)}`;
  }
  return trimmed(formatFixed(value, Math.max(0, digits - 1 - tens)));
}

/** A unit in which a quantity is shown. */
export interface DisplayUnit {
  /** As set: "m² s⁻¹"; empty for a pure number. */
  text: string;
  /** SI value of one. */
  size: number;
}

/** "m^2 s^-1" as "m² s⁻¹" */
export const setUnit = (text: string): string =>
  text === "1"
    ? ""
    : text.replace(/\^(-?[\d.]+)/g, (_, exponent: string) => superscript(exponent)).replace(/ /g, thinSpace);

interface Display {
  dimension: Dimension;
  /** SI text, as results carry it. */
  si: string;
  cgs: readonly [string, number];
}

const kinds = quantityKinds;

/** Dimensions whose unit has a name of its own. */
const displays: readonly Display[] = [
  { dimension: kinds.pressure.dimension, si: "Pa", cgs: ["µbar", 0.1] },
  { dimension: kinds.force.dimension, si: "N", cgs: ["dyn", 1e-5] },
  { dimension: kinds.energy.dimension, si: "J", cgs: ["erg", 1e-7] },
  { dimension: kinds.power.dimension, si: "W", cgs: ["erg s^-1", 1e-7] },
  { dimension: kinds.energyFlux.dimension, si: "W m^-2", cgs: ["erg cm^-2 s^-1", 1e-3] },
  { dimension: kinds.magneticField.dimension, si: "T", cgs: ["nT", 1e-9] },
];

/** SI unit of a dimension as results carry it: "m^-2 s^-1", "Pa"; "1" for a pure number. */
export function siUnitText(dimension: Dimension): string {
  return (
    displays.find((display) => sameDimension(display.dimension, dimension))?.si ?? baseUnitText(dimension)
  );
}

const julianYear = 31_557_600;
const times: readonly (readonly [number, string, number])[] = [
  [julianYear * 1e9, "Gyr", julianYear * 1e9],
  [julianYear * 1e6, "Myr", julianYear * 1e6],
  [julianYear, "yr", julianYear],
  [86_400, "day", 86_400],
  [3600, "h", 3600],
  [60, "min", 60],
];

/** 100^n or 1000^n for a small exponent, whole or not. */
function cgsSize(dimension: Dimension): number {
  const [length, mass] = dimension;
  if (!Number.isInteger(length) || !Number.isInteger(mass)) return NaN;
  return Number(`1e${-2 * length - 3 * mass}`);
}

/** The unit in which a magnitude is shown; a range gives its larger end. */
export function displayUnit(dimension: Dimension, unitSystem: UnitSystem, magnitude: number): DisplayUnit {
  const size = Math.abs(magnitude);
  const is = (kind: keyof typeof kinds): boolean => sameDimension(dimension, kinds[kind].dimension);
  if (isDimensionless(dimension)) return { text: "", size: 1 };
  if (is("length") && size >= 1e3 && size < 1e9) return { text: "km", size: 1e3 };
  if (is("speed") && size >= 1e3) return { text: setUnit("km s^-1"), size: 1e3 };
  if (is("perLength")) return { text: setUnit("km^-1"), size: 1e-3 };
  if (is("magneticField")) return { text: "nT", size: 1e-9 };
  if (is("time")) {
    const larger = times.find(([from]) => size >= from);
    if (larger) return { text: larger[1], size: larger[2] };
  }
  if (is("energyFlux") && unitSystem === "SI" && size < 0.1 && size >= 1e-5)
    return { text: setUnit("mW m^-2"), size: 1e-3 };
  const display = displays.find((candidate) => sameDimension(candidate.dimension, dimension));
  if (unitSystem === "SI") return { text: setUnit(siUnitText(dimension)), size: 1 };
  if (display) return { text: setUnit(display.cgs[0]), size: display.cgs[1] };
  const inCgs = cgsSize(dimension);
  if (!(inCgs > 0)) return { text: setUnit(siUnitText(dimension)), size: 1 };
  const text = baseUnitText(dimension)
    .replace(/\bm\b/, "cm")
    .replace(/\bkg\b/, "g");
  return { text: setUnit(text), size: inCgs };
}

export const withUnit = (number: string, unit: string): string =>
  unit === "" ? number : `${number}${thinSpace}${unit}`;

/** "2.449×10²⁴ kg": a value in SI as it is shown. */
export function formatQuantity(
  value: number,
  dimension: Dimension,
  { unitSystem, digits = 4 }: { unitSystem: UnitSystem; digits?: number },
): string {
  const unit = displayUnit(dimension, unitSystem, value);
  return withUnit(formatPlainNumber(value / unit.size, digits), unit.text);
}
