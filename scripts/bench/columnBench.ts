import { defaultTolerance, solveColumn, type Column } from "../../shared/physics/index";
import { benchColumn, benchGasCounts } from "./benchColumns";
import type { BenchTable, Timer } from "./timing";

/** The open column: from its base to beyond Kn = 10, with exobase, band and homopauses. */
export function columnBench(time: Timer): BenchTable {
  const rows = benchGasCounts.flatMap((gases) =>
    (["half", "measured"] as const).flatMap((exponents) =>
      [1e-9, defaultTolerance].map((tolerance) => {
        const input = benchColumn(gases, exponents);
        const column = solveColumn(input, tolerance);
        const { median, ratio } = time(() => solveColumn(input, tolerance));
        return [
          String(gases),
          exponents,
          tolerance.toExponential(0),
          median.toFixed(3),
          ratio.toFixed(2),
          String(column.evaluations),
          largestError(column, solveColumn(input, 1e-13)).toExponential(0),
        ];
      }),
    ),
  );
  return {
    title: "Open column",
    remark: "Warm medians; error: the largest of ln n of any gas at 200 altitudes against tolerance 1e-13.",
    columns: ["gases", "exponents", "tolerance", "ms", "÷ plain loop", "evaluations", "error"],
    rows,
  };
}

function largestError(column: Column, exact: Column): number {
  const { input, topAltitude } = column;
  let largest = 0;
  for (let k = 0; k < 200; k += 1) {
    const altitude = input.baseAltitude + (k / 200) * (topAltitude - input.baseAltitude);
    const [some, all] = [column, exact].map((solved) => solved.levelAt(altitude).logNumberDensities);
    some.forEach((value, i) => (largest = Math.max(largest, Math.abs(value - all[i]))));
  }
  return largest;
}
