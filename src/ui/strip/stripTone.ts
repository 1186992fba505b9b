import type { Strip } from "../../../shared/notebook/summary";
import { leadingGas, sampleStrip } from "./stripSample";
import type { StripScale } from "./stripScale";

/** One gas's share of the tone, from the low end of the band to the high one. */
export interface GasTone {
  gas: string;
  /** offset 0 to 1, opacity 0 to 1 */
  stops: { offset: number; opacity: number }[];
}

const smoothStep = (x: number): number => {
  const t = Math.min(1, Math.max(0, x));
  return t * t * (3 - 2 * t);
};

/** How much of the gas still acts as a fluid: 1 at Kn = 0.1 and below, 0 at Kn = 10 and above. */
export const fluidShare = (log10Knudsen: number): number => 1 - smoothStep((log10Knudsen + 1) / 2);

const stopCount = 45;
/** A gas with less than this everywhere gets no tone of its own. */
const leastShare = 0.03;
/** Shares are raised to this, so that one gas leads. */
const leadPower = 1.7;

/**
 * Tone by log density between base and Kn = 10, opacity .16 to .90; tint by gas; fading as the gas stops
 * being a fluid. Where there is no exobase it does not fade.
 */
export function stripTone(strip: Strip, scale: StripScale): GasTone[] {
  const densest = sampleStrip(strip, strip.base).log10NumberDensity;
  const thinnest = sampleStrip(strip, Math.min(strip.upper ?? strip.top, strip.top)).log10NumberDensity;
  const levels = Array.from({ length: stopCount }, (_, i) => {
    const offset = i / (stopCount - 1);
    const sample = sampleStrip(strip, Math.max(strip.base, scale.low + offset * (scale.high - scale.low)));
    const height = (sample.log10NumberDensity - thinnest) / (densest - thinnest || 1);
    const tone = 0.16 + 0.74 * Math.min(1, Math.max(0, height)) ** 0.95;
    const fluid = strip.exobase === null ? 1 : fluidShare(sample.log10Knudsen);
    const weights = sample.moleFractions.map((share) => share ** leadPower);
    const sum = weights.reduce((a, b) => a + b, 0) || 1;
    return { offset, sample, opacities: weights.map((weight) => (weight / sum) * tone * fluid) };
  });
  return strip.gases.flatMap((gas, g) => {
    const counts = levels.some(
      ({ sample }) => sample.moleFractions[g]! > leastShare || leadingGas(sample) === g,
    );
    if (!counts) return [];
    return { gas, stops: levels.map(({ offset, opacities }) => ({ offset, opacity: opacities[g]! })) };
  });
}
