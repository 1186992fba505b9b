import { expect } from "vitest";

import published from "../../../fixtures/jeansCases.json";

const { boltzmann, atomicMass, massesU, gravitationalParametersKm3S2 } = published.inputs;

/** The rows of the fixture: inputs in SI, with the masses it states, and the values to meet. */
export const jeansCases = published.rows.map((row) => ({
  ...row,
  label: `${row.gas} at ${row.body}, ${row.radiusKm} km, ${row.temperature} K`,
  gravitationalParameter:
    gravitationalParametersKm3S2[row.body as keyof typeof gravitationalParametersKm3S2] * 1e9,
  radius: row.radiusKm * 1e3,
  particleMass: massesU[row.gas as keyof typeof massesU] * atomicMass,
}));

/** Fails if the fixture was made with another Boltzmann constant, which would shift every row. */
export function expectSameBoltzmann(own: number): void {
  expect(own).toBe(boltzmann);
}
