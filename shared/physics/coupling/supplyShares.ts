import { bindStep, stateWithin, type ColumnPath } from "../column/columnPath";
import { columnSlope, slopeParts } from "../column/columnSlope";
import { maximumGases } from "../column/composition";
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
    const middle = (positions[step] + positions[step + 1]) / 2;
    const half = (positions[step + 1] - positions[step]) / 2;
    if (half === 0) continue; // a step that only changed the law
    for (let k = 0; k < nodes.length; k += 1) {
      const height = middle + half * nodes[k];
      stateWithin(path, step, height, state);
      bindStep(path, step);
      columnSlope(height, state, slope);
      const { fractions, resistances } = slopeParts;
      const kappa = slopeParts.kappa();
      for (let i = 0; i < integrals.length; i += 1) {
        if (fluxes[i] === 0) continue;
        const pull = ((fluxes[i] / fractions[i]) * resistances[i]) / (1 + kappa * resistances[i]);
        integrals[i] += half * weights[k] * pull;
      }
    }
  }
  return integrals.map((integral) => 0 - expm1(-integral));
}

/** Gauss and Legendre's rule with 5 points: enough for steps within which no gas changes by more than e⁴. */
const inner = Math.sqrt(5 - 2 * Math.sqrt(10 / 7)) / 3;
const outer = Math.sqrt(5 + 2 * Math.sqrt(10 / 7)) / 3;
const innerWeight = (322 + 13 * Math.sqrt(70)) / 900;
const outerWeight = (322 - 13 * Math.sqrt(70)) / 900;
const nodes = [-outer, -inner, 0, inner, outer];
const weights = [outerWeight, innerWeight, 128 / 225, innerWeight, outerWeight];

const state = new Float64Array(maximumGases);
const slope = new Float64Array(maximumGases);
