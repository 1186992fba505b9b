import {
  scrambledSobol,
  truncatedDistribution,
  type PhysicalBounds,
  type TruncatedDistribution,
} from "../../physics";
import { spreadLimits } from "../kinds/spread";
import type { Uncertainty } from "../language/quantity";
import { boundsOf } from "./physicalRole";
import type { Replacements } from "./surroundings";
import type { SpreadPlan } from "./taskPlan";

export interface SpreadDraws {
  /** Coordinates of a draw, one for each input: the share of its distribution that lies below. */
  coordinatesAt(index: number): Float64Array;
  /** What acts in place of the centres; the array of coordinates may be filled anew for the next draw. */
  replacements(coordinates: Float64Array): (cellId: string) => Replacements;
}

interface KnownDistribution {
  uncertainty: Uncertainty;
  distribution: TruncatedDistribution | null;
}

/** Draws of a spread: the scramblings take turns, so that the first N draws are even for any N. */
export function spreadDraws({ seed, trace: { inputs } }: SpreadPlan): SpreadDraws {
  const sequence = scrambledSobol(inputs.length, seed);
  const places = new Map(inputs.map(({ cellId, path }, place) => [`${cellId} ${path}`, place]));
  const bounds = new Map<number, PhysicalBounds>();
  const known = new Map<number, KnownDistribution>();

  /** The distribution of an input, which may rest on what other inputs are in this draw. */
  const distributionOf = (place: number, uncertainty: Uncertainty): TruncatedDistribution | null => {
    const last = known.get(place);
    if (last && isSame(last.uncertainty, uncertainty)) return last.distribution;
    const distribution = truncatedDistribution(uncertainty, bounds.get(place)!);
    known.set(place, { uncertainty, distribution });
    return distribution;
  };

  return {
    coordinatesAt(index) {
      const coordinates = new Float64Array(inputs.length);
      const { scramblings } = spreadLimits;
      sequence.pointAt(Math.floor(index / scramblings), index % scramblings, coordinates);
      return coordinates;
    },
    replacements: (coordinates) => (cellId) => ({
      draw(path, uncertainty, dimension) {
        const place = places.get(`${cellId} ${path}`);
        if (place === undefined) return null;
        if (!bounds.has(place)) bounds.set(place, boundsOf(inputs[place].roles, dimension));
        return distributionOf(place, uncertainty)?.quantile(coordinates[place]) ?? null;
      },
    }),
  };
}

function isSame(one: Uncertainty, other: Uncertainty): boolean {
  if (one.form === "normal")
    return other.form === "normal" && one.mean === other.mean && one.deviation === other.deviation;
  if (one.form === "uniform")
    return other.form === "uniform" && one.lower === other.lower && one.upper === other.upper;
  return other.form === "log_normal" && one.median === other.median && one.factor === other.factor;
}
