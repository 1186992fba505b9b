import { emptyLevel, fillLevel } from "../column/columnLevel";
import { stateWithin, stepAt } from "../column/columnPath";
import { altitudeOf } from "../column/columnProblem";
import { maximumDimension } from "../numerics/dormandPrince";
import { exponential, logarithm } from "../numerics/elementary";
import type { ExobaseCriterion, ExobaseOutcome, PhysicsNote } from "../types";
import { nameOfNumber } from "./nameOfNumber";
import { findCrossings, findLargest, type NumberAlong } from "./numberAlong";

/** ln Kn at the two ends of the band in which the gas turns from a fluid into free particles. */
const bandStart = logarithm(0.1);
const bandEnd = logarithm(10);
/** Below this escape parameter of the mean mass no column is held. */
export const smallestBoundParameter = 2;

/** Geopotential heights at which Kn passes 0.1 and 10, and of the exobase between. */
export interface ExobaseBand {
  lower: number | null;
  exobase: number | null;
  upper: number | null;
  /** Further upward crossings below the exobase. */
  others: number[];
}

/**
 * The exobase and its band along a path marched upward. The exobase is the last upward crossing of 1 before the
 * first of Kn = 10: further up the gas no longer collides, whatever Kn does there. By another criterion than the
 * bulk all crossings may lie above Kn = 10; then it is the first.
 *
 * @param along  the number of the criterion
 * @param bulk   the Knudsen number; the same for the bulk criterion
 *
 * @explained exobase_lower, exobase_upper
 */
export function findExobaseBand(along: NumberAlong, bulk: NumberAlong): ExobaseBand {
  const first = risingThrough(bulk, bandEnd)[0] ?? Infinity;
  const upper = first < Infinity ? first : null;
  const crossings = risingThrough(along, 0);
  const below = crossings.filter((height) => height < first);
  const exobase = below.pop() ?? (along === bulk ? null : (crossings[0] ?? null));
  const middle =
    along === bulk ? exobase : (risingThrough(bulk, 0).findLast((height) => height < first) ?? upper);
  if (middle === null) return { lower: null, exobase, upper, others: below };
  const lower = risingThrough(bulk, bandStart).findLast((height) => height < middle) ?? null;
  return { lower, exobase, upper, others: below };
}

function risingThrough(along: NumberAlong, logValue: number): number[] {
  return findCrossings(along, logValue).flatMap(({ height, isUpward }) => (isUpward ? [height] : []));
}

/** What the end of a march tells about a column. */
export interface ColumnEnd {
  /** The number of the criterion. */
  along: NumberAlong;
  band: ExobaseBand;
  /** Geopotential height of the top, m; an exobase beyond does not count. */
  top: number;
  /** Escape parameter at the base, of the mean mass and the lowest temperature anywhere above. */
  baseEscapeParameter: number;
  /** Whether Kn fell where that parameter was below 2. */
  isRunaway: boolean;
}

/**
 * The exobase by a criterion, or why there is none.
 *
 * @source [Chamberlain1963] for the exobase; [OpikSinger1959] for the bound of a hydrostatic column
 */
export function exobaseOutcome(end: ColumnEnd): ExobaseOutcome {
  const { along, band, top, baseEscapeParameter, isRunaway } = end;
  const { criterion } = along.number;
  const name = nameOfNumber(criterion);
  const baseFault = faultOfBase(criterion, exponential(along.values[0]), baseEscapeParameter);
  if (baseFault !== null) return notFound(end, baseFault.reason, baseFault.message);
  if (band.exobase !== null && band.exobase <= top) return exobaseAt(end, band.exobase);
  if (isRunaway) {
    return notFound(
      end,
      "runaway",
      `The ${name} never reaches 1: the gas becomes unbound before it becomes free of collisions. ` +
        "It leaves as a wind.",
    );
  }
  return notFound(
    end,
    "top_below_exobase",
    `The ${name} is still below 1 at the top, ${inKilometres(end, top)}. ` +
      "Raise the top, or leave it out to have it found.",
  );
}

/** What is wrong with the base alone, where the number of the criterion is `baseNumber`; null if nothing is. */
export function faultOfBase(
  criterion: ExobaseCriterion,
  baseNumber: number,
  baseEscapeParameter: number,
): { reason: "base_above_exobase" | "base_unbound"; message: string } | null {
  if (baseNumber >= 1) {
    return {
      reason: "base_above_exobase",
      message:
        `The ${nameOfNumber(criterion)} is ${short(baseNumber)} at the base already: the exobase lies ` +
        "below it. Start the column deeper, or with more gas.",
    };
  }
  if (baseEscapeParameter < smallestBoundParameter) {
    return {
      reason: "base_unbound",
      message:
        `The escape parameter of the mean mass is ${short(baseEscapeParameter)} at the base; below ` +
        `${smallestBoundParameter} no hydrostatic column is held. The gas leaves as a wind.`,
    };
  }
  return null;
}

/** The exobase at a height, with its band as far as the top. */
export function exobaseAt(
  { along, band, top }: Pick<ColumnEnd, "along" | "band" | "top">,
  exobase: number,
): Extract<ExobaseOutcome, { found: true }> {
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
    notes:
      otherAltitudes.length > 0
        ? [severalExobases(otherAltitudes, nameOfNumber(along.number.criterion))]
        : [],
  };
}

const state = new Float64Array(maximumDimension);

function severalExobases(altitudes: number[], name: string): PhysicsNote {
  const list = altitudes.map((altitude) => `${short(altitude / 1000)} km`).join(", ");
  return {
    level: "caution",
    code: "several_exobases",
    message:
      `The ${name} passes 1 more than once, since a light gas takes over from a heavy one; also at ${list}. ` +
      "The exobase given is the last passage before the Knudsen number reaches 10.",
  };
}

function notFound(
  end: ColumnEnd,
  reason: Extract<ExobaseOutcome, { found: false }>["reason"],
  message: string,
): ExobaseOutcome {
  const { along, top } = end;
  const { logValue, height } = findLargest(along, top);
  const largest = exponential(logValue);
  const name = nameOfNumber(along.number.criterion);
  return {
    found: false,
    reason,
    message: `${message} The largest ${name} is ${short(largest)}, at ${inKilometres(end, height)}.`,
    largestKnudsen: largest,
    altitudeOfLargest: altitudeOf(along.path.problem, height),
  };
}

function inKilometres({ along }: ColumnEnd, height: number): string {
  return `${short(altitudeOf(along.path.problem, height) / 1000)} km`;
}

function short(value: number): string {
  return String(Number(value.toPrecision(4)));
}
