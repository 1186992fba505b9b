import { describe, expect, it } from "vitest";
import {
  altitudeOfKnudsen,
  densityCurves,
  densityDecades,
  drawnRows,
  interpolateProfile,
} from "../../../../src/ui/plots/columnCurves";
import { ilmara, sampleColumn } from "../../fixtures/sampleColumn";

const { strip, profiles } = sampleColumn(ilmara);

describe("curves of a column", () => {
  it("are few points, ends included", () => {
    const rows = drawnRows(profiles, strip);
    expect(rows.length).toBeLessThanOrEqual(121);
    expect(rows[0]).toBe(0);
    expect(profiles.altitude![rows.at(-1)!]).toBeGreaterThanOrEqual(strip.top);
  });

  it("end just past the strip's top, however far the column goes", () => {
    const rows = drawnRows(profiles, { ...strip, top: 200e3 });
    expect(profiles.altitude![rows.at(-1)!]).toBeGreaterThan(200e3);
    expect(profiles.altitude![rows.at(-2)!]).toBeLessThanOrEqual(200e3);
  });

  it("meet at the exobase, where they change their line", () => {
    for (const { below, above } of densityCurves(profiles, strip, "SI")) {
      expect(below.y.at(-1)).toBe(strip.exobase! / 1000);
      expect([above.x[0], above.y[0]]).toEqual([below.x.at(-1), below.y.at(-1)]);
    }
  });

  it("are one curve each where there is no exobase", () => {
    for (const { above } of densityCurves(profiles, { ...strip, exobase: null }, "SI"))
      expect(above.x).toEqual([]);
  });

  it("are a million times thinner per cm³ than per m³", () => {
    const [perM3] = densityCurves(profiles, strip, "SI");
    const [perCm3] = densityCurves(profiles, strip, "cgs");
    expect(perCm3!.below.x[0]! / perM3!.below.x[0]!).toBeCloseTo(1e-6, 12);
  });

  it("have decades that hold the base and lose what is gone at the top", () => {
    const curves = densityCurves(profiles, strip, "SI");
    const [from, to] = densityDecades(curves);
    expect(10 ** to).toBeGreaterThan(curves[0]!.below.x[0]!);
    expect(Number.isInteger(from)).toBe(true);
    expect(to - from).toBeLessThan(16);
  });
});

describe("between the rows", () => {
  it("interpolates straight, or straight in the logarithm", () => {
    expect(interpolateProfile([0, 10], [1, 100], 5, false)).toBeCloseTo(50.5, 9);
    expect(interpolateProfile([0, 10], [1, 100], 5, true)).toBeCloseTo(10, 9);
    expect(interpolateProfile([0, 10], [1, 100], 50, true)).toBe(100);
    expect(interpolateProfile([0, 10], [1, 100], -5, true)).toBe(1);
  });

  it("finds where the Knudsen number has a value, and null where it never has", () => {
    const simple = { altitude: [0, 10, 20], knudsen: [0.01, 0.1, 10] };
    expect(altitudeOfKnudsen(simple, 0)).toBeCloseTo(15, 9);
    expect(altitudeOfKnudsen(simple, 2)).toBeNull();
  });
});
