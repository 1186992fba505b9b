// `npm run bench`: how fast the engine is, each figure also as a ratio to a plain loop of floating-point work that
// is timed in the same run, so that figures of different machines and hours can be compared. Add a file to
// scripts/bench/ that exports a function from a `Timer` to a `BenchTable`, and name it here.
import { columnBench } from "./bench/columnBench";
import { coupledBench } from "./bench/coupledBench";
import { evaluationBench } from "./bench/evaluationBench";
import { spreadBench } from "./bench/spreadBench";
import { printTable, timer } from "./bench/timing";

for (const bench of [columnBench, coupledBench, evaluationBench, spreadBench]) printTable(bench(timer));
