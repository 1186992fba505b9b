/** A corona as the figure and the strip of its column need it. Altitudes in m, densities in m⁻³. */
export interface ColumnCorona {
  gas: string;
  /** Name of the corona cell. */
  cell: string;
  /** Density at the exobase over that just below it. */
  share: number;
  /** Just below the exobase. */
  densityBelow: number;
  /** From the exobase up. */
  altitude: readonly number[];
  numberDensity: readonly number[];
}

/** Density at an altitude, straight in its logarithm between the corona's own levels; null below its exobase. */
export function coronaDensityAt({ altitude, numberDensity }: ColumnCorona, at: number): number | null {
  if (at < altitude[0]!) return null;
  const high = altitude.findIndex((z) => z >= at);
  if (high < 0) return numberDensity.at(-1)!;
  if (high === 0) return numberDensity[0]!;
  const share = (at - altitude[high - 1]!) / (altitude[high]! - altitude[high - 1]!);
  const [low, top] = [numberDensity[high - 1]!, numberDensity[high]!];
  return low > 0 && top > 0 ? low * (top / low) ** share : low + share * (top - low);
}
