import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { exponential, logarithm } from "../../../../shared/physics/numerics/elementary";
import { cubicSlope, cubicValue, monotoneCubic } from "../../../../shared/physics/numerics/monotoneCubic";
import "../../../toBeCloseToRelative";

const seed = 20261201;

/** Strictly ascending abscissae with ordinates. */
const points = fc
  .array(
    fc.tuple(fc.double({ min: 0.01, max: 10, noNaN: true }), fc.double({ min: -100, max: 100, noNaN: true })),
    {
      minLength: 2,
      maxLength: 12,
    },
  )
  .map((steps) => {
    let x = 0;
    return { x: steps.map(([step]) => (x += step)), y: steps.map(([, y]) => y) };
  });

describe("monotoneCubic", () => {
  it("passes through its points", () => {
    const x = [0, 1, 3, 4.5, 9];
    const y = [200, 180, 180, 350, 400];
    const curve = monotoneCubic(x, y);
    x.forEach((abscissa, i) => expect(cubicValue(curve, abscissa)).toBe(y[i]));
  });

  it("equals the Hermite cubic written out in powers", () => {
    // By hand: x 0, 1, 3; y 0, 1, 5. Secants 1 and 2; three-point slope (2·1 + 1·2)/3 = 4/3; ends 0; no scaling.
    const curve = monotoneCubic([0, 1, 3], [0, 1, 5]);
    expect(curve.slopes[1]).toBeCloseToRelative(4 / 3, 1e-15);
    // On [0, 1]: y = a x² + b x³ with a + b = 1 and 2a + 3b = 4/3.
    expect(cubicValue(curve, 0.25)).toBeCloseToRelative((5 / 3) * 0.0625 - (2 / 3) * 0.015625, 1e-14);
  });

  it("scales slopes into the circle of radius 3 of Fritsch and Carlson (1980)", () => {
    // Secants 1 and 10 of equal width: slope 5.5, so α² + β² = 5.5² > 9 on the first interval; scaled to β = 3.
    const curve = monotoneCubic([0, 1, 2], [0, 1, 11]);
    expect(curve.slopes[1]).toBeCloseToRelative(3, 1e-15);
  });

  it("is flat at its ends, at turning points and beyond", () => {
    const curve = monotoneCubic([0, 1, 2, 4], [1, 3, 2, 2]);
    expect(Array.from(curve.slopes)).toEqual([0, 0, 0, 0]);
    expect([cubicValue(curve, -5), cubicValue(curve, 9)]).toEqual([1, 2]);
    expect([cubicSlope(curve, -5), cubicSlope(curve, 0), cubicSlope(curve, 9)]).toEqual([0, 0, 0]);
  });

  it("is constant through one point", () => {
    const curve = monotoneCubic([3], [7]);
    expect([cubicValue(curve, 0), cubicValue(curve, 3), cubicValue(curve, 9)]).toEqual([7, 7, 7]);
  });

  it("gives a slope that is the derivative of its value", () => {
    const curve = monotoneCubic([0, 1, 3, 4.5, 9], [200, 180, 190, 350, 400]);
    for (const x of [0.3, 0.8, 1.7, 2.9, 4, 5, 8.5]) {
      const step = 1e-6;
      const difference = (cubicValue(curve, x + step) - cubicValue(curve, x - step)) / (2 * step);
      expect(cubicSlope(curve, x)).toBeCloseToRelative(difference, 1e-6);
    }
  });

  it("carries a quantity over many powers of ten by its logarithm", () => {
    const curve = monotoneCubic([80e3, 120e3, 200e3], [10, 1e3, 1e6].map(logarithm));
    const middle = exponential(cubicValue(curve, 100e3));
    expect(middle).toBeGreaterThan(10);
    expect(middle).toBeLessThan(1e3);
  });

  it("never leaves the range of the two points around it, and never turns between them", () => {
    const share = fc.double({ min: 0, max: 1, noNaN: true });
    fc.assert(
      fc.property(points, share, share, ({ x, y }, a, b) => {
        const curve = monotoneCubic(x, y);
        const [early, late] = a < b ? [a, b] : [b, a];
        for (let i = 0; i + 1 < x.length; i += 1) {
          const at = (t: number) => cubicValue(curve, x[i] + t * (x[i + 1] - x[i]));
          const slack = 1e-12 * (Math.abs(y[i]) + Math.abs(y[i + 1]));
          const low = Math.min(y[i], y[i + 1]) - slack;
          const high = Math.max(y[i], y[i + 1]) + slack;
          if (at(early) < low || at(early) > high) return false;
          if ((at(late) - at(early)) * Math.sign(y[i + 1] - y[i]) < -slack) return false;
        }
        return true;
      }),
      { seed },
    );
  });

  it.each([
    ["no points", [], []],
    ["points out of order", [0, 2, 1], [1, 1, 1]],
    ["a point twice", [0, 1, 1], [1, 1, 1]],
    ["too few values", [0, 1], [1]],
    ["a value that is not a number", [0, 1], [1, NaN]],
    ["an infinite point", [0, Infinity], [1, 1]],
  ])("refuses %s", (_, x, y) => {
    expect(() => monotoneCubic(x, y)).toThrow(PhysicsDomainError);
  });
});
