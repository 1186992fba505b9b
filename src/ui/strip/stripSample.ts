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
 * Values between the strip's own levels, straight in altitude; below its base the lowest level stands, and
 * above its top each gas goes on thinning as it does between the last two levels, for drawing only.
 *
 * @param altitude  m
 */
export function sampleStrip(strip: Strip, altitude: number): StripSample {
  const levels = strip.altitude;
  let low = 0;
  let high = levels.length - 1;
  if (altitude > levels[high]!) return sampleAbove(strip, altitude);
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (levels[middle]! <= altitude) low = middle;
    else high = middle;
  }
  const span = levels[high]! - levels[low]!;
  const share = span > 0 ? Math.max(0, (altitude - levels[low]!) / span) : 0;
  const between = (column: readonly number[]) => column[low]! + share * (column[high]! - column[low]!);
  return {
    altitude,
    temperature: between(strip.temperature),
    log10NumberDensity: between(strip.log10NumberDensity),
    log10Knudsen: between(strip.log10Knudsen),
    moleFractions: strip.moleFractions.map(between),
  };
}

function sampleAbove(strip: Strip, altitude: number): StripSample {
  const last = strip.altitude.length - 1;
  const before = Math.max(0, last - 1);
  const span = strip.altitude[last]! - strip.altitude[before]!;
  const steps = span > 0 ? (altitude - strip.altitude[last]!) / span : 0;
  const densities = strip.moleFractions.map((shares) => {
    const [x, y] = [before, last].map((i) => Math.log10(shares[i]!) + strip.log10NumberDensity[i]!) as [
      number,
      number,
    ];
    return shares[last]! > 0 ? 10 ** (y + steps * Math.min(0, y - x)) : 0;
  });
  const total = densities.reduce((a, b) => a + b, 0);
  return {
    altitude,
    temperature: strip.temperature[last]!,
    log10NumberDensity: Math.log10(total),
    log10Knudsen: strip.log10Knudsen[last]! + strip.log10NumberDensity[last]! - Math.log10(total),
    moleFractions: densities.map((density) => density / total),
  };
}

/** Index of the gas there is most of. */
export function leadingGas(sample: StripSample): number {
  return sample.moleFractions.reduce((best, share, i, all) => (share > all[best]! ? i : best), 0);
}
