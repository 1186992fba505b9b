// `npx tsx scripts/try-columns.ts [from] [to]`: solves the columns of that many random planets (3,000 unless told)
// and prints what came out, what is not a number, and how far half the tolerance moves any number. Run it after
// a change to the integrator; the tests try only a few hundred.
import { performance } from "node:perf_hooks";

import { solveColumn } from "../shared/physics/index";
import { numbersOf, verdictOf } from "../tests/shared/physics/column/columnAnswers";
import { randomColumn } from "../tests/shared/physics/column/randomColumn";

const [from, to] = [Number(process.argv[2] ?? 0), Number(process.argv[3] ?? 3000)];
const tally = new Map<string, number>();
const count = (what: string) => tally.set(what, (tally.get(what) ?? 0) + 1);
const times: number[] = [];
let worst = { change: 0, seed: -1 };

for (let seed = from; seed < to; seed += 1) {
  const input = randomColumn(seed);
  try {
    const before = performance.now();
    const column = solveColumn(input);
    times.push(performance.now() - before);
    count(verdictOf(column));
    for (const note of column.notes) count(`note ${note.code}`);
    const finer = solveColumn(input, 5e-11);
    if (verdictOf(finer) !== verdictOf(column))
      console.log(`seed ${seed}: ${verdictOf(finer)} at half the tolerance`);
    const expected = numbersOf(finer);
    numbersOf(column).forEach((value, k) => {
      if (!Number.isFinite(value)) console.log(`seed ${seed}: number ${k} is ${value}`);
      const change = Math.abs(value - expected[k]) / Math.max(Math.abs(expected[k]), 1e-100);
      if (change > worst.change) worst = { change, seed };
    });
  } catch (error) {
    count("refused");
    console.log(`seed ${seed}: ${String(error)}`);
  }
}

times.sort((a, b) => a - b);
const quantile = (share: number) => times[Math.floor(share * (times.length - 1))].toFixed(2);
for (const [what, number] of [...tally].sort()) console.log(`${String(number).padStart(6)}  ${what}`);
console.log(`largest change at half the tolerance: ${worst.change.toExponential(1)}, seed ${worst.seed}`);
console.log(
  `ms: median ${quantile(0.5)}, 90 % ${quantile(0.9)}, 99 % ${quantile(0.99)}, largest ${quantile(1)}`,
);
