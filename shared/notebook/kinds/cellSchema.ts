import type { CellKind } from "../document";
import type { QuantityName } from "../language/dimensions";

/** Bounds of a number in SI. */
export interface Bounds {
  above?: number;
  atLeast?: number;
  below?: number;
  atMost?: number;
}

/** What one entry takes: serves evaluation, completion, hover, forms and help. */
export interface EntrySchema {
  key: string;
  /** "one" needs company: exactly one of the entries of the same `oneOf` is needed. */
  needed: boolean | "one";
  oneOf?: readonly string[];
  /**
   * quantity: one number with a unit. profile: a quantity, or a call such as bates(…). gases: a list of gases with
   * fractions. gasName: a formula. gasNames: a list of formulas. factors: a list of gases, each with a number.
   * pairs: a list of gases with binary(…). lengths: a list of altitudes. samples: a quantity, or points(…) against
   * altitude. history: points(…) against age. ion: an ion such as O2+. variation: a name from one value to another in
   * steps. results: names of results. cell: the name of a cell above. choice: one of
   * `choices`. handbook: handbook(Name).
   */
  form:
    | "quantity"
    | "profile"
    | "gases"
    | "gasName"
    | "gasNames"
    | "factors"
    | "pairs"
    | "lengths"
    | "samples"
    | "history"
    | "ion"
    | "variation"
    | "results"
    | "cell"
    | "choice"
    | "handbook";
  /** Kind of the quantity, or of each number in a list or profile. */
  dimension: QuantityName | null;
  bounds?: Bounds;
  choices?: readonly string[];
  /** For `cell`: the kind that is named. */
  names?: CellKind;
  /** One line. */
  description: string;
  /** What acts when the entry is left out; `null` where nothing does. */
  default: { text: string; meaning: string } | null;
  example: string;
}

/** What one kind of cell takes. */
export interface CellSchema {
  kind: CellKind;
  /** Where the kind stands in the menu. */
  group: "write" | "set up" | "answer" | "explore";
  /** One line of sense. */
  description: string;
  /** What the name of such a cell is. */
  naming: "none" | "name" | "formula";
  /** Any key is an entry, as in `values`. */
  takesAnyKey: boolean;
  entries: readonly EntrySchema[];
}
