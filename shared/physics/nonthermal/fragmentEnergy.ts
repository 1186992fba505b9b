import { requireNonNegative, requirePositive } from "../guards";

/**
 * Kinetic energy of one of two fragments that fly apart from rest, by equal momenta.
 *
 *   E₁ = E m₂/(m₁ + m₂)
 *
 * @param pair.energy      E   [J]   zero or more; what the two share
 * @param pair.mass        m₁  [kg]  above zero; of the fragment asked for
 * @param pair.otherMass   m₂  [kg]  above zero; of the other
 * @returns                E₁  [J]
 *
 * @assumes an ion and an electron nearly at rest
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [FoxHac1997]
 * @explained channel_energy
 */
export function fragmentEnergy({
  energy,
  mass,
  otherMass,
}: {
  energy: number;
  mass: number;
  otherMass: number;
}): number {
  requireNonNegative("energy of the fragments", energy);
  requirePositive("mass of the fragment", mass);
  requirePositive("mass of the other fragment", otherMass);
  return energy * (otherMass / (mass + otherMass));
}
