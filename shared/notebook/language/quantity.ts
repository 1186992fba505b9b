import type { Dimension } from "./dimensions";

/** How an uncertain entry is distributed; every number in SI, in the quantity's own dimension. */
export type Uncertainty =
  | { form: "normal"; mean: number; deviation: number }
  | { form: "uniform"; lower: number; upper: number }
  | { form: "log_normal"; median: number; factor: number };

export interface Quantity {
  /** SI. The centre of an uncertain quantity (mean, midpoint, median), or its draw where the scope draws. */
  value: number;
  dimension: Dimension;
  /** Of an uncertain expression itself, not of what is computed from one. */
  uncertainty?: Uncertainty;
}
