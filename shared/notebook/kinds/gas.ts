import type { CellSchema } from "./cellSchema";

/** A gas by its formula; what it states holds instead of the handbook in the cells below. */
export const gasSchema: CellSchema = {
  kind: "gas",
  group: "set up",
  description: "a gas of your own, or a better cross section",
  naming: "formula",
  takesAnyKey: false,
  entries: [
    {
      key: "mass",
      needed: false,
      form: "quantity",
      dimension: "mass",
      bounds: { above: 0 },
      description: "Mass of one particle. Needed where the handbook does not know the gas.",
      default: { text: "mass of the handbook", meaning: "conventional atomic weights, isotopes for H and D" },
      example: "mass = 44.0095 u",
    },
    {
      key: "cross_section",
      needed: false,
      form: "quantity",
      dimension: "area",
      bounds: { above: 0 },
      description:
        "Cross section σ = πd² for the mean free path. Needed where the handbook does not know the gas.",
      default: { text: "cross_section of the handbook", meaning: "from Lennard-Jones diameters" },
      example: "cross_section = 4.1e-15 cm^2",
    },
    {
      key: "thermal_diffusion",
      needed: false,
      form: "quantity",
      dimension: "number",
      description: "Thermal diffusion factor α.",
      default: { text: "thermal_diffusion of the handbook", meaning: "0 where it does not know the gas" },
      example: "thermal_diffusion = -0.25",
    },
    {
      key: "collision",
      needed: false,
      form: "pairs",
      dimension: null,
      description: "Binary collision parameter b = A (T/1 K)^s with each gas named.",
      default: {
        text: "collision of the handbook",
        meaning: "measured pairs, else estimated from the masses",
      },
      example: "collision = CO2: binary(A = 8.4e17 /(cm s), s = 0.597)",
    },
  ],
};
