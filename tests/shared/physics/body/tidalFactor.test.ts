import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { tidalFactor } from "../../../../shared/physics/body/tidalFactor";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";

const seed = 20261201;

describe("tidalFactor", () => {
  it.each([
    // K(ξ) = 1 − 3/(2ξ) + 1/(2ξ³) of Erkaev et al. (2007) by hand.
    [1.5, 4 / 27],
    [2, 0.3125],
    [4, 0.6328125],
    [5, 0.704],
    [10, 0.8505],
    [20, 0.9250625],
  ])("at ξ = %s is %s", (xi, factor) => {
    expect(tidalFactor({ hillRadius: xi * 7e7, xuvRadius: 7e7 })).toAgreeWith({
      what: "tidal factor K(ξ), ξ from 1.5 to 20",
      unit: "1",
      published: factor,
      within: { relative: 1e-12 },
      source: "Erkaev2007",
      mark: "computed independently",
    });
  });

  it("is the climb to the Hill radius over the climb to infinity, in the star's tide", () => {
    // Work against GM(1/r² − r/r_H³), from R to r_H, over GM/R; midpoint rule.
    const [radius, hill, parts] = [1, 3.7, 20000];
    let work = 0;
    for (let i = 0; i < parts; i += 1) {
      const r = radius + ((hill - radius) * (i + 0.5)) / parts;
      work += ((1 / r ** 2 - r / hill ** 3) * (hill - radius)) / parts;
    }
    expect(tidalFactor({ hillRadius: hill, xuvRadius: radius })).toBeCloseToRelative(work, 1e-7);
  });

  it("tends to 1 far from the star and to 0 at the edge of the Hill sphere", () => {
    expect(tidalFactor({ hillRadius: 1e9, xuvRadius: 1 })).toBeCloseToRelative(1, 2e-9);
    expect(tidalFactor({ hillRadius: 1 + 1e-9, xuvRadius: 1 })).toBeLessThan(2e-18);
  });

  it("grows with the Hill radius and stays between 0 and 1", () => {
    const ratio = fc.double({ min: 1.000001, max: 1e6, noNaN: true });
    fc.assert(
      fc.property(ratio, ratio, (a, b) => {
        const [near, far] = a < b ? [a, b] : [b, a];
        const low = tidalFactor({ hillRadius: near, xuvRadius: 1 });
        const high = tidalFactor({ hillRadius: far, xuvRadius: 1 });
        return low > 0 && high <= 1 && low <= high + 1e-15;
      }),
      { seed },
    );
  });

  it("refuses an absorption radius outside the Hill sphere, and says so", () => {
    expect(() => tidalFactor({ hillRadius: 1, xuvRadius: 1 })).toThrow(
      /above the radius of XUV absorption, 1 m/,
    );
    expect(() => tidalFactor({ hillRadius: 1, xuvRadius: 2 })).toThrow(PhysicsDomainError);
    expect(() => tidalFactor({ hillRadius: NaN, xuvRadius: 1 })).toThrow(PhysicsDomainError);
    expect(() => tidalFactor({ hillRadius: 1, xuvRadius: 0 })).toThrow(PhysicsDomainError);
  });
});
