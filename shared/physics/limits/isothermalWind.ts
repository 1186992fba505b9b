import { boltzmann } from "../constants/codata2022";
import { escapeParameter } from "../escape/escapeParameter";
import { requirePositive } from "../guards";
import { logarithm } from "../numerics/elementary";
import { lowerLambertLogarithm, principalLambertLogarithm } from "../numerics/lambertW";
import { magnitude } from "../numerics/magnitude";
import type { PhysicsNote } from "../types";

export interface WindBase {
  gravitationalParameter: number;
  radius: number;
  temperature: number;
  particleMass: number;
  massDensity: number;
}

export interface IsothermalWind {
  escapeParameter: number;
  soundSpeed: number;
  sonicRadius: number;
  /** Speed over the speed of sound at the base. */
  machNumber: number | null;
  log10MachNumber: number;
  massRate: number | null;
  log10MassRate: number;
  notes: PhysicsNote[];
}

/**
 * Isothermal wind that passes the speed of sound, from a base of given density.
 *
 *   (u/a)² − ln(u/a)² = 4 ln(r₀/r_s) + 4 r_s/r₀ − 3,   a = √(kT/m),   r_s = GM/2a²
 *   with y = r_s/r₀ = λ/2 and w = 2 ln(u/a):  e^w − w − 1 = 4 (y − 1 − ln y), solved by Lambert's W
 *   Ṁ = 4πr₀² ρ₀ u
 *
 * @param base.gravitationalParameter  GM  [m³ s⁻²]  above zero
 * @param base.radius                  r₀  [m]       above zero; from the centre
 * @param base.temperature             T   [K]       above zero; throughout
 * @param base.particleMass            m   [kg]      above zero; the mean
 * @param base.massDensity             ρ₀  [kg m⁻³]  above zero; at the base
 * @returns  λ [1], a [m s⁻¹], r_s [m], u/a [1] at the base and Ṁ [kg s⁻¹] outward positive, null where below 1e-300,
 *           with decimal logarithms
 *
 * @assumes one well mixed gas, kept at its temperature by heat from elsewhere, with collisions out to r_s
 * @valid   λ of 2 or more; below, the base lies beyond r_s, the wind starts faster than sound, and a caution says so
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [Parker1958]; [Cranmer2004] for the solution by W
 * @explained wind_mass_rate
 */
export function isothermalWind(base: WindBase): IsothermalWind {
  const { radius, temperature, particleMass, massDensity } = base;
  const lambda = escapeParameter(base);
  requirePositive("mass density", massDensity);
  const soundSpeed = Math.sqrt((boltzmann.value * temperature) / particleMass);
  const y = lambda / 2;
  const excess = 4 * distanceFromOne(y);
  const logMach = 0.5 * (y > 1 ? principalLambertLogarithm(excess) : lowerLambertLogarithm(excess));
  const logMassRate =
    logarithm(4 * Math.PI) + 2 * logarithm(radius) + logarithm(massDensity) + logarithm(soundSpeed) + logMach;
  return {
    escapeParameter: lambda,
    soundSpeed,
    sonicRadius: radius * y,
    machNumber: magnitude(logMach),
    log10MachNumber: logMach / Math.LN10,
    massRate: magnitude(logMassRate),
    log10MassRate: logMassRate / Math.LN10,
    notes: y < 1 ? [supersonicStart(lambda)] : [],
  };
}

/** y − 1 − ln y; as a series near 1, where the difference would lose digits. */
function distanceFromOne(y: number): number {
  const e = y - 1;
  if (Math.abs(e) > 0.3) return e - logarithm(y);
  let term = e * e;
  let sum = term / 2;
  for (let k = 3; Math.abs(term) > 1e-17 * sum; k += 1) {
    term *= -e;
    sum += term / k;
  }
  return sum;
}

function supersonicStart(lambda: number): PhysicsNote {
  const message = `The escape parameter at the base of the wind is ${lambda.toFixed(2)}, below 2: the sonic point lies inside the body, and the wind starts faster than sound. Take its rate as an order of magnitude, or put the base deeper.`;
  return { level: "caution", code: "wind_starts_supersonic", message };
}
