import { bindStep, nodeState, stateWithin, type ColumnPath } from "../column/columnPath";
import { columnSlope, slopeParts, type BaseFluxes } from "../column/columnSlope";
import { maximumGases, setComposition } from "../column/composition";
import { expm1 } from "../numerics/elementary";

/**
 * The share of each present gas that its own escape keeps away from the exobase: near 0 the gas is there as if it did
 * not escape, near 1 what diffusion supplies leaves at once.
 *
 *   wJ/(1 + wJ) = 1 − n/n_F = 1 − exp(−∫ Φ₀/[(D + K) n] dh),   1/[(D + K) n] = Sᵢ/[(1 + κSᵢ) Xᵢ]
 *
 * with n_F the density that the same background would hold without the gas's flux; from base to exobase.
 *
 * @param path  of which the first `descent` steps were marched with the fluxes
 */
export function supplyShares(path: ColumnPath): Float64Array {
  const { fluxes, descent, positions } = path;
  const integrals = new Float64Array(path.problem.masses.length);
  if (fluxes === null || fluxes.every((flux) => flux === 0)) return integrals;
  for (let step = 0; step < descent; step += 1) {
    const length = positions[step + 1] - positions[step];
    if (length === 0) continue; // a step that only changed the law
    const parts = Math.max(1, Math.ceil(separationWithin(path, fluxes, step) / largestSeparation));
    const half = length / parts / 2;
    for (let part = 0; part < parts; part += 1) {
      const middle = positions[step] + (2 * part + 1) * half;
      for (let k = 0; k < nodes.length; k += 1) {
        addPull(path, fluxes, step, middle + half * nodes[k], half * weights[k], integrals);
      }
    }
  }
  return integrals.map((integral) => 0 - expm1(-integral));
}

/** Adds Sᵢ/[(1 + κSᵢ) Xᵢ] Φ₀ of each gas at a height, times a weight. */
function addPull(
  path: ColumnPath,
  fluxes: BaseFluxes,
  step: number,
  height: number,
  weight: number,
  integrals: Float64Array,
): void {
  stateWithin(path, step, height, state);
  bindStep(path, step);
  columnSlope(height, state, slope);
  const { fractions, resistances } = slopeParts;
  const kappa = slopeParts.kappa();
  for (let i = 0; i < fluxes.length; i += 1) {
    if (fluxes[i] === 0) continue;
    integrals[i] += (weight * (fluxes[i] / fractions[i]) * resistances[i]) / (1 + kappa * resistances[i]);
  }
}

/** The largest change of ln X, within a step, of a gas that has a flux. */
function separationWithin(path: ColumnPath, fluxes: BaseFluxes, step: number): number {
  const size = fluxes.length;
  nodeState(path, step, state);
  nodeState(path, step + 1, slope);
  const rise = setComposition(slope, size) - setComposition(state, size);
  let largest = 0;
  for (let i = 0; i < size; i += 1) {
    if (fluxes[i] !== 0) largest = Math.max(largest, Math.abs(slope[i] - state[i] - rise));
  }
  return largest;
}

/** Change of ln X within a part of a step, up to which the rule below is exact to 1e-7. */
const largestSeparation = 3;

/** Gauss and Legendre's rule with 5 points. */
const inner = Math.sqrt(5 - 2 * Math.sqrt(10 / 7)) / 3;
const outer = Math.sqrt(5 + 2 * Math.sqrt(10 / 7)) / 3;
const innerWeight = (322 + 13 * Math.sqrt(70)) / 900;
const outerWeight = (322 - 13 * Math.sqrt(70)) / 900;
const nodes = [-outer, -inner, 0, inner, outer];
const weights = [outerWeight, innerWeight, 128 / 225, innerWeight, outerWeight];

const state = new Float64Array(maximumGases);
const slope = new Float64Array(maximumGases);
