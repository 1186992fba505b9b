import { truncatedDistribution, type PhysicalBounds } from "../../physics";
import type { JoinedParts } from "../finishTask";
import { dimensionless } from "../language/dimensions";
import { formatPlainNumber, formatQuantity, siUnitText } from "../language/formatQuantity";
import type { CellResult, ResultRow } from "../result";
import { aboveMagnitude, belowMagnitude, type TaskAnswer } from "../tasks";
import type { OpenTask, WrittenInput } from "./openTask";
import { measured } from "./resultValue";
import { spreadDraws } from "./spreadDraws";
import { spreadStatistics, type SpreadStatistics } from "./spreadStatistics";
import { outcomeNotes, outcomeRows } from "./taskOutcomes";
import type { SpreadPlan } from "./taskPlan";

/** Quantiles of each watched name with their errors, what drives it, its histogram, and how the inputs were drawn. */
export function spreadAnswer(
  open: OpenTask,
  joined: JoinedParts,
): Pick<TaskAnswer, "values" | "tables" | "notes" | "spreads" | "drawn"> {
  const coordinates = coordinatesOf(open.plan as SpreadPlan, joined.done);
  const statistics = joined.values.map((values) => spreadStatistics(values, coordinates));
  const names = open.inputs.map(({ name }) => name);
  const isPartial = joined.done < open.plan.points;
  return {
    values: {
      ...Object.assign({}, ...statistics.map((each, index) => valuesOf(open.written[index], each))),
      draws: measured(joined.done, "1"),
      faulted_share: measured(faultedShare(joined), "1"),
    },
    tables: {
      sensitivity: statistics.flatMap((each, index) => sensitivityRows(open.plan.watch[index], names, each)),
      histogram: statistics.flatMap((each, index) => histogramRows(open.plan.watch[index], each)),
      inputs: open.inputs.map(inputRow),
      ...outcomeRows(joined),
    },
    notes: [
      ...open.inputs.flatMap(cutNote),
      ...open.plan.watch.flatMap((name, index) => magnitudeNote(name, joined.values[index])),
      ...outcomeNotes(joined, "draws"),
    ],
    spreads: Object.fromEntries(
      statistics.flatMap(({ quantiles }, index) => {
        const { median, lower, upper, q2_5, q97_5 } = quantiles ?? {};
        if (!median || !lower || !upper || !q2_5 || !q97_5) return [];
        const spread = {
          median: median.value,
          lower: lower.value,
          upper: upper.value,
          q2_5: q2_5.value,
          q97_5: q97_5.value,
          ...(isPartial ? { isPartial: true as const } : {}),
        };
        return [[open.plan.watch[index], spread]];
      }),
    ),
    drawn: names,
  };
}

/** By input, then by draw. */
function coordinatesOf(plan: SpreadPlan, done: number): Float64Array[] {
  const draws = spreadDraws(plan);
  const coordinates = plan.trace.inputs.map(() => new Float64Array(done));
  for (let index = 0; index < done; index += 1)
    draws.coordinatesAt(index).forEach((u, input) => (coordinates[input][index] = u));
  return coordinates;
}

function faultedShare({ outcomes, done }: JoinedParts): number {
  const faulted = new Set(outcomes.flatMap(({ level, points }) => (level === "fault" ? points : [])));
  return done === 0 ? 0 : faulted.size / done;
}

function valuesOf(
  { name, unit }: OpenTask["written"][number],
  { quantiles }: SpreadStatistics,
): CellResult["values"] {
  return Object.fromEntries(
    Object.entries(quantiles ?? {}).flatMap(([quantile, { value, error }]) => [
      [`${name}.${quantile}`, measured(value, unit)],
      ...(error === null ? [] : [[`${name}.${quantile}_error`, measured(error, unit)]]),
    ]),
  );
}

/** What drives a result, the strongest first. */
function sensitivityRows(
  watched: string,
  inputs: readonly string[],
  { sensitivity, scale }: SpreadStatistics,
): ResultRow[] {
  return sensitivity
    .map(({ correlation, correlationError, share, shareError }, index) => ({
      watched,
      input: inputs[index],
      scale,
      rank_correlation: correlation,
      rank_correlation_error: correlationError,
      variance_share: share,
      variance_share_error: shareError,
    }))
    .toSorted((a, b) => (b.variance_share ?? 0) - (a.variance_share ?? 0));
}

function histogramRows(watched: string, { histogram, scale }: SpreadStatistics): ResultRow[] {
  return histogram.map(({ from, to, count }) => ({ watched, scale, from, to, count }));
}

function inputRow({ name, uncertainty, dimension, bounds }: WrittenInput): ResultRow {
  const parameters = {
    normal: "mean" in uncertainty ? [uncertainty.mean, uncertainty.deviation] : [],
    uniform: "lower" in uncertainty ? [uncertainty.lower, uncertainty.upper] : [],
    log_normal: "median" in uncertainty ? [uncertainty.median, uncertainty.factor] : [],
  }[uncertainty.form];
  return {
    input: name,
    unit: siUnitText(dimension),
    distribution: uncertainty.form,
    first: parameters[0],
    second: parameters[1],
    lower_bound: Number.isFinite(bounds.lower) ? bounds.lower : null,
    upper_bound: Number.isFinite(bounds.upper) ? bounds.upper : null,
  };
}

/** A smaller part of a distribution than this is cut without a word. */
const noticeable = 1e-6;

function cutNote({ name, uncertainty, dimension, bounds }: WrittenInput): TaskAnswer["notes"] {
  const cut = truncatedDistribution(uncertainty, bounds)?.cut ?? 1;
  if (cut < noticeable) return [];
  const shown = (bound: number) =>
    bound === 0 ? "zero" : formatQuantity(bound, dimension ?? dimensionless, { unitSystem: "SI" });
  const share = formatPlainNumber(100 * cut, 2);
  const message = `*${name}* is kept ${boundsInWords(bounds, shown)}; ${share} % of its distribution lie beyond and are cut off, the rest is drawn in proportion.`;
  return [{ level: "remark", code: "cut_at_bounds", message }];
}

function boundsInWords({ lower, upper }: PhysicalBounds, shown: (bound: number) => string): string {
  if (!Number.isFinite(upper)) return `above ${shown(lower)}`;
  if (!Number.isFinite(lower)) return `below ${shown(upper)}`;
  return `between ${shown(lower)} and ${shown(upper)}`;
}

/** Draws whose value only the log10 twin carries spoil the statistics of the value itself. */
function magnitudeNote(name: string, values: Float64Array): TaskAnswer["notes"] {
  const count = values.filter((value) => value === belowMagnitude || value === aboveMagnitude).length;
  if (count === 0) return [];
  const twin = name.replace(/([^.]+)$/, "log10_$1");
  const message = `In ${count} of ${values.length} draws *${name}* lies outside 1e-300 to 1e300 and has no value: it counts in the quantiles, but there is no share of variance and no histogram. Watch *${twin}* instead.`;
  return [{ level: "caution", code: "beyond_magnitude", message }];
}
