import type { Column } from "../../../../shared/physics/types";
import { altitudesBetween } from "./sampleColumns";

/** Every number that a column answers with. */
export function numbersOf(column: Column): number[] {
  const { exobase, topAltitude, input } = column;
  const numbers = [topAltitude];
  if (exobase.found) {
    const { level, lower, upper, otherAltitudes } = exobase;
    numbers.push(
      level.altitude,
      level.temperature,
      level.numberDensity,
      level.scaleHeight,
      ...otherAltitudes,
    );
    numbers.push(...level.numberDensities, lower ?? 0, upper ?? 0);
  } else numbers.push(exobase.largestKnudsen, exobase.altitudeOfLargest);
  for (const homopause of column.homopauses) numbers.push(homopause.found ? homopause.altitude : 0);
  for (const altitude of altitudesBetween(input.baseAltitude, topAltitude, 7)) {
    const level = column.levelAt(altitude);
    numbers.push(
      level.pressure,
      level.meanMass,
      level.knudsen,
      level.eddyCoefficient,
      ...level.numberDensities,
    );
  }
  return numbers;
}

/** Whether it has an exobase, or why not. */
export function verdictOf({ exobase }: Column): string {
  return exobase.found ? "found" : exobase.reason;
}
