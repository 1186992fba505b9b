import { describe, expect, it } from "vitest";

import { solveColumn } from "../../../../shared/physics/column/solveColumn";
import type { Column, ColumnInput, ColumnLevel, ExobaseCriterion } from "../../../../shared/physics/types";
import "../../../toBeCloseToRelative";
import { altitudesBetween, baseGravity, geopotential, sampleColumn } from "../column/sampleColumns";

function foundIn(column: Column) {
  if (!column.exobase.found) throw new Error(`No exobase: ${column.exobase.message}`);
  return column.exobase;
}

describe("the exobase", () => {
  it("is where the mean free path equals the scale height, found to a micrometre", () => {
    const column = solveColumn(sampleColumn());
    const { level, lower, upper } = foundIn(column);
    expect(level.meanFreePath).toBeCloseToRelative(level.scaleHeight, 1e-12);
    const [below, above] = [-1e-6, 1e-6].map((shift) => column.levelAt(level.altitude + shift).knudsen);
    expect(below).toBeLessThan(1);
    expect(above).toBeGreaterThan(1);
    expect(column.levelAt(lower ?? NaN).knudsen).toBeCloseToRelative(0.1, 1e-12);
    expect(column.levelAt(upper ?? NaN).knudsen).toBeCloseToRelative(10, 1e-12);
  });

  /**
   * One gas, isothermal: Kn = (l₀/H₀)(r₀/r)² e^{h/H₀}, whose root is found here by bisection in r.
   */
  it("lies where a closed form has it for one isothermal gas", () => {
    const temperature = { kind: "constant", temperature: 250 } as const;
    const input = sampleColumn({ fractions: { N2: 1 }, temperature });
    const [gas] = input.gases;
    const scaleHeight = (1.380649e-23 * 250) / (gas.mass * baseGravity(input));
    const free = 1 / (Math.SQRT2 * Math.PI * gas.collisionDiameter ** 2 * input.baseNumberDensity);
    const knudsen = (z: number) =>
      (free / scaleHeight) *
      ((input.radius + input.baseAltitude) / (input.radius + z)) ** 2 *
      Math.exp(geopotential(input, z) / scaleHeight);
    for (const [value, altitude] of [
      [1, foundIn(solveColumn(input)).level.altitude],
      [0.1, foundIn(solveColumn(input)).lower],
      [10, foundIn(solveColumn(input)).upper],
    ] as [number, number][]) {
      let [low, high] = [input.baseAltitude, 2000e3];
      for (let k = 0; k < 80; k += 1) {
        const middle = (low + high) / 2;
        if (knudsen(middle) < value) low = middle;
        else high = middle;
      }
      expect(Math.abs(altitude - low)).toBeLessThan(1e-3);
    }
  });

  it("rises as the gas grows hotter, denser or its molecules larger", () => {
    const altitude = (given: Parameters<typeof sampleColumn>[0]) =>
      foundIn(solveColumn(sampleColumn({ fractions: { N2: 1 }, ...given }))).level.altitude;
    const temperatures = [150, 200, 300, 400].map((temperature) =>
      altitude({ temperature: { kind: "constant", temperature } }),
    );
    const densities = [1e17, 1e18, 1e19, 1e20].map((baseNumberDensity) => altitude({ baseNumberDensity }));
    for (const list of [temperatures, densities]) expect(list).toEqual([...list].sort((a, b) => a - b));
    const [gas] = sampleColumn({ fractions: { N2: 1 } }).gases;
    const small = altitude({ gases: [{ ...gas, collisionDiameter: 2e-10 }] });
    expect(small).toBeLessThan(altitude({}));
  });

  it("has its band cut where the column ends", () => {
    const whole = foundIn(solveColumn(sampleColumn()));
    const top = whole.level.altitude + 1e3;
    const cut = foundIn(solveColumn(sampleColumn({ top })));
    expect(cut.level.altitude).toBeCloseToRelative(whole.level.altitude, 1e-10);
    expect(cut.upper).toBeNull();
    const start = solveColumn(sampleColumn()).levelAt((whole.lower ?? NaN) + 1e3);
    const gases = sampleColumn().gases.map((gas, i) => ({ ...gas, moleFraction: start.moleFractions[i] }));
    const base = { baseAltitude: start.altitude, baseNumberDensity: start.numberDensity, gases };
    expect(foundIn(solveColumn(sampleColumn(base))).lower).toBeNull();
  });
});

