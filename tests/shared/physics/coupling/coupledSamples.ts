import { solveCoupledColumn } from "../../../../shared/physics/coupling/solveCoupledColumn";
import type { Column, CoupledInput, CoupledOutcome } from "../../../../shared/physics/types";
import { altitudesBetween, sampleColumn } from "../column/sampleColumns";

/** A column of the invented planet from which gases escape; what is given replaces the usual. */
export function sampleCoupled({
  criterion = { kind: "bulk" },
  corrections = {},
  ...column
}: Parameters<typeof sampleColumn>[0] & Partial<CoupledInput> = {}): CoupledInput {
  return { ...sampleColumn(column), criterion, corrections };
}

export type Solved = Extract<CoupledOutcome, { converged: true }>;

/** A solution that is known to exist. */
export function solved(input: CoupledInput, tolerance?: number): Solved {
  const outcome = solveCoupledColumn(input, tolerance);
  if (!outcome.converged) throw new Error(`No coupled exobase: ${outcome.message}`);
  return outcome;
}

/** The same escape in a column that is hot enough for light gases to be limited by their supply. */
export const warm = {
  kind: "bates",
  base: 180,
  exosphere: 420,
  shape: 3.5e-5,
  referenceAltitude: 100e3,
} as const;

/** Every number that a solution answers with, without rates. */
export function numbersOf({ column, exobase, gases }: Solved): number[] {
  const { level, lower, upper, otherAltitudes } = exobase;
  const numbers = [level.altitude, level.temperature, level.numberDensity, lower ?? 0, upper ?? 0];
  numbers.push(...otherAltitudes, ...level.numberDensities, ...gases.map(({ supplyShare }) => supplyShare));
  for (const homopause of column.homopauses) numbers.push(homopause.found ? homopause.altitude : 0);
  return [...numbers, ...levelNumbers(column)];
}

function levelNumbers({ input, topAltitude, levelAt }: Column): number[] {
  return [...altitudesBetween(input.baseAltitude, topAltitude, 7)].flatMap((altitude) => {
    const level = levelAt(altitude);
    return [level.pressure, level.meanMass, level.knudsen, ...level.numberDensities];
  });
}
