import type { PhysicalConstant } from "./physicalConstant";

/** The CODATA recommended values of 2022, as far as they are used here. */

export const boltzmann: PhysicalConstant = {
  symbol: "k",
  name: "Boltzmann constant",
  value: 1.380649e-23,
  unit: "J K⁻¹",
  uncertainty: 0,
  source: "CODATA2022",
};

export const avogadro: PhysicalConstant = {
  symbol: "N_A",
  name: "Avogadro constant",
  value: 6.02214076e23,
  unit: "mol⁻¹",
  uncertainty: 0,
  source: "CODATA2022",
};

export const gravitationalConstant: PhysicalConstant = {
  symbol: "G",
  name: "Newtonian constant of gravitation",
  value: 6.6743e-11,
  unit: "m³ kg⁻¹ s⁻²",
  uncertainty: 0.00015e-11,
  source: "CODATA2022",
};

export const atomicMass: PhysicalConstant = {
  symbol: "m_u",
  name: "atomic mass constant",
  value: 1.66053906892e-27,
  unit: "kg",
  uncertainty: 0.00000000052e-27,
  source: "CODATA2022",
};

export const elementaryCharge: PhysicalConstant = {
  symbol: "e",
  name: "elementary charge",
  value: 1.602176634e-19,
  unit: "C",
  uncertainty: 0,
  source: "CODATA2022",
};

export const electronMass: PhysicalConstant = {
  symbol: "m_e",
  name: "electron mass",
  value: 9.1093837139e-31,
  unit: "kg",
  uncertainty: 0.0000000028e-31,
  source: "CODATA2022",
};

export const codata2022: readonly PhysicalConstant[] = [
  boltzmann,
  avogadro,
  gravitationalConstant,
  atomicMass,
  elementaryCharge,
  electronMass,
];
