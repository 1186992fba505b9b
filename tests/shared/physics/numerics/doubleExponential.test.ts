import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { integrateFromZero, integrateHalfLine } from "../../../../shared/physics/numerics/doubleExponential";
import "../../../toBeCloseToRelative";

const seed = 20261201;

describe("integrateHalfLine", () => {
  it.each([
    ["e^{−x}", (x: number) => Math.exp(-x), 3, 1],
    ["e^{−x²}", (x: number) => Math.exp(-x * x), 3, Math.sqrt(Math.PI) / 2],
    ["1/(1 + x)²", (x: number) => 1 / (1 + x) ** 2, 1, 1],
    ["√x/(1 + x)^{7/2}", (x: number) => Math.sqrt(x) / (1 + x) ** 3.5, 1, 4 / 15],
    ["1/(1 + x²)", (x: number) => 1 / (1 + x * x), 1, Math.PI / 2],
  ])("of %s is known", (_, f, scale, integral) => {
    expect(integrateHalfLine(f, scale)).toBeCloseToRelative(integral, 1e-12);
  });

  it("agrees with the midpoint rule on a bell", () => {
    const f = (x: number) => Math.exp(-x * x) / (1 + x);
    const [end, parts] = [7, 20000];
    let sum = 0;
    for (let i = 0; i < parts; i += 1) sum += f((end * (i + 0.5)) / parts) * (end / parts);
    expect(integrateHalfLine(f, 3)).toBeCloseToRelative(sum, 1e-7);
  });

  it("is nothing for nothing", () => {
    expect(integrateHalfLine(() => 0, 1)).toBe(0);
  });

  it("does not rest on the scale, within a factor of 3", () => {
    const scale = fc.double({ min: 1.2, max: 10, noNaN: true });
    fc.assert(
      fc.property(scale, (s) => Math.abs(integrateHalfLine((x) => Math.exp(-x), s) - 1) < 1e-11),
      { seed },
    );
  });

  it.each([0, -1, NaN, Infinity])("refuses a scale of %s", (scale) => {
    expect(() => integrateHalfLine((x) => Math.exp(-x), scale)).toThrow(PhysicsDomainError);
  });
});

describe("integrateFromZero", () => {
  it.each([
    ["√x to 2", (x: number) => Math.sqrt(x), 2, (2 / 3) * 2 ** 1.5],
    ["e^{−x} to 10", (x: number) => Math.exp(-x), 10, 1 - Math.exp(-10)],
    ["√(1 − x²) to 1", (x: number) => Math.sqrt((1 - x) * (1 + x)), 1, Math.PI / 4],
    ["1/(1 + x) to 100", (x: number) => 1 / (1 + x), 100, Math.log(101)],
  ])("of %s is known", (_, f, end, integral) => {
    expect(integrateFromZero(f, end)).toBeCloseToRelative(integral, 2e-12);
  });

  it("agrees with the midpoint rule on a fall", () => {
    const f = (x: number) => (x + 0.1) ** -1.5;
    const parts = 100000;
    let sum = 0;
    for (let i = 0; i < parts; i += 1) sum += f((9 * (i + 0.5)) / parts) * (9 / parts);
    expect(integrateFromZero(f, 9)).toBeCloseToRelative(sum, 1e-6);
  });

  it("is the width times the height of a constant, however narrow", () => {
    expect(integrateFromZero(() => 3, 1e-200)).toBeCloseToRelative(3e-200, 1e-12);
  });

  it("does not call beyond its ends", () => {
    const end = fc.double({ min: 1e-6, max: 1e9, noNaN: true });
    fc.assert(
      fc.property(end, (to) => {
        let isInside = true;
        integrateFromZero((x) => {
          isInside &&= x > 0 && x <= to;
          return 1;
        }, to);
        return isInside;
      }),
      { seed },
    );
  });

  it.each([0, -1, NaN, Infinity])("refuses an end at %s", (end) => {
    expect(() => integrateFromZero((x) => x, end)).toThrow(PhysicsDomainError);
  });
});
