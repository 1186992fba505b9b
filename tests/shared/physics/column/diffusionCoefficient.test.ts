import { describe, expect, it } from "vitest";

import { diffusionCoefficient } from "../../../../shared/physics/column/diffusionCoefficient";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import "../../../toBeCloseToRelative";
import { sampleColumn } from "./sampleColumns";

const column = sampleColumn({ fractions: { CO2: 0.6, N2: 0.4, H: 0 } });
const level = (moleFractions: number[]) => ({
  temperature: 250,
  numberDensity: 3e17,
  moleFractions: Float64Array.from(moleFractions),
});
const pair = (i: number, j: number) => {
  const { coefficient, exponent } = column.collisionParameters[i][j];
  return (coefficient * 250 ** exponent) / 3e17;
};

describe("diffusionCoefficient", () => {
  it("is b/n for a gas in one other, however much of it there is", () => {
    for (const share of [0, 1e-6, 0.5, 0.999]) {
      expect(diffusionCoefficient(column, level([1 - share, 0, share]), 2)).toBeCloseToRelative(
        pair(2, 0),
        1e-14,
      );
    }
  });

  it("is the weighted harmonic mean in a mixture, the gas itself left out", () => {
    const expected = 1 / (0.6 / pair(2, 0) + 0.4 / pair(2, 1));
    expect(diffusionCoefficient(column, level([0.6, 0.4, 0]), 2)).toBeCloseToRelative(expected, 1e-14);
    expect(diffusionCoefficient(column, level([0.3, 0.2, 0.5]), 2)).toBeCloseToRelative(expected, 1e-14);
  });

  it("falls in proportion to the density", () => {
    const thin = { ...level([0.6, 0.4, 0]), numberDensity: 3e15 };
    expect(
      diffusionCoefficient(column, thin, 2) / diffusionCoefficient(column, level([0.6, 0.4, 0]), 2),
    ).toBeCloseToRelative(100, 1e-13);
  });

  it("is refused where there is nothing else", () => {
    expect(() => diffusionCoefficient(column, level([0, 0, 1]), 2)).toThrow(PhysicsDomainError);
  });
});
