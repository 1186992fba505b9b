import { PhysicsDomainError } from "../errors";
import { logarithmsHigh, logarithmsLow, powersOfTwoHigh, powersOfTwoLow } from "./elementaryTables";

/**
 * Exponential, logarithm, power, sine and cosine from + − × ÷ alone, so that a result is the same to the last
 * bit on every machine; the built-in ones differ between engines. Errors stay below one unit in the last place
 * (1.1e-16 to 2.2e-16 relative), of `expm1` and `log1p` below two. NaN goes in as NaN and comes out as NaN.
 *
 * Method: reduction by tables of 64 entries (Tang 1989, 1990), products kept in two parts (Dekker 1971) where
 * one part would lose digits.
 *
 * @source [Tang1989], [Tang1990], [Dekker1971]
 */

const stepsPerUnit = 92.33248261689366; // 64 / ln 2
const stepHigh = 0.010830424695996044; // ln 2 / 64: 35 bits, so that its multiples are exact
const stepLow = 2.5310172166650877e-13;
const ln2High = 0.6931471806019545; // ln 2: a multiple of 2⁻³²
const ln2Low = -4.2009150726810846e-11;
const ln10High = 2.302585092994046;
const ln10Low = -2.1707562233822494e-16;
const inverseLn10High = 0.4342944819032518;
const inverseLn10Low = 1.098319650216765e-17;

/** Adding and taking away 1.5 × 2⁵² rounds to a whole number. */
const rounder = 6755399441055744;
/** 2²⁷ + 1 parts a double into two halves. */
const splitter = 134217729;

/** 2ⁿ at index n + 1074, from the smallest double to 2¹⁰²³. */
const powersOfTwo = new Float64Array(2098);
for (let i = 0, power = Number.MIN_VALUE; i < powersOfTwo.length; i += 1, power *= 2) powersOfTwo[i] = power;

/** 10ⁿ, n = 0 … 22: those that a double holds exactly. */
const powersOfTen = Float64Array.of(
  ...[1, 1e1, 1e2, 1e3, 1e4, 1e5, 1e6, 1e7, 1e8, 1e9, 1e10, 1e11, 1e12, 1e13, 1e14, 1e15, 1e16, 1e17, 1e18],
  ...[1e19, 1e20, 1e21, 1e22],
);

/** A double seen as its two words, for the exponent. */
const seen = Float64Array.of(1);
const words = new Uint32Array(seen.buffer);
const highWord = words[1] === 0 ? 0 : 1;

/**
 * e^x.
 *
 * @param x  above 709.78 the result is Infinity, below −745.13 it is 0
 */
export function exponential(x: number): number {
  return exponentialOfSum(x, 0);
}

/** e^(x + tail), |tail| far below |x|. */
function exponentialOfSum(x: number, tail: number): number {
  const k = x * stepsPerUnit + rounder - rounder;
  const r = x - k * stepHigh - (k * stepLow - tail);
  const p = r + r * r * (0.5 + r * (1 / 6 + r * (1 / 24 + r * (1 / 120 + r * (1 / 720)))));
  const j = k & 63;
  const t = powersOfTwoHigh[j];
  const mantissa = t + (powersOfTwoLow[j] + t * p);
  if (x > -708 && x < 709) return mantissa * powersOfTwo[(k >> 6) + 1074];
  return exponentialAtTheEnds(x, mantissa, k >> 6);
}

function exponentialAtTheEnds(x: number, mantissa: number, n: number): number {
  if (x > 710) return Infinity;
  if (x < -746) return 0;
  if (x !== x) return NaN;
  const half = n >> 1;
  return mantissa * powersOfTwo[half + 1074] * powersOfTwo[n - half + 1074];
}

/**
 * e^x − 1, without loss of digits near 0.
 *
 * @param x  above 709.78 the result is Infinity
 */
export function expm1(x: number): number {
  if (!(x > -40 && x < 709)) return x !== x ? NaN : x > 0 ? exponential(x) : -1;
  const k = x * stepsPerUnit + rounder - rounder;
  const r = x - k * stepHigh - k * stepLow;
  const p = r + r * r * (0.5 + r * (1 / 6 + r * (1 / 24 + r * (1 / 120 + r * (1 / 720)))));
  if (k === 0) return p;
  const j = k & 63;
  const scale = powersOfTwo[(k >> 6) + 1074];
  const t = powersOfTwoHigh[j];
  return t * scale - 1 + (powersOfTwoLow[j] + t * p) * scale;
}

