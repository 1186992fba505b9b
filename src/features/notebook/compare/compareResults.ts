import { findRecord, withSubject } from "../../../../shared/notebook/explanations/explanations";
import type { CellEvaluation, CellResult, ResultValue } from "../../../../shared/notebook/result";

/** A magnitude by its value, or by its logarithm where it is too small or too large for one. */
export interface Magnitude {
  value: number | null;
  log10: number | null;
}

export interface ResultDifference {
  /** `leak.H.rate` */
  name: string;
  /** Without its cell. */
  key: string;
  words: string;
  unit: string;
  /** Among the few that tell most. */
  isMain: boolean;
  older: Magnitude | string | null;
  newer: Magnitude | string | null;
  /** log10 of newer over older; null where there is no such ratio. */
  log10Ratio: number | null;
}

export interface ResultComparison {
  differing: ResultDifference[];
  /** Results that both have, equal but for the last digits. */
  same: number;
}

/** What is needed of a cell that was computed. */
export type ComparedCell = Pick<CellEvaluation, "result" | "gases">;

/** Results that differ by less are the same: a thousandth of what any figure or table shows. */
const alike = 1e-9;

/** Results of two states side by side, in the order of the newer one; what `values` cells state is compared as entries. */
export function compareResults(
  older: readonly ComparedCell[],
  newer: readonly ComparedCell[],
): ResultComparison {
  const before = new Map(older.map((cell) => [cell.result.name, cell]));
  const after = new Map(newer.map((cell) => [cell.result.name, cell]));
  const names = [...after.keys(), ...[...before.keys()].filter((name) => !after.has(name))];
  const rows = names.flatMap((name) => compareCell(before.get(name), after.get(name)));
  const differing = rows.filter(isDifferent);
  return { differing, same: rows.length - differing.length };
}

/** What leaves, from where, and what that comes to. */
const main =
  /^(exobase\.(altitude|temperature)|[A-Z][A-Za-z0-9]*\.(rate|supply_fraction)|water_layer|surface_pressure|[^.]+\+\.escape_rate)$/;

function compareCell(before: ComparedCell | undefined, after: ComparedCell | undefined): ResultDifference[] {
  const [older, newer] = [before?.result, after?.result];
  const { kind, name } = (newer ?? older)!;
  const [gas] = (after ?? before)!.gases;
  if (kind === "values" || kind === "prose" || kind === "gas") return [];
  const keys = new Set([...Object.keys(newer?.values ?? {}), ...Object.keys(older?.values ?? {})]);
  return [...keys].flatMap((key): ResultDifference[] => {
    if (/(^|\.)log10_/.test(key)) return [];
    const found = findRecord(kind, key);
    if (!found || found.record.formula === null) return [];
    const [one, other] = [older?.values[key], newer?.values[key]];
    const [from, to] = [magnitudeOf(older, key), magnitudeOf(newer, key)];
    return [
      {
        name: `${name}.${key}`,
        key,
        // A corona or a loss is of the one gas that its entry names.
        words: withSubject(found.record.words, found.subject ?? gas ?? null),
        unit: unitOf(other ?? one),
        isMain: main.test(key),
        older: from,
        newer: to,
        log10Ratio: ratioOf(from, to),
      },
    ];
  });
}

const unitOf = (value: ResultValue | undefined): string => value?.unit ?? "1";

function magnitudeOf(cell: CellResult | undefined, key: string): Magnitude | string | null {
  const value = cell?.values[key]?.value;
  if (value === undefined) return null;
  if (typeof value === "string") return value;
  const twin = cell?.values[key.replace(/([^.]+)$/, "log10_$1")]?.value;
  return { value, log10: typeof twin === "number" ? twin : null };
}

function ratioOf(older: Magnitude | string | null, newer: Magnitude | string | null): number | null {
  if (older === null || newer === null || typeof older === "string" || typeof newer === "string") return null;
  const [before, after] = [logOf(older), logOf(newer)];
  return before === null || after === null ? null : after - before;
}

function logOf({ value, log10 }: Magnitude): number | null {
  if (log10 !== null) return log10;
  return value !== null && value > 0 ? Math.log10(value) : null;
}

function isDifferent({ older, newer, log10Ratio }: ResultDifference): boolean {
  if (older === null || newer === null || typeof older === "string" || typeof newer === "string")
    return older !== newer;
  if (log10Ratio !== null) return Math.abs(log10Ratio) > alike / Math.LN10;
  return Math.abs((older.value ?? 0) - (newer.value ?? 0)) > alike * Math.abs(older.value ?? 0);
}
