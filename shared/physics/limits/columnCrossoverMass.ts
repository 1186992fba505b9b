import { PhysicsDomainError } from "../errors";
import { powerOfTen, power } from "../numerics/elementary";
import type { Column, PhysicsNote } from "../types";
import { crossoverMass } from "./crossoverMass";
import { limitLevel } from "./limitLevel";

export type ColumnCrossoverMass =
  | {
      exists: true;
      mass: number;
      /** Indices of the gas that flows out and of the one it would drag along. */
      light: number;
      heavy: number;
      altitude: number;
      notes: PhysicsNote[];
    }
  | { exists: false; reason: "no_heavier_gas" | "light_gas_absent" };

/**
 * Crossover mass of a column: of the gas with the largest mass rate, against the most abundant heavier one, at the
 * homopause of the first, else at the base.
 *
 *   m_c = m₁ + kT Φ₁/(b g X₁),   Φ₁ = F₁/4πr²
 *
 * @param column      solved, with or without flux
 * @param log10Rates  log₁₀ F  [F in s⁻¹]  one for each gas of the column, −Infinity where none escapes; with their
 *                    correction factors
 * @returns  m_c [kg], of which gases and where; or why there is none
 *
 * @assumes as `crossoverMass`
 * @throws  PhysicsDomainError if there is not one rate for each gas
 * @source  [HuntenPepinWalker1987]
 */
export function columnCrossoverMass(
  column: Pick<Column, "input" | "homopauses" | "levelAt">,
  log10Rates: readonly number[],
): ColumnCrossoverMass {
  const { gases, collisionParameters } = column.input;
  if (log10Rates.length !== gases.length) {
    throw new PhysicsDomainError("number of rates", log10Rates.length, `that of the gases, ${gases.length}`);
  }
  const light = largestMassRate(gases, log10Rates);
  const { level, notes } = limitLevel(column, light);
  let heavy = -1;
  for (let j = 0; j < gases.length; j += 1) {
    const isHeavier = gases[j].mass > gases[light].mass && level.moleFractions[j] > 0;
    if (isHeavier && (heavy < 0 || level.moleFractions[j] > level.moleFractions[heavy])) heavy = j;
  }
  if (heavy < 0) return { exists: false, reason: "no_heavier_gas" };
  if (!(level.moleFractions[light] > 0)) return { exists: false, reason: "light_gas_absent" };
  const { coefficient, exponent } = collisionParameters[light][heavy];
  const mass = crossoverMass({
    particleMass: gases[light].mass,
    temperature: level.temperature,
    flux: powerOfTen(log10Rates[light]) / (4 * Math.PI * level.radius * level.radius),
    collisionParameter: coefficient * power(level.temperature, exponent),
    gravity: level.gravity,
    moleFraction: level.moleFractions[light],
  });
  return { exists: true, mass, light, heavy, altitude: level.altitude, notes };
}

/** Compared as F₁/F₂ > m₂/m₁, which no rate is too small for. */
function largestMassRate(gases: readonly { mass: number }[], log10Rates: readonly number[]): number {
  let largest = 0;
  for (let j = 1; j < gases.length; j += 1) {
    const isLarger = powerOfTen(log10Rates[j] - log10Rates[largest]) > gases[largest].mass / gases[j].mass;
    if (isLarger) largest = j;
  }
  return largest;
}
