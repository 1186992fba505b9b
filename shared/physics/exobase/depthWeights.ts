import {
  altitudeOf,
  temperatureGradientOf,
  temperatureOf,
  type ColumnProblem,
} from "../column/columnProblem";
import type { StepLaw } from "../column/stepLaw";
import { boltzmann } from "../constants/codata2022";

/**
 * Sets the weights of the criterion of unit depth at a height: above it the column of each gas is nⱼHⱼA(λⱼ), so
 *
 *   ∫ Σ nⱼσⱼ dz = (p/g) Σ Xⱼ σⱼA(λⱼ)/mⱼ,   λⱼ = GMmⱼ/(kTr),   dλ/dh = −λ (r/r₀² + d ln T/dh)
 *
 * @param number.weights       σⱼA/mⱼ  [m² kg⁻¹]  written
 * @param number.weightSlopes  its derivative by h  [m kg⁻¹]  written
 *
 * @assumes each gas isothermal and on its own scale height above
 */
export function setDepthWeights(
  {
    problem,
    weights,
    weightSlopes,
  }: { problem: ColumnProblem; weights: Float64Array; weightSlopes: Float64Array },
  height: number,
  law: StepLaw,
): void {
  const { input, masses, crossSections, baseRadius } = problem;
  const altitude = altitudeOf(problem, height);
  const radius = input.radius + altitude;
  const stretch = radius / baseRadius;
  const temperature = temperatureOf(problem.temperature, height, altitude, law.temperaturePiece);
  const gradient = temperatureGradientOf(problem, height, altitude, law.temperaturePiece);
  const fall = stretch / baseRadius + (gradient * stretch * stretch) / temperature;
  const lambdaOfUnitMass = input.gravitationalParameter / (boltzmann.value * temperature * radius);
  for (let i = 0; i < masses.length; i += 1) {
    const lambda = lambdaOfUnitMass * masses[i];
    setColumnFactor(lambda);
    weights[i] = (crossSections[i] / masses[i]) * factor[0];
    weightSlopes[i] = -(crossSections[i] / masses[i]) * factor[1] * lambda * fall;
  }
}

/** A and dA/dλ, as `setColumnFactor` left them. */
const factor = new Float64Array(2);

/**
 * Column of a gas above a level, over its nH there: the asymptotic series of the hydrostatic integral, which itself
 * diverges,
 *
 *   A = 1 + 2/λ + 6/λ² + … = Σ (k+1)!/λᵏ,
 *
 * cut at its smallest term, the one of k = N − 1 where N ≤ λ < N + 1. That term is taken λ − N times, so that A has no
 * jumps; where the series is of use it is too small to matter. Below λ = 2 there is only the first.
 *
 * @param lambda  λ  [1]  above zero
 * @returns       A  [1]
 */
export function columnFactor(lambda: number): number {
  setColumnFactor(lambda);
  return factor[0];
}

function setColumnFactor(lambda: number): void {
  let sum = 1;
  let slope = 0;
  if (lambda >= 2) {
    const whole = Math.floor(lambda);
    let term = 1;
    for (let k = 1; k < whole && term > 1e-17; k += 1) {
      term *= (k + 1) / lambda;
      const share = k === whole - 1 ? lambda - whole : 1;
      sum += share * term;
      slope += (k === whole - 1 ? term : 0) - (share * k * term) / lambda;
    }
  }
  factor[0] = sum;
  factor[1] = slope;
}
