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
      key: "criterion",
      needed: false,
      form: "choice",
      dimension: null,
      choices: ["bulk", "gas", "simple", "unit_depth"],
      description:
        "What makes the exobase. bulk: mean free path of the mixture equal to its scale height. gas: the same of one gas. simple: bulk without √2 in the mean free path. unit_depth: one collision on the way out.",
      default: { text: "criterion = bulk", meaning: "mean free path equal to scale height" },
      example: "criterion = simple",
    },
    {
      key: "gas",
      needed: false,
      form: "gasName",
      dimension: null,
      description: "The gas whose mean free path and scale height count, with criterion = gas.",
      default: null,
      example: "gas = O",
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
    {
      key: "coupling",
      needed: false,
      form: "choice",
      dimension: null,
      choices: ["coupled", "open"],
      description:
        "coupled: the gases flow up through the column as they escape. open: the column is solved without a flux, the Jeans flux evaluated after.",
      default: { text: "coupling = coupled", meaning: "the column feels what escapes" },
      example: "coupling = open",
    },
    {
      key: "correction",
      needed: false,
      form: "factors",
      dimension: "number",
      bounds: { above: 0 },
      description: "Factor by which a gas leaves faster or slower than the Jeans rate.",
      default: null,
      example: "correction = H: 0.73 ± 0.03, He: 0.98",
    },
  ],
};
