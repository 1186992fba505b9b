import type { CellSchema } from "./cellSchema";

/** Bounds of one spread. */
export const spreadLimits = {
  fewestSamples: 64,
  samples: 1_000_000,
  /** Below this the outer quantiles rest on few draws. */
  sparseSamples: 512,
  /** Independent scramblings that the draws are shared among. */
  scramblings: 8,
  seed: 4_294_967_295,
} as const;

/** What uncertain entries make of results. */
export const spreadSchema: CellSchema = {
  kind: "spread",
  group: "explore",
  description: "quantiles of results from uncertain entries, and which entry matters",
  naming: "name",
  takesAnyKey: false,
  entries: [
    {
      key: "watch",
      needed: true,
      form: "results",
      dimension: null,
      description: "Results of cells above, with commas between; they then carry a ±.",
      default: null,
      example: "watch = leak.exobase.altitude",
    },
    {
      key: "samples",
      needed: false,
      form: "quantity",
      dimension: "number",
      bounds: { atLeast: spreadLimits.fewestSamples, atMost: spreadLimits.samples },
      description: "Draws of all uncertain entries together; best is a power of two.",
      default: { text: "samples = 4096", meaning: "in eight scramblings of 512 points" },
      example: "samples = 4096",
    },
    {
      key: "seed",
      needed: false,
      form: "quantity",
      dimension: "number",
      bounds: { atLeast: 0, atMost: spreadLimits.seed },
      description: "Begins the draws; the same seed gives the same draws everywhere.",
      default: { text: "seed = 1", meaning: "the same draws every time" },
      example: "seed = 1",
    },
  ],
};
