/** How one comparison, or several of a kind, are written in a row. */
import {
  type Agreement,
  isCompared,
  isRange,
  type NumberRange,
  type SingleNumber,
  strain,
} from "./agreement";

export interface ToldAgreement {
  /** The comparison that comes nearest to its tolerance. */
  worst: Agreement;
  count: number;
}

/** One row for all that share quantity, unit and source, where their first stands. */
export function collapse(rows: readonly Agreement[]): ToldAgreement[] {
  const told = new Map<string, ToldAgreement>();
  for (const row of rows) {
    const key = JSON.stringify([row.what, row.unit, row.source, row.mark]);
    const before = told.get(key);
    if (!before) told.set(key, { worst: row, count: 1 });
    else {
      before.count += 1;
      if (strainOf(row) > strainOf(before.worst)) before.worst = row;
    }
  }
  return [...told.values()];
}

const strainOf = (row: Agreement): number => (isRange(row) || isCompared(row) ? 0 : strain(row));

/** Six significant digits; powers of ten as e where plain digits would be long. */
export function writeNumber(value: number, digits = 6): string {
  if (value === Infinity) return "∞";
  const rounded = Number(value.toPrecision(digits));
  const size = Math.abs(rounded);
  const text = size !== 0 && (size < 1e-3 || size >= 1e6) ? rounded.toExponential() : String(rounded);
  return text.replace("e+", "e").replace(/^-/, "−");
}

/** A number as its source prints it; what has more digits than print, a computed one, in six. */
export function writePublished(value: number): string {
  const asPrinted = Number(value.toPrecision(12));
  return writeNumber(value, asPrinted === value ? 12 : 6);
}

/** Below this, ours and the outside number are told to be the same unless the tolerance is as small. */
const hardlyAny = 1e-12;

export function writeDeviation(row: SingleNumber & { ours: number }): string {
  const { ours, published, within } = row;
  if (ours === published) return "0";
  const deviation = published === 0 ? ours : ours / published - 1;
  const allowed = (within.relative ?? 0) + (within.absolute ?? 0) / Math.abs(published || 1);
  if (Math.abs(deviation) < hardlyAny && allowed > 10 * hardlyAny) return `below ${hardlyAny}`;
  const sign = deviation < 0 ? "−" : "+";
  return `${sign}${Number(Math.abs(deviation).toPrecision(2)).toExponential().replace("e+", "e")}`;
}

export function writeTolerance(row: (SingleNumber | NumberRange) & { ours: number }): string {
  if (isRange(row)) {
    const [lowest, highest] = row.within.range;
    if (highest === Infinity) return `${writeNumber(lowest)} and more`;
    return `${writeNumber(lowest)} to ${writeNumber(highest)}`;
  }
  const { relative, absolute } = row.within as SingleNumber["within"];
  if (relative === 0) return "exact";
  const unit = row.unit === "1" ? "" : ` ${row.unit}`;
  const parts = [
    relative === undefined ? "" : writeNumber(relative, 2),
    absolute === undefined ? "" : `± ${writeNumber(absolute, 2)}${unit}`,
  ];
  return parts.filter((text) => text !== "").join(" ");
}
