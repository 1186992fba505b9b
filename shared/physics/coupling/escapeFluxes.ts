import { altitudeOf, temperatureGradientOf, temperatureOf } from "../column/columnProblem";
import { maximumGases } from "../column/composition";
import { boltzmann } from "../constants/codata2022";
import { log1p, logarithm } from "../numerics/elementary";
import type { EscapingColumn } from "./escapingColumn";

/**
 * What escapes of each present gas from a height, as if that height were the exobase: the effusion velocity with its
 * correction c, referred to the base, and the flux,
 *
 *   ln(cw r²/r₀²) = ln c + ½ ln(kT/2πm) + ln(1 + λ) − λ + 2 ln(r/r₀),   ln Φ₀ = ln n + ln(cw r²/r₀²),
 *
 * with their derivatives by h at fixed ln p,
 *
 *   τ/2 + λ′/(1 + λ) − λ′ + 2r/r₀²,   less τ for the flux,   τ = d ln T/dh,  λ′ = −λ(r/r₀² + τ)
 *
 * All arrays are of this module, per present gas, and written anew by every call.
 *
 * @source [Jeans1925], [ChamberlainHunten1987]
 */

/** ln(cw r²/r₀²), in m s⁻¹. */
export const logVelocities = new Float64Array(maximumGases);
/** Its derivative, m⁻¹. */
export const velocitySlopes = new Float64Array(maximumGases);
/** ln Φ₀, m⁻² s⁻¹. */
export const logFluxes = new Float64Array(maximumGases);
/** Its derivative, m⁻¹. */
export const fluxSlopes = new Float64Array(maximumGases);
/** ln kT and τ, as `setVelocities` left them. */
const thermal = new Float64Array(2);

/**
 * Sets `logVelocities` and `velocitySlopes`.
 *
 * @param height  h  [m]  geopotential height above the base
 * @param piece   of the temperature, where it is points
 */
export function setVelocities({ problem, logSpeeds }: EscapingColumn, height: number, piece: number): void {
  const { input, masses, baseRadius } = problem;
  const altitude = altitudeOf(problem, height);
  const radius = input.radius + altitude;
  const stretch = radius / baseRadius;
  const temperature = temperatureOf(problem.temperature, height, altitude, piece);
  const gradient = temperatureGradientOf(problem, height, altitude, piece);
  const warming = (gradient * stretch * stretch) / temperature;
  const thermalEnergy = boltzmann.value * temperature;
  const lambdaOfUnitMass = input.gravitationalParameter / (thermalEnergy * radius);
  const shared = logarithm(temperature) / 2 + 2 * logarithm(stretch);
  const widening = stretch / baseRadius;
  thermal[0] = logarithm(thermalEnergy);
  thermal[1] = warming;
  for (let i = 0; i < masses.length; i += 1) {
    const lambda = lambdaOfUnitMass * masses[i];
    const fall = lambda * (widening + warming);
    logVelocities[i] = logSpeeds[i] + shared + log1p(lambda) - lambda;
    velocitySlopes[i] = warming / 2 - fall / (1 + lambda) + fall + 2 * widening;
  }
}

/**
 * Sets `logFluxes` and `fluxSlopes` as well.
 *
 * @param state  ln p of each present gas  [ln Pa]; the other parameters as of `setVelocities`
 */
export function setFluxes(column: EscapingColumn, height: number, piece: number, state: Float64Array): void {
  setVelocities(column, height, piece);
  for (let i = 0; i < column.logSpeeds.length; i += 1) {
    logFluxes[i] = state[i] - thermal[0] + logVelocities[i];
    fluxSlopes[i] = velocitySlopes[i] - thermal[1];
  }
}
