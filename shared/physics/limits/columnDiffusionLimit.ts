import { diffusionCoefficient } from "../column/diffusionCoefficient";
import type { Column, PhysicsNote } from "../types";
import { diffusionLimit } from "./diffusionLimit";
import { limitLevel } from "./limitLevel";

export type ColumnDiffusionLimit =
  | { exists: true; flux: number; altitude: number; isAtHomopause: boolean; notes: PhysicsNote[] }
  | { exists: false; reason: "not_lighter" | "held_by_thermal_diffusion" | "no_other_gas" };

/**
 * Diffusion limit of one gas of a column: `diffusionLimit` with what the column has at the gas's homopause, else at
 * its base.
 *
 *   Φ_lim = n D X [(m_a − m) g/kT − α T′/T] (r_h/r_c)²
 *
 * @param column         solved, with or without flux
 * @param gas            index of the gas in `column.input.gases`
 * @param exobaseRadius  r_c  [m]  above zero
 * @returns  Φ_lim [m⁻² s⁻¹] at the exobase, outward positive, and where it was taken; or why there is none
 *
 * @assumes α to be that of the gas against the mean of the others
 * @throws  PhysicsDomainError if the radius is not above zero
 * @source  [Hunten1973]; [Blanc1908] for D
 */
export function columnDiffusionLimit(
  column: Pick<Column, "input" | "homopauses" | "levelAt">,
  gas: number,
  exobaseRadius: number,
): ColumnDiffusionLimit {
  const { level, isAtHomopause, notes } = limitLevel(column, gas);
  const others = othersMass(column, level.moleFractions, gas);
  if (others === null) return { exists: false, reason: "no_other_gas" };
  const { mass, thermalDiffusionFactor } = column.input.gases[gas];
  const limit = diffusionLimit({
    ...level,
    moleFraction: level.moleFractions[gas],
    particleMass: mass,
    othersMass: others,
    diffusionCoefficient: diffusionCoefficient(column.input, level, gas),
    thermalDiffusionFactor,
    exobaseRadius,
  });
  return limit.exists ? { ...limit, altitude: level.altitude, isAtHomopause, notes } : limit;
}

/** Mean mass of all gases but one; null where there are none. */
function othersMass({ input }: Pick<Column, "input">, fractions: Float64Array, gas: number): number | null {
  let amount = 0;
  let sum = 0;
  for (let j = 0; j < fractions.length; j += 1) {
    if (j === gas) continue;
    amount += fractions[j];
    sum += fractions[j] * input.gases[j].mass;
  }
  return amount > 0 ? sum / amount : null;
}
