import { bindStep } from "../column/columnPath";
import { columnSlope, slopeParts } from "../column/columnSlope";
import { maximumGases } from "../column/composition";
import { keptStages } from "../numerics/dormandPrince";
import { exponential, expm1 } from "../numerics/elementary";
import { solveLinear } from "../numerics/solveLinear";
import type { DownwardMarch } from "./marchDown";

/**
 * How what arrives at the base depends on the exobase that a march set out from, to about a part in ten thousand, from the
 * march itself: small changes δᵢ of ln pᵢ, and δ ln Φᵢ of the fluxes, are carried down along it. With y = ln X,
 *
 *   δᵢ′ = −c + δyᵢ′,   c = (g₀/kT) Σ Xⱼ(mⱼ − m̄)δⱼ,   e = (d ln T/dh) Σ Xⱼ(αⱼ − ᾱ)δⱼ
 *   (1 + κSᵢ) δyᵢ′ − κ Σⱼ (Xⱼ/bᵢⱼ) δyⱼ′ = c + e − (Φᵢ/Xᵢ)[Sᵢ(δ ln Φᵢ − δᵢ) + Σⱼ Xⱼδⱼ/bᵢⱼ] + Σⱼ (Φⱼ/bᵢⱼ) δ ln Φⱼ
 *                                      + κ Σⱼ (Xⱼδⱼ/bᵢⱼ)(yⱼ′ − yᵢ′) + x(sᵢ − yᵢ′) Σ Xⱼδⱼ,
 *
 * x the exponent of K where it is a power of the density. Each step is parted; along a part the coefficients are those of
 * its middle, and the relaxation of a gas towards its flux is exponential.
 *
 * @param down  just marched
 * @param out   written: row by gas at the base; columns by ln p of each gas at the exobase, its flux with it, and by the
 *              height of the exobase  [m⁻¹]
 */
export function marchJacobian(down: DownwardMarch, out: Float64Array): void {
  const { path } = down;
  setChanges(down, out);
  for (let step = 0; step < path.steps; step += 1) {
    const from = path.positions[step];
    const length = path.positions[step + 1] - from;
    for (let part = 0; part < parts; part += 1) {
      const fraction = (part + 0.5) / parts;
      setHermite(down, step, fraction, length);
      bindStep(path, step);
      columnSlope(from + fraction * length, stateHere, slopeHere);
      setCoefficients(down, step);
      carry(down, out, length / parts);
    }
  }
}

const parts = 3;
const stateHere = new Float64Array(maximumGases);
const slopeHere = new Float64Array(maximumGases);
const square = () => new Float64Array(maximumGases * (maximumGases + 1));
/** δ ln Φ of each gas in each column. */
const fluxChanges = square();

