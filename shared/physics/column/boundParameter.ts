import { escapeParameter } from "../escape/escapeParameter";
import { altitudeOf, smallestTemperatureAbove, temperatureOf, type ColumnProblem } from "./columnProblem";
import { fractions } from "./composition";

/**
 * Escape parameter that tells whether the gas is held, for the composition that was just set.
 *
 *   GMm̄/(kTr), T the lowest temperature from there up
 *
 * @param height  h  [m]  geopotential height above the base
 * @param piece   of the temperature, where it is points
 */
export function boundParameter(problem: ColumnProblem, height: number, piece: number): number {
  const { input, masses, temperature } = problem;
  const altitude = altitudeOf(problem, height);
  let meanMass = 0;
  for (let i = 0; i < masses.length; i += 1) meanMass += fractions[i] * masses[i];
  return escapeParameter({
    gravitationalParameter: input.gravitationalParameter,
    particleMass: meanMass,
    temperature: smallestTemperatureAbove(
      temperature,
      temperatureOf(temperature, height, altitude, piece),
      piece,
    ),
    radius: input.radius + altitude,
  });
}
