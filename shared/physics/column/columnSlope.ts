import { boltzmann } from "../constants/codata2022";
import { exponential, logarithm } from "../numerics/elementary";
import { pieceSlope, pieceValue } from "../numerics/piecewiseCubic";
import { solveSymmetric } from "../numerics/solveSymmetric";
import type { ColumnProblem } from "./columnProblem";
import { maximumGases } from "./composition";
import type { StepLaw } from "./stepLaw";

/**
 * The right-hand side of the column: d ln pᵢ/dh of every gas at a geopotential height, from the Stefan–Maxwell
 * equations with eddy diffusion. With y = ln X, κ = K n, g₀ the gravity at the base and Φ₀ fluxes there,
 *
 *   d ln pᵢ/dh = −m̄g₀/kT + yᵢ′
 *   yᵢ′ + κ Σⱼ (Xⱼ/bᵢⱼ)(yᵢ′ − yⱼ′) = sᵢ
 *   sᵢ = −(mᵢ − m̄)g₀/kT − (αᵢ − ᾱ) d ln T/dh + Σⱼ (Φ₀ⱼ/bᵢⱼ) − (Φ₀ᵢ/Xᵢ) Σⱼ (Xⱼ/bᵢⱼ)
 *
 * With d the most abundant gas and qᵢ = Xᵢ(yᵢ′ − y_d′), Σ Xᵢyᵢ′ = 0 gives y_d′ = −Σ qᵢ and a symmetric,
 * positive definite system N q = s without cancellation, however large K is:
 *
 *   Nᵢⱼ = −(1 + κ/bᵢⱼ),   Nᵢᵢ = (1 − Xᵢ + κSᵢ)/Xᵢ,   Sᵢ = Σⱼ Xⱼ/bᵢⱼ
 *
 * Gases below 1e-13 take no part in it; theirs follow explicitly. Without K there is nothing to solve.
 *
 * All arrays are of this module and used anew by every call: one column is in work at a time, the one that was
 * bound last.
 *
 * @source [ChapmanCowling1970], section 18.2; [BanksKockarts1973], chapter 15
 */

/** Upward flux of a gas, referred to the base: Φ₀ = F/4πr₀², m⁻² s⁻¹; per present gas. */
export type BaseFluxes = Float64Array;

/** Mole fraction below which a gas does not act on the others' gradients. */
const traceLimit = 1e-13;

let bound: ColumnProblem;
let boundFluxes: BaseFluxes | null = null;
let isCapped = false;
let temperaturePiece = 0;
let eddyPiece = 0;
let count = 0;
let hasEddy = false;
let isDragOnly = false;

const pairCount = (maximumGases * (maximumGases - 1)) / 2;
const masses = new Float64Array(maximumGases);
const thermalFactors = new Float64Array(maximumGases);
const fractions = new Float64Array(maximumGases);
const forces = new Float64Array(maximumGases);
const resistances = new Float64Array(maximumGases);
const frictions = new Float64Array(pairCount);
const inverseCoefficients = new Float64Array(pairCount);
const exponentGroups = new Int32Array(pairCount);
const powers = new Float64Array(pairCount);
const active = new Int32Array(maximumGases);
const matrix = new Float64Array(maximumGases * maximumGases);
const unknowns = new Float64Array(maximumGases);

/** T and d ln T/dh, as `setTemperature` left them, the T that `frictions` belong to, κ and g₀/kT. */
const thermal = new Float64Array(5);
const evaluations = new Float64Array(1);

/**
 * What `columnSlope` worked out when it was last called on a column with fluxes: Xᵢ, sᵢ, Sᵢ and 1/bᵢⱼ (lower triangle
 * row by row); T [K], d ln T/dh [m⁻¹], κ [m⁻¹ s⁻¹] and g₀/kT [kg⁻¹ m⁻¹].
 */
export const slopeParts = {
  fractions,
  forces,
  resistances,
  frictions,
  temperature: () => thermal[0],
  warming: () => thermal[1],
  kappa: () => thermal[3],
  weight: () => thermal[4],
} as const;

