import { bindStep } from "../column/columnPath";
import { columnSlope, slopeParts } from "../column/columnSlope";
import { maximumGases } from "../column/composition";
import { keptStages } from "../numerics/dormandPrince";
import { exponential, expm1 } from "../numerics/elementary";
import type { DownwardMarch } from "./marchDown";

/**
 * How what arrives at the base depends on the exobase a march set out from, roughly, from the march itself: small
 * changes δᵢ of ln pᵢ are carried down along it,
 *
 *   δᵢ′ = −(1 − dᵢ)(g₀/kT) Σ Xⱼ(mⱼ − m̄)δⱼ − dᵢ²κ sᵢ [Pᵢ − x Sᵢ Σ Xⱼδⱼ] − dᵢ²(Φᵢ/Xᵢ) Pᵢ
 *         + dᵢ(Φᵢ/Xᵢ)Sᵢ(δᵢ − δ ln Φᵢ) + dᵢ Σⱼ (Φⱼ/bᵢⱼ) δ ln Φⱼ,
 *   dᵢ = 1/(1 + κSᵢ),   Pᵢ = Σⱼ Xⱼδⱼ/bᵢⱼ,
 *
 * s without the gas's own flux, x the exponent of K where below its ceiling. It leaves out how the gradients of other
 * gases act through K. Changes of the fluxes follow those of the state at the exobase.
 *
 * @param down  just marched
 * @param out   written: row by gas at the base; columns by ln p of each gas at the exobase, then by its height [m⁻¹]
 */
export function marchJacobian(down: DownwardMarch, out: Float64Array): void {
  const { path } = down;
  const size = down.fluxes.length;
  const columns = size + 1;
  setChanges(down, out, size);
  for (let step = 0; step < path.steps; step += 1) {
    const from = path.positions[step];
    const length = path.positions[step + 1] - from;
    for (let part = 0; part < parts; part += 1) {
      const fraction = (part + 0.5) / parts;
      hermiteState(down, step, fraction, length);
      bindStep(path, step);
      columnSlope(from + fraction * length, stateHere, slopeHere);
      setCoefficients(down, step, length / parts);
      for (let c = 0; c < columns; c += 1) carry(out, size, columns, c);
    }
  }
}

const parts = 3;
const stateHere = new Float64Array(maximumGases);
const slopeHere = new Float64Array(maximumGases);
/** δ ln Φ of each gas in each column. */
const fluxChanges = new Float64Array(maximumGases * (maximumGases + 1));

/** Changes at the exobase: one gas each, with its flux; at last the height, where the column itself has changed. */
function setChanges({ fluxSlopes, topSlope }: DownwardMarch, out: Float64Array, size: number): void {
  const columns = size + 1;
  out.fill(0, 0, size * columns);
  fluxChanges.fill(0, 0, size * columns);
  for (let i = 0; i < size; i += 1) {
    out[i * columns + i] = 1;
    fluxChanges[i * columns + i] = 1;
    out[i * columns + size] = -topSlope[i];
    fluxChanges[i * columns + size] = fluxSlopes[i];
  }
}

function hermiteState({ path }: DownwardMarch, step: number, fraction: number, length: number): void {
  const size = path.problem.masses.length;
  const t = fraction;
  const [h00, h10] = [(1 + 2 * t) * (1 - t) * (1 - t), t * (1 - t) * (1 - t) * length];
  const [h01, h11] = [t * t * (3 - 2 * t), t * t * (t - 1) * length];
  const first = step * keptStages * size;
  const last = first + (keptStages - 1) * size;
  for (let i = 0; i < size; i += 1) {
    stateHere[i] =
      h00 * path.states[step * size + i] +
      h10 * path.stages[first + i] +
      h01 * path.states[(step + 1) * size + i] +
      h11 * path.stages[last + i];
  }
}

