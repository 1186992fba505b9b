import { describe, expect, it } from "vitest";

import { solveColumn } from "../../../../shared/physics/column/solveColumn";
import type { ColumnInput } from "../../../../shared/physics/types";
import "../../../toBeCloseToRelative";
import { altitudesBetween, sampleColumn } from "./sampleColumns";
import { gradient, slowColumn } from "./slowColumn";

const samples: [string, ColumnInput][] = [
  ["a constant K", sampleColumn({ eddy: { kind: "constant", coefficient: 2e3 }, top: 260e3 })],
  ["a K that grows to its ceiling", sampleColumn({ top: 260e3 })],
  ["no K", sampleColumn({ eddy: { kind: "none" }, top: 260e3 })],
  ["a light main gas", sampleColumn({ fractions: { H2: 0.85, He: 0.14, CH4: 0.01, H: 1e-4 }, top: 900e3 })],
  [
    "points of T",
    sampleColumn({
      temperature: {
        kind: "points",
        altitudes: Float64Array.of(80e3, 120e3, 135e3, 180e3, 240e3),
        temperatures: Float64Array.of(160, 140, 190, 260, 275),
      },
      top: 260e3,
    }),
  ],
];

describe("the equations of the column", () => {
  it.each(samples)("hold to 1e-7 at every altitude, with %s", (_, input) => {
    const column = solveColumn(input);
    const step = 250; // m; by differences of the fourth order
    const knots = input.temperature.kind === "points" ? [...input.temperature.altitudes] : [];
    const logs = (z: number) => [...column.levelAt(z).logNumberDensities];
    for (const z of altitudesBetween(input.baseAltitude + 1e3, (input.top as number) - 1e3, 17)) {
      // Across a knot the fourth derivative does not exist.
      if (knots.some((knot) => Math.abs(knot - z) < 2 * step)) continue;
      const [a, b, c, d] = [z - 2 * step, z - step, z + step, z + 2 * step].map(logs);
      const expected = gradient(input, z, logs(z));
      expected.forEach((slope, i) => {
        const measured = (8 * (c[i] - b[i]) - (d[i] - a[i])) / (12 * step);
        expect(Math.abs(measured - slope)).toBeLessThan(1e-7 * Math.max(...expected.map(Math.abs)));
      });
    }
  });

  it.each(samples)("have the same solution by a slow route, with %s", (_, input) => {
    const column = solveColumn(input);
    const top = input.baseAltitude + 0.9 * ((input.top as number) - input.baseAltitude);
    const slow = slowColumn(input, top, 3000);
    const fast = column.levelAt(top).logNumberDensities;
    slow.forEach((value, i) => expect(Math.abs(fast[i] - value)).toBeLessThan(1e-6));
  });
});

