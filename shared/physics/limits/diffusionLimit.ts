import { boltzmann } from "../constants/codata2022";
import { requireFinite, requireFraction, requirePositive } from "../guards";

export interface DiffusionLimitPlace {
  numberDensity: number;
  temperature: number;
  temperatureGradient: number;
  gravity: number;
  moleFraction: number;
  particleMass: number;
  /** Mean mass of the other gases. */
  othersMass: number;
  diffusionCoefficient: number;
  thermalDiffusionFactor: number;
  radius: number;
  exobaseRadius: number;
}

/** There is no limit for a gas that does not rise through the others. */
export type DiffusionLimit =
  { exists: true; flux: number } | { exists: false; reason: "not_lighter" | "held_by_thermal_diffusion" };

/**
 * Largest flux of a light gas that diffusion through the others sustains, referred to the area of the exobase.
 *
 *   Φ_lim = n D X [(m_a − m) g/kT − α T′/T] (r_h/r_c)²
 *
 * @param place.numberDensity           n    [m⁻³]     above zero; of all gases
 * @param place.temperature             T    [K]       above zero
 * @param place.temperatureGradient     T′   [K m⁻¹]   any; outward positive
 * @param place.gravity                 g    [m s⁻²]   above zero
 * @param place.moleFraction            X    [1]       0 to 1; of the gas
 * @param place.particleMass            m    [kg]      above zero; of the gas
 * @param place.othersMass              m_a  [kg]      above zero; mean mass of the other gases
 * @param place.diffusionCoefficient    D    [m² s⁻¹]  above zero; of the gas in the others, by Blanc's law
 * @param place.thermalDiffusionFactor  α    [1]       any
 * @param place.radius                  r_h  [m]       above zero; from the centre, where all of this holds
 * @param place.exobaseRadius           r_c  [m]       above zero
 * @returns  Φ_lim [m⁻² s⁻¹] outward positive; or that there is none, where m ≥ m_a or thermal diffusion holds it back
 *
 * @assumes the gas is no sink or source between r_h and the exobase, and its mixing ratio does not fall off by then
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [Hunten1973]; [Blanc1908] for D
 * @explained diffusion_limit
 */
export function diffusionLimit(place: DiffusionLimitPlace): DiffusionLimit {
  const { numberDensity, temperature, temperatureGradient, gravity, moleFraction } = place;
  const { particleMass, othersMass, diffusionCoefficient, thermalDiffusionFactor } = place;
  const { radius, exobaseRadius } = place;
  requirePositive("number density", numberDensity);
  requirePositive("temperature", temperature);
  requireFinite("temperature gradient", temperatureGradient);
  requirePositive("gravity", gravity);
  requireFraction("mole fraction", moleFraction);
  requirePositive("particle mass", particleMass);
  requirePositive("mean mass of the other gases", othersMass);
  requirePositive("diffusion coefficient", diffusionCoefficient);
  requireFinite("thermal diffusion factor", thermalDiffusionFactor);
  requirePositive("radius", radius);
  requirePositive("radius of the exobase", exobaseRadius);
  if (particleMass >= othersMass) return { exists: false, reason: "not_lighter" };

  const buoyancy = ((othersMass - particleMass) * gravity) / (boltzmann.value * temperature);
  const thermal = (thermalDiffusionFactor * temperatureGradient) / temperature;
  if (buoyancy <= thermal) return { exists: false, reason: "held_by_thermal_diffusion" };
  const spread = (radius / exobaseRadius) * (radius / exobaseRadius);
  const flux = numberDensity * diffusionCoefficient * moleFraction * (buoyancy - thermal) * spread;
  return { exists: true, flux };
}
