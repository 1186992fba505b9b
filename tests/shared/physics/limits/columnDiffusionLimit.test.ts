import { describe, expect, it } from "vitest";

import { solveColumn } from "../../../../shared/physics/column/solveColumn";
import { atomicMass, boltzmann } from "../../../../shared/physics/constants/codata2022";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { collisionParameter } from "../../../../shared/physics/handbook/collisionParameter";
import { findGas } from "../../../../shared/physics/handbook/handbookGases";
import { columnDiffusionLimit } from "../../../../shared/physics/limits/columnDiffusionLimit";
import { limitLevel } from "../../../../shared/physics/limits/limitLevel";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";
import { eightGases, sampleColumn } from "../column/sampleColumns";

const mixed = solveColumn(sampleColumn());
const still = solveColumn(sampleColumn({ eddy: { kind: "none" } }));
const indexOf = (formula: string): number => Object.keys(eightGases).indexOf(formula);
const exobaseRadius = 3.6e6;

const fluxOf = (limit: ReturnType<typeof columnDiffusionLimit>): number => (limit.exists ? limit.flux : NaN);

describe("columnDiffusionLimit", () => {
  it("of two gases is Hunten's b X [(m_a − m) g/kT − α T′/T], by hand", () => {
    // Hunten (1973): with one other gas n D is b itself.
    const two = solveColumn(sampleColumn({ fractions: { CO2: 0.999, H2: 0.001 } }));
    const homopause = two.homopauses[1];
    const level = two.levelAt(homopause.found ? homopause.altitude : NaN);
    const [co2, h2] = two.input.gases;
    const { coefficient, exponent } = two.input.collisionParameters[0][1];
    const lift = ((co2.mass - h2.mass) * level.gravity) / (boltzmann.value * level.temperature);
    const expected =
      coefficient *
      level.temperature ** exponent *
      level.moleFractions[1] *
      (lift + (0.25 * level.temperatureGradient) / level.temperature) *
      (level.radius / exobaseRadius) ** 2;
    expect(fluxOf(columnDiffusionLimit(two, 1, exobaseRadius))).toBeCloseToRelative(expected, 1e-12);
  });

  it("takes the mean mass of the other gases and Blanc's law for a mixture", () => {
    const gas = indexOf("H2");
    const { level } = limitLevel(mixed, gas);
    const { gases, collisionParameters } = mixed.input;
    let [amount, mass, resistance] = [0, 0, 0];
    level.moleFractions.forEach((fraction, j) => {
      if (j === gas) return;
      const { coefficient, exponent } = collisionParameters[gas][j];
      amount += fraction;
      mass += fraction * gases[j].mass;
      resistance += fraction / (coefficient * level.temperature ** exponent);
    });
    const lift = ((mass / amount - gases[gas].mass) * level.gravity) / (boltzmann.value * level.temperature);
    const thermal = (0.25 * level.temperatureGradient) / level.temperature;
    const spread = (level.radius / exobaseRadius) ** 2;
    const expected = ((amount * level.moleFractions[gas]) / resistance) * (lift + thermal) * spread;
    expect(fluxOf(columnDiffusionLimit(mixed, gas, exobaseRadius))).toBeCloseToRelative(expected, 1e-12);
  });

  it.each([
    // b/H_a (1 − m/m_a) at 120 km on Mars, g 3.470 m/s², M 43.34, in cm⁻² s⁻¹ over X.
    ["H2", 140, 1.118e13],
    ["H2", 200, 1.023e13],
    ["H", 140, 2.026e13],
    ["H", 200, 1.754e13],
  ])("of %s on Mars at %s K is %s cm⁻² s⁻¹ over its mixing ratio", (formula, temperature, fluxCm) => {
    const [light, main] = [findGas(formula)!, findGas("CO2")!];
    const gases = [
      { ...main, mass: 43.34 * atomicMass.value, moleFraction: 1 - 1e-6 },
      { ...light, thermalDiffusionFactor: 0, moleFraction: 1e-6 },
    ];
    const mars = sampleColumn({
      // A gravity of 3.470 m/s² at 120 km; the handbook's Mars has 3.477.
      gravitationalParameter: 3.47 * 3509.5e3 ** 2,
      radius: 3389.5e3,
      baseAltitude: 120e3,
      temperature: { kind: "constant", temperature },
      eddy: { kind: "none" },
    });
    const collisionParameters = gases.map((a) => gases.map((b) => collisionParameter(a, b)));
    const column = solveColumn({ ...mars, gases, collisionParameters });
    const flux = fluxOf(columnDiffusionLimit(column, 1, mars.radius + 120e3));
    expect(flux / 1e-6).toAgreeWith({
      what: `diffusion limit over X of ${formula} on Mars at 120 km, ${temperature} K`,
      unit: "m⁻² s⁻¹",
      published: fluxCm * 1e4,
      within: { relative: 1e-3 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("of a trace gas hardly depends on where the homopause is put", () => {
    const higher = solveColumn(sampleColumn({ eddy: { kind: "constant", coefficient: 1e4 } }));
    const gas = indexOf("H");
    const ratio =
      fluxOf(columnDiffusionLimit(higher, gas, exobaseRadius)) /
      fluxOf(columnDiffusionLimit(mixed, gas, exobaseRadius));
    expect(ratio).toBeGreaterThan(0.5);
    expect(ratio).toBeLessThan(2);
  });

  it("is taken at the base, with a remark, where nothing mixes", () => {
    const limit = columnDiffusionLimit(still, indexOf("H"), exobaseRadius);
    expect(limit).toMatchObject({ exists: true, isAtHomopause: false, altitude: 100e3 });
    expect(limit.exists && limit.notes[0]).toMatchObject({ level: "remark", code: "limits_at_base" });
    expect(limit.exists && limit.notes[0].message).toContain("no eddy mixing");
    expect(columnDiffusionLimit(mixed, indexOf("H"), exobaseRadius)).toMatchObject({
      isAtHomopause: true,
      notes: [],
    });
  });

  it("is left out for the heavy gases and for a gas that is alone", () => {
    expect(columnDiffusionLimit(mixed, indexOf("CO2"), exobaseRadius)).toEqual({
      exists: false,
      reason: "not_lighter",
    });
    const alone = solveColumn(sampleColumn({ fractions: { N2: 1 } }));
    expect(columnDiffusionLimit(alone, 0, exobaseRadius)).toEqual({ exists: false, reason: "no_other_gas" });
  });

  it.each([0, -1, NaN])("refuses an exobase radius of %s m", (radius) => {
    expect(() => columnDiffusionLimit(mixed, indexOf("H"), radius)).toThrow(PhysicsDomainError);
  });
});

describe("limitLevel", () => {
  it("is the homopause where there is one, and the base elsewhere", () => {
    const gas = indexOf("H2");
    const homopause = mixed.homopauses[gas];
    expect(homopause.found && limitLevel(mixed, gas).level.altitude).toBe(
      homopause.found && homopause.altitude,
    );
    expect(limitLevel(still, gas).level.altitude).toBe(100e3);
  });

  it("says why there is none", () => {
    const strong = solveColumn(sampleColumn({ eddy: { kind: "constant", coefficient: 1e25 } }));
    expect(limitLevel(strong, 0).notes[0].message).toContain("outdoes diffusion up to the top");
    const weak = solveColumn(sampleColumn({ eddy: { kind: "constant", coefficient: 1e-6 } }));
    expect(limitLevel(weak, 0).notes[0].message).toContain("outdoes eddy mixing from the base up");
    const alone = solveColumn(sampleColumn({ fractions: { N2: 1 } }));
    expect(limitLevel(alone, 0).notes[0].message).toContain("the only gas");
  });
});
