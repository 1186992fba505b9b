/** From a number and its unit to SI, rounded once wherever SI makes that possible. */
import { power, powerOfTen } from "../../physics";
import type { Note } from "../result";
import { dimensionless, type Dimension } from "./dimensions";
import { changeTo, fault } from "./notes";
import { nearestName } from "./nearestName";
import type { NumberNode, UnitFactor, UnitNode } from "./syntax";
import { findForeignUnit, findUnit, unitsForCompletion } from "./units";

/** SI = numerator / denominator × 10^powerOfTen; both are products of the units' factors. */
export interface Measure {
  dimension: Dimension;
  numerator: number;
  /** The numerator as a whole number, where it is one. */
  wholeNumerator: bigint | null;
  denominator: number;
  powerOfTen: number;
}

export const combineDimensions = (a: Dimension, b: Dimension, times: number): Dimension =>
  a.map((exponent, index) => roundExponent(exponent + times * b[index])) as unknown as Dimension;

export const scaleDimension = (dimension: Dimension, times: number): Dimension =>
  dimension.map((exponent) => roundExponent(exponent * times)) as unknown as Dimension;

/** Exponents such as 1/3 + 2/3 come back to whole numbers; −0 becomes 0. */
const roundExponent = (exponent: number): number => Math.round(exponent * 1e9) / 1e9 + 0;

export const sameDimension = (a: Dimension, b: Dimension): boolean =>
  a.every((exponent, index) => Math.abs(exponent - b[index]) < 1e-6);

export const isDimensionless = (dimension: Dimension): boolean => sameDimension(dimension, dimensionless);

function unknownUnit({ symbol, range }: UnitFactor): Note {
  const foreign = findForeignUnit(symbol);
  if (foreign) {
    const { message, replacement } = foreign;
    const remedy = replacement === undefined ? undefined : changeTo(range, replacement);
    return fault("unknown_unit", range, `*${symbol}* is not a unit here. ${message}`, remedy);
  }
  const nearest = nearestName(
    symbol,
    unitsForCompletion.map(({ unit }) => unit),
  );
  if (nearest === undefined) return fault("unknown_unit", range, `No unit *${symbol}*.`);
  return fault(
    "unknown_unit",
    range,
    `No unit *${symbol}*. The nearest is *${nearest}*.`,
    changeTo(range, nearest),
  );
}

const largestWhole = 1n << 200n;

export function measureOf(unit: UnitNode): Measure | Note {
  let dimension: Dimension = dimensionless;
  let numerator = 1;
  let wholeNumerator: bigint | null = 1n;
  let denominator = 1;
  let tens = 0;
  for (const factor of unit.factors) {
    const { exponent } = factor;
    const found = findUnit(factor.symbol);
    if (!found) return unknownUnit(factor);
    dimension = combineDimensions(dimension, found.dimension, exponent);
    tens += found.powerOfTen * exponent;
    if (found.factor === 1) continue;
    const size = Math.abs(exponent);
    const isWhole = Number.isInteger(size);
    const raised = isWhole ? repeated(found.factor, size) : power(found.factor, size);
    if (exponent < 0) {
      denominator *= raised;
      continue;
    }
    numerator *= raised;
    wholeNumerator =
      wholeNumerator !== null && isWhole && Number.isInteger(found.factor) && wholeNumerator < largestWhole
        ? wholeNumerator * repeatedWhole(BigInt(found.factor), size)
        : null;
  }
  return { dimension, numerator, wholeNumerator, denominator, powerOfTen: tens };
}

function repeated(factor: number, times: number): number {
  let product = 1;
  for (let count = 0; count < times; count += 1) product *= factor;
  return product;
}

function repeatedWhole(factor: bigint, times: number): bigint {
  let product = 1n;
  for (let count = 0; count < times; count += 1) product *= factor;
  return product;
}

/** A decimal number, correctly rounded. */
const decimal = (digits: string, tens: number): number => Number(`${digits}e${tens}`);

/** Value in SI of a written number with its unit. */
export function literalInSi({ digits, powerOfTen: tens }: NumberNode, measure: Measure): number {
  const total = tens + measure.powerOfTen;
  if (!Number.isInteger(total)) return valueInSi(decimal(digits, tens), measure);
  if (measure.wholeNumerator === null)
    return (decimal(digits, total) * measure.numerator) / measure.denominator;
  if (measure.wholeNumerator === 1n) return decimal(digits, total) / measure.denominator;
  const [whole, fraction = ""] = digits.split(".");
  const product = BigInt(`${whole}${fraction}`) * measure.wholeNumerator;
  return decimal(String(product), total - fraction.length) / measure.denominator;
}

/** Value in SI of a computed number with its unit. */
export function valueInSi(value: number, measure: Measure): number {
  const { numerator, denominator, powerOfTen: tens } = measure;
  const scaled = (value * numerator) / denominator;
  if (tens === 0) return scaled;
  if (!Number.isInteger(tens)) return scaled * powerOfTen(tens);
  return tens > 0 ? scaled * decimal("1", tens) : scaled / decimal("1", -tens);
}
