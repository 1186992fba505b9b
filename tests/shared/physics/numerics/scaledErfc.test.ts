import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { scaledErfc } from "../../../../shared/physics/numerics/scaledErfc";
import functions from "../../../fixtures/specialFunctions.json";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";

const seed = 20261201;

describe("scaledErfc", () => {
  it.each(functions.gamma)("at $x is that of mpmath", ({ x, scaledErfc: expected }) => {
    expect(scaledErfc(x)).toAgreeWith({
      what: "e^{x²} erfc x",
      unit: "1",
      published: expected,
      within: { relative: 6e-16 },
      source: "MPMath",
      mark: "computed independently",
    });
  });

  it.each([
    // Table 7.1: erfc 0.5, 1, 2.
    [0.5, 0.4795001222],
    [1, 0.1572992071],
    [2, 0.0046777349],
  ])("at %s is e^{x²} times the tabulated %s", (x, erfc) => {
    expect(scaledErfc(x) * Math.exp(-x * x)).toAgreeWith({
      what: "erfc x at 0.5, 1 and 2",
      unit: "1",
      published: erfc,
      within: { relative: 1e-7 },
      source: "AbramowitzStegun1964",
      mark: "from memory",
    });
  });

  it("is the integral (2/√π) ∫ e^{−t² − 2xt} dt over t above zero", () => {
    for (const x of [0, 0.3, 1.7, 6]) {
      let sum = 0;
      const [end, parts] = [7, 20000];
      for (let i = 0; i < parts; i += 1) {
        const t = (end * (i + 0.5)) / parts;
        sum += Math.exp(-t * t - 2 * x * t) * (end / parts);
      }
      expect(scaledErfc(x)).toBeCloseToRelative((2 / Math.sqrt(Math.PI)) * sum, 1e-6);
    }
  });

  it("is 1 at zero and tends to 1/(x√π)", () => {
    expect(scaledErfc(0)).toBeCloseToRelative(1, 3e-16);
    expect(scaledErfc(1e9) * 1e9 * Math.sqrt(Math.PI)).toBeCloseToRelative(1, 1e-15);
    expect(scaledErfc(1e300)).toBeGreaterThan(0);
  });

  it("falls, and lies between its bounds by continued fractions", () => {
    // 2/(x + √(x² + 2)) < √π erfcx < 2/(x + √(x² + 4/π))
    const argument = fc.double({ min: 0.001, max: 1e4, noNaN: true });
    fc.assert(
      fc.property(argument, (x) => {
        const value = scaledErfc(x) * Math.sqrt(Math.PI);
        const low = 2 / (x + Math.sqrt(x * x + 2));
        const high = 2 / (x + Math.sqrt(x * x + 4 / Math.PI));
        return (
          value > low * (1 - 1e-15) && value < high * (1 + 1e-15) && scaledErfc(x * 1.001) < scaledErfc(x)
        );
      }),
      { seed },
    );
  });

  it.each([-1e-9, NaN, Infinity])("refuses %s", (x) => {
    expect(() => scaledErfc(x)).toThrow(PhysicsDomainError);
  });
});
