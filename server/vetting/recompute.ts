import { engineVersion } from "../../shared/notebook/engine";
import type { KeptResult } from "../../shared/schemas/results";
import type { Drift } from "../../shared/schemas/references";
import type { Recomputation } from "../../shared/schemas/vettings";
import type { EvaluationAnswer } from "../jobs/evaluator";

type Leaf = readonly [name: string, value: unknown];

/** Every value and every member of a table, by name, in order. */
function leavesOf({ cells }: KeptResult): Leaf[] {
  return cells.flatMap(({ name, values, tables }) => [
    ...Object.entries(values).flatMap(([key, { value, unit, spread }]): Leaf[] => [
      [`${name}.${key}`, value],
      [`${name}.${key} unit`, unit],
      ...Object.entries(spread ?? {}).map(([part, number]): Leaf => [`${name}.${key} ${part}`, number]),
    ]),
    ...Object.entries(tables).flatMap(([table, rows]) =>
      rows.flatMap((row, index) =>
        Object.entries(row).map(([key, value]): Leaf => [`${name}, ${table} ${index + 1}, ${key}`, value]),
      ),
    ),
  ]);
}

const mostNamed = 5;

/** Whether a version's results come out the same again, to the last bit. */
export function compareToTheBit(kept: KeptResult, answer: EvaluationAnswer): Recomputation {
  if (!answer.ok) return { engine: engineVersion, compared: 0, differing: [], failure: answer.reason };
  const before = leavesOf(kept);
  const now = new Map(leavesOf(answer.outcome.result));
  const differing = before.filter(([name, value]) => !now.has(name) || !Object.is(now.get(name), value));
  const known = new Set(before.map(([name]) => name));
  const added = [...now.keys()].filter((name) => !known.has(name));
  return {
    engine: answer.outcome.result.engine,
    compared: before.length,
    differing: [...differing.map(([name]) => name), ...added].slice(0, mostNamed),
    failure: null,
  };
}

/** How far the numbers of a published result have moved. */
export function driftOf(published: KeptResult, answer: EvaluationAnswer): Drift {
  if (!answer.ok) return { largest: null, name: null, changed: 0, failure: answer.reason };
  const before = new Map(leavesOf(published));
  const now = new Map(leavesOf(answer.outcome.result));
  let largest: number | null = null;
  let name: string | null = null;
  let changed = [...now.keys()].filter((key) => !before.has(key)).length;
  for (const [key, then] of before) {
    const value = now.get(key);
    if (typeof then !== "number" || typeof value !== "number") {
      if (!Object.is(then, value)) changed += 1;
      continue;
    }
    if (then === value) continue;
    const move = Math.abs(value - then) / Math.max(Math.abs(then), Number.MIN_VALUE);
    if (largest === null || move > largest) [largest, name] = [move, key];
  }
  return { largest, name, changed, failure: null };
}
