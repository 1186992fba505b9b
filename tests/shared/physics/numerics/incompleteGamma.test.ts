import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { incompleteGamma, scaledUpperGamma } from "../../../../shared/physics/numerics/incompleteGamma";
import functions from "../../../fixtures/specialFunctions.json";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";

const seed = 20261201;

describe("incompleteGamma", () => {
  it.each(functions.gamma)("at $x is that of mpmath", ({ x, lower }) => {
    expect(incompleteGamma(x)).toAgreeWith({
      what: "P(3/2, x)",
      unit: "1",
      published: lower,
      within: { relative: 1e-15 },
      source: "MPMath",
      mark: "computed independently",
    });
  });

  it.each([
    // Chi-square with three degrees of freedom, P(3/2, χ²/2): 50 %, 95 % and 99 %.
    [2.366, 0.5],
    [7.815, 0.95],
    [11.345, 0.99],
  ])("at half of %s is %s", (chiSquare, share) => {
    expect(incompleteGamma(chiSquare / 2)).toAgreeWith({
      what: "P(3/2, χ²/2) at percentage points of χ²",
      unit: "1",
      published: share,
      within: { relative: 1e-4 },
      source: "ChiSquareTable",
      mark: "from memory",
    });
  });

  it("counts the slow ones of three normal speeds", () => {
    // (4/√π) ∫ v² e^{−v²} dv from 0 to √x; midpoint rule.
    for (const x of [0.2, 1.99, 2.01, 6]) {
      let sum = 0;
      const parts = 20000;
      for (let i = 0; i < parts; i += 1) {
        const v = (Math.sqrt(x) * (i + 0.5)) / parts;
        sum += v * v * Math.exp(-v * v) * (Math.sqrt(x) / parts);
      }
      expect(incompleteGamma(x)).toBeCloseToRelative((4 / Math.sqrt(Math.PI)) * sum, 1e-8);
    }
  });

  it("begins as 4x^{3/2}/(3√π) and ends at 1", () => {
    expect(incompleteGamma(0)).toBe(0);
    expect(incompleteGamma(1e-14)).toBeCloseToRelative((4e-21 / 3) * (1 / Math.sqrt(Math.PI)), 2e-14);
    expect(incompleteGamma(50)).toBe(1);
  });

  it("joins its two formulas without a step", () => {
    expect(incompleteGamma(2)).toBeCloseToRelative(incompleteGamma(2 - 4.5e-16), 1e-15);
  });

  it("with its complement adds up to 1, and rises", () => {
    const argument = fc.double({ min: 0, max: 600, noNaN: true });
    fc.assert(
      fc.property(argument, argument, (a, b) => {
        const sum = incompleteGamma(a) + Math.exp(-a) * scaledUpperGamma(a);
        const [low, high] = a < b ? [a, b] : [b, a];
        return Math.abs(sum - 1) < 5e-16 && incompleteGamma(low) <= incompleteGamma(high) + 3e-16;
      }),
      { seed },
    );
  });

  it.each([-1e-9, NaN, Infinity])("refuses %s", (x) => {
    expect(() => incompleteGamma(x)).toThrow(PhysicsDomainError);
  });
});

describe("scaledUpperGamma", () => {
  it.each(functions.gamma)("at $x is that of mpmath", ({ x, scaledUpper }) => {
    expect(scaledUpperGamma(x)).toAgreeWith({
      what: "eˣ Q(3/2, x)",
      unit: "1",
      published: scaledUpper,
      within: { relative: 1e-15 },
      source: "MPMath",
      mark: "computed independently",
    });
  });

  it("is the integral (2/√π) ∫ √(x + t) e^{−t} dt over t above zero", () => {
    for (const x of [0.5, 3, 40]) {
      let sum = 0;
      const [end, parts] = [40, 40000];
      for (let i = 0; i < parts; i += 1) {
        const t = (end * (i + 0.5)) / parts;
        sum += Math.sqrt(x + t) * Math.exp(-t) * (end / parts);
      }
      expect(scaledUpperGamma(x)).toBeCloseToRelative((2 / Math.sqrt(Math.PI)) * sum, 1e-6);
    }
  });

  it("is 1 at zero and tends to 2√(x/π)", () => {
    expect(scaledUpperGamma(0)).toBeCloseToRelative(1, 3e-16);
    expect(scaledUpperGamma(1e18)).toBeCloseToRelative(2e9 / Math.sqrt(Math.PI), 1e-15);
  });

  it("of χ² = 7.815 leaves 5 %", () => {
    expect(Math.exp(-7.815 / 2) * scaledUpperGamma(7.815 / 2)).toAgreeWith({
      what: "Q(3/2, χ²/2) at χ² = 7.815",
      unit: "1",
      published: 0.05,
      within: { relative: 1e-3 },
      source: "ChiSquareTable",
      mark: "from memory",
    });
  });

  it("solves its differential equation, Q̂′ = Q̂ − 2√(x/π)", () => {
    const argument = fc.double({ min: 0.1, max: 500, noNaN: true });
    fc.assert(
      fc.property(argument, (x) => {
        const h = x * 1e-4;
        const slope = (scaledUpperGamma(x + h) - scaledUpperGamma(x - h)) / (2 * h);
        return Math.abs(slope - (scaledUpperGamma(x) - 2 * Math.sqrt(x / Math.PI))) < 1e-6 * slope;
      }),
      { seed },
    );
  });

  it.each([-1e-9, NaN, Infinity])("refuses %s", (x) => {
    expect(() => scaledUpperGamma(x)).toThrow(PhysicsDomainError);
  });
});
