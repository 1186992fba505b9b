/** What the draws of one watched result say. */
import {
  histogram,
  log10,
  powerOfTen,
  rankCorrelation,
  sampleQuantile,
  varianceShare,
  type HistogramBin,
} from "../../physics";
import { spreadLimits } from "../kinds/spread";
import { aboveMagnitude, belowMagnitude } from "../tasks";
import { shownValue } from "./taskOutcomes";

export interface SpreadStatistics {
  /** null where no draw has an answer. Errors are one standard error; null where the scramblings give none. */
  quantiles: Record<QuantileName, { value: number | null; error: number | null }> | null;
  /** On which histogram and shares of variance are taken: log10 of what is positive and spans a factor 10. */
  scale: "linear" | "log10";
  /** By input. */
  sensitivity: InputSensitivity[];
  histogram: HistogramBin[];
}

export interface InputSensitivity {
  correlation: number | null;
  correlationError: number | null;
  share: number | null;
  shareError: number | null;
}

const probabilities = { median: 0.5, lower: 0.16, upper: 0.84, q2_5: 0.025, q97_5: 0.975 } as const;
export type QuantileName = keyof typeof probabilities;

/** The middle 95 % of a positive result over more than this factor are taken on a logarithmic scale. */
const wideFactor = 10;

/**
 * @param values       by draw; NaN without answer
 * @param coordinates  by input, then by draw
 */
export function spreadStatistics(
  values: Float64Array,
  coordinates: readonly Float64Array[],
): SpreadStatistics {
  const sorted = values.filter((value) => !Number.isNaN(value)).sort();
  const isNowhere = sorted.length === 0;
  const groups = Array.from({ length: spreadLimits.scramblings }, (_, group) =>
    values
      .filter((value, index) => index % spreadLimits.scramblings === group && !Number.isNaN(value))
      .sort(),
  );
  const [low, high] = isNowhere ? [0, 0] : [sampleQuantile(sorted, 0.025), sampleQuantile(sorted, 0.975)];
  const isWide = !isNowhere && sorted[0] > 0 && high > wideFactor * low;
  const isWhole = !sorted.some((value) => value === belowMagnitude || value === aboveMagnitude);
  const scaled =
    isWide && isWhole ? values.map((value) => (Number.isNaN(value) ? NaN : log10(value))) : values;
  return {
    quantiles: isNowhere ? null : quantilesOf(sorted, groups),
    scale: isWide ? "log10" : "linear",
    sensitivity: coordinates.map((input) => sensitivityTo(input, scaled, isWhole)),
    histogram: isNowhere || !isWhole ? [] : histogramOf(sorted, isWide),
  };
}

function quantilesOf(
  sorted: Float64Array,
  groups: readonly Float64Array[],
): NonNullable<SpreadStatistics["quantiles"]> {
  const of = (probability: number) => ({
    value: shownValue(within(sampleQuantile(sorted, probability))),
    error: groups.every(({ length }) => length > 0)
      ? standardError(groups.map((group) => shownValue(within(sampleQuantile(group, probability)))))
      : null,
  });
  const { median, lower, upper, q2_5, q97_5 } = probabilities;
  return {
    median: of(median),
    lower: of(lower),
    upper: of(upper),
    q2_5: of(q2_5),
    q97_5: of(q97_5),
  };
}

/** A mean of a value and of one without a value is none itself. */
function within(value: number): number {
  if (value !== 0 && Math.abs(value) < 1e-300) return belowMagnitude;
  return Math.abs(value) > 1e300 ? aboveMagnitude : value;
}

/** Of the mean of independent estimates; null for fewer than two, or where one has no value. */
function standardError(estimates: readonly (number | null)[]): number | null {
  const known = estimates.filter((estimate) => estimate !== null);
  const count = known.length;
  if (count < 2 || count < estimates.length) return null;
  const mean = known.reduce((sum, estimate) => sum + estimate / count, 0);
  const largest = known.reduce((most, estimate) => Math.max(most, Math.abs(estimate - mean)), 0);
  if (largest === 0) return 0;
  // Over the largest deviation, so that squares of tiny or huge results neither vanish nor overflow.
  const squares = known.reduce((sum, estimate) => {
    const deviation = (estimate - mean) / largest;
    return sum + deviation * deviation;
  }, 0);
  return largest * Math.sqrt(squares / (count - 1) / count);
}

function sensitivityTo(input: Float64Array, values: Float64Array, isWhole: boolean): InputSensitivity {
  const { scramblings } = spreadLimits;
  const known = indices(values, () => true);
  const correlations = Array.from({ length: scramblings }, (_, group) =>
    correlationOver(
      input,
      values,
      indices(values, (index) => index % scramblings === group),
    ),
  );
  const share = isWhole ? varianceShare(input, values, scramblings) : null;
  return {
    correlation: correlationOver(input, values, known),
    correlationError: standardError(correlations),
    share: share?.share ?? null,
    shareError: share?.error ?? null,
  };
}

/** Of the draws that have an answer. */
function indices(values: Float64Array, isTaken: (index: number) => boolean): number[] {
  const taken: number[] = [];
  values.forEach((value, index) => {
    if (!Number.isNaN(value) && isTaken(index)) taken.push(index);
  });
  return taken;
}

function correlationOver(input: Float64Array, values: Float64Array, draws: readonly number[]): number | null {
  const pick = (from: Float64Array) => Float64Array.from(draws, (index) => from[index]);
  return rankCorrelation(pick(input), pick(values));
}

function histogramOf(sorted: Float64Array, isWide: boolean): HistogramBin[] {
  if (!isWide) return histogram(sorted);
  const [first, last] = [sorted[0], sorted[sorted.length - 1]];
  const bins = histogram(sorted.map(log10));
  return bins.map(({ from, to, count }, index) => ({
    from: index === 0 ? first : powerOfTen(from),
    to: index === bins.length - 1 ? last : powerOfTen(to),
    count,
  }));
}
