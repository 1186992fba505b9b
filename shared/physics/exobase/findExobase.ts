import { emptyLevel, fillLevel } from "../column/columnLevel";
import { stateWithin, stepAt } from "../column/columnPath";
import { altitudeOf } from "../column/columnProblem";
import { maximumDimension } from "../numerics/dormandPrince";
import { exponential, logarithm } from "../numerics/elementary";
import type { ExobaseOutcome, PhysicsNote } from "../types";
import {
  findKnudsenCrossings,
  findLargestKnudsen,
  type KnudsenAlong,
  type KnudsenCrossing,
} from "./knudsenAlong";

/** ln Kn at the two ends of the band in which the gas turns from a fluid into free particles. */
export const bandStart = logarithm(0.1);
export const bandEnd = logarithm(10);
/** Below this escape parameter of the mean mass no column is held. */
export const smallestBoundParameter = 2;

/** Geopotential heights at which Kn passes 0.1, 1 and 10. */
export interface KnudsenBand {
  lower: number | null;
  exobase: number | null;
  upper: number | null;
  /** Further upward crossings of 1 below the exobase. */
  others: number[];
}

/**
 * The heights of Kn = 0.1, 1 and 10 along a path marched upward. The exobase is the last upward crossing of 1
 * before the first of 10: further up the gas no longer collides, whatever Kn does there.
 */
export function findKnudsenBand(along: KnudsenAlong): KnudsenBand {
  const rising = (logValue: number) => findKnudsenCrossings(along, logValue).filter(isUpward).map(heightOf);
  const first = rising(bandEnd)[0] ?? Infinity;
  const below = rising(0).filter((height) => height < first);
  const exobase = below.pop() ?? null;
  if (exobase === null)
    return { lower: null, exobase, upper: first < Infinity ? first : null, others: below };
  const lower = rising(bandStart)
    .filter((height) => height < exobase)
    .pop();
  return { lower: lower ?? null, exobase, upper: first < Infinity ? first : null, others: below };
}

const isUpward = (crossing: KnudsenCrossing) => crossing.isUpward;
const heightOf = (crossing: KnudsenCrossing) => crossing.height;

/** What the end of a march tells about a column. */
export interface ColumnEnd {
  along: KnudsenAlong;
  band: KnudsenBand;
  /** Geopotential height of the top, m. */
  top: number;
  /** Escape parameter at the base, of the mean mass and the lowest temperature anywhere above. */
  baseEscapeParameter: number;
  /** Whether Kn fell where that parameter was below 2. */
  isRunaway: boolean;
}

/**
 * The exobase by the bulk criterion, l = H, or why there is none.
 *
 * @source [Chamberlain1963] for the exobase; [OpikSinger1959] for the bound of a hydrostatic column
 */
export function exobaseOutcome(end: ColumnEnd): ExobaseOutcome {
  const { along, band, top, baseEscapeParameter, isRunaway } = end;
  const baseKnudsen = exponential(along.values[0]);
  if (baseKnudsen >= 1) {
    return notFound(
      end,
      "base_above_exobase",
      `The Knudsen number is ${short(baseKnudsen)} at the base already: the exobase lies below it. ` +
        "Start the column deeper, or with more gas.",
    );
  }
  if (baseEscapeParameter < smallestBoundParameter) {
    return notFound(
      end,
      "base_unbound",
      `The escape parameter of the mean mass is ${short(baseEscapeParameter)} at the base; below ` +
        `${smallestBoundParameter} no hydrostatic column is held. The gas leaves as a wind.`,
    );
  }
  if (band.exobase !== null && band.exobase <= top) return found(end, band.exobase);
  if (isRunaway) {
    return notFound(
      end,
      "runaway",
      "The Knudsen number never reaches 1: the gas becomes unbound before it becomes free of collisions. " +
        "It leaves as a wind.",
    );
  }
  return notFound(
    end,
    "top_below_exobase",
    `The Knudsen number is still below 1 at the top, ${inKilometres(end, top)}. ` +
      "Raise the top, or leave it out to have it found.",
  );
}

function found({ along, band, top }: ColumnEnd, exobase: number): ExobaseOutcome {
  const { path } = along;
  const { problem } = path;
  const step = stepAt(path, exobase);
  stateWithin(path, step, exobase, state);
  const level = emptyLevel(problem.input.gases.length);
  fillLevel(level, problem, path.laws[step], exobase, state);
  const altitudeOrNull = (height: number | null) =>
    height === null || height > top ? null : altitudeOf(problem, height);
  const otherAltitudes = band.others.map((height) => altitudeOf(problem, height));
  return {
    found: true,
    level,
    lower: altitudeOrNull(band.lower),
    upper: altitudeOrNull(band.upper),
    otherAltitudes,
    notes: otherAltitudes.length > 0 ? [severalExobases(otherAltitudes)] : [],
  };
}

const state = new Float64Array(maximumDimension);

function severalExobases(altitudes: number[]): PhysicsNote {
  const list = altitudes.map((altitude) => `${short(altitude / 1000)} km`).join(", ");
  return {
    level: "caution",
    code: "several_exobases",
    message:
      `The Knudsen number passes 1 more than once, since a light gas takes over from a heavy one; also at ${list}. ` +
      "The exobase given is the last passage before the Knudsen number reaches 10.",
  };
}

function notFound(
  end: ColumnEnd,
  reason: Extract<ExobaseOutcome, { found: false }>["reason"],
  message: string,
): ExobaseOutcome {
  const largest = findLargestKnudsen(end.along, end.top);
  const largestKnudsen = exponential(largest.logKnudsen);
  return {
    found: false,
    reason,
    message: `${message} The largest Knudsen number is ${short(largestKnudsen)}, at ${inKilometres(end, largest.height)}.`,
    largestKnudsen,
    altitudeOfLargest: altitudeOf(end.along.path.problem, largest.height),
  };
}

function inKilometres({ along }: ColumnEnd, height: number): string {
  return `${short(altitudeOf(along.path.problem, height) / 1000)} km`;
}

function short(value: number): string {
  return String(Number(value.toPrecision(4)));
}
