import type { Provenance } from "./provenance";

/** One published binary collision parameter, b(T) = A (T/1 K)^s. */
export interface CollisionRow {
  /** Formulas; "air" and "other" where the source lumps gases together. */
  gases: readonly [string, string];
  /** A, m⁻¹ s⁻¹. */
  coefficient: number;
  exponent: number;
  /**
   * `measured`: a law fitted to measurements by its source. `estimated`: the source itself guessed it or scaled it
   * from another pair. `fitted`: a law fitted here to a printed table of D.
   */
  basis: "measured" | "estimated" | "fitted";
  /** Temperatures that the law was found for, K, where they are known. */
  validTemperatures?: { from: number; to: number };
  provenance: Provenance;
}

const row = (
  first: string,
  second: string,
  coefficient: number,
  exponent: number,
  basis: CollisionRow["basis"],
  provenance: Provenance,
): CollisionRow => ({
  gases: [first, second],
  coefficient,
  exponent,
  basis,
  ...(provenance === crc && { validTemperatures: crcTemperatures }),
  provenance,
});

const masonMarrero: Provenance = {
  source: "Pavlov2019",
  mark: "secondary",
  note: "after Mason and Marrero (1970) and Marrero and Mason (1972)",
};
const hunten: Provenance = { source: "Hunten1973", mark: "secondary", note: "table 1" };
const huntenGuess: Provenance = { source: "Hunten1973", mark: "secondary", note: "table 1, estimated there" };
const marreroMason: Provenance = { source: "MarreroMason1972", mark: "secondary" };
const olderLaw: Provenance = {
  source: "BanksKockarts1973",
  mark: "secondary",
  note: "older law, given there as A (T/200 K)^s",
};
const standardAir: Provenance = {
  source: "Minzner1976",
  mark: "read",
  note: "D = a (T/273.15 K)^s/n, converted",
};
const crc: Provenance = {
  source: "CRCDiffusion",
  mark: "secondary",
  note: "fitted to the D printed for 101,325 Pa, within 200 to 673 K",
};
const crcTemperatures = { from: 200, to: 673 };

/**
 * What is published for each pair. The first `measured` row of a pair is its default (`collisionParameter`); the
 * others stand beside it for comparison, and so do all rows of D and HD.
 */
export const collisionRows: readonly CollisionRow[] = [
  row("O2", "N2", 8.29e18, 0.724, "measured", masonMarrero),
  row("O", "N2", 9.69e18, 0.774, "measured", masonMarrero),
  row("He", "N2", 4.335e19, 0.648, "measured", masonMarrero),
  row("O", "O2", 9.69e18, 0.774, "measured", masonMarrero),
  row("He", "O2", 3.21e19, 0.71, "measured", masonMarrero),
  row("H", "O2", 4.672e19, 0.749, "measured", masonMarrero),
  row("O", "He", 3.43e19, 0.749, "measured", masonMarrero),
  row("H", "O", 4.383e19, 0.76, "measured", masonMarrero),
  row("H", "He", 1.042e20, 0.732, "measured", masonMarrero),
  row("Ar", "N2", 6.63e18, 0.752, "measured", masonMarrero),
  row("Ar", "O2", 7.17e18, 0.736, "measured", masonMarrero),
  row("Ar", "O", 5.51e18, 0.841, "measured", masonMarrero),
  row("Ar", "He", 3.622e19, 0.689, "measured", masonMarrero),
  row("H", "CO2", 8.4e19, 0.597, "measured", hunten),
  row("H2", "CO2", 2.23e19, 0.75, "measured", hunten),
  row("D", "CO2", 5.98e19, 0.597, "estimated", huntenGuess),
  row("HD", "CO2", 1.84e19, 0.75, "estimated", huntenGuess),
  row("other", "CO2", 1e19, 0.75, "estimated", huntenGuess),
  row("H", "O", 4.8e19, 0.75, "measured", { source: "ZahnleKasting1986", mark: "secondary" }),
  row("H", "N2", 4.87e19, 0.698, "measured", marreroMason),
  row("H2", "N2", 2.8e19, 0.74, "measured", marreroMason),
  row("CH4", "N2", 7.34e18, 0.75, "measured", { source: "BanksKockarts1973", mark: "secondary" }),
  row("CH4", "O2", 7.51e18, 0.759, "measured", marreroMason),
  row("CH4", "H2", 2.2965e19, 0.765, "measured", { source: "Moses2000", mark: "read" }),
  row("H2", "air", 2.67e19, 0.75, "measured", {
    source: "MarreroMason1972",
    mark: "from memory",
    note: "a fit to the CRC table gives the same",
  }),
  row("H", "air", 6.5e19, 0.7, "measured", { source: "BanksKockarts1973", mark: "from memory" }),
  row("H", "N2", 5.0768141756666315e19, 0.75, "measured", olderLaw),
  row("H2", "N2", 2.6324221651604754e19, 0.75, "measured", olderLaw),
  row("H", "H2", 8.3e19, 0.728, "measured", { source: "MarreroMason1972", mark: "from memory" }),
  row("D", "H2", 7.183e19, 0.728, "measured", { source: "MasonMarrero1970", mark: "from memory" }),
  row("H", "He", 1.04e20, 0.732, "measured", { source: "Hu2015", mark: "from memory" }),
  row("H2", "N2", 1.88e19, 0.82, "measured", { source: "Atreya1986", mark: "from memory" }),
  row("O", "air", 1.0397470040754317e19, 0.75, "measured", standardAir),
  row("O2", "air", 7.237746465529381e18, 0.75, "measured", standardAir),
  row("Ar", "air", 3.4063323676641075e18, 0.87, "measured", standardAir),
  row("He", "air", 3.5228624688354726e19, 0.691, "measured", standardAir),
  row("H", "air", 1.9997276951729357e20, 0.5, "measured", standardAir),
  row("Ar", "air", 6.649e18, 0.7509, "fitted", crc),
  row("CH4", "air", 7.519e18, 0.7478, "fitted", crc),
  row("CO", "air", 8.294e18, 0.7285, "fitted", crc),
  row("CO2", "air", 3.767e18, 0.823, "fitted", crc),
  row("H2", "air", 2.671e19, 0.75, "fitted", crc),
  row("H2O", "air", 4.722e18, 0.8604, "fitted", crc),
  row("He", "air", 2.782e19, 0.7285, "fitted", crc),
  row("Ar", "CO", 6.675e18, 0.7511, "fitted", crc),
  row("Ar", "CO2", 2.813e18, 0.8596, "fitted", crc),
  row("Ar", "H2", 2.278e19, 0.7868, "fitted", crc),
  row("Ar", "He", 3.938e19, 0.6743, "fitted", crc),
  row("Ar", "N2", 6.675e18, 0.7511, "fitted", crc),
  row("Ar", "Ne", 1.363e19, 0.7123, "fitted", crc),
  row("Ar", "O2", 7.186e18, 0.7356, "fitted", crc),
  row("CH4", "H2", 2.303e19, 0.7646, "fitted", crc),
  row("CH4", "He", 2.302e19, 0.7496, "fitted", crc),
  row("CH4", "N2", 7.419e18, 0.7483, "fitted", crc),
  row("CH4", "O2", 6.038e18, 0.795, "fitted", crc),
];
