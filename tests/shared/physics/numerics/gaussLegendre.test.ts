import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { gaussLegendre } from "../../../../shared/physics/numerics/gaussLegendre";
import "../../../toBeCloseToRelative";

const seed = 20261201;

describe("gaussLegendre", () => {
  it.each([0, 1, 2, 7, 16, 30, 31])("is exact for the power %s", (n) => {
    expect(gaussLegendre((x) => x ** n, 0, 1)).toBeCloseToRelative(1 / (n + 1), 1e-15);
  });

  it("is no longer exact for the power 32", () => {
    expect(Math.abs(gaussLegendre((x) => x ** 32, -1, 1) * 16.5 - 1)).toBeGreaterThan(1e-10);
  });

  it("gives π, from 4/(1 + x²)", () => {
    expect(gaussLegendre((x) => 4 / (1 + x * x), 0, 1)).toBeCloseToRelative(Math.PI, 1e-15);
  });

  it("agrees with the midpoint rule on e^{−x}", () => {
    const parts = 10000;
    let sum = 0;
    for (let i = 0; i < parts; i += 1) sum += Math.exp((-2 * (i + 0.5)) / parts) * (2 / parts);
    expect(gaussLegendre((x) => Math.exp(-x), 0, 2)).toBeCloseToRelative(sum, 1e-8);
  });

  it("turns its sign with its ends and adds up over pieces", () => {
    const end = fc.double({ min: -3, max: 3, noNaN: true });
    const f = (x: number) => Math.exp(-x / 4);
    fc.assert(
      fc.property(end, end, end, (a, b, c) => {
        const whole = gaussLegendre(f, a, c);
        const pieces = gaussLegendre(f, a, b) + gaussLegendre(f, b, c);
        return gaussLegendre(f, c, a) === -whole && Math.abs(whole - pieces) < 1e-13;
      }),
      { seed },
    );
    expect(gaussLegendre(f, 2, 2)).toBe(0);
  });
});
