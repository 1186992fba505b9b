import { defaultTolerance, solveCoupledColumn, type CoupledInput } from "../../shared/physics/index";
import { benchColumn, benchGasCounts } from "./benchColumns";
import type { BenchTable, Timer } from "./timing";

/** The coupled column: escape, exobase and profile solved together, with supply shares, band and homopauses. */
export function coupledBench(time: Timer): BenchTable {
  const rows = benchGasCounts.flatMap((gases) =>
    [1e-9, defaultTolerance].map((tolerance) => {
      const input: CoupledInput = {
        ...benchColumn(gases, "measured"),
        criterion: { kind: "bulk" },
        corrections: {},
      };
      const { marches, evaluations } = solveCoupledColumn(input, tolerance);
      const { median, ratio } = time(() => solveCoupledColumn(input, tolerance));
      return [
        String(gases),
        tolerance.toExponential(0),
        median.toFixed(3),
        ratio.toFixed(2),
        String(marches),
        String(evaluations),
        largestError(input, tolerance).toExponential(0),
      ];
    }),
  );
  return {
    title: "Coupled column",
    remark: "Warm medians; error: the largest of ln of any rate against tolerance 1e-13.",
    columns: ["gases", "tolerance", "ms", "÷ plain loop", "marches", "evaluations", "error"],
    rows,
  };
}

function largestError(input: CoupledInput, tolerance: number): number {
  const [some, all] = [tolerance, 1e-13].map((each) => solveCoupledColumn(input, each));
  if (!some.converged || !all.converged) throw new Error("The column that is timed has an exobase.");
  return Math.max(...some.gases.map(({ logRate }, i) => Math.abs(logRate - all.gases[i].logRate)));
}
