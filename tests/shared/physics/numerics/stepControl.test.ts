import { describe, expect, it } from "vitest";

import { growthAfter, rememberStep, shrinkAfter } from "../../../../shared/physics/numerics/stepControl";
import "../../../toBeCloseToRelative";

describe("growthAfter", () => {
  it("aims at 0.85⁸ of the tolerance where the error goes as the eighth power of the step", () => {
    // e = (h/h₀)⁸ on a straight course: the next step is 0.85 h₀, twice in a row.
    const memory = { step: 0.5, error: 0.5 ** 8 };
    const factor = growthAfter(0.7, 0.7 ** 8, memory);
    expect(0.7 * factor).toBeCloseToRelative(0.85, 0.15);
    expect(0.7 * factor).toBeLessThanOrEqual(0.85);
  });

  it("never more than quadruples, whatever the error", () => {
    expect(growthAfter(1, 0, { step: 0, error: 1 })).toBe(4);
    expect(growthAfter(1, 1e-30, { step: 1, error: 1e-30 })).toBeLessThanOrEqual(4);
  });

  it("foresees that an error which has grown will grow on", () => {
    const growing = growthAfter(1, 0.5, { step: 1, error: 0.01 });
    const steady = growthAfter(1, 0.5, { step: 1, error: 0.5 });
    expect(growing).toBeLessThan(steady);
  });
});

describe("shrinkAfter", () => {
  it("takes the eighth root of the error, with a margin", () => {
    expect(shrinkAfter(256)).toBeCloseToRelative(0.425, 1e-14);
  });

  it("always makes the step smaller, and by ten where the error is not a number", () => {
    expect(shrinkAfter(1.0000001)).toBeLessThan(0.9);
    expect(shrinkAfter(NaN)).toBe(0.1);
    expect(shrinkAfter(Infinity)).toBe(0.1);
    expect(shrinkAfter(1e60)).toBe(0.1);
  });
});

describe("rememberStep", () => {
  it("keeps the step and an error that is not taken for less than rounding", () => {
    const memory = { step: 0, error: 1 };
    rememberStep(memory, 3, 0);
    expect(memory).toEqual({ step: 3, error: 1e-10 });
  });
});
