import { PhysicsDomainError } from "../errors";
import { maximumDimension } from "../numerics/dormandPrince";
import type { Column, ColumnLevel, ColumnProfiles } from "../types";
import { emptyLevel, fillLevel } from "./columnLevel";
import { stateWithin, stepAt, type ColumnPath } from "./columnPath";
import { altitudeOf, heightOf } from "./columnProblem";

/**
 * Reads a path that was marched upward at any altitude between its base and a top. A column that set its own top can
 * also be read further up, as far as an exobase by another criterion made it go.
 */
export function columnReaders(path: ColumnPath, topAltitude: number): Pick<Column, "levelAt" | "profilesAt"> {
  const { problem } = path;
  const { input } = problem;
  const gases = input.gases.length;

  const highest = () =>
    input.top === "auto"
      ? Math.max(topAltitude, altitudeOf(problem, path.positions[path.steps]))
      : topAltitude;

  const read = (altitude: number, level: ColumnLevel) => {
    const isInside = altitude <= topAltitude || altitude <= highest();
    if (!(altitude >= input.baseAltitude && isInside)) {
      const requirement = `within the column, ${input.baseAltitude} to ${topAltitude} m`;
      throw new PhysicsDomainError("altitude", altitude, requirement);
    }
    const height = heightOf(altitude, input.radius, problem.baseRadius);
    const step = stepAt(path, height);
    stateWithin(path, step, height, state);
    fillLevel(level, problem, path.laws[step], height, state);
    level.altitude = altitude;
  };

  return {
    levelAt(altitude) {
      const level = emptyLevel(gases);
      read(altitude, level);
      return level;
    },
    profilesAt(altitudes) {
      const profiles = emptyProfiles(altitudes.length, gases);
      const level = emptyLevel(gases);
      for (let k = 0; k < altitudes.length; k += 1) {
        read(altitudes[k], level);
        for (const quantity of profiled) profiles[quantity][k] = level[quantity];
        for (let i = 0; i < gases; i += 1) {
          profiles.gases[i].numberDensity[k] = level.numberDensities[i];
          profiles.gases[i].moleFraction[k] = level.moleFractions[i];
          profiles.gases[i].scaleHeight[k] = level.scaleHeights[i];
        }
      }
      return profiles;
    },
  };
}

const state = new Float64Array(maximumDimension);

const profiled = [
  "altitude",
  "temperature",
  "pressure",
  "numberDensity",
  "massDensity",
  "meanMass",
  "gravity",
  "scaleHeight",
  "meanFreePath",
  "knudsen",
] as const;

function emptyProfiles(length: number, gases: number): ColumnProfiles {
  const array = () => new Float64Array(length);
  return {
    altitude: array(),
    temperature: array(),
    pressure: array(),
    numberDensity: array(),
    massDensity: array(),
    meanMass: array(),
    gravity: array(),
    scaleHeight: array(),
    meanFreePath: array(),
    knudsen: array(),
    gases: Array.from({ length: gases }, () => ({
      numberDensity: array(),
      moleFraction: array(),
      scaleHeight: array(),
    })),
  };
}
