import type { CellResult } from "../../../../../shared/notebook/result";

/** Whether any point of a sweep has a number to draw. */
export function hasSweptAnswer({ tables }: Pick<CellResult, "tables">): boolean {
  const watched = (tables.quantities ?? [])
    .filter(({ part }) => part === "watched")
    .map(({ name }) => String(name));
  return (tables.rows ?? []).some((row) => watched.some((name) => typeof row[name] === "number"));
}

/** Whether any draw of a spread has one. */
export function hasSpreadAnswer({ values, tables }: Pick<CellResult, "values" | "tables">): boolean {
  const isQuantile = /\.(median|lower|upper|q2_5|q97_5)$/;
  return (
    (tables.sensitivity?.length ?? 0) > 0 &&
    Object.entries(values).some(([name, { value }]) => isQuantile.test(name) && typeof value === "number")
  );
}
