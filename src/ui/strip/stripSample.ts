import type { Strip } from "../../../shared/notebook/summary";

/** The gas of a strip at one altitude. */
export interface StripSample {
  altitude: number;
  temperature: number;
  log10NumberDensity: number;
  log10Knudsen: number;
  /** In the order of `strip.gases`. */
  moleFractions: number[];
}

/**
 * Values between the strip's own levels, straight in altitude; beyond its ends the nearest level stands.
 *
 * @param altitude  m
 */
export function sampleStrip(strip: Strip, altitude: number): StripSample {
  const levels = strip.altitude;
  let low = 0;
  let high = levels.length - 1;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (levels[middle]! <= altitude) low = middle;
    else high = middle;
  }
  const span = levels[high]! - levels[low]!;
  const share = span > 0 ? Math.min(1, Math.max(0, (altitude - levels[low]!) / span)) : 0;
  const between = (column: readonly number[]) => column[low]! + share * (column[high]! - column[low]!);
  return {
    altitude,
    temperature: between(strip.temperature),
    log10NumberDensity: between(strip.log10NumberDensity),
    log10Knudsen: between(strip.log10Knudsen),
    moleFractions: strip.moleFractions.map(between),
  };
}

/** Index of the gas there is most of. */
export function leadingGas(sample: StripSample): number {
  return sample.moleFractions.reduce((best, share, i, all) => (share > all[best]! ? i : best), 0);
}
