import type { Strip } from "../../../shared/notebook/summary";
import { coronaDensityAt, type ColumnCorona } from "../../lib/columnCorona";

/** The strip whose gases with a corona follow it above its exobase; the others stay hydrostatic. */
export function stripWithCoronae(strip: Strip, coronae: readonly ColumnCorona[]): Strip {
  const present = coronae.filter(({ gas }) => strip.gases.includes(gas));
  if (present.length === 0) return strip;
  const log10NumberDensity = [...strip.log10NumberDensity];
  const moleFractions = strip.moleFractions.map((shares) => [...shares]);
  strip.altitude.forEach((altitude, level) => {
    if (!present.some((corona) => altitude >= corona.altitude[0]!)) return;
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