/**
 * Makes a column the one that `columnSlope` works on.
 *
 * @param isOnlyDrag  whether the fluxes act on each other's gases alone, not on their own
 */
export function bindColumn(
  problem: ColumnProblem,
  fluxes: BaseFluxes | null,
  law: StepLaw,
  isOnlyDrag = false,
): void {
  isDragOnly = isOnlyDrag;
  isCapped = law.isCapped;
  temperaturePiece = law.temperaturePiece;
  eddyPiece = law.eddyPiece;
  boundFluxes = fluxes;
  if (bound === problem) return;
  bound = problem;
  count = problem.masses.length;
  hasEddy = problem.eddy.kind !== "none" && count > 1;
  thermal[2] = 0;
  masses.set(problem.masses);
  thermalFactors.set(problem.thermalFactors);
  inverseCoefficients.set(problem.inverseCoefficients);
  exponentGroups.set(problem.exponentGroups);
}

/** How often `columnSlope` was called since the module was loaded. */
export function slopeEvaluations(): number {
  return evaluations[0];
}

/** Writes d ln pᵢ/dh [m⁻¹] at height h [m] and state ln pᵢ [ln Pa] of the bound column. */
export function columnSlope(height: number, state: Float64Array, slope: Float64Array): void {
  evaluations[0] += 1;
  const { baseRadius, gravityOverBoltzmann, centrifugalFactor } = bound;
  const radius = (baseRadius * baseRadius) / (baseRadius - height);
  setTemperature(height, bound.input.baseAltitude + (height * radius) / baseRadius, radius);
  const temperature = thermal[0];
  const warming = thermal[1];

  let dominant = 0;
  for (let i = 1; i < count; i += 1) if (state[i] > state[dominant]) dominant = i;
  const peak = state[dominant];
  let sum = 0;
  for (let i = 0; i < count; i += 1) {
    const share = exponential(state[i] - peak);
    fractions[i] = share;
    sum += share;
  }
  let meanMass = 0;
  let meanFactor = 0;
  for (let i = 0; i < count; i += 1) {
    const fraction = fractions[i] / sum;
    fractions[i] = fraction;
    meanMass += fraction * masses[i];
    meanFactor += fraction * thermalFactors[i];
  }

  const gravity = gravityOverBoltzmann * (1 - centrifugalFactor * radius * radius * radius);
  const weight = gravity / temperature;
  thermal[4] = weight;
  if (!hasEddy && boundFluxes === null) {
    for (let i = 0; i < count; i += 1) {
      slope[i] = -masses[i] * weight - (thermalFactors[i] - meanFactor) * warming;
    }
    return;
  }

  for (let i = 0; i < count; i += 1) {
    forces[i] = -(masses[i] - meanMass) * weight - (thermalFactors[i] - meanFactor) * warming;
  }
  setFrictions(temperature);
  setResistances();
  if (boundFluxes !== null) addFluxes(boundFluxes);
  if (hasEddy) {
    thermal[3] = eddyTimesDensity(peak, sum, temperature, height, radius);
    separate(thermal[3], dominant, slope);
  } else {
    thermal[3] = 0;
    for (let i = 0; i < count; i += 1) slope[i] = forces[i];
  }
  const fall = meanMass * weight;
  for (let i = 0; i < count; i += 1) slope[i] -= fall;
}

/** T and d ln T/dh at a height. */
function setTemperature(height: number, altitude: number, radius: number): void {
  const along = bound.temperature;
  if (along.kind === "constant") {
    thermal[0] = along.temperature;
    thermal[1] = 0;
  } else if (along.kind === "bates") {
    const deficit = along.amplitude * exponential(-along.rate * height);
    thermal[0] = along.exosphere - deficit;
    thermal[1] = (along.rate * deficit) / thermal[0];
  } else {
    const stretch = radius / bound.baseRadius;
    thermal[0] = pieceValue(along.cubic, temperaturePiece, altitude);
    thermal[1] = (pieceSlope(along.cubic, temperaturePiece, altitude) * stretch * stretch) / thermal[0];
  }
}

