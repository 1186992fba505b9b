import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { freeEndedCubic } from "../../../../shared/physics/numerics/freeEndedCubic";
import { cubicSlope, cubicValue, monotoneCubic } from "../../../../shared/physics/numerics/monotoneCubic";
import "../../../toBeCloseToRelative";

const seed = 20261201;

describe("freeEndedCubic", () => {
  it("is a straight line through the points of one, to the ends", () => {
    const curve = freeEndedCubic([0, 1, 5, 6], [3, 1, -7, -9]);
    for (const x of [0, 0.2, 0.9, 3, 5.7, 6]) expect(cubicValue(curve, x)).toBeCloseTo(3 - 2 * x, 14);
    const two = freeEndedCubic([1, 3], [2, 8]);
    expect(cubicValue(two, 1.5)).toBeCloseTo(3.5, 14);
  });

  it("has at the ends the slope of the parabola through three points", () => {
    // y = x² over unequal steps: y′ = 2x.
    const xs = [1, 1.5, 2.5, 3];
    const curve = freeEndedCubic(
      xs,
      xs.map((x) => x * x),
    );
    expect(curve.slopes[0]).toBeCloseToRelative(2, 1e-14);
    expect(curve.slopes[3]).toBeCloseToRelative(6, 1e-14);
  });

  it("differs from the curve with level ends only in its outer pieces", () => {
    const [xs, ys] = [
      [0, 1, 2, 3, 4],
      [5, 3, 2.5, 1, 0.2],
    ];
    const [free, level] = [freeEndedCubic(xs, ys), monotoneCubic(xs, ys)];
    for (const x of [1, 1.4, 2, 2.9, 3]) expect(cubicValue(free, x)).toBe(cubicValue(level, x));
    expect(cubicValue(free, 0.3)).not.toBe(cubicValue(level, 0.3));
  });

  it("comes closer to a smooth profile than level ends do", () => {
    const f = (x: number) => Math.log(1 + x) - x;
    const xs = [0.5, 1, 1.5, 2];
    const [free, level] = [freeEndedCubic(xs, xs.map(f)), monotoneCubic(xs, xs.map(f))];
    const miss = (curve: typeof free) => Math.abs(cubicValue(curve, 0.65) - f(0.65));
    expect(miss(free)).toBeLessThan(0.1 * miss(level));
  });

  it("never leaves the range of its neighbours", () => {
    const points = fc.array(
      fc.tuple(fc.double({ min: 0.1, max: 3, noNaN: true }), fc.integer({ min: -9, max: 9 })),
      {
        minLength: 2,
        maxLength: 8,
      },
    );
    fc.assert(
      fc.property(points, (rows) => {
        let x = 0;
        const xs = rows.map(([step]) => (x += step));
        const ys = rows.map(([, y]) => y);
        const curve = freeEndedCubic(xs, ys);
        for (let i = 1; i < xs.length; i += 1) {
          const [low, high] = [Math.min(ys[i - 1], ys[i]), Math.max(ys[i - 1], ys[i])];
          for (let t = 0.05; t < 1; t += 0.05) {
            const value = cubicValue(curve, xs[i - 1] + t * (xs[i] - xs[i - 1]));
            if (value < low - 1e-12 || value > high + 1e-12) return false;
          }
        }
        return true;
      }),
      { seed, numRuns: 300 },
    );
  });

  it("stays level through one point, and at an end whose neighbours turn back", () => {
    expect(cubicSlope(freeEndedCubic([1], [4]), 1)).toBe(0);
    expect(cubicValue(freeEndedCubic([1], [4]), 9)).toBe(4);
    expect(freeEndedCubic([0, 1, 2], [0, 0.1, 5]).slopes[0]).toBe(0);
    expect(freeEndedCubic([0, 1, 2], [0, 1, -9]).slopes[0]).toBe(3);
  });

  it("refuses points that are not in order or not matched", () => {
    expect(() => freeEndedCubic([1, 1], [0, 1])).toThrow(PhysicsDomainError);
    expect(() => freeEndedCubic([1, 2], [0])).toThrow(PhysicsDomainError);
    expect(() => freeEndedCubic([1, 2], [0, NaN])).toThrow(PhysicsDomainError);
  });
});
