import type { Provenance } from "./provenance";

/** A published ratio of the actual to the Jeans flux. */
export interface JeansCorrection {
  /** Of what, as it reads after "for". */
  gas: string;
  low: number;
  high: number;
  provenance: Provenance;
}

/** A light trace gas: fast particles leave faster than collisions with the background replace them. */
export const traceGasCorrection: JeansCorrection = {
  gas: "a light gas in a heavier one",
  low: 0.7,
  high: 0.8,
  provenance: { source: "ChamberlainCampbell1967", mark: "from memory" },
};

/** One gas alone, expanding as a whole: it drifts, and so loses more. */
export const singleGasCorrection: JeansCorrection = {
  gas: "a single gas",
  low: 1.4,
  high: 1.7,
  provenance: { source: "Volkov2011", mark: "from memory", note: "hard spheres and Maxwell molecules" },
};

/** What is published of how far escape departs from the Jeans flux of the exobase. */
export const jeansCorrections: readonly JeansCorrection[] = [
  {
    gas: "H at Earth",
    low: 0.7,
    high: 0.75,
    provenance: { source: "Brinkmann1970", mark: "read", note: "abstract" },
  },
  {
    gas: "He at Earth",
    low: 0.97,
    high: 0.99,
    provenance: { source: "Brinkmann1970", mark: "read", note: "abstract" },
  },
  traceGasCorrection,
  {
    gas: "a light gas in a heavier one (review)",
    low: 0.7,
    high: 0.8,
    provenance: { source: "ShizgalArkos1996", mark: "from memory" },
  },
  singleGasCorrection,
  {
    gas: "Pluto as a whole",
    low: 0.5,
    high: 2,
    provenance: { source: "Tucker2012", mark: "read", note: "abstract: within a factor of 2" },
  },
];
