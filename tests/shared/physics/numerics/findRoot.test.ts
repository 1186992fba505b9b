import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { findRoot, rootOf } from "../../../../shared/physics/numerics/findRoot";
import "../../../toBeCloseToRelative";

const tight = { value: 0, bracket: 1e-15 };

describe("findRoot", () => {
  it.each([
    ["x² − 2", (x: number) => x * x - 2, 0, 2, Math.SQRT2],
    ["cos x", Math.cos, 0, 3, Math.PI / 2],
    ["e^x − 1e6", (x: number) => Math.exp(x) - 1e6, 0, 100, Math.log(1e6)],
    ["x⁹", (x: number) => x ** 9, -1, 1.5, 0],
  ])("finds where %s vanishes", (_, f, left, right, expected) => {
    const outcome = findRoot(f, left, right, tight);
    expect(outcome.converged && outcome.root).toBeCloseTo(expected, expected === 0 ? 1 : 13);
  });

  it("takes the ends in either order", () => {
    const outcome = findRoot((x) => x ** 3 - 5, 3, 0, tight);
    expect(outcome.converged && outcome.root).toBeCloseToRelative(Math.cbrt(5), 1e-14);
  });

  it("stops as soon as the value is small enough", () => {
    let calls = 0;
    const f = (x: number) => {
      calls += 1;
      return x - 0.3;
    };
    expect(findRoot(f, 0, 1, { value: 1e-3, bracket: 0 }).converged).toBe(true);
    expect(calls).toBeLessThan(5);
  });

  it("gives an end that is a root itself", () => {
    expect(findRoot((x) => x, 0, 1, tight)).toEqual({ converged: true, root: 0, iterations: 0 });
    expect(findRoot((x) => x - 1, 0, 1, tight)).toEqual({ converged: true, root: 1, iterations: 0 });
  });

  it("says that the signs do not differ", () => {
    const outcome = findRoot((x) => x * x + 1, -1, 1, tight);
    expect(outcome).toMatchObject({ converged: false, reason: "no_sign_change", lastBracket: [-1, 1] });
  });

  it("says where a value is not a number", () => {
    expect(findRoot((x) => (x > 0.4 ? NaN : -1), 0, 1, tight)).toMatchObject({ reason: "not_a_number" });
    expect(findRoot((x) => (x === 1 ? 1 : x === 0 ? -1 : NaN), 0, 1, tight)).toMatchObject({
      reason: "not_a_number",
      iterations: 1,
    });
  });

  it("closes in on a jump", () => {
    const outcome = findRoot((x) => (x < 1 / 3 ? -1 : 2), 0, 1, { value: 0, bracket: 1e-12 });
    expect(outcome.converged && outcome.root).toBeCloseTo(1 / 3, 10);
  });

  it("closes in on a jump however lopsided, and on a root however flat", () => {
    const share = fc.double({ min: 0.001, max: 0.999, noNaN: true });
    const exponent = fc.integer({ min: -30, max: 30 });
    const flatness = fc.constantFrom(1, 3, 9, 31);
    fc.assert(
      fc.property(share, exponent, flatness, (root, ratio, flat) => {
        const jump = (x: number) => (x < root ? -1 : 10 ** ratio);
        const curve = (x: number) => (x - root) ** flat * (x < root ? 1 : 10 ** ratio);
        for (const f of [jump, curve]) {
          const outcome = findRoot(f, 0, 1, { value: 0, bracket: 1e-12 });
          expect(outcome.converged && outcome.root).toBeCloseTo(root, 8);
        }
      }),
      { seed: 11, numRuns: 2000 },
    );
  });

  it("says that it did not get there", () => {
    const outcome = findRoot((x) => (x < 1e-300 ? -1 : 2), 0, 1e300, { value: 0, bracket: 0 });
    expect(outcome).toMatchObject({ converged: false, reason: "too_many_iterations", iterations: 416 });
  });
});

describe("rootOf", () => {
  it("names what has no root", () => {
    expect(() =>
      rootOf(
        "height of nothing",
        findRoot(() => 1, 0, 1, tight),
      ),
    ).toThrow(PhysicsDomainError);
    expect(() =>
      rootOf(
        "height of nothing",
        findRoot(() => 1, 0, 1, tight),
      ),
    ).toThrow(/height of nothing/);
    expect(
      rootOf(
        "zero",
        findRoot((x) => x, 0, 1, tight),
      ),
    ).toBe(0);
  });
});
