import { atomicMass } from "../constants/codata2022";
import type { Provenance } from "./provenance";

/** A gas as the handbook knows it. SI; `molarMassU` in u, the same number as g/mol. */
export interface HandbookGas {
  formula: string;
  name: string;
  /** One particle, kg. */
  mass: number;
  /** One particle, u. */
  molarMassU: number;
  /** m; the cross section is πd². */
  collisionDiameter: number;
  /** α, dimensionless; negative for a gas that drifts towards the hot side. */
  thermalDiffusionFactor: number;
  sources: { mass: Provenance[]; collisionDiameter: Provenance; thermalDiffusionFactor: Provenance };
}

/** Masses of atoms in u: of the isotopes for H and D, conventional atomic weights for all others. */
const atoms: Record<string, { massU: number; provenance: Provenance }> = {
  H: { massU: 1.00782503223, provenance: { source: "Wang2012", mark: "secondary", note: "isotope ¹H" } },
  D: { massU: 2.01410177812, provenance: { source: "Wang2012", mark: "secondary", note: "isotope ²H" } },
  He: { massU: 4.002602, provenance: { source: "Meija2016", mark: "secondary" } },
  C: { massU: 12.011, provenance: { source: "Meija2016", mark: "secondary" } },
  N: { massU: 14.007, provenance: { source: "Meija2016", mark: "secondary" } },
  O: { massU: 15.999, provenance: { source: "Meija2016", mark: "secondary" } },
  Ne: { massU: 20.1797, provenance: { source: "Meija2016", mark: "secondary" } },
  S: { massU: 32.06, provenance: { source: "Meija2016", mark: "secondary" } },
  Ar: { massU: 39.95, provenance: { source: "Prohaska2022", mark: "from memory" } },
  Kr: { massU: 83.798, provenance: { source: "Meija2016", mark: "secondary" } },
  Xe: { massU: 131.293, provenance: { source: "Meija2016", mark: "secondary" } },
};

const griMech: Provenance = { source: "GRIMech3", mark: "read", note: "Lennard-Jones σ" };
const likeH: Provenance = { source: "GRIMech3", mark: "by analogy", note: "Lennard-Jones σ of H" };
const likeH2: Provenance = { source: "GRIMech3", mark: "by analogy", note: "Lennard-Jones σ of H2" };
const poling: Provenance = { source: "Poling2001", mark: "secondary", note: "Lennard-Jones σ" };

const standard: Provenance = { source: "USSA1976", mark: "read" };
const standardLikeH: Provenance = { source: "USSA1976", mark: "by analogy", note: "that of H" };
const standardZero: Provenance = {
  source: "USSA1976",
  mark: "by analogy",
  note: "that of the heavier gases",
};

type Sourced = [value: number, provenance: Provenance];

function gas(
  formula: string,
  name: string,
  composition: Record<string, number>,
  [diameterAngstrom, diameterSource]: Sourced,
  [thermalDiffusionFactor, thermalDiffusionSource]: Sourced,
): HandbookGas {
  const parts = Object.entries(composition);
  const molarMassU = parts.reduce((sum, [atom, count]) => sum + count * atoms[atom].massU, 0);
  return {
    formula,
    name,
    mass: molarMassU * atomicMass.value,
    molarMassU,
    collisionDiameter: diameterAngstrom / 1e10,
    thermalDiffusionFactor,
    sources: {
      mass: parts.map(([atom]) => atoms[atom].provenance),
      collisionDiameter: diameterSource,
      thermalDiffusionFactor: thermalDiffusionSource,
    },
  };
}

/**
 * Gases with their default mass, collision diameter and thermal diffusion factor, from light to heavy. The factors
 * are meant for a background of N2 or heavier gas.
 */
export const handbookGases: readonly HandbookGas[] = [
  gas("H", "atomic hydrogen", { H: 1 }, [2.05, griMech], [-0.25, standard]),
  gas("D", "atomic deuterium", { D: 1 }, [2.05, likeH], [-0.25, standardLikeH]),
  gas("H2", "molecular hydrogen", { H: 2 }, [2.92, griMech], [-0.25, standardLikeH]),
  gas("HD", "hydrogen deuteride", { H: 1, D: 1 }, [2.92, likeH2], [-0.25, standardLikeH]),
  gas("He", "helium", { He: 1 }, [2.551, poling], [-0.4, standard]),
  gas("C", "atomic carbon", { C: 1 }, [3.298, griMech], [0, standardZero]),
  gas("CH4", "methane", { C: 1, H: 4 }, [3.746, griMech], [0, standardZero]),
  gas("N", "atomic nitrogen", { N: 1 }, [3.298, griMech], [0, standardZero]),
  gas("O", "atomic oxygen", { O: 1 }, [2.75, griMech], [0, standard]),
  gas("OH", "hydroxyl", { O: 1, H: 1 }, [2.75, griMech], [0, standardZero]),
  gas("NH3", "ammonia", { N: 1, H: 3 }, [2.92, griMech], [0, standardZero]),
  gas("H2O", "water vapour", { H: 2, O: 1 }, [2.605, griMech], [0, standardZero]),
  gas("Ne", "neon", { Ne: 1 }, [2.82, poling], [0, standardZero]),
  gas("CO", "carbon monoxide", { C: 1, O: 1 }, [3.65, griMech], [0, standardZero]),
  gas("N2", "molecular nitrogen", { N: 2 }, [3.621, griMech], [0, standard]),
  gas("NO", "nitric oxide", { N: 1, O: 1 }, [3.621, griMech], [0, standardZero]),
  gas("O2", "molecular oxygen", { O: 2 }, [3.458, griMech], [0, standard]),
  gas("Ar", "argon", { Ar: 1 }, [3.33, griMech], [0, standard]),
  gas("CO2", "carbon dioxide", { C: 1, O: 2 }, [3.763, griMech], [0, standardZero]),
  gas("SO2", "sulphur dioxide", { S: 1, O: 2 }, [4.112, poling], [0, standardZero]),
  gas("Kr", "krypton", { Kr: 1 }, [3.655, poling], [0, standardZero]),
  gas("Xe", "xenon", { Xe: 1 }, [4.047, poling], [0, standardZero]),
];

const byFormula = new Map(handbookGases.map((entry) => [entry.formula, entry]));

/** The gas of a formula such as "CO2"; undefined if the handbook has none. */
export function findGas(formula: string): HandbookGas | undefined {
  return byFormula.get(formula);
}
