import type { Strip } from "../../../shared/notebook/summary";

/** Altitude along a length in px, counted from the low end. */
export interface StripScale {
  low: number;
  high: number;
  length: number;
  /** px from the low end */
  along(altitude: number): number;
  /** m at a distance from the low end */
  altitudeAt(along: number): number;
}

export function stripScale(low: number, high: number, length: number): StripScale {
  return {
    low,
    high,
    length,
    along: (altitude) => ((altitude - low) / (high - low)) * length,
    altitudeAt: (along) => low + (along / length) * (high - low),
  };
}

/** A scale that leaves so many px under the base, for the air that is not computed. */
export function scaleAboveBase(strip: Strip, length: number, under: number): StripScale {
  const metresPerPixel = (strip.top - strip.base) / Math.max(1, length - under);
  return stripScale(strip.base - under * metresPerPixel, strip.top, length);
}

export interface StripTick {
  altitude: number;
  isMajor: boolean;
}

/** Steps between ticks at round values: major ones at least so far apart, four or five minor steps in each. */
export function tickSteps(least: number): { major: number; minor: number } {
  const decade = 10 ** Math.floor(Math.log10(least));
  const major = [1, 2, 5, 10].map((factor) => factor * decade).find((step) => step >= least * (1 - 1e-9))!;
  return { major, minor: Math.round(major / decade) === 2 ? major / 4 : major / 5 };
}

/** Ticks of a scale, with at least so many px between major ones. */
export function stripTicks(scale: StripScale, leastApart: number): StripTick[] {
  const { major, minor } = tickSteps(((scale.high - scale.low) / scale.length) * leastApart);
  const ticks: StripTick[] = [];
  for (let k = Math.ceil(scale.low / minor); k * minor <= scale.high; k++) {
    const altitude = k * minor;
    ticks.push({ altitude, isMajor: Math.abs(altitude / major - Math.round(altitude / major)) < 1e-6 });
  }
  return ticks;
}
