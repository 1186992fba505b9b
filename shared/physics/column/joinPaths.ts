import { denseRows, keptStages } from "../numerics/dormandPrince";
import { nodeState, type ColumnPath } from "./columnPath";

/**
 * One ascending path of two that set out from the same state at an exobase: one marched downward to the base with
 * the fluxes, one marched upward without.
 */
export function joinPaths(below: ColumnPath, above: ColumnPath): ColumnPath {
  const { problem, fluxes } = below;
  const size = problem.masses.length;
  const descent = below.steps;
  const steps = descent + above.steps;
  const joined: ColumnPath = {
    problem,
    fluxes: fluxes && Float64Array.from(fluxes),
    descent,
    steps,
    positions: new Float64Array(steps + 1),
    states: new Float64Array((steps + 1) * size),
    stages: new Float64Array(steps * keptStages * size),
    laws: [...below.laws.slice(0, descent).reverse(), ...above.laws],
    dense: new Float64Array(steps * denseRows * size),
    isDense: new Uint8Array(steps),
  };
  for (let node = 0; node <= steps; node += 1) {
    const isBelow = node < descent;
    const [source, place] = isBelow ? [below, descent - node] : [above, node - descent];
    joined.positions[node] = source.positions[place];
    nodeState(source, place, joined.states.subarray(node * size));
  }
  const length = keptStages * size;
  for (let step = 0; step < descent; step += 1) {
    const from = (descent - 1 - step) * length;
    joined.stages.set(below.stages.subarray(from, from + length), step * length);
  }
  joined.stages.set(above.stages.subarray(0, above.steps * length), descent * length);
  return joined;
}
