import { PhysicsDomainError } from "../errors";
import { power } from "../numerics/elementary";
import type { ColumnInput, ColumnLevel } from "../types";

/**
 * Diffusion coefficient of one gas in the mixture, by Blanc's law.
 *
 *   Dᵢ = (1 − Xᵢ) / Σⱼ (Xⱼ/Dᵢⱼ),   Dᵢⱼ = bᵢⱼ/n,  j ≠ i
 *
 * @param column  its gases and collision parameters
 * @param level   n  [m⁻³], T  [K], X at the level
 * @param gas     index of the gas in `column.gases`; it may be absent itself
 * @returns       Dᵢ  [m² s⁻¹]
 *
 * @throws  PhysicsDomainError if no other gas is there, or only in traces too small for a number
 * @source  [Blanc1908]
 */
export function diffusionCoefficient(
  column: Pick<ColumnInput, "gases" | "collisionParameters">,
  level: Pick<ColumnLevel, "temperature" | "numberDensity" | "moleFractions">,
  gas: number,
): number {
  let others = 0;
  let resistance = 0;
  for (let j = 0; j < column.gases.length; j += 1) {
    if (j === gas || level.moleFractions[j] === 0) continue;
    const { coefficient, exponent } = column.collisionParameters[gas][j];
    others += level.moleFractions[j];
    resistance += level.moleFractions[j] / (coefficient * power(level.temperature, exponent));
  }
  if (!(others > 0)) throw new PhysicsDomainError("mole fraction of all other gases", others, "above zero");
  return others / (resistance * level.numberDensity);
}
