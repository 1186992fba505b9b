import type { CellResult, ResultRow } from "../../../shared/notebook/result";
import {
  displayScale,
  formatUnit,
  resultScale,
  unitSpace,
  formatNumber,
  type DisplayScale,
  type UnitSystem,
} from "../../lib/format";
import { resultLabels, type ResultLabel } from "../../lib/resultLabel";
import type { RichText } from "../../lib/richText";

export interface SweepAxis {
  name: string;
  unit: string;
  /** SI; as the notebook has it. */
  written: number | null;
  /** One standard deviation below and above it, where it is uncertain. */
  sigma: readonly [number, number] | null;
  isLog: boolean;
  /** SI, in the order of the points. */
  values: number[];
  scale: DisplayScale;
}

export interface SweptResult extends ResultLabel {
  unit: string;
  written: number | null;
  /** SI, point by point, the first axis fastest; null where there is no answer. */
  values: (number | null)[];
  scale: DisplayScale;
}

/** What a sweep cell answers, read from its tables. */
export interface SweepResult {
  name: string;
  axes: SweepAxis[];
  watched: SweptResult[];
  /** Point by point: the code of the outcome that says why there is no answer. */
  reasons: (string | null)[];
  outcomes: ResultRow[];
}

const numberOf = (value: ResultRow[string] | undefined): number | null =>
  typeof value === "number" ? value : null;

const largest = (values: readonly (number | null)[]): number =>
  values.reduce<number>((most, value) => Math.max(most, Math.abs(value ?? 0)), 0);

/** null where there is nothing to draw: the tables of a sweep that has not been computed. */
export function readSweep(result: CellResult, unitSystem: UnitSystem): SweepResult | null {
  const { rows = [], quantities = [], outcomes = [] } = result.tables;
  if (rows.length === 0 || quantities.length === 0) return null;
  const varied = quantities.filter(({ part }) => part === "varied");
  const watched = quantities.filter(({ part }) => part === "watched");
  const counts = varied.map(({ steps }) => (numberOf(steps) ?? 0) + 1);
  const labels = resultLabels(watched.map(({ name }) => String(name)));
  return {
    name: result.name,
    axes: varied.map((row, index) =>
      readAxis(row, pointsAlong(rows, counts, index, String(row.name)), unitSystem),
    ),
    watched: watched.map((row, index) => {
      const label = labels[index]!;
      const unit = String(row.unit ?? "1");
      const values = rows.map((point) => numberOf(point[label.name]));
      return {
        ...label,
        unit,
        written: numberOf(row.written),
        values,
        scale: resultScale(label.name, unit, unitSystem, largest(values)),
      };
    }),
    reasons: rows.map(({ reason }) => (typeof reason === "string" ? reason : null)),
    outcomes: outcomes.filter(({ level }) => level === "fault"),
  };
}

/** Values along one axis. Of a sweep that was stopped, the first axis may be whole and the second short. */
function pointsAlong(
  rows: readonly ResultRow[],
  counts: readonly number[],
  index: number,
  name: string,
): number[] {
  const stride = counts.slice(0, index).reduce((product, count) => product * count, 1);
  const count = Math.min(counts[index]!, Math.ceil(rows.length / stride));
  return Array.from({ length: count }, (_, step) => numberOf(rows[step * stride]![name]) ?? NaN);
}

function readAxis(row: ResultRow, values: number[], unitSystem: UnitSystem): SweepAxis {
  const unit = String(row.unit ?? "1");
  const [lower, upper] = [numberOf(row.sigma_lower), numberOf(row.sigma_upper)];
  return {
    name: String(row.name),
    unit,
    written: numberOf(row.written),
    sigma: lower !== null && upper !== null ? [lower, upper] : null,
    isLog: row.spacing === "logarithmic",
    values,
    scale: displayScale(unit, unitSystem, largest(values)),
  };
}

/** "428 K" */
export function shownNumber(value: number, { factor, unit }: DisplayScale, digits = 3): RichText {
  const shown = formatUnit(unit);
  const number = formatNumber(value * factor, digits);
  return shown.length > 0 ? [...number, unitSpace, ...shown] : number;
}

/** The same of a number that was written or stepped to: as many digits as it has, four at most. */
export function steppedNumber(value: number, scale: DisplayScale): RichText {
  const [mantissa = ""] = Number((value * scale.factor).toPrecision(4))
    .toExponential()
    .split("e");
  return shownNumber(value, scale, mantissa.replace(/\D/g, "").length);
}

/** "T_quiet, K" */
export function titleOf(words: RichText, { unit }: DisplayScale): RichText {
  const shown = formatUnit(unit);
  return shown.length > 0 ? [...words, ", ", ...shown] : words;
}
