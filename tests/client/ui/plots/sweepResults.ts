import { completeNotebook } from "../../../../shared/notebook/completeNotebook";
import type { CellResult } from "../../../../shared/notebook/result";
import { aCell, aNotebook } from "../../features/notebook/aNotebook";

/** What the last of some small cells answers; `given` stands above them. */
export function answerOf(kind: "sweep" | "spread", text: string, given = arithmetic): CellResult {
  const cells = [
    aCell({ id: "given", kind: "values", name: "given", text: given }),
    aCell({ id: "asked", kind, name: "asked", text }),
  ];
  return completeNotebook(aNotebook({ cells })).cells.at(-1)!.result;
}

/** Arithmetic whose every value is known without computing it. */
const arithmetic = [
  "x = 4 ± 1",
  "r = 2 within factor 2",
  "e = between 3 and 9",
  "length = x * 1 km",
  "root = sqrt(x)",
  "tenfold = exp(2.302585092994046 * (x + r))",
  "both = x + r",
].join("\n");

/** A sweep as an escape cell would answer it: a gas's rate, a height, a point without an answer. */
export const gasSweep: CellResult = {
  kind: "sweep",
  name: "warmer",
  status: "caution",
  values: {},
  notes: [],
  tables: {
    quantities: [
      {
        name: "T",
        part: "varied",
        unit: "K",
        written: 250,
        from: 200,
        to: 400,
        steps: 2,
        spacing: "linear",
        sigma_lower: 220,
        sigma_upper: 280,
      },
      {
        name: "leak.exobase.altitude",
        part: "watched",
        unit: "m",
        written: 2.2e5,
        from: null,
        to: null,
        steps: null,
        spacing: null,
      },
      {
        name: "leak.H.rate",
        part: "watched",
        unit: "s^-1",
        written: 2e25,
        from: null,
        to: null,
        steps: null,
        spacing: null,
      },
      {
        name: "leak.H2.rate",
        part: "watched",
        unit: "s^-1",
        written: 2e23,
        from: null,
        to: null,
        steps: null,
        spacing: null,
      },
    ],
    rows: [
      { T: 200, "leak.exobase.altitude": 2e5, "leak.H.rate": 1e25, "leak.H2.rate": 1e22, reason: null },
      { T: 300, "leak.exobase.altitude": 2.5e5, "leak.H.rate": 1e26, "leak.H2.rate": 1e24, reason: null },
      {
        T: 400,
        "leak.exobase.altitude": null,
        "leak.H.rate": null,
        "leak.H2.rate": null,
        reason: "no_exobase_runaway",
      },
    ],
    outcomes: [
      {
        level: "fault",
        cell: "leak",
        code: "no_exobase_runaway",
        count: 1,
        share: 1 / 3,
        first: 2,
        message: "No exobase.",
      },
    ],
  },
};

export const inks: Record<string, string> = {
  ink: "#111111",
  ink2: "#222222",
  ink3: "#444444",
  paper: "#ffffff",
  redline: "#aa2222",
  pale: "#fefefe",
  deep: "#010101",
  H: "#123456",
  H2: "#654321",
  ...Object.fromEntries(
    ["f6edd1", "f0d0a0", "ebb27b", "e29264", "d2755b", "ba5c63", "964c6f", "6d426e", "463a5c", "292e42"].map(
      (hex, step) => [`map${step}`, `#${hex}`],
    ),
  ),
};
