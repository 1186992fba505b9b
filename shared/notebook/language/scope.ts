import type { Dimension } from "./dimensions";
import type { SuppliedReference } from "../references";
import type { Quantity, Uncertainty } from "./quantity";

/** A name that exists but has no value to give; the reason is a whole sentence. */
export interface Unavailable {
  unavailable: string;
}

/** What an expression may refer to: results of the cells above and `values` entries. Constants need no scope. */
export interface Scope {
  /** A string for a choice, such as a regime, or for the name of a cell. */
  lookup(path: string): Quantity | Unavailable | string | undefined;
  /** Every name that `lookup` knows, for suggestions. */
  names(): readonly string[];
  /** A published reference by its pin, such as "CAR4.2", where it was supplied. */
  reference(pin: string): SuppliedReference | undefined;
  /**
   * Where present, gives an uncertain entry its value in SI instead of the centre; null where no part of it is
   * possible. `path` names it within its cell.
   */
  draw?: ((path: string, uncertainty: Uncertainty, dimension: Dimension) => number | null) | undefined;
}
