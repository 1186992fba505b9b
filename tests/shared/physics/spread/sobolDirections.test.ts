import { describe, expect, it } from "vitest";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { directionNumbers } from "../../../../shared/physics/spread/directionNumbers";
import { sobolAt } from "../../../../shared/physics/spread/scrambledSobol";
import { largestSobolDimension, sobolDirections } from "../../../../shared/physics/spread/sobolDirections";

const directions = sobolDirections(largestSobolDimension);

describe("sobolDirections", () => {
  it("begins as the published table does", () => {
    // new-joe-kuo-6.21201, web page of Joe and Kuo (2008): rows d = 2 to 10, columns a and m_i
    expect(directionNumbers.slice(0, 9)).toEqual([
      [0, 1],
      [1, 1, 3],
      [1, 1, 3, 1],
      [2, 1, 1, 1],
      [1, 1, 1, 3, 3],
      [4, 1, 3, 5, 13],
      [2, 1, 1, 5, 5, 17],
      [4, 1, 1, 5, 5, 5],
      [7, 1, 1, 7, 11, 19],
    ]);
  });

  it("gives the first points of the published sequence, up to their order", () => {
    // Joe and Kuo (2008), notes to the program sobol.cc: the first ten points in three dimensions (Gray code order)
    const published = [
      [0, 0, 0],
      [0.5, 0.5, 0.5],
      [0.75, 0.25, 0.25],
      [0.25, 0.75, 0.75],
      [0.375, 0.375, 0.625],
      [0.875, 0.875, 0.125],
      [0.625, 0.125, 0.875],
      [0.125, 0.625, 0.375],
      [0.1875, 0.3125, 0.9375],
      [0.6875, 0.8125, 0.4375],
    ];
    published.forEach((point, i) => {
      const index = i ^ (i >> 1);
      expect(directions.slice(0, 3).map((each) => sobolAt(each, index) / 2 ** 32)).toEqual(point);
    });
  });

  it("takes a different irreducible polynomial for every dimension, and odd initial numbers below 2^k", () => {
    const polynomials = directionNumbers.map(([a, ...m]) => (1 << m.length) | (a << 1) | 1);
    expect(new Set(polynomials).size).toBe(polynomials.length);
    for (const polynomial of polynomials) expect(isIrreducible(polynomial), `${polynomial}`).toBe(true);
    for (const [, ...initial] of directionNumbers) {
      initial.forEach((m, k) => {
        expect(m % 2).toBe(1);
        expect(m).toBeLessThan(2 ** (k + 1));
      });
    }
  });

  it("puts one of the first 2^k points into each of 2^k equal intervals, in every dimension", () => {
    for (const each of directions) {
      for (const k of [1, 5, 10]) {
        const cells = new Set(Array.from({ length: 2 ** k }, (_, i) => sobolAt(each, i) >>> (32 - k)));
        expect(cells.size).toBe(2 ** k);
      }
    }
  });

  it("fills squares of neighbouring dimensions evenly: 2 to 12 with as few as 2^10 points", () => {
    for (let d = 0; d < 11; d += 1) {
      const counts = new Map<number, number>();
      for (let i = 0; i < 1024; i += 1) {
        const cell = ((sobolAt(directions[d], i) >>> 30) << 2) | (sobolAt(directions[d + 1], i) >>> 30);
        counts.set(cell, (counts.get(cell) ?? 0) + 1);
      }
      expect([...counts.values()]).toEqual(Array(16).fill(64));
    }
  });

  it.each([0, -1, 1.5, NaN, largestSobolDimension + 1])("refuses %s dimensions", (dimensions) => {
    expect(() => sobolDirections(dimensions)).toThrow(PhysicsDomainError);
  });
});

/** Of polynomials over two elements, coded in binary: no smaller one divides it. */
function isIrreducible(polynomial: number): boolean {
  const degree = (p: number) => 31 - Math.clz32(p);
  for (let divisor = 2; degree(divisor) * 2 <= degree(polynomial); divisor += 1) {
    let rest = polynomial;
    while (rest !== 0 && degree(rest) >= degree(divisor)) rest ^= divisor << (degree(rest) - degree(divisor));
    if (rest === 0) return false;
  }
  return true;
}
