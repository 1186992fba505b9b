// `npx tsx scripts/try-coupled.ts [from] [to]`: solves the coupled columns of that many random planets (3,000 unless
// told) and prints what came out, what is not a number, which searches ended without an answer, and how far half the
// tolerance moves any rate or number. Run it after a change to the solver; the tests try only a few hundred.
import { performance } from "node:perf_hooks";

import { solveCoupledColumn } from "../shared/physics/index";
import { randomColumn } from "../tests/shared/physics/column/randomColumn";
import { numbersOf } from "../tests/shared/physics/coupling/coupledSamples";

const [from, to] = [Number(process.argv[2] ?? 0), Number(process.argv[3] ?? 3000)];
const tally = new Map<string, number>();
const count = (what: string) => tally.set(what, (tally.get(what) ?? 0) + 1);
const times: number[] = [];
const marches: number[] = [];
let worstRate = { change: 0, seed: -1 };
let worstNumber = { change: 0, seed: -1 };

for (let seed = from; seed < to; seed += 1) {
  const input = { ...randomColumn(seed), criterion: { kind: "bulk" }, corrections: {} } as const;
  try {
    const before = performance.now();
    const outcome = solveCoupledColumn(input);
    times.push(performance.now() - before);
    count(outcome.converged ? "converged" : outcome.reason);
    if (!outcome.converged) {
      if (outcome.reason === "not_converged") console.log(`seed ${seed}: ${outcome.message}`);
      continue;
    }
    marches.push(outcome.marches);
    for (const note of outcome.notes) count(`note ${note.code}`);
    const finer = solveCoupledColumn(input, 5e-11);
    if (!finer.converged) {
      console.log(`seed ${seed}: ${finer.reason} at half the tolerance`);
      continue;
    }
    outcome.gases.forEach(({ logRate }, i) => {
      const change = Math.abs(logRate - finer.gases[i].logRate) / Math.LN10;
      if (change > worstRate.change) worstRate = { change, seed };
    });
    const expected = numbersOf(finer);
    numbersOf(outcome).forEach((value, k) => {
      if (!Number.isFinite(value)) console.log(`seed ${seed}: number ${k} is ${value}`);
      if (Math.abs(value) < 1e-100) return;
      const change = Math.abs(value - expected[k]) / Math.abs(expected[k]);
      if (change > worstNumber.change) worstNumber = { change, seed };
    });
  } catch (error) {
    count("refused");
    console.log(`seed ${seed}: ${String(error)}`);
  }
}

const quantiles = (values: number[], digits: number) => {
  const sorted = [...values].sort((a, b) => a - b);
  const at = (share: number) => sorted[Math.floor(share * (sorted.length - 1))].toFixed(digits);
  return `median ${at(0.5)}, 90 % ${at(0.9)}, 99 % ${at(0.99)}, largest ${at(1)}`;
};
for (const [what, number] of [...tally].sort()) console.log(`${String(number).padStart(6)}  ${what}`);
console.log(
  `largest change of log10 of a rate: ${worstRate.change.toExponential(1)}, seed ${worstRate.seed}`,
);
console.log(
  `largest change of another number: ${worstNumber.change.toExponential(1)}, seed ${worstNumber.seed}`,
);
console.log(`ms: ${quantiles(times, 2)}`);
console.log(`marches: ${quantiles(marches, 0)}`);
