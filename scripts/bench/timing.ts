import { performance } from "node:perf_hooks";

/** Median times of a task and of the plain loop beside it. */
export interface Timing {
  /** ms, warm. */
  median: number;
  /** Median of task over plain loop, each pair timed one after the other. */
  ratio: number;
}

export type Timer = (task: () => void) => Timing;

export interface BenchTable {
  title: string;
  remark: string;
  columns: readonly string[];
  rows: readonly (readonly string[])[];
}

/** How long (ms) and how often at least a task is warmed up and measured; a busy machine may give little of either. */
const warming = { duration: 400, turns: 100 };
const measuring = { duration: 1200, turns: 60 };

/** Times a task in turn with the plain loop, so that both meet the same load. */
export const timer: Timer = (task) => {
  repeatFor(warming, () => {
    plainLoop();
    task();
  });
  const times: number[] = [];
  const ratios: number[] = [];
  repeatFor(measuring, () => {
    const beforeLoop = performance.now();
    plainLoop();
    const before = performance.now();
    task();
    const after = performance.now();
    times.push(after - before);
    ratios.push((after - before) / (before - beforeLoop));
  });
  return { median: median(times), ratio: median(ratios) };
};

function repeatFor(least: { duration: number; turns: number }, turn: () => void): void {
  const end = performance.now() + least.duration;
  for (let turns = 0; turns < least.turns || performance.now() < end; turns += 1) turn();
}

const loopValues = new Float64Array(64).map((_, i) => 1 + i / 64);

/** 64 × 1,600 multiplications and additions and 1,600 divisions on an array: about 0.1 ms. */
export function plainLoop(): number {
  let sum = 0;
  for (let round = 0; round < 1600; round += 1) {
    const scale = 1 / (1 + round);
    for (let i = 0; i < loopValues.length; i += 1) sum = sum * 0.5 + loopValues[i] * scale;
  }
  return sum;
}

export function median(values: number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.floor(sorted.length / 2)];
}

export function printTable({ title, remark, columns, rows }: BenchTable): void {
  const widths = columns.map((column, k) => Math.max(column.length, ...rows.map((row) => row[k].length)));
  const line = (cells: readonly string[]) => cells.map((cell, k) => cell.padStart(widths[k])).join("  ");
  console.log(`\n${title}\n${remark}\n`);
  for (const row of [columns, ...rows]) console.log(line(row));
}
