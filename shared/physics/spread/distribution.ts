/** How an uncertain quantity is distributed; all numbers in its own unit. */
export type Distribution =
  | { form: "normal"; mean: number; deviation: number }
  | { form: "uniform"; lower: number; upper: number }
  /** The logarithm is normal, with a standard deviation of ln `factor`. */
  | { form: "log_normal"; median: number; factor: number };

/** What a quantity can be at all; without bound where ±Infinity. */
export interface PhysicalBounds {
  lower: number;
  upper: number;
}
