import { describe, expect, it } from "vitest";

import {
  logarithmsHigh,
  logarithmsLow,
  powersOfTwoHigh,
  powersOfTwoLow,
} from "../../../../shared/physics/numerics/elementaryTables";

// The tables again in whole numbers, scaled by 2^300.
const bits = 300n;
const one = 1n << bits;

function scaled(x: number): bigint {
  const view = new DataView(new ArrayBuffer(8));
  view.setFloat64(0, x);
  const word = view.getBigUint64(0);
  const exponent = (word >> 52n) & 2047n;
  const fraction = word & ((1n << 52n) - 1n);
  const mantissa = exponent === 0n ? fraction : fraction | (1n << 52n);
  const shift = bits + (exponent === 0n ? 1n : exponent) - 1075n;
  const magnitude = shift >= 0n ? mantissa << shift : mantissa >> -shift;
  return x < 0 ? -magnitude : magnitude;
}

function wholeRoot(n: bigint): bigint {
  let root = 1n << (BigInt(n.toString(2).length + 1) / 2n);
  for (;;) {
    const next = (root + n / root) >> 1n;
    if (next >= root) return root;
    root = next;
  }
}

/** ln(a/b) = 2 artanh((a − b)/(a + b)). */
function logarithmOfRatio(a: bigint, b: bigint): bigint {
  const s = ((a - b) * one) / (a + b);
  const square = (s * s) >> bits;
  let term = s;
  let sum = 0n;
  for (let odd = 1n; term !== 0n; odd += 2n) {
    sum += term / odd;
    term = (term * square) >> bits;
  }
  return 2n * sum;
}

const size = (n: bigint): bigint => (n < 0n ? -n : n);

describe("the tables behind the elementary functions", () => {
  it("hold 2^(j/64) to twice the digits of a double, the first part rounded to nearest", () => {
    expect([powersOfTwoHigh.length, powersOfTwoLow.length]).toEqual([64, 64]);
    for (let j = 0; j < 64; j += 1) {
      let exact = (1n << BigInt(j)) * one;
      for (let k = 0; k < 6; k += 1) exact = wholeRoot(exact * one);
      const left = exact - scaled(powersOfTwoHigh[j]);
      expect(size(left)).toBeLessThanOrEqual(one >> 53n);
      expect(size(left - scaled(powersOfTwoLow[j]))).toBeLessThanOrEqual(one >> 106n);
    }
  });

  it("hold ln(1 + (2j + 1)/128), the first part a multiple of 2^-32", () => {
    expect([logarithmsHigh.length, logarithmsLow.length]).toEqual([64, 64]);
    for (let j = 0; j < 64; j += 1) {
      const exact = logarithmOfRatio(BigInt(129 + 2 * j), 128n);
      expect(Number.isInteger(logarithmsHigh[j] * 2 ** 32)).toBe(true);
      const left = exact - scaled(logarithmsHigh[j]);
      expect(size(left)).toBeLessThanOrEqual(one >> 33n);
      expect(size(left - scaled(logarithmsLow[j]))).toBeLessThanOrEqual(one >> 86n);
    }
  });
});