describe("what a level is told to be", () => {
  const input = sampleColumn({ top: 400e3 });
  const column = solveColumn(input);

  it.each([100e3, 123.4e3, 250e3, 400e3])("fits together at %d m", (altitude) => {
    const level = column.levelAt(altitude);
    const sum = (values: Float64Array) => values.reduce((a, b) => a + b, 0);
    const boltzmann = 1.380649e-23; // CODATA 2022, exact
    expect(level.altitude).toBe(altitude);
    expect(level.radius).toBe(3.4e6 + altitude);
    expect(sum(level.moleFractions)).toBeCloseToRelative(1, 1e-15);
    expect(sum(level.numberDensities)).toBeCloseToRelative(level.numberDensity, 1e-13);
    expect(level.pressure).toBeCloseToRelative(level.numberDensity * boltzmann * level.temperature, 1e-13);
    expect(level.massDensity).toBeCloseToRelative(level.meanMass * level.numberDensity, 1e-15);
    expect(level.gravity).toBeCloseToRelative(4.2e13 / level.radius ** 2, 1e-14);
    const crossSections = input.gases.map((gas) => Math.PI * gas.collisionDiameter ** 2);
    const free =
      1 / (Math.SQRT2 * crossSections.reduce((s, sigma, i) => s + sigma * level.numberDensities[i], 0));
    expect(level.meanFreePath).toBeCloseToRelative(free, 1e-13);
    expect(level.knudsen).toBeCloseToRelative(free / level.scaleHeight, 1e-13);
    input.gases.forEach((gas, i) => {
      expect(level.scaleHeights[i] * gas.mass).toBeCloseToRelative(level.scaleHeight * level.meanMass, 1e-13);
      expect(Math.exp(level.logNumberDensities[i])).toBeCloseToRelative(level.numberDensities[i], 1e-12);
    });
  });

  it("starts from what was given", () => {
    const base = column.levelAt(100e3);
    expect(base.numberDensity).toBeCloseToRelative(1e20, 1e-13);
    expect(base.temperature).toBeCloseToRelative(140, 1e-14);
    expect(base.eddyCoefficient).toBeCloseToRelative(50, 1e-12);
    input.gases.forEach((gas, i) =>
      expect(base.moleFractions[i]).toBeCloseToRelative(gas.moleFraction, 1e-13),
    );
  });

  it("has the temperature gradient of its temperature", () => {
    const [below, at, above] = [199.99e3, 200e3, 200.01e3].map((z) => column.levelAt(z));
    expect(at.temperatureGradient).toBeCloseToRelative((above.temperature - below.temperature) / 20, 1e-7);
  });

  it("is the same in profiles, and keeps its order", () => {
    const altitudes = altitudesBetween(100e3, 400e3, 31);
    const profiles = column.profilesAt(altitudes);
    altitudes.forEach((altitude, k) => {
      const level = column.levelAt(altitude);
      expect(profiles.altitude[k]).toBe(altitude);
      expect(profiles.knudsen[k]).toBe(level.knudsen);
      expect(profiles.meanMass[k]).toBe(level.meanMass);
      input.gases.forEach((_, i) => {
        expect(profiles.gases[i].numberDensity[k]).toBe(level.numberDensities[i]);
        expect(profiles.gases[i].moleFraction[k]).toBe(level.moleFractions[i]);
        expect(profiles.gases[i].scaleHeight[k]).toBe(level.scaleHeights[i]);
      });
    });
  });

  it("stays as it was when other columns are solved after it", () => {
    const kept = solveColumn(sampleColumn());
    const untouched = [130e3, 210e3, 330e3].map((z) => solveColumn(sampleColumn()).levelAt(z));
    solveColumn(sampleColumn({ fractions: { H2: 0.9, He: 0.1 }, eddy: { kind: "none" } })).levelAt(150e3);
    solveColumn(sampleColumn({ fractions: { N2: 1 } })).levelAt(150e3);
    const later = [130e3, 210e3, 330e3].map((z) => kept.levelAt(z));
    expect(later).toEqual(untouched);
  });

  it.each([99.9e3, 400.1e3, NaN])("does not exist at %d m, outside the column", (altitude) => {
    expect(() => column.levelAt(altitude)).toThrow(/within the column, 100000 to 400000 m/);
  });
});

describe("gases that are absent", () => {
  it("change nothing, and are there with nothing", () => {
    const without = solveColumn(sampleColumn({ fractions: { CO2: 0.9, O: 0.1 } }));
    const input = sampleColumn({ fractions: { CO2: 0.9, He: 0, O: 0.1, D: 0 }, spread: 0 });
    const same = sampleColumn({ fractions: { CO2: 0.9, O: 0.1 }, spread: 0 });
    const [level, expected] = [input, same].map((column) => solveColumn(column).levelAt(180e3));
    expect([level.moleFractions[1], level.numberDensities[3]]).toEqual([0, 0]);
    expect(level.logNumberDensities[1]).toBe(-Infinity);
    expect(level.scaleHeights[1]).toBeCloseToRelative(
      (level.scaleHeight * level.meanMass) / input.gases[1].mass,
      1e-14,
    );
    expect(level.numberDensities[0]).toBe(expected.numberDensities[0]);
    expect(level.numberDensities[2]).toBe(expected.numberDensities[1]);
    expect(without.exobase.found).toBe(true);
  });
});
