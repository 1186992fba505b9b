/** A constant with where it comes from. */
export interface PhysicalConstant {
  symbol: string;
  name: string;
  value: number;
  /** SI, written as on paper: "m³ kg⁻¹ s⁻²". */
  unit: string;
  /** One standard uncertainty in `unit`; 0 where the value is exact by definition. */
  uncertainty: number;
  /** A key of `references`. */
  source: string;
}
