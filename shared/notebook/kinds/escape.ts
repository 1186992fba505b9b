import type { CellSchema } from "./cellSchema";

/** The exobase of a column, and how each gas leaves there. */
export const escapeSchema: CellSchema = {
  kind: "escape",
  group: "answer",
  description: "exobase, flux and rate of each gas",
  naming: "name",
  takesAnyKey: false,
  entries: [
    {
      key: "column",
      needed: true,
      form: "cell",
      dimension: null,
      names: "column",
      description: "The column that the gas escapes from: the name of a column cell above.",
      default: null,
      example: "column = dayside",
    },
    {
      key: "coupling",
      needed: true,
      form: "choice",
      dimension: null,
      choices: ["open"],
      description: "open: the column is solved without a flux, the Jeans flux evaluated after.",
      default: null,
      example: "coupling = open",
    },
    {
      key: "criterion",
      needed: false,
      form: "choice",
      dimension: null,
      choices: ["bulk"],
      description: "bulk: the exobase is where the mean free path of the mixture equals its scale height.",
      default: { text: "criterion = bulk", meaning: "mean free path equal to scale height" },
      example: "criterion = bulk",
    },
    {
      key: "gases",
      needed: false,
      form: "gasNames",
      dimension: null,
      description: "Gases to answer for.",
      default: { text: "gases of the column", meaning: "all of them" },
      example: "gases = H, H2, O",
    },
  ],
};