/** What multiplies ΣXmδ, P, ΣXδ in the change of each gas; what its own flux does; its relaxation along the part. */
const byMass = new Float64Array(maximumGases);
const byFriction = new Float64Array(maximumGases);
const bySum = new Float64Array(maximumGases);
const byOwnFlux = new Float64Array(maximumGases);
const byOtherFluxes = new Float64Array(maximumGases);
const decays = new Float64Array(maximumGases);
const lengths = new Float64Array(maximumGases);
const relativeMasses = new Float64Array(maximumGases);

function setCoefficients({ path, fluxes }: DownwardMarch, step: number, length: number): void {
  const { masses, eddy } = path.problem;
  const { fractions, forces, resistances } = slopeParts;
  const kappa = slopeParts.kappa();
  const weight = slopeParts.weight();
  const exponent =
    eddy.kind === "power" && !(path.laws[step].isCapped && eddy.ceiling !== null) ? eddy.exponent : 0;
  let meanMass = 0;
  for (let i = 0; i < masses.length; i += 1) meanMass += fractions[i] * masses[i];
  for (let i = 0; i < masses.length; i += 1) {
    const resistance = resistances[i];
    const d = 1 / (1 + kappa * resistance);
    const flow = fluxes[i] === 0 ? 0 : fluxes[i] / fractions[i];
    const force = forces[i] + flow * resistance;
    const mixing = d * d * kappa * force;
    const relaxation = d * flow * resistance;
    relativeMasses[i] = masses[i] - meanMass;
    byMass[i] = -(1 - d) * weight;
    byFriction[i] = -mixing - d * d * flow;
    bySum[i] = mixing * exponent * resistance;
    byOwnFlux[i] = -relaxation;
    byOtherFluxes[i] = d;
    const exponentOfDecay = relaxation * length;
    decays[i] = exponential(exponentOfDecay);
    lengths[i] = Math.abs(exponentOfDecay) < 1e-8 ? length : expm1(exponentOfDecay) / relaxation;
  }
  const { frictions } = slopeParts;
  let pair = 0;
  for (let i = 0; i < masses.length; i += 1) {
    drags[i * maximumGases + i] = 0;
    sharedFrictions[i * maximumGases + i] = 0;
    for (let j = 0; j < i; j += 1) {
      const friction = frictions[pair];
      pair += 1;
      sharedFrictions[i * maximumGases + j] = fractions[j] * friction;
      sharedFrictions[j * maximumGases + i] = fractions[i] * friction;
      drags[i * maximumGases + j] = fluxes[j] * friction;
      drags[j * maximumGases + i] = fluxes[i] * friction;
    }
  }
}

/** Xⱼ/bᵢⱼ and Φⱼ/bᵢⱼ. */
const sharedFrictions = new Float64Array(maximumGases * maximumGases);
const drags = new Float64Array(maximumGases * maximumGases);
const changes = new Float64Array(maximumGases);

/** Carries one column of changes along a part of a step. */
function carry(out: Float64Array, size: number, columns: number, column: number): void {
  const { fractions } = slopeParts;
  let sum = 0;
  let massSum = 0;
  for (let j = 0; j < size; j += 1) {
    const change = out[j * columns + column];
    changes[j] = change;
    sum += fractions[j] * change;
    massSum += fractions[j] * relativeMasses[j] * change;
  }
  for (let i = 0; i < size; i += 1) {
    let friction = 0;
    let drag = 0;
    const row = i * maximumGases;
    for (let j = 0; j < size; j += 1) {
      friction += sharedFrictions[row + j] * changes[j];
      drag += drags[row + j] * fluxChanges[j * columns + column];
    }
    const gain =
      byMass[i] * massSum +
      byFriction[i] * friction +
      bySum[i] * sum +
      byOtherFluxes[i] * drag +
      byOwnFlux[i] * fluxChanges[i * columns + column];
    out[i * columns + column] = changes[i] * decays[i] + gain * lengths[i];
  }
}
