import type { Strip } from "../../../shared/notebook/summary";
import type { ColumnCorona } from "../../lib/columnCorona";

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

/** The strip whose gases with a corona follow it above its exobase; the others stay hydrostatic. */
export function stripWithCoronae(strip: Strip, coronae: readonly ColumnCorona[]): Strip {
  const present = coronae.filter(({ gas }) => strip.gases.includes(gas));
  if (present.length === 0) return strip;
  const log10NumberDensity = [...strip.log10NumberDensity];
  const moleFractions = strip.moleFractions.map((shares) => [...shares]);
  strip.altitude.forEach((altitude, level) => {
    const densities = moleFractions.map((shares) => shares[level]! * 10 ** log10NumberDensity[level]!);
    for (const corona of present) {
      const density = coronaDensityAt(corona, altitude);
      if (density !== null) densities[strip.gases.indexOf(corona.gas)] = density;
    }
    const total = densities.reduce((sum, density) => sum + density, 0);
    if (!(total > 0)) return;
    log10NumberDensity[level] = Math.log10(total);
    moleFractions.forEach((shares, gas) => (shares[level] = densities[gas]! / total));
  });
  return { ...strip, log10NumberDensity, moleFractions };
}
