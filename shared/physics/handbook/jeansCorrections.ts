import type { Provenance } from "./provenance";

/** A published ratio of the actual to the Jeans flux. */
export interface JeansCorrection {
  /** Of what, as it reads after "for". */
  gas: string;
  /** The one gas it holds for; null where it is meant in general. */
  formula: string | null;
  low: number;
  high: number;
  provenance: Provenance;
}

/** A light trace gas: fast particles leave sooner than collisions with the background replace them. */
const traceGasCorrection: JeansCorrection = {
  gas: "a light gas in a heavier one",
  formula: null,
  low: 0.7,
  high: 0.8,
  provenance: {
    source: "ChamberlainCampbell1967",
    mark: "from memory",
    note: "the review of Shizgal and Arkos (1996) gives the same range",
  },
};

/** One gas alone: it expands as a whole, drifts, and so loses more. */
export const singleGasCorrection: JeansCorrection = {
  gas: "a single gas",
  formula: null,
  low: 1.4,
  high: 1.7,
  provenance: { source: "Volkov2011", mark: "from memory", note: "hard spheres and Maxwell molecules" },
};

/** What is published of how far escape departs from the Jeans flux of the exobase. */
export const jeansCorrections: readonly JeansCorrection[] = [
  {
    gas: "H at Earth",
    formula: "H",
    low: 0.7,
    high: 0.75,
    provenance: { source: "Brinkmann1970", mark: "read", note: "abstract" },
  },
  {
    gas: "He at Earth",
    formula: "He",
    low: 0.97,
    high: 0.99,
    provenance: { source: "Brinkmann1970", mark: "read", note: "abstract" },
  },
  traceGasCorrection,
  singleGasCorrection,
];