/** 1/bᵢⱼ of every pair. */
function setFrictions(temperature: number): void {
  if (temperature === thermal[2]) return;
  thermal[2] = temperature;
  const { exponents } = bound;
  const logTemperature = logarithm(temperature);
  for (let e = 0; e < exponents.length; e += 1) {
    const exponent = exponents[e];
    powers[e] = exponent === 0.5 ? 1 / Math.sqrt(temperature) : exponential(-exponent * logTemperature);
  }
  const pairs = (count * (count - 1)) / 2;
  for (let p = 0; p < pairs; p += 1) frictions[p] = inverseCoefficients[p] * powers[exponentGroups[p]];
}

/** Sᵢ = Σⱼ Xⱼ/bᵢⱼ. */
function setResistances(): void {
  let pair = 0;
  for (let i = 0; i < count; i += 1) {
    const fraction = fractions[i];
    let resistance = 0;
    for (let j = 0; j < i; j += 1) {
      const friction = frictions[pair];
      pair += 1;
      resistance += fractions[j] * friction;
      resistances[j] += fraction * friction;
    }
    resistances[i] = resistance;
  }
}

/** The drag of the fluxes on each other's gases, and of every gas on its own. */
function addFluxes(fluxes: BaseFluxes): void {
  for (let i = 0; i < count; i += 1) {
    const flux = fluxes[i];
    if (flux === 0) continue;
    const firstPair = (i * (i - 1)) / 2;
    for (let j = 0; j < i; j += 1) forces[j] += flux * frictions[firstPair + j];
    for (let j = i + 1; j < count; j += 1) forces[j] += flux * frictions[(j * (j - 1)) / 2 + i];
    if (!isDragOnly) forces[i] -= (flux / fractions[i]) * resistances[i];
  }
}

/** κ = K n. */
function eddyTimesDensity(
  peak: number,
  sum: number,
  temperature: number,
  height: number,
  radius: number,
): number {
  const along = bound.eddy;
  const density = (exponential(peak) * sum) / (boltzmann.value * temperature);
  if (along.kind === "constant") return along.coefficient * density;
  if (along.kind === "power") {
    if (isCapped && along.ceiling !== null) return along.ceiling.coefficient * density;
    const logDensity = peak + logarithm(sum / (boltzmann.value * temperature));
    return exponential(along.logScale + (1 - along.exponent) * logDensity);
  }
  if (along.kind === "none") return 0;
  const altitude = bound.input.baseAltitude + (height * radius) / bound.baseRadius;
  return exponential(pieceValue(along.cubic, eddyPiece, altitude)) * density;
}

/** Solves for y′, into `slope`. */
function separate(kappa: number, dominant: number, slope: Float64Array): void {
  let size = 0;
  for (let i = 0; i < count; i += 1) {
    const fraction = fractions[i];
    if (i === dominant || fraction <= traceLimit) continue;
    const row = size * maximumGases;
    const firstPair = (i * (i - 1)) / 2;
    for (let a = 0; a < size; a += 1) matrix[row + a] = -(1 + kappa * frictions[firstPair + active[a]]);
    matrix[row + size] = (1 - fraction + kappa * resistances[i]) / fraction;
    unknowns[size] = forces[i];
    active[size] = i;
    size += 1;
  }
  solveSymmetric(matrix, maximumGases, size, unknowns);

  let dominantSlope = 0;
  for (let a = 0; a < size; a += 1) dominantSlope -= unknowns[a];
  slope[dominant] = dominantSlope;
  for (let a = 0; a < size; a += 1) slope[active[a]] = unknowns[a] / fractions[active[a]] + dominantSlope;
  for (let i = 0; i < count; i += 1) {
    if (i === dominant || fractions[i] > traceLimit) continue;
    const resistance = resistances[i];
    let pull = resistance * dominantSlope;
    for (let a = 0; a < size; a += 1) {
      const j = active[a];
      pull += unknowns[a] * frictions[i > j ? (i * (i - 1)) / 2 + j : (j * (j - 1)) / 2 + i];
    }
    slope[i] = (forces[i] + kappa * pull) / (1 + kappa * resistance);
  }
}
