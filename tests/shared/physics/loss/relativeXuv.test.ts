import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { julianYear } from "../../../../shared/physics/constants/iau";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { relativeXuv } from "../../../../shared/physics/loss/relativeXuv";
import { solarXuvExponent, type XuvHistory, xuvPieces } from "../../../../shared/physics/loss/xuvHistory";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";

const seed = 20261201;
const gyr = 1e9 * julianYear.value;
const sun: XuvHistory = { kind: "power", exponent: solarXuvExponent, saturationAge: 0.1 * gyr };
const table: XuvHistory = { kind: "table", ages: [0.1 * gyr, gyr, 4.56 * gyr], fluxes: [504, 29.7, 4.594] };

describe("relativeXuv", () => {
  it.each([
    // From an age of 4.56 Gyr.
    [3.5, 6],
    [2.5, 2.5],
  ])("of the Sun %s Gyr ago is %s", (ago, ratio) => {
    expect(relativeXuv(sun, (4.56 - ago) * gyr, 4.56 * gyr)).toAgreeWith({
      what: `the Sun's XUV ${ago} Gyr ago over today's`,
      unit: "1",
      published: ratio,
      within: { relative: 0.07 },
      source: "Ribas2005",
      mark: "published",
    });
  });

  it("is 6.02 and 2.66 by the law as it is printed", () => {
    // 29.7 τ^−1.23.
    expect(relativeXuv(sun, 1.06 * gyr, 4.56 * gyr)).toAgreeWith({
      what: "the Sun's XUV 3.5 Gyr ago, by the law as printed",
      unit: "1",
      published: 6.02,
      within: { relative: 1e-3 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
    expect(relativeXuv(sun, 2.06 * gyr, 4.56 * gyr)).toAgreeWith({
      what: "the Sun's XUV 2.5 Gyr ago, by the law as printed",
      unit: "1",
      published: 2.66,
      within: { relative: 1e-3 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("by a table of the law is the law", () => {
    const ages = [0.2, 0.9, 3, 7].map((t) => t * gyr);
    const fluxes = ages.map((t) => 29.7 * (t / gyr) ** -1.23);
    for (const t of [0.2, 0.5, 2.2, 6.9]) {
      const byTable = relativeXuv({ kind: "table", ages, fluxes }, t * gyr, 4.56 * gyr);
      expect(byTable).toBeCloseToRelative((t / 4.56) ** -1.23, 1e-13);
    }
  });

  it("stays as it was before saturation ends, and beyond the ends of a table", () => {
    const saturated = relativeXuv(sun, 0.1 * gyr, gyr);
    expect(saturated).toBeCloseToRelative(0.1 ** -1.23, 1e-13);
    for (const t of [0, 1e-9, 0.05, 0.0999]) expect(relativeXuv(sun, t * gyr, gyr)).toBe(saturated);
    expect(relativeXuv(table, 0, gyr)).toBeCloseToRelative(504 / 29.7, 1e-14);
    expect(relativeXuv(table, 12 * gyr, gyr)).toBeCloseToRelative(4.594 / 29.7, 1e-14);
  });

  it("never rises with age, and chains from age to age", () => {
    const age = fc.double({ min: 1e-3, max: 14, noNaN: true });
    fc.assert(
      fc.property(age, age, age, (a, b, c) => {
        const through = relativeXuv(sun, a * gyr, b * gyr) * relativeXuv(sun, b * gyr, c * gyr);
        const [young, old] = a < b ? [a, b] : [b, a];
        const isFalling = relativeXuv(sun, young * gyr, c * gyr) >= relativeXuv(sun, old * gyr, c * gyr);
        return isFalling && Math.abs(through / relativeXuv(sun, a * gyr, c * gyr) - 1) < 1e-14;
      }),
      { seed },
    );
  });

  it.each([-1, NaN, Infinity])("refuses an age of %s s", (age) => {
    expect(() => relativeXuv(sun, age, gyr)).toThrow(PhysicsDomainError);
    expect(() => relativeXuv(sun, gyr, age)).toThrow(PhysicsDomainError);
  });

  it("refuses age 0 where no saturation ends the rise", () => {
    expect(() => relativeXuv({ ...sun, saturationAge: 0 }, 0, gyr)).toThrow(PhysicsDomainError);
  });

  it.each<[string, XuvHistory]>([
    ["no rows", { kind: "table", ages: [], fluxes: [] }],
    ["rows of unequal length", { kind: "table", ages: [1, 2], fluxes: [1] }],
    ["ages that fall", { kind: "table", ages: [2, 1], fluxes: [1, 1] }],
    ["an age of zero", { kind: "table", ages: [0, 1], fluxes: [1, 1] }],
    ["a flux of zero", { kind: "table", ages: [1, 2], fluxes: [1, 0] }],
    ["no exponent", { kind: "power", exponent: NaN, saturationAge: 1 }],
    ["a negative age of saturation", { kind: "power", exponent: 1, saturationAge: -1 }],
  ])("refuses %s", (_, history) => {
    expect(() => relativeXuv(history, gyr, gyr)).toThrow(PhysicsDomainError);
  });
});

describe("xuvPieces", () => {
  it.each<[string, XuvHistory, number]>([
    ["a law with saturation", sun, 2],
    ["a law without", { ...sun, saturationAge: 0 }, 1],
    ["a table of three rows", table, 4],
  ])("of %s run from age 0 on without a gap", (_, history, count) => {
    const pieces = xuvPieces(history);
    expect(pieces).toHaveLength(count);
    expect(pieces[0].from).toBe(0);
    expect(pieces[count - 1].to).toBe(Infinity);
    for (let i = 1; i < count; i += 1) expect(pieces[i].from).toBe(pieces[i - 1].to);
  });
});
