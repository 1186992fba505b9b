import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { PhysicsDomainError } from "../../../../shared/physics/errors";
import {
  lowerLambertLogarithm,
  principalLambertLogarithm,
} from "../../../../shared/physics/numerics/lambertW";
import functions from "../../../fixtures/specialFunctions.json";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";

const seed = 20261201;
const branches = [
  { name: "principalLambertLogarithm", solve: principalLambertLogarithm, key: "principal", sign: -1 },
  { name: "lowerLambertLogarithm", solve: lowerLambertLogarithm, key: "lower", sign: 1 },
] as const;

describe.each(branches)("$name", ({ solve, key, sign }) => {
  it.each(functions.lambert)("at $c is that of mpmath", (row) => {
    expect(solve(row.c)).toAgreeWith({
      what: `logarithm of Lambert's W, ${key === "lower" ? "lower" : "principal"} branch`,
      unit: "1",
      published: row[key],
      within: { relative: 5e-16 },
      source: "MPMath",
      mark: "computed independently",
    });
  });

  it("finds what bisection finds", () => {
    for (const c of [1e-5, 0.02, 0.7, 4, 33]) {
      let [near, far] = [0, sign * 60];
      for (let i = 0; i < 200; i += 1) {
        const middle = (near + far) / 2;
        if (Math.exp(middle) - middle - 1 < c) near = middle;
        else far = middle;
      }
      expect(solve(c)).toBeCloseToRelative(near, 1e-9);
    }
  });

  it("begins as √(2c) to its side of zero", () => {
    expect(solve(0)).toBe(0);
    expect(solve(1e-20)).toBeCloseToRelative(sign * Math.sqrt(2e-20), 1e-9);
    expect(solve(5e-324) * sign).toBeGreaterThan(0);
  });

  it("solves the equation it is made for, and moves away from zero as c grows", () => {
    const excess = fc.double({ min: 1e-3, max: 600, noNaN: true });
    fc.assert(
      fc.property(excess, (c) => {
        const w = solve(c);
        const back = Math.expm1(w) - w;
        return Math.abs(back - c) <= 1e-13 * c * (1 + Math.abs(w)) && solve(c * 1.001) * sign > w * sign;
      }),
      { seed },
    );
  });

  it.each([-1e-9, NaN, Infinity])("refuses %s", (c) => {
    expect(() => solve(c)).toThrow(PhysicsDomainError);
  });
});

describe("the two branches", () => {
  it("of W(−0.2) are −0.259171 and −2.542641", () => {
    // As commonly tabulated; c = −1 − ln 0.2.
    const c = -1 - Math.log(0.2);
    expect(-Math.exp(principalLambertLogarithm(c))).toAgreeWith({
      what: "W₀(−0.2)",
      unit: "1",
      published: -0.2591711,
      within: { absolute: 5e-7 },
      source: "Corless1996",
      mark: "from memory",
    });
    expect(-Math.exp(lowerLambertLogarithm(c))).toAgreeWith({
      what: "W₋₁(−0.2)",
      unit: "1",
      published: -2.5426414,
      within: { absolute: 5e-7 },
      source: "Corless1996",
      mark: "from memory",
    });
  });

  it("are far apart for large c: −1 − c, and ln c", () => {
    expect(principalLambertLogarithm(700)).toBe(-701);
    expect(lowerLambertLogarithm(1e300)).toBeCloseToRelative(Math.log(1e300), 1e-15);
  });
});
