/** A corona as the figure and the strip of its column need it. Altitudes in m, densities in m⁻³. */
export interface ColumnCorona {
  gas: string;
  /** Names of the corona cell and of the escape cell that it rests on. */
  cell: string;
  escape: string;
  /** The escape cell reckons with the flux of the gas, which the column itself does not. */
  isCoupled: boolean;
  /** Density at the exobase over that just below it. */
  share: number;
  /** Just below the exobase. */
  densityBelow: number;
  /** From the exobase up. */
  altitude: readonly number[];
  numberDensity: readonly number[];
}
