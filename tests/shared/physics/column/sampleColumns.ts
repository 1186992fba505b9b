import { atomicMass, boltzmann } from "../../../../shared/physics/constants/codata2022";
import type {
  CollisionParameter,
  ColumnGas,
  ColumnInput,
  EddyProfile,
  TemperatureProfile,
} from "../../../../shared/physics/types";

/** Columns to try things on. The planet is invented: GM 4.2e13 m³ s⁻², radius 3,400 km. */

interface SampleGas {
  formula: string;
  molarMass: number;
  diameter: number;
  alpha: number;
}

/** Round numbers near those of real gases; what rests on exact ones states its own. */
export const sampleGases: readonly SampleGas[] = [
  { formula: "CO2", molarMass: 44, diameter: 3.8e-10, alpha: 0 },
  { formula: "N2", molarMass: 28, diameter: 3.6e-10, alpha: 0 },
  { formula: "Ar", molarMass: 40, diameter: 3.3e-10, alpha: 0 },
  { formula: "CO", molarMass: 28, diameter: 3.65e-10, alpha: 0 },
  { formula: "O2", molarMass: 32, diameter: 3.5e-10, alpha: 0 },
  { formula: "O", molarMass: 16, diameter: 2.75e-10, alpha: 0 },
  { formula: "H2", molarMass: 2, diameter: 2.9e-10, alpha: -0.25 },
  { formula: "H", molarMass: 1, diameter: 2.05e-10, alpha: -0.25 },
  { formula: "He", molarMass: 4, diameter: 2.6e-10, alpha: -0.4 },
  { formula: "Ne", molarMass: 20, diameter: 2.8e-10, alpha: 0 },
  { formula: "D", molarMass: 2, diameter: 2.05e-10, alpha: -0.25 },
  { formula: "CH4", molarMass: 16, diameter: 3.75e-10, alpha: 0 },
];

/** Gases by name with their mole fractions, which are made to add up to 1. */
export function gasesOf(fractions: Record<string, number>): ColumnGas[] {
  const sum = Object.values(fractions).reduce((total, fraction) => total + fraction, 0);
  return Object.entries(fractions).map(([formula, fraction]) => {
    const gas = sampleGases.find((candidate) => candidate.formula === formula);
    if (!gas) throw new Error(`There is no sample gas ${formula}.`);
    return {
      formula,
      mass: gas.molarMass * atomicMass.value,
      collisionDiameter: gas.diameter,
      thermalDiffusionFactor: gas.alpha,
      moleFraction: fraction / sum,
    };
  });
}

/** b = 1.5e20 (1/M₁ + 1/M₂)^½ (300 K)^(½−s) T^s for every pair; s differs from pair to pair if `spread` > 0. */
export function collisionParametersOf(gases: readonly ColumnGas[], spread = 0): CollisionParameter[][] {
  return gases.map((a, i) =>
    gases.map((b, j) => {
      const exponent = 0.5 + (spread * (((i + j) * 7 + i * j * 3) % 11)) / 10;
      const reduced = Math.sqrt(atomicMass.value / a.mass + atomicMass.value / b.mass);
      const coefficient = 1.5e20 * reduced * 300 ** (0.5 - exponent);
      return { coefficient, exponent, source: "given", isEstimate: false };
    }),
  );
}

export const batesOfSample = {
  kind: "bates",
  base: 140,
  exosphere: 220,
  shape: 3.5e-5,
  referenceAltitude: 100e3,
} as const satisfies TemperatureProfile;

export const risingEddy: EddyProfile = { kind: "power", base: 50, exponent: 0.5, ceiling: 3000 };

/** The fractions of the usual sample: a heavy main gas, some of its fragments, light traces. */
export const eightGases = { CO2: 0.93, N2: 0.03, Ar: 0.02, CO: 0.01, O2: 0.002, O: 0.008, H2: 1e-6, H: 1e-8 };

/** A column of the invented planet from 100 km up; what is given replaces the usual. */
export function sampleColumn({
  fractions = eightGases,
  spread = 0.35,
  ...given
}: Partial<ColumnInput> & { fractions?: Record<string, number>; spread?: number } = {}): ColumnInput {
  const gases = gasesOf(fractions);
  return {
    gravitationalParameter: 4.2e13,
    radius: 3.4e6,
    centrifugal: null,
    baseAltitude: 100e3,
    baseNumberDensity: 1e20,
    gases,
    collisionParameters: collisionParametersOf(gases, spread),
    temperature: batesOfSample,
    eddy: risingEddy,
    top: "auto",
    ...given,
  };
}

/** g at the base of a column, without the centrifugal term. */
export function baseGravity({ gravitationalParameter, radius, baseAltitude }: ColumnInput): number {
  return gravitationalParameter / (radius + baseAltitude) ** 2;
}

/** Geopotential height above the base of a column. */
export function geopotential({ radius, baseAltitude }: ColumnInput, altitude: number): number {
  return ((altitude - baseAltitude) * (radius + baseAltitude)) / (radius + altitude);
}

/** kT/(mg) at the base. */
export function baseScaleHeight(input: ColumnInput, mass: number, temperature: number): number {
  return (boltzmann.value * temperature) / (mass * baseGravity(input));
}

/** Altitudes in equal steps, ends included. */
export function altitudesBetween(from: number, to: number, count: number): Float64Array {
  return Float64Array.from({ length: count }, (_, k) =>
    k === count - 1 ? to : from + ((to - from) * k) / (count - 1),
  );
}
