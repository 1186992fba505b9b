import { gravityAt, type ColumnProblem } from "../column/columnProblem";
import { fractions, setComposition } from "../column/composition";
import type { StepLaw } from "../column/stepLaw";
import { PhysicsDomainError } from "../errors";
import { maximumDimension } from "../numerics/dormandPrince";
import { logarithm } from "../numerics/elementary";
import type { ExobaseCriterion } from "../types";
import { setDepthWeights } from "./depthWeights";

/**
 * The number that rises through 1 at the exobase, by each criterion. All are of one form, from which T cancels
 * but for the corrections of the last,
 *
 *   f = c g m̂/(p q̄),   q̄ = Σ Xⱼ qⱼ
 *
 *   bulk        l/H                  c = 1/√2,  m̂ = m̄,  qⱼ = σⱼ
 *   simple      l/H without √2       c = 1,     m̂ = m̄,  qⱼ = σⱼ
 *   gas         lᵢ/Hᵢ                c = mᵢ,    m̂ = 1,  qⱼ = πdᵢⱼ² √(1 + mᵢ/mⱼ),  dᵢⱼ = (dᵢ + dⱼ)/2
 *   unit_depth  1/∫ Σ nⱼσⱼ dz        c = 1,     m̂ = 1,  qⱼ = σⱼ A(λⱼ)/mⱼ; see `setDepthWeights`
 *
 * @source [ChapmanCowling1970] for the mean free paths; [Chamberlain1963] for the exobase
 */
export interface ExobaseNumber {
  readonly criterion: ExobaseCriterion;
  readonly problem: ColumnProblem;
  readonly scale: number;
  readonly hasMeanMass: boolean;
  /** q of each present gas. */
  readonly weights: Float64Array;
  /** dq/dh, m⁻¹ per unit of q; all zero but for unit depth. */
  readonly weightSlopes: Float64Array;
}

/**
 * Makes the number of a criterion ready for a column.
 *
 * @throws  PhysicsDomainError if the criterion is of a gas that the column has not
 * @explained exobase_altitude
 */
export function exobaseNumber(problem: ColumnProblem, criterion: ExobaseCriterion): ExobaseNumber {
  const { crossSections } = problem;
  const weightSlopes = new Float64Array(crossSections.length);
  const shared = { criterion, problem, weightSlopes };
  switch (criterion.kind) {
    case "bulk":
      return { ...shared, scale: 1 / Math.SQRT2, hasMeanMass: true, weights: crossSections };
    case "simple":
      return { ...shared, scale: 1, hasMeanMass: true, weights: crossSections };
    case "unit_depth":
      return { ...shared, scale: 1, hasMeanMass: false, weights: new Float64Array(crossSections.length) };
    case "gas": {
      const { mass, weights } = crossSectionsOf(problem, criterion.formula);
      return { ...shared, scale: mass, hasMeanMass: false, weights };
    }
  }
}

/** πdᵢⱼ² √(1 + mᵢ/mⱼ) of one gas i with each present gas j, m². */
function crossSectionsOf({ input, present }: ColumnProblem, formula: string) {
  const gas = input.gases.find((candidate) => candidate.formula === formula);
  if (!gas) {
    const formulas = input.gases.map((candidate) => candidate.formula).join(", ");
    const requirement = `those of a gas of the column: ${formulas}`;
    throw new PhysicsDomainError(`mean free path and scale height of ${formula}`, NaN, requirement);
  }
  const weights = Float64Array.from(present, (index) => {
    const other = input.gases[index];
    const diameter = (gas.collisionDiameter + other.collisionDiameter) / 2;
    return Math.PI * diameter * diameter * Math.sqrt(1 + gas.mass / other.mass);
  });
  return { mass: gas.mass, weights };
}

/**
 * Logarithm of the number.
 *
 * @param height  h  [m]  geopotential height above the base
 * @param law     that holds there
 * @param state   ln p of each present gas  [ln Pa]
 */
export function logNumber(number: ExobaseNumber, height: number, law: StepLaw, state: Float64Array): number {
  return logNumberOfComposition(number, height, law, setComposition(state, number.weights.length));
}

/** The same for the composition that was just set, under the pressure that came with it. */
export function logNumberOfComposition(
  number: ExobaseNumber,
  height: number,
  law: StepLaw,
  logPressure: number,
): number {
  const { criterion, problem, scale, hasMeanMass, weights } = number;
  if (criterion.kind === "unit_depth") setDepthWeights(number, height, law);
  const mass = hasMeanMass ? weighted(problem.masses) : 1;
  return logarithm((scale * mass * gravityAt(problem, height)) / weighted(weights)) - logPressure;
}

/**
 * Derivatives of the logarithm for the composition that was just set.
 *
 *   C_i = Xᵢ(mᵢ/m̄ − qᵢ/q̄) − Xᵢ with the mean mass, −Xᵢqᵢ/q̄ without,   C_h = d ln g/dh − q̄′/q̄
 *
 * @param byState  C of each present gas, written
 * @returns        C_h  [m⁻¹]; the other parameters as of `logNumber`
 */
export function logNumberGradient(
  number: ExobaseNumber,
  height: number,
  law: StepLaw,
  byState: Float64Array,
): number {
  const { criterion, problem, hasMeanMass, weights, weightSlopes } = number;
  const { masses, baseRadius, centrifugalFactor } = problem;
  const isOfDepth = criterion.kind === "unit_depth";
  if (isOfDepth) setDepthWeights(number, height, law);
  const mean = weighted(weights);
  const meanMass = hasMeanMass ? weighted(masses) : 1;
  for (let i = 0; i < weights.length; i += 1) {
    const byMass = hasMeanMass ? masses[i] / meanMass - 1 : 0;
    byState[i] = fractions[i] * (byMass - weights[i] / mean);
  }
  const radius = (baseRadius * baseRadius) / (baseRadius - height);
  const spun = centrifugalFactor * radius * radius * radius;
  const byGravity = (-(radius / baseRadius) * (2 + (3 * spun) / (1 - spun))) / baseRadius;
  return isOfDepth ? byGravity - weighted(weightSlopes) / mean : byGravity;
}

/**
 * Slope of the logarithm, C_h + Σ Cᵢ d ln pᵢ/dh, for the composition that was just set.
 *
 * @param slope  d ln pᵢ/dh  [m⁻¹]; the other parameters as of `logNumber`
 * @returns      [m⁻¹]
 */
export function logNumberSlope(
  number: ExobaseNumber,
  height: number,
  law: StepLaw,
  slope: Float64Array,
): number {
  let sum = logNumberGradient(number, height, law, gradient);
  for (let i = 0; i < number.weights.length; i += 1) sum += gradient[i] * slope[i];
  return sum;
}

const gradient = new Float64Array(maximumDimension);

/** Mean over the composition that was just set. */
function weighted(values: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < values.length; i += 1) sum += fractions[i] * values[i];
  return sum;
}
