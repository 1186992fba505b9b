import type { CellSchema } from "./cellSchema";

/** Bounds of one sweep. */
export const sweepLimits = { points: 100_000 } as const;

/** One or two quantities varied in steps, everything else as written. */
export const sweepSchema: CellSchema = {
  kind: "sweep",
  group: "explore",
  description: "one or two quantities varied in steps; curves or a map",
  naming: "name",
  takesAnyKey: false,
  entries: [
    {
      key: "vary",
      needed: true,
      form: "variation",
      dimension: null,
      description: "An entry of a values cell, from one value to another; N steps are N + 1 points.",
      default: null,
      example: "vary = T_quiet from 180 K to 350 K in 40 steps",
    },
    {
      key: "watch",
      needed: true,
      form: "results",
      dimension: null,
      description: "Results of cells above, with commas between.",
      default: null,
      example: "watch = leak.exobase.altitude",
    },
    {
      key: "against",
      needed: false,
      form: "variation",
      dimension: null,
      description: "A second entry that is varied, so that the answer is a map.",
      default: null,
      example: "against = K_base from 1e5 cm^2/s to 1e8 cm^2/s in 30 steps, logarithmic",
    },
  ],
};
