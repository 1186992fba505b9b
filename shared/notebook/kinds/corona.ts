import type { CellSchema } from "./cellSchema";

/** One gas above the exobase, by kind of orbit. */
export const coronaSchema: CellSchema = {
  kind: "corona",
  group: "answer",
  description: "a gas above the exobase, by kind of orbit",
  naming: "name",
  takesAnyKey: false,
  entries: [
    {
      key: "escape",
      needed: true,
      form: "cell",
      dimension: null,
      names: "escape",
      description: "The exobase that the corona begins at: the name of an escape cell above.",
      default: null,
      example: "escape = leak",
    },
    {
      key: "gas",
      needed: true,
      form: "gasName",
      dimension: null,
      description: "The gas of the corona, one of the column's.",
      default: null,
      example: "gas = H",
    },
    {
      key: "satellites",
      needed: false,
      form: "quantity",
      dimension: "number",
      bounds: { atLeast: 0, atMost: 1 },
      description: "Share of the satellite orbits that is filled: those that never cross the exobase.",
      default: { text: "satellites = 0", meaning: "no satellite orbits" },
      example: "satellites = 0.3",
    },
    {
      key: "reach",
      needed: false,
      form: "quantity",
      dimension: "length",
      description: "Altitude up to which the corona is drawn, and beyond which no satellite orbit is filled.",
      default: { text: "reach = 10 radii", meaning: "ten times the body's radius" },
      example: "reach = 30000 km",
    },
    {
      key: "levels",
      needed: false,
      form: "lengths",
      dimension: "length",
      description: "Altitudes to tabulate, with the columns along the limb and overhead.",
      default: null,
      example: "levels = 1000 km, 3000 km, 10000 km",
    },
  ],
};
