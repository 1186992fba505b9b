import type { CellResult, ResultRow } from "../../../shared/notebook/result";
import { resultScale, type DisplayScale, type UnitSystem } from "../../lib/format";
import { resultLabels, type ResultLabel } from "../../lib/resultLabel";

export const quantileNames = ["q2_5", "lower", "median", "upper", "q97_5"] as const;
export type QuantileName = (typeof quantileNames)[number];

export interface SpreadBin {
  /** SI */
  from: number;
  to: number;
  count: number;
}

export interface SpreadWatched extends ResultLabel {
  unit: string;
  scale: DisplayScale;
  /** Histogram and shares of variance are of its logarithm. */
  isLog: boolean;
  bins: SpreadBin[];
  /** SI; null where there is none. Errors are one standard error. */
  quantiles: Record<QuantileName, { value: number | null; error: number | null }>;
  /** First-order share of the variance by uncertain entry, where there is one. */
  shares: ReadonlyMap<string, { share: number | null; error: number | null }>;
}

/** What a spread cell answers, read from its values and tables. */
export interface SpreadResult {
  name: string;
  draws: number;
  /** Of the draws, those without an answer. */
  faultedShare: number;
  watched: SpreadWatched[];
  /** Uncertain entries, the one that drives the first watched result most first. */
  inputs: string[];
}

const numberOf = (value: ResultRow[string] | undefined): number | null =>
  typeof value === "number" ? value : null;

/** null where nothing has been computed. */
export function readSpread(
  { name, values, tables }: CellResult,
  unitSystem: UnitSystem,
): SpreadResult | null {
  const draws = numberOf(values.draws?.value);
  const { sensitivity = [], histogram = [] } = tables;
  if (draws === null || sensitivity.length === 0) return null;
  const names = [...new Set(sensitivity.map(({ watched }) => String(watched)))];
  return {
    name,
    draws,
    faultedShare: numberOf(values.faulted_share?.value) ?? 0,
    watched: resultLabels(names).map((label) =>
      readWatched(label, values, sensitivity, histogram, unitSystem),
    ),
    inputs: sensitivity.flatMap(({ watched, input }) => (watched === names[0] ? [String(input)] : [])),
  };
}

function readWatched(
  label: ResultLabel,
  values: CellResult["values"],
  sensitivity: readonly ResultRow[],
  histogram: readonly ResultRow[],
  unitSystem: UnitSystem,
): SpreadWatched {
  const own = sensitivity.filter(({ watched }) => watched === label.name);
  const unit = values[`${label.name}.median`]?.unit ?? "1";
  const quantiles = Object.fromEntries(
    quantileNames.map((quantile) => {
      const key = `${label.name}.${quantile}`;
      return [
        quantile,
        { value: numberOf(values[key]?.value), error: numberOf(values[`${key}_error`]?.value) },
      ];
    }),
  ) as SpreadWatched["quantiles"];
  return {
    ...label,
    unit,
    scale: resultScale(label.name, unit, unitSystem, quantiles.median.value ?? 0),
    isLog: own[0]?.scale === "log10",
    bins: histogram.flatMap((row) => {
      const [from, to, count] = [numberOf(row.from), numberOf(row.to), numberOf(row.count)];
      return row.watched === label.name && from !== null && to !== null
        ? [{ from, to, count: count ?? 0 }]
        : [];
    }),
    quantiles,
    shares: new Map(
      own.map((row) => [
        String(row.input),
        { share: numberOf(row.variance_share), error: numberOf(row.variance_share_error) },
      ]),
    ),
  };
}
