import { describe, expect, it } from "vitest";
import { coronaDensityAt, type ColumnCorona } from "../../../../src/lib/columnCorona";
import { stripDots } from "../../../../src/ui/strip/stripDots";
import { sampleStrip } from "../../../../src/ui/strip/stripSample";
import { stripScale } from "../../../../src/ui/strip/stripScale";
import { stripWithCoronae } from "../../../../src/ui/strip/stripWithCoronae";
import { ilmara, sampleColumn } from "../../fixtures/sampleColumn";

const { strip } = sampleColumn(ilmara);

/** Made by hand, far denser than the column's hydrogen, so that it shows. */
const halo: ColumnCorona = {
  gas: "H",
  cell: "halo",
  share: 0.99,
  densityBelow: 1.01e16,
  altitude: [strip.exobase!, 400e3, 1000e3],
  numberDensity: [1e16, 1e15, 1e14],
};
const drawn = stripWithCoronae(strip, [halo]);
const densityOf = (gas: string, of: typeof strip, altitude: number) => {
  const sample = sampleStrip(of, altitude);
  return sample.moleFractions[of.gases.indexOf(gas)]! * 10 ** sample.log10NumberDensity;
};
const levels = strip.altitude;
const above = levels.find((altitude) => altitude > 450e3)!;
const below = levels.findLast((altitude) => altitude < strip.exobase!)!;

describe("a strip with a corona", () => {
  it("has the corona's density of its gas above the exobase, and its own of all others", () => {
    expect(densityOf("H", drawn, above)).toBeCloseTo(coronaDensityAt(halo, above)!, -9);
    const others = densityOf("O", drawn, above) / densityOf("O", strip, above);
    expect(others).toBeCloseTo(1, 9);
  });

  it("stays as it is below the exobase, and without a corona of its gases", () => {
    expect(sampleStrip(drawn, below)).toEqual(sampleStrip(strip, below));
    expect(stripWithCoronae(strip, [])).toBe(strip);
    expect(stripWithCoronae(strip, [{ ...halo, gas: "Xe" }])).toBe(strip);
  });

  it("draws its dots by it", () => {
    const scale = stripScale(strip.base, strip.top, 600);
    const count = (of: typeof strip) =>
      stripDots(of, scale, 104, 5)
        .filter(({ gas }) => gas === "H")
        .reduce((sum, { dots }) => sum + dots.length, 0);
    expect(count(drawn)).toBeGreaterThan(count(strip));
  });
});

it("reads a corona straight in its logarithm between its levels, and nothing below them", () => {
  expect(coronaDensityAt(halo, 700e3)).toBeCloseTo(10 ** 14.5, -6);
  expect(coronaDensityAt(halo, strip.exobase! - 1)).toBeNull();
  expect(coronaDensityAt(halo, 2000e3)).toBe(1e14);
});
