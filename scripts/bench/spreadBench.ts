import type { NotebookDocument } from "../../shared/notebook/document";
import { evaluateNotebook } from "../../shared/notebook/evaluateNotebook";
import { finishTask } from "../../shared/notebook/finishTask";
import { taskRunner } from "../../shared/notebook/runTask";
import type { BenchTable, Timer } from "./timing";

const draws = 10_000;

/** Draws of one timed turn; the turns go on through the sequence, so that no two are the same. */
const drawsAtOnce = 8;

const mixtures: Record<string, string> = {
  "3": "CO2: rest, O: x_O, H: x_H",
  "5": "CO2: rest, N2: 3 %, Ar: 1.6 %, O: x_O, H: x_H",
  "8": "CO2: rest, N2: 2.7 %, Ar: 1.6 %, CO: 0.1 %, O2: 0.12 %, O: x_O, H2: x_H2, H: x_H",
};

/** A spread of what escapes: temperature ± 15 %, mixing and light gases within a factor 2. */
export function spreadBench(time: Timer): BenchTable {
  const couplings = ["open", "coupled"] as const;
  const turns = Object.entries(mixtures).flatMap(([gases, mixture]) =>
    couplings.map((coupling) => [gases, coupling, mixture] as const),
  );
  const rows = turns.map(([gases, coupling, mixture]) => {
    const document = documentOf(mixture, coupling);
    const [task] = evaluateNotebook(document).tasks;
    const run = taskRunner(document, task);
    // The engine takes a while to settle on so much code.
    run(0, 400);
    let next = 0;
    const { median, ratio } = time(() => {
      run(next, next + drawsAtOnce);
      next = (next + drawsAtOnce) % (draws - drawsAtOnce);
    });
    const each = median / drawsAtOnce;
    const part = run(0, 512);
    const begun = performance.now();
    finishTask(document, task, [part]);
    const finished = performance.now() - begun;
    return [
      gases,
      coupling,
      each.toFixed(3),
      (ratio / drawsAtOnce).toFixed(1),
      ((each * draws) / 1000).toFixed(1),
      finished.toFixed(0),
    ];
  });
  return {
    title: "Spread",
    remark: `Warm medians on one thread; the seconds are those of ${draws} draws at that pace.`,
    columns: ["gases", "coupling", "ms a draw", "÷ plain loop", "s", "ms for the answer of 512"],
    rows,
  };
}

function documentOf(mixture: string, coupling: "open" | "coupled"): NotebookDocument {
  const cells = [
    [
      "values",
      "given",
      `T_quiet = 240 K ± 15 %
K_base = 3e5 cm^2/s within factor 2
x_O = 0.4 % within factor 2
x_H = 1 ppm within factor 2
x_H2 = 15 ppm within factor 2`,
    ],
    ["body", "ilmara", "gm = 4.2828e13 m^3/s^2\nradius = 3389.5 km"],
    [
      "column",
      "dayside",
      `body = ilmara
base = 70 km
number_density = 8e14 /cm^3
gases = ${mixture}
temperature = bates(base = 140 K, exosphere = T_quiet, shape = 0.04 /km)
eddy = power(base = K_base, exponent = 0.5, ceiling = 3e7 cm^2/s)`,
    ],
    ["escape", "leak", `column = dayside\ncoupling = ${coupling}`],
    ["spread", "sure", `watch = leak.H.rate, leak.exobase.altitude\nsamples = ${draws}`],
  ] as const;
  return {
    format: 1,
    title: "Spread",
    unitSystem: "SI",
    headline: [],
    authors: [],
    cells: cells.map(([kind, name, text]) => ({ id: name, kind, name, text })),
  };
}
