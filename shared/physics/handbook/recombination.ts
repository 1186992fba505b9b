import { elementaryCharge } from "../constants/codata2022";
import type { Provenance } from "./provenance";

/** One way for an ion and an electron to recombine into two neutrals. */
export interface RecombinationChannel {
  /** Formulas of the two, which `handbookGases` knows. */
  products: readonly [string, string];
  /** Their states, as written by spectroscopists. */
  states: readonly [string, string];
  /** Kinetic energy that the two share, J. */
  energy: number;
  /** Share of recombinations that go this way; null where none is published here. */
  branching: number | null;
  provenance: { energy: Provenance; branching: Provenance | null };
}

/** α = A (T₀/T_e)^s up to and including an electron temperature; the last piece has no end. */
export interface RecombinationPiece {
  upTo: number;
  /** A, m³ s⁻¹. */
  coefficient: number;
  /** T₀, K. */
  referenceTemperature: number;
  exponent: number;
}

export interface RecombiningIon {
  formula: string;
  rate: { pieces: readonly RecombinationPiece[]; provenance: Provenance };
  channels: readonly RecombinationChannel[];
  /** Another published set of branchings, in the order of the channels. */
  otherBranchings: readonly { branchings: readonly number[]; provenance: Provenance }[];
}

type Row = [
  products: readonly [string, string],
  states: readonly [string, string],
  energyEv: number,
  branching: number | null,
  energyMark?: Provenance,
];

function channels(
  rows: readonly Row[],
  energies: Provenance,
  branchings: Provenance | null,
): RecombinationChannel[] {
  return rows.map(([products, states, energyEv, branching, own]) => ({
    products,
    states,
    energy: energyEv * elementaryCharge.value,
    branching,
    provenance: { energy: own ?? energies, branching: branching === null ? null : branchings },
  }));
}

/** Of A in cm³ s⁻¹ at 300 K. */
const law = (coefficientCm3: number, exponent: number): RecombinationPiece => ({
  upTo: Infinity,
  coefficient: coefficientCm3 / 1e6,
  referenceTemperature: 300,
  exponent,
});

const secondary = (source: string, note?: string): Provenance => ({
  source,
  mark: "secondary",
  ...(note && { note }),
});
const fromMemory = (source: string, note?: string): Provenance => ({
  source,
  mark: "from memory",
  ...(note && { note }),
});

/**
 * Molecular ions whose recombination makes fast atoms, with the energy of each channel for an ion in its lowest
 * vibrational state and slow electrons, the share of each, and the rate coefficient.
 */
export const recombiningIons: readonly RecombiningIon[] = [
  {
    formula: "O2+",
    rate: {
      pieces: [
        { upTo: 1200, coefficient: 1.953e-13, referenceTemperature: 300, exponent: 0.7 },
        { upTo: Infinity, coefficient: 7.389e-14, referenceTemperature: 1200, exponent: 0.56 },
      ],
      provenance: secondary("MehrBiondi1969"),
    },
    channels: channels(
      [
        [["O", "O"], ["3P", "3P"], 6.99, 0.22],
        [["O", "O"], ["3P", "1D"], 5.02, 0.42],
        [["O", "O"], ["1D", "1D"], 3.06, 0.31],
        [["O", "O"], ["1D", "1S"], 0.84, 0.05, secondary("FoxHac1997", "0.83 or 0.84 eV")],
      ],
      secondary("FoxHac1997"),
      secondary("Kella1997"),
    ),
    otherBranchings: [
      {
        branchings: [0.265, 0.473, 0.204, 0.058],
        provenance: secondary("Petrignani2005", "lowest vibrational state"),
      },
    ],
  },
  {
    formula: "CO+",
    rate: { pieces: [law(2.75e-7, 0.55)], provenance: fromMemory("Rosen1998", "all channels together") },
    channels: channels(
      [
        [["C", "O"], ["3P", "3P"], 2.9, 0.761, { source: "Rosen1998", mark: "read" }],
        [["C", "O"], ["1D", "3P"], 1.64, 0.145],
        [["C", "O"], ["3P", "1D"], 0.94, 0.094],
      ],
      fromMemory("Rosen1998"),
      { source: "Rosen1998", mark: "read" },
    ),
    otherBranchings: [],
  },
  {
    formula: "N2+",
    rate: { pieces: [law(2.2e-7, 0.39)], provenance: { source: "Zipf1980", mark: "read" } },
    channels: channels(
      [
        [["N", "N"], ["4S", "4S"], 5.82, 0],
        [["N", "N"], ["4S", "2D"], 3.44, 0.37],
        [["N", "N"], ["4S", "2P"], 2.25, 0.11, fromMemory("Peterson1998")],
        [["N", "N"], ["2D", "2D"], 1.04, 0.52],
      ],
      { source: "Peterson1998", mark: "read" },
      fromMemory("Peterson1998", "the numbers were read, which channel each belongs to is from memory"),
    ),
    otherBranchings: [],
  },
  {
    formula: "NO+",
    rate: { pieces: [law(4.0e-7, 0.5)], provenance: { source: "VejbyChristensen1998", mark: "read" } },
    channels: channels(
      [
        [["N", "O"], ["4S", "3P"], 2.75, 0.15],
        [["N", "O"], ["2D", "3P"], 0.38, 0.85],
      ],
      fromMemory("VejbyChristensen1998"),
      { source: "VejbyChristensen1998", mark: "read", note: "0.85; the rest taken for the other channel" },
    ),
    otherBranchings: [],
  },
  {
    formula: "CO2+",
    rate: { pieces: [law(3.5e-7, 0.5)], provenance: secondary("Gougousi1997", "in Fox and Sung (2001)") },
    channels: channels(
      [
        [["CO", "O"], ["X1Σ+", "3P"], 8.31, null],
        [["CO", "O"], ["a3Π", "3P"], 2.3, null],
        [["CO", "O"], ["a′3Σ+", "3P"], 1.26, null],
        [["CO", "O"], ["d3Δ", "3P"], 0.49, null],
      ],
      secondary("Rosati2003", "energies as later works quote them"),
      null,
    ),
    otherBranchings: [],
  },
];

const byFormula = new Map(recombiningIons.map((ion) => [ion.formula, ion]));

/** The ion of a formula such as "O2+"; undefined if the handbook has none. */
export function findRecombiningIon(formula: string): RecombiningIon | undefined {
  return byFormula.get(formula);
}
