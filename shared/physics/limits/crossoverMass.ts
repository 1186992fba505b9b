import { boltzmann } from "../constants/codata2022";
import { PhysicsDomainError } from "../errors";
import { requireNonNegative, requirePositive } from "../guards";

export interface OutflowingGas {
  particleMass: number;
  temperature: number;
  flux: number;
  collisionParameter: number;
  gravity: number;
  moleFraction: number;
}

/**
 * Mass of the heaviest gas that the outflow of a light one drags along.
 *
 *   m_c = m₁ + kT Φ₁/(b g X₁)
 *
 * @param gas.particleMass        m₁   [kg]        above zero; of the light gas
 * @param gas.temperature         T    [K]         above zero
 * @param gas.flux                Φ₁   [m⁻² s⁻¹]   zero or more; of the light gas, where the others are
 * @param gas.collisionParameter  b    [m⁻¹ s⁻¹]   above zero; of the light with the heavy gas, at T
 * @param gas.gravity             g    [m s⁻²]     above zero
 * @param gas.moleFraction        X₁   [1]         above 0, up to 1; of the light gas
 * @returns                       m_c  [kg]        m₁ or more; a gas heavier than this stays behind
 *
 * @assumes an isothermal gas, the light one flowing out and the heavy one a trace in it
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [HuntenPepinWalker1987]
 * @explained crossover_mass
 */
export function crossoverMass(gas: OutflowingGas): number {
  const { particleMass, temperature, flux, collisionParameter, gravity, moleFraction } = gas;
  requirePositive("particle mass", particleMass);
  requirePositive("temperature", temperature);
  requireNonNegative("flux", flux);
  requirePositive("collision parameter", collisionParameter);
  requirePositive("gravity", gravity);
  if (!(moleFraction > 0 && moleFraction <= 1)) {
    throw new PhysicsDomainError("mole fraction", moleFraction, "above 0 and no more than 1");
  }
  const drag = (boltzmann.value * temperature * flux) / (collisionParameter * gravity * moleFraction);
  return particleMass + drag;
}
