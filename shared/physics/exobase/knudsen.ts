import { gravityAt, type ColumnProblem } from "../column/columnProblem";
import { fractions, setComposition } from "../column/composition";
import { logarithm } from "../numerics/elementary";

/**
 * Logarithm of the Knudsen number of the whole gas, l/H, from which the temperature cancels:
 *
 *   ln Kn = ln(m̄g/(√2 σ̄)) − ln p,   σ̄ = Σ Xⱼσⱼ
 *
 * @param problem  the column
 * @param height   h  [m]  geopotential height above the base
 * @param state    ln p of each present gas  [ln Pa]
 *
 * @source [ChapmanCowling1970] for the mean free path
 */
export function logKnudsen(problem: ColumnProblem, height: number, state: Float64Array): number {
  const logPressure = setComposition(state, problem.masses.length);
  return logKnudsenOfComposition(problem, height, logPressure);
}

/** The same for the composition that was just set, under the pressure that came with it. */
export function logKnudsenOfComposition(problem: ColumnProblem, height: number, logPressure: number): number {
  const meanMass = weighted(problem.masses);
  const meanCrossSection = weighted(problem.crossSections);
  const gravity = gravityAt(problem, height);
  return logarithm((meanMass * gravity) / (Math.SQRT2 * meanCrossSection)) - logPressure;
}

/**
 * d ln Kn/dh, for the composition that was just set.
 *
 *   C_h + Σ C_i d ln pᵢ/dh,   C_i = Xᵢ(mᵢ/m̄ − σᵢ/σ̄) − Xᵢ,   C_h = d ln g/dh
 *
 * @param slope  d ln pᵢ/dh  [m⁻¹]; the other parameters as of `logKnudsen`
 * @returns      [m⁻¹]
 */
export function logKnudsenSlope(problem: ColumnProblem, height: number, slope: Float64Array): number {
  const { masses, crossSections, baseRadius, centrifugalFactor } = problem;
  const meanMass = weighted(masses);
  const meanCrossSection = weighted(crossSections);
  const radius = (baseRadius * baseRadius) / (baseRadius - height);
  const spun = centrifugalFactor * radius * radius * radius;
  let sum = (-(radius / baseRadius) * (2 + (3 * spun) / (1 - spun))) / baseRadius;
  for (let i = 0; i < masses.length; i += 1) {
    const weight = masses[i] / meanMass - crossSections[i] / meanCrossSection - 1;
    sum += fractions[i] * weight * slope[i];
  }
  return sum;
}

/** Mean over the composition that was just set. */
function weighted(values: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < values.length; i += 1) sum += fractions[i] * values[i];
  return sum;
}