/** Changes at the exobase: one gas each, with its flux; at last the height, where the column itself has changed. */
function setChanges({ fluxes, fluxSlopes, topSlope }: DownwardMarch, out: Float64Array): void {
  const size = fluxes.length;
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

/** Sets `stateHere` within a step, by the cubic through both ends. */
function setHermite({ path, fluxes }: DownwardMarch, step: number, t: number, length: number): void {
  const size = fluxes.length;
  const h00 = (1 + 2 * t) * (1 - t) * (1 - t);
  const h10 = t * (1 - t) * (1 - t) * length;
  const h01 = t * t * (3 - 2 * t);
  const h11 = t * t * (t - 1) * length;
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

/** 1 + κS on the diagonal, −κX/b beside it; what multiplies δ and δ ln Φ of each gas on the right-hand side. */
const mixing = square();
const byState = square();
const byFlux = square();
/** What multiplies δ of each gas in c. */
const byWeight = new Float64Array(maximumGases);
/** What is left to the exponential: d of a change of a gas on its own slope, m⁻¹. */
const relaxations = new Float64Array(maximumGases);

function setCoefficients({ path, fluxes }: DownwardMarch, step: number): void {
  const { masses, thermalFactors, eddy } = path.problem;
  const { fractions, forces, resistances, frictions } = slopeParts;
  const size = fluxes.length;
  const kappa = slopeParts.kappa();
  const weight = slopeParts.weight();
  const warming = slopeParts.warming();
  const isPower = eddy.kind === "power" && !(path.laws[step].isCapped && eddy.ceiling !== null);
  const exponent = isPower ? eddy.exponent : 0;
  let meanMass = 0;
  let meanFactor = 0;
  for (let i = 0; i < size; i += 1) {
    meanMass += fractions[i] * masses[i];
    meanFactor += fractions[i] * thermalFactors[i];
  }
  const fall = meanMass * weight;
  for (let j = 0; j < size; j += 1) byWeight[j] = fractions[j] * (masses[j] - meanMass) * weight;
  for (let i = 0; i < size; i += 1) {
    const flow = fluxes[i] === 0 ? 0 : fluxes[i] / fractions[i];
    const separation = slopeHere[i] + fall;
    const bySum = exponent * (forces[i] - separation);
    const row = i * size;
    for (let j = 0; j < size; j += 1) {
      const fraction = fractions[j];
      byState[row + j] = byWeight[j] + fraction * ((thermalFactors[j] - meanFactor) * warming + bySum);
      if (j === i) {
        mixing[row + i] = 1 + kappa * resistances[i];
        byState[row + i] += flow * resistances[i];
        byFlux[row + i] = -flow * resistances[i];
        continue;
      }
      const friction = frictions[i > j ? (i * (i - 1)) / 2 + j : (j * (j - 1)) / 2 + i];
      const shared = fraction * friction;
      mixing[row + j] = -kappa * shared;
      byState[row + j] += shared * (kappa * (slopeHere[j] - slopeHere[i]) - flow);
      byFlux[row + j] = fluxes[j] * friction;
    }
    relaxations[i] = (flow * resistances[i]) / (1 + kappa * resistances[i]);
  }
}

/** By row, what multiplies δ of each gas in δy′, then what the changes of the fluxes make of it in each column. */
const response = new Float64Array(maximumGases * (2 * maximumGases + 1));
const halfway = square();

/** Carries all changes along a part of a step: to its middle first, whose slopes then hold for the whole. */
function carry({ fluxes }: DownwardMarch, out: Float64Array, length: number): void {
  const size = fluxes.length;
  setResponse(size);
  addGains(out, out, halfway, size, length / 2);
  addGains(out, halfway, out, size, length);
}

function setResponse(size: number): void {
  const columns = size + 1;
  const width = size + columns;
  for (let i = 0; i < size; i += 1) {
    const row = i * width;
    for (let j = 0; j < size; j += 1) response[row + j] = byState[i * size + j];
    response.fill(0, row + size, row + width);
    for (let j = 0; j < size; j += 1) {
      const factor = byFlux[i * size + j];
      if (factor === 0) continue;
      for (let c = 0; c < columns; c += 1) {
        response[row + size + c] += factor * fluxChanges[j * columns + c];
      }
    }
  }
  solveLinear(mixing, size, response, width);
}

/** Writes to `after` what becomes of `before` along a length on which the slopes are those of `middle`. */
function addGains(
  before: Float64Array,
  middle: Float64Array,
  after: Float64Array,
  size: number,
  length: number,
): void {
  const columns = size + 1;
  const width = size + columns;
  for (let i = 0; i < size; i += 1) {
    for (let c = 0; c < columns; c += 1) gains[i * columns + c] = response[i * width + size + c];
    for (let j = 0; j < size; j += 1) {
      const factor = response[i * width + j] - byWeight[j] - (i === j ? relaxations[i] : 0);
      for (let c = 0; c < columns; c += 1) gains[i * columns + c] += factor * middle[j * columns + c];
    }
  }
  for (let i = 0; i < size; i += 1) {
    const exponent = relaxations[i] * length;
    const decay = exponential(exponent);
    const reach = Math.abs(exponent) < 1e-8 ? length : expm1(exponent) / relaxations[i];
    for (let k = i * columns; k < (i + 1) * columns; k += 1) after[k] = before[k] * decay + gains[k] * reach;
  }
}

const gains = square();
