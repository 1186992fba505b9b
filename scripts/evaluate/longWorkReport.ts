/** Sweeps and spreads as text for a terminal; the result document has more: histogram, errors, outcomes. */
import { dimensionOfUnit } from "../../shared/notebook/evaluation/resultUnits";
import { formatPlainNumber, formatQuantity } from "../../shared/notebook/language/formatQuantity";
import type { CellResult, ResultRow } from "../../shared/notebook/result";
import { alignColumns } from "./alignColumns";

const digits = 5;

/** Rows of a sweep, each column with its unit. */
export function sweepLines({ tables }: CellResult): string[] {
  const { rows = [], quantities = [] } = tables;
  if (rows.length === 0) return [];
  const units = new Map(quantities.map(({ name, unit }) => [String(name), String(unit)]));
  const columns = Object.keys(rows[0]);
  const heads = columns.map((column) => {
    const unit = units.get(column) ?? "1";
    return unit === "1" ? column : `${column} [${unit}]`;
  });
  return alignColumns([heads, ...rows.map((row) => columns.map((column) => numberText(row[column])))]);
}

/** Quantiles of each watched result, then what drives it. */
export function spreadLines({ values, tables }: CellResult, unitSystem: "SI" | "cgs"): string[] {
  const watched = Object.keys(values).flatMap((name) =>
    name.endsWith(".median") ? [name.slice(0, -".median".length)] : [],
  );
  if (watched.length === 0) return [];
  const quantiles = ["q2_5", "lower", "median", "upper", "q97_5"];
  const heads = ["", "2.5 %", "16 %", "median", "84 %", "97.5 %"];
  const rows = watched.map((name) => [
    name,
    ...quantiles.map((quantile) => {
      const { value = null, unit = "1" } = values[`${name}.${quantile}`] ?? {};
      return typeof value === "number"
        ? formatQuantity(value, dimensionOfUnit(unit), { unitSystem, digits })
        : "–";
    }),
  ]);
  const driven = (tables.sensitivity ?? []).map((row) => [
    String(row.watched),
    String(row.input),
    withError(row.variance_share, row.variance_share_error),
    withError(row.rank_correlation, row.rank_correlation_error),
  ]);
  return [
    ...alignColumns([heads, ...rows]),
    "",
    ...alignColumns([["what drives", "entry", "share of variance", "rank correlation"], ...driven]),
  ];
}

function withError(value: ResultRow[string], error: ResultRow[string]): string {
  if (typeof value !== "number") return "–";
  return typeof error === "number" ? `${value.toFixed(3)} ± ${error.toFixed(3)}` : value.toFixed(3);
}

function numberText(value: ResultRow[string]): string {
  if (value === null) return "–";
  return typeof value === "string" ? value : formatPlainNumber(value, digits);
}
