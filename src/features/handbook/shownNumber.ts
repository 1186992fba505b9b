import { unitFactors } from "../../../shared/notebook/unitFactors";
import { formatFixed, formatUnit, thinSpace, unitSpace, type UnitSystem } from "../../lib/format";
import type { RichText } from "../../lib/richText";
import type { ColumnScale, TableColumn, TableValue } from "./handbookTable";

/** Powers of ten from SI to cgs for each unit that has a twin there, and the twin. */
const cgsTwins: Readonly<Record<string, { shift: number; symbols: readonly [string, number][] }>> = {
  m: { shift: 2, symbols: [["cm", 1]] },
  kg: { shift: 3, symbols: [["g", 1]] },
  J: { shift: 7, symbols: [["erg", 1]] },
  W: {
    shift: 7,
    symbols: [
      ["erg", 1],
      ["s", -1],
    ],
  },
};

/** An SI unit in the system asked for: m^-1 s^-1 is 10⁻² cm^-1 s^-1. What has no twin stays: the coulomb, the kelvin. */
export function systemScale(unit: string, system: UnitSystem): Required<Pick<ColumnScale, "shift" | "unit">> {
  let shift = 0;
  const words = unitFactors(unit).flatMap(({ symbol, exponent }) => {
    const twin = system === "cgs" ? cgsTwins[symbol] : undefined;
    shift += (twin?.shift ?? 0) * exponent;
    return (twin?.symbols ?? [[symbol, 1] as const]).map(([name, power]) =>
      power * exponent === 1 ? name : `${name}^${power * exponent}`,
    );
  });
  return { shift, unit: words.join(" ") };
}

/** Scale of a column in a system of units. */
export function columnScale({ unit, scale }: TableColumn, system: UnitSystem): ColumnScale {
  if (!scale) return systemScale(unit, system);
  return "SI" in scale ? scale[system] : scale;
}

/** Moves the point without touching a digit. */
function shiftPoint(value: number, shift: number): number {
  const [mantissa, exponent] = value.toExponential().split("e");
  return Number(`${mantissa}e${Number(exponent) + shift}`);
}

export function scaled(value: number, { shift = 0, per }: ColumnScale): number {
  return per === undefined ? shiftPoint(value, shift) : value / per;
}

const trueMinus = (text: string): string => text.replace(/-/g, "−");

/** In threes after the point too, from five digits on: 1.007 825 03. */
function grouped(text: string): string {
  const [whole = "", fraction = ""] = text.split(".");
  const left = formatFixed(Number(whole), 0);
  const sign = text.startsWith("-") && Number(whole) === 0 ? "−" : "";
  if (fraction === "") return `${sign}${left}`;
  const right = fraction.length < 5 ? fraction : fraction.replace(/(\d{3})(?=\d)/g, `$1${thinSpace}`);
  return `${sign}${left}.${right}`;
}

/** A number with between so many significant digits, as a power of ten where it is very large or small. */
export function shownNumber(value: number, digits: number, leastDigits = 1): RichText {
  if (value === 0) return ["0"];
  const rounded = Number(value.toPrecision(digits));
  const own = rounded.toExponential().split("e")[0]!.replace(/[-.]/g, "").length;
  const count = Math.max(own, leastDigits);
  const size = Math.abs(rounded);
  if (size >= 1e-3 && size < 1e7) {
    const before = Math.floor(Math.log10(size)) + 1;
    return [grouped(rounded.toFixed(Math.max(0, count - before)))];
  }
  return power(rounded.toExponential(count - 1));
}

function power(text: string, uncertainty = ""): RichText {
  const [mantissa = "", exponent = ""] = text.split("e");
  return [
    `${trueMinus(mantissa)}${uncertainty}${thinSpace}×${thinSpace}10`,
    { sup: trueMinus(exponent.replace("+", "")) },
  ];
}

/** 6.674 30(15) × 10⁻¹¹: the uncertainty counts in the last two digits written. */
function withUncertainty(value: number, uncertainty: number): RichText {
  const exponentOf = (number: number) => Number(number.toExponential().split("e")[1]);
  const decimals = exponentOf(value) - exponentOf(uncertainty) + 1;
  const last = Math.round(shiftPoint(uncertainty, 1 - exponentOf(uncertainty)));
  return power(value.toExponential(decimals), `(${last})`);
}

/** A value of a table as it is set, with its unit where that is its own. */
export function shownValue(
  { value, uncertainty = 0, unit, rich }: TableValue,
  column: TableColumn,
  system: UnitSystem,
): RichText {
  if (value === null) return ["–"];
  if (typeof value === "string") return rich ?? [value];
  const scale = unit === undefined ? columnScale(column, system) : systemScale(unit, system);
  const number =
    uncertainty > 0
      ? withUncertainty(scaled(value, scale), scaled(uncertainty, scale))
      : shownNumber(scaled(value, scale), column.digits, column.leastDigits);
  return unit === undefined ? number : [...number, unitSpace, ...formatUnit(scale.unit)];
}
