import { completeNotebook } from "../../../../shared/notebook/completeNotebook";
import { evaluateNotebook } from "../../../../shared/notebook/evaluateNotebook";
import { finishTask } from "../../../../shared/notebook/finishTask";
import type { CellResult, ResultRow } from "../../../../shared/notebook/result";
import { runTask } from "../../../../shared/notebook/runTask";
import type { TaskAnswer } from "../../../../shared/notebook/tasks";
import { notebookOf, type WrittenCell } from "../evaluateCells";

/** A small warm planet whose column rests on uncertain entries. */
export const given: WrittenCell = [
  "values",
  "given",
  "T_quiet = 240 ± 30 K\nK_base = 1e6 cm^2/s within factor 2\nx_O = 0.5 ± 0.3 %\nidle = 3 km",
];
export const ilmara: WrittenCell = ["body", "ilmara", "mass = 0.41 earth_mass\nradius = 4943 km"];
export const dayside: WrittenCell = [
  "column",
  "dayside",
  `body = ilmara
base = 80 km
number_density = 2.5e14 /cm^3
gases = CO2: rest, O: x_O, H2: 15 ppm
temperature = bates(base = 140 K, exosphere = T_quiet, shape = 0.03 /km)
eddy = power(base = K_base, exponent = 0.5, ceiling = 1e8 cm^2/s)`,
];
export const leak: WrittenCell = ["escape", "leak", "column = dayside\ncoupling = open"];
export const planet: readonly WrittenCell[] = [given, ilmara, dayside, leak];

/** Results of all cells, sweeps and spreads computed. */
export function completed(cells: readonly WrittenCell[]): CellResult[] {
  return completeNotebook(notebookOf(cells)).cells.map(({ result }) => result);
}

/** The result of the last cell, its sweep or spread computed. */
export function completedLast(...cells: readonly WrittenCell[]): CellResult {
  return completed(cells).at(-1)!;
}

/** The answer of the only task, computed in parts that end at the given points. */
export function answerInParts(cells: readonly WrittenCell[], ends: readonly number[]): TaskAnswer {
  const document = notebookOf(cells);
  const [task] = evaluateNotebook(document).tasks;
  const parts = ends.map((to, place) => runTask(document, task, place === 0 ? 0 : ends[place - 1], to));
  return finishTask(document, task, parts.toReversed());
}

export function rowsOf(result: CellResult, table: string): ResultRow[] {
  return result.tables[table] ?? [];
}

export function numberOf(row: ResultRow, key: string): number {
  const value = row[key];
  if (typeof value !== "number") throw new Error(`${key} is ${String(value)}`);
  return value;
}