/**
 * ln x.
 *
 * @param x  zero or more; 0 gives −Infinity
 * @throws   PhysicsDomainError if x is negative
 */
export function logarithm(x: number): number {
  if (x > 0.9375 && x < 1.0625) return logarithmNearOne(x - 1);
  if (!(x >= 2.2250738585072014e-308 && x < Infinity)) return logarithmAtTheEnds(x);
  seen[0] = x;
  const word = words[highWord];
  const exponent = (word >>> 20) - 1023;
  const j = (word >>> 14) & 63;
  const m = x * powersOfTwo[1074 - exponent];
  const c = (j + 64.5) * 0.015625;
  const s = (m - c) / (m + c);
  const z = s * s;
  const rest = 2 * s + 2 * s * z * (1 / 3 + z * (1 / 5 + z * (1 / 7)));
  return exponent * ln2High + logarithmsHigh[j] + (rest + (exponent * ln2Low + logarithmsLow[j]));
}

function logarithmAtTheEnds(x: number): number {
  if (x < 0) throw new PhysicsDomainError("argument of a logarithm", x, "zero or more");
  if (x === 0) return -Infinity;
  if (!(x < Infinity)) return x;
  return logarithm(x * 18014398509481984) - 37.42994775023705; // a subnormal number, times 2⁵⁴
}

/** ln(1 + f), |f| ≤ 1/16, with the rounding of f ÷ (2 + f) kept out of the leading term. */
function logarithmNearOne(f: number): number {
  const s = f / (2 + f);
  const z = s * s;
  return f - s * (f - 2 * z * atanhTail(z));
}

/** (atanh s − s)/s³ as a series in z = s², |s| ≤ 0.034. */
function atanhTail(z: number): number {
  return 1 / 3 + z * (1 / 5 + z * (1 / 7 + z * (1 / 9 + z * (1 / 11 + z * (1 / 13)))));
}

/**
 * ln(1 + x), without loss of digits near 0.
 *
 * @param x  −1 or more; −1 gives −Infinity
 * @throws   PhysicsDomainError if x is below −1
 */
export function log1p(x: number): number {
  if (x > -0.0625 && x < 0.0625) return logarithmNearOne(x);
  const sum = 1 + x;
  if (!(sum > 0 && sum < Infinity)) return logarithm(sum);
  const lost = x > 1 ? 1 - (sum - x) : x - (sum - 1);
  return logarithm(sum) + lost / sum;
}

/** Where `logarithmInTwoParts` leaves its answer. */
const parts = new Float64Array(2);

/** What is missing from the rounded product p of a and b. */
function productError(a: number, b: number, p: number): number {
  const aScaled = a * splitter;
  const aHigh = aScaled - (aScaled - a);
  const aLow = a - aHigh;
  const bScaled = b * splitter;
  const bHigh = bScaled - (bScaled - b);
  const bLow = b - bHigh;
  return aHigh * bHigh - p + aHigh * bLow + aLow * bHigh + aLow * bLow;
}

/** ln x = parts[0] + parts[1] to some 70 bits; x finite, above zero. */
function logarithmInTwoParts(x: number): void {
  const isNearOne = x > 0.9375 && x < 1.0625;
  let exponent = 0;
  let m = x;
  if (m < 2.2250738585072014e-308) {
    m *= 18014398509481984;
    exponent = -54;
  }
  seen[0] = m;
  const word = words[highWord];
  const j = (word >>> 14) & 63;
  let c = 1;
  if (!isNearOne) {
    const own = (word >>> 20) - 1023;
    exponent += own;
    m *= powersOfTwo[1074 - own];
    c = (j + 64.5) * 0.015625;
  }
  const f = m - c;
  const d = m + c;
  const dWithoutM = d - m;
  const dLow = m - (d - dWithoutM) + (c - dWithoutM);
  const q = f / d;
  const p = q * d;
  const qLow = (f - p - productError(q, d, p) - q * dLow) / d;
  const z = q * q;
  const rest = 2 * q * z * atanhTail(z) + 2 * qLow;

  let high = 2 * q;
  let low = rest;
  if (!isNearOne) {
    const table = exponent * ln2High + logarithmsHigh[j];
    high = table + 2 * q;
    low = table - high + 2 * q + (rest + (exponent * ln2Low + logarithmsLow[j]));
  }
  parts[0] = high + low;
  parts[1] = high - parts[0] + low;
}

/**
 * log₁₀ x; exact where x is a power of ten that a double holds.
 *
 * @param x  zero or more; 0 gives −Infinity
 * @throws   PhysicsDomainError if x is negative
 */
