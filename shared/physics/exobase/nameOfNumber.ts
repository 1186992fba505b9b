import type { ExobaseCriterion } from "../types";

/** What the number that is 1 at the exobase is called in a sentence, after "the". */
export function nameOfNumber(criterion: ExobaseCriterion): string {
  switch (criterion.kind) {
    case "bulk":
      return "Knudsen number";
    case "simple":
      return "Knudsen number without √2";
    case "gas":
      return `mean free path of ${criterion.formula} over its scale height`;
    case "unit_depth":
      return "inverse of the collisional depth from there up";
  }
}