describe("several exobases", () => {
  // Hydrogen, an eighth as wide and 40 times as light, takes over from argon near Kn = 1.
  const separated = (share: number) =>
    sampleColumn({
      fractions: { Ar: 1, H: share },
      eddy: { kind: "none" },
      temperature: { kind: "constant", temperature: 120 },
      baseNumberDensity: 1e18,
      top: 2500e3,
    });

  /** Upward passages of Kn = 1, seen by sampling every 200 m. */
  function passages(column: Column): number[] {
    const altitudes = altitudesBetween(column.input.baseAltitude, column.topAltitude, 12_001);
    const { knudsen } = column.profilesAt(altitudes);
    return [...altitudes].filter((_, k) => k > 0 && knudsen[k - 1] < 1 && knudsen[k] >= 1);
  }

  it("give the last one before Kn = 10 and name the others", () => {
    let seen = 0;
    for (let exponent = -7; exponent <= -3; exponent += 0.25) {
      const column = solveColumn(separated(10 ** exponent));
      const expected = passages(column);
      const { exobase } = column;
      if (!exobase.found) continue;
      const first = exobase.upper ?? Infinity;
      const before = expected.filter((altitude) => altitude < first);
      const all = [...exobase.otherAltitudes, exobase.level.altitude];
      expect(all.length).toBe(before.length);
      all.forEach((altitude, k) => expect(Math.abs(altitude - before[k])).toBeLessThan(400));
      if (all.length > 1) {
        seen += 1;
        expect(exobase.notes).toMatchObject([{ level: "caution", code: "several_exobases" }]);
      } else expect(exobase.notes).toEqual([]);
    }
    expect(seen).toBeGreaterThan(0);
  });
});

describe("a column without an exobase", () => {
  const hot = (temperature: number, given: Partial<ColumnInput> = {}) =>
    sampleColumn({ fractions: { H: 1 }, temperature: { kind: "constant", temperature }, ...given });

  it("says that its base lies above it", () => {
    const column = solveColumn(sampleColumn({ baseNumberDensity: 1e12 }));
    expect(column.exobase).toMatchObject({ found: false, reason: "base_above_exobase" });
    expect(column.levelAt(column.topAltitude).numberDensity).toBeGreaterThan(0);
  });

  it("says that its base is unbound: λ below 2", () => {
    // λ = GMm/(kTr): with m = 1 u and r = 3,500 km, 2 at 721.6 K.
    const unbound = solveColumn(hot(730));
    expect(unbound.exobase).toMatchObject({ found: false, reason: "base_unbound" });
    expect(unbound.exobase.found || unbound.exobase.message).toContain("1.977");
    expect(solveColumn(hot(723)).exobase).toMatchObject({ found: false, reason: "base_unbound" });
    const bound = solveColumn(hot(720)).exobase;
    expect(bound).not.toMatchObject({ reason: "base_unbound" });
  });

  it("uses the lowest temperature further up for that", () => {
    const cooling = {
      kind: "points",
      altitudes: Float64Array.of(100e3, 300e3),
      temperatures: Float64Array.of(900, 250),
    } as const;
    expect(solveColumn(hot(0, { temperature: cooling, baseNumberDensity: 5e12 })).exobase).toMatchObject({
      found: true,
    });
  });

  it("says how near it came where it runs away", () => {
    const column = solveColumn(hot(500, { baseNumberDensity: 1e22 }));
    const { exobase } = column;
    if (exobase.found) throw new Error("It has none.");
    expect(exobase.reason).toBe("runaway");
    // Isothermal, one gas: Kn is largest where λ = 2, r = GMm/(2kT).
    const summit = (4.2e13 * column.input.gases[0].mass) / (2 * 1.380649e-23 * 500);
    expect(exobase.altitudeOfLargest + 3.4e6).toBeCloseToRelative(summit, 1e-7);
    expect(column.topAltitude).toBeGreaterThanOrEqual(exobase.altitudeOfLargest);
    expect(column.levelAt(exobase.altitudeOfLargest).knudsen).toBeCloseToRelative(
      exobase.largestKnudsen,
      1e-9,
    );
    expect(exobase.largestKnudsen).toBeLessThan(1);
  });

  it("says that its top is too low, and how far Kn came", () => {
    const column = solveColumn(sampleColumn({ top: 150e3 }));
    expect(column.exobase).toMatchObject({ found: false, reason: "top_below_exobase" });
    if (column.exobase.found) return;
    expect(column.exobase.altitudeOfLargest).toBeCloseToRelative(150e3, 1e-12);
    expect(column.exobase.largestKnudsen).toBeCloseToRelative(column.levelAt(150e3).knudsen, 1e-10);
    expect(column.exobase.message).toMatch(/top, 150 km/);
  });

  it.each([
    solveColumn(sampleColumn({ baseNumberDensity: 1e12 })),
    solveColumn(hot(730)),
    solveColumn(hot(500, { baseNumberDensity: 1e22 })),
    solveColumn(sampleColumn({ top: 150e3 })),
  ])("still has its levels (case %#)", (column) => {
    const { input, topAltitude } = column;
    for (const altitude of altitudesBetween(input.baseAltitude, topAltitude, 5)) {
      expect(column.levelAt(altitude).knudsen).toBeGreaterThan(0);
    }
    expect(column.exobase.found || column.exobase.message).toMatch(/^The .*\.$/);
  });
});