export function log10(x: number): number {
  if (!(x > 0 && x < Infinity)) return logarithm(x);
  logarithmInTwoParts(x);
  const p = parts[0] * inverseLn10High;
  const low = parts[0] * inverseLn10Low + parts[1] * inverseLn10High;
  return p + (productError(parts[0], inverseLn10High, p) + low);
}

/**
 * 10^x; exact where x is a whole number from 0 to 22, correctly rounded from −22 to −1.
 *
 * @param x  above 308.25 the result is Infinity, below −323.6 it is 0
 */
export function powerOfTen(x: number): number {
  if (x === Math.trunc(x) && x <= 22 && x >= -22) return x < 0 ? 1 / powersOfTen[-x] : powersOfTen[x];
  const p = x * ln10High;
  if (!(p > -746 && p < 710)) return exponential(p);
  return exponentialOfSum(p, productError(x, ln10High, p) + x * ln10Low);
}

/**
 * x^y.
 *
 * @param x  zero or more; below zero only with a whole y
 * @param y  any; x^0 = 1, and 0^y is Infinity where y is negative
 * @throws   PhysicsDomainError if x is negative and y no whole number
 */
export function power(x: number, y: number): number {
  if (x !== x || y !== y) return NaN;
  if (y === 0 || x === 1) return 1;
  if (x < 0) {
    if (y !== Math.trunc(y))
      throw new PhysicsDomainError("exponent of a negative number", y, "a whole number");
    return y % 2 === 0 ? power(-x, y) : -power(-x, y);
  }
  if (x === 0) return y > 0 ? 0 : Infinity;
  if (x === Infinity) return y > 0 ? Infinity : 0;
  if (y > 1e20 || y < -1e20) return exponential(logarithm(x) * y);
  logarithmInTwoParts(x);
  const p = parts[0] * y;
  if (!(p > -746 && p < 710)) return exponential(p);
  return exponentialOfSum(p, productError(parts[0], y, p) + parts[1] * y);
}

const quarterTurnHigh = 1.5707963267341256; // π/2 in three parts, the first two exact in whole multiples
const quarterTurnMiddle = 6.07710050359346e-11;
const quarterTurnLow = 2.912732056093356e-20;
const largestAngle = 1e6;

/**
 * sin x.
 *
 * @param x  [rad]  −1e6 to 1e6
 * @throws   PhysicsDomainError if x lies outside, where the reduction to one quarter turn would lose digits
 */
export function sine(x: number): number {
  return sineOfQuarter(x, 0);
}

/**
 * cos x.
 *
 * @param x  [rad]  −1e6 to 1e6
 * @throws   PhysicsDomainError if x lies outside, where the reduction to one quarter turn would lose digits
 */
export function cosine(x: number): number {
  return sineOfQuarter(x, 1);
}

/** sin(x + quarters × π/2). */
function sineOfQuarter(x: number, quarters: number): number {
  if (x < -largestAngle || x > largestAngle) {
    throw new PhysicsDomainError("angle", x, `between −${largestAngle} and ${largestAngle} rad`);
  }
  const turns = x * 0.6366197723675814 + rounder - rounder;
  const first = x - turns * quarterTurnHigh;
  const second = turns * quarterTurnMiddle;
  const difference = first - second;
  const left = first - difference - second - turns * quarterTurnLow;
  const y = difference + left;
  const tail = difference - y + left;
  const quadrant = (turns + quarters) & 3;
  const value = quadrant % 2 === 0 ? sineKernel(y, tail) : cosineKernel(y, tail);
  return quadrant < 2 ? value : -value;
}

/** sin(y + tail), |y| ≤ π/4. */
function sineKernel(y: number, tail: number): number {
  const z = y * y;
  const high =
    1 / 362880 + z * (-1 / 39916800 + z * (1 / 6227020800 + z * (-1 / 1307674368000 + z / 355687428096000)));
  const series = -1 / 6 + z * (1 / 120 + z * (-1 / 5040 + z * high));
  return y + (y * z * series + tail * (1 - 0.5 * z));
}

/** cos(y + tail), |y| ≤ π/4. */
function cosineKernel(y: number, tail: number): number {
  const z = y * y;
  const high = -1 / 3628800 + z * (1 / 479001600 + z * (-1 / 87178291200 + z * (1 / 20922789888000)));
  const series = 1 / 24 + z * (-1 / 720 + z * (1 / 40320 + z * high));
  const half = 0.5 * z;
  const w = 1 - half;
  return w + (1 - w - half + (z * z * series - y * tail));
}
