import { PhysicsDomainError } from "../errors";
import { requireNonNegative, requirePositive } from "../guards";

/**
 * Mean mass of the particles of a mixture.
 *
 *   m̄ = Σ wᵢ mᵢ / Σ wᵢ
 *
 * @param gases[].mass    mᵢ  [kg]                   above zero; one particle
 * @param gases[].amount  wᵢ  [any, alike for all]   zero or more, not all zero; mole fractions or number densities
 * @returns               m̄   [kg]
 *
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [ChamberlainHunten1987]
 */
export function meanMass(gases: readonly { mass: number; amount: number }[]): number {
  let amounts = 0;
  let masses = 0;
  for (const { mass, amount } of gases) {
    requirePositive("particle mass", mass);
    requireNonNegative("amount of a gas", amount);
    amounts += amount;
    masses += amount * mass;
  }
  if (!(amounts > 0)) throw new PhysicsDomainError("sum of the amounts", amounts, "above zero");
  return masses / amounts;
}