describe("an exobase by another criterion", () => {
  const column = solveColumn(sampleColumn());
  const by = (criterion: ExobaseCriterion, of = column) => {
    const outcome = of.exobaseBy(criterion);
    if (!outcome.found) throw new Error(`No exobase: ${outcome.message}`);
    return outcome;
  };
  const area = (of: Column, i: number, j: number) =>
    Math.PI * ((of.input.gases[i].collisionDiameter + of.input.gases[j].collisionDiameter) / 2) ** 2;

  it("is the column's own by the bulk criterion", () => {
    expect(column.exobaseBy({ kind: "bulk" })).toBe(column.exobase);
  });

  it("lies lower without √2, where l/H of the bulk is 1/√2", () => {
    const simple = by({ kind: "simple" });
    expect(simple.level.knudsen).toBeCloseToRelative(1 / Math.SQRT2, 1e-12);
    expect(simple.level.altitude).toBeLessThan(foundIn(column).level.altitude);
  });

  it.each(["CO2", "O", "H"])(
    "is where the mean free path of %s in the mixture is its scale height",
    (formula) => {
      const { level } = by({ kind: "gas", formula });
      const gas = column.input.gases.findIndex((candidate) => candidate.formula === formula);
      const collisions = column.input.gases.reduce(
        (sum, { mass }, j) =>
          sum +
          level.numberDensities[j] *
            area(column, gas, j) *
            Math.sqrt(1 + column.input.gases[gas].mass / mass),
        0,
      );
      expect(1 / collisions).toBeCloseToRelative(level.scaleHeights[gas], 1e-12);
    },
  );

  it("lies higher for a lighter gas", () => {
    const altitudes = ["CO2", "O2", "H2", "H"].map((formula) => by({ kind: "gas", formula }).level.altitude);
    expect(altitudes).toEqual([...altitudes].sort((a, b) => a - b));
  });

  it("is where a particle on its way out collides once, by unit depth", () => {
    const cold = solveColumn(
      sampleColumn({ fractions: { CO2: 0.9, O: 0.1 }, temperature: { kind: "constant", temperature: 150 } }),
    );
    const { level } = by({ kind: "unit_depth" }, cold);
    // Isothermal and without mixing above: the depth by Simpson's rule along the column itself.
    const [parts, reach] = [2000, level.altitude + 900e3];
    const high = solveColumn({ ...cold.input, eddy: { kind: "none" }, top: 1300e3, ...startAt(level) });
    const step = (reach - level.altitude) / parts;
    let depth = 0;
    for (let k = 0; k <= parts; k += 1) {
      const weight = k === 0 || k === parts ? 1 : k % 2 === 1 ? 4 : 2;
      const { numberDensities } = high.levelAt(level.altitude + k * step);
      depth += (weight * step * numberDensities.reduce((sum, n, i) => sum + n * area(cold, i, i), 0)) / 3;
    }
    expect(depth).toBeCloseToRelative(1, 1e-5);

    function startAt({ altitude, numberDensity, moleFractions }: ColumnLevel): Partial<ColumnInput> {
      const gases = cold.input.gases.map((gas, i) => ({ ...gas, moleFraction: moleFractions[i] }));
      return { gases, baseAltitude: altitude, baseNumberDensity: numberDensity };
    }
  });

  it("has the band of the bulk all the same", () => {
    for (const criterion of [{ kind: "gas", formula: "CO2" }, { kind: "unit_depth" }] as ExobaseCriterion[]) {
      const { lower, upper } = by(criterion);
      expect([lower, upper]).toEqual([foundIn(column).lower, foundIn(column).upper]);
    }
  });

  it("is found above Kn = 10 as well, where the criterion has it there", () => {
    const pure = solveColumn(
      sampleColumn({
        fractions: { CO2: 1, H: 1e-20 },
        temperature: { kind: "constant", temperature: 200 },
        eddy: { kind: "none" },
      }),
    );
    const { level } = by({ kind: "gas", formula: "H" }, pure);
    // l_H/H_H over l/H: √2 (2·3.8/(3.8 + 2.05))² / √(1 + 1/44) · 1/44
    const ratio = (Math.SQRT2 * (7.6 / 5.85) ** 2) / Math.sqrt(45 / 44) / 44;
    expect(level.knudsen).toBeCloseToRelative(1 / ratio, 1e-9);
    expect(level.knudsen).toBeGreaterThan(10);
  });

  it("is told by its name where there is none", () => {
    const low = solveColumn(sampleColumn({ top: 150e3 })).exobaseBy({ kind: "gas", formula: "H" });
    expect(low).toMatchObject({ found: false, reason: "top_below_exobase" });
    expect(low.found || low.message).toMatch(
      /^The mean free path of H over its scale height is still below 1/,
    );
    const deep = solveColumn(sampleColumn({ baseNumberDensity: 1e12 })).exobaseBy({ kind: "unit_depth" });
    expect(deep).toMatchObject({ found: false, reason: "base_above_exobase" });
    expect(deep.found || deep.message).toMatch(/^The inverse of the collisional depth/);
  });

  it("leaves the column as it was", () => {
    const fresh = solveColumn(sampleColumn());
    const before = fresh.levelAt(fresh.topAltitude);
    fresh.exobaseBy({ kind: "gas", formula: "H" });
    expect(fresh.levelAt(fresh.topAltitude)).toEqual(before);
  });
});
