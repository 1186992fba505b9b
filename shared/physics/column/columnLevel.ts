import { boltzmann } from "../constants/codata2022";
import { exponential, logarithm } from "../numerics/elementary";
import type { ColumnLevel } from "../types";
import {
  altitudeOf,
  eddyOf,
  gravityAt,
  temperatureGradientOf,
  temperatureOf,
  type ColumnProblem,
} from "./columnProblem";
import { fractions, setComposition } from "./composition";
import type { StepLaw } from "./stepLaw";

/** A level to be filled, for a column of so many gases. */
export function emptyLevel(gases: number): ColumnLevel {
  return {
    altitude: 0,
    radius: 0,
    temperature: 0,
    temperatureGradient: 0,
    pressure: 0,
    numberDensity: 0,
    massDensity: 0,
    meanMass: 0,
    gravity: 0,
    scaleHeight: 0,
    meanFreePath: 0,
    knudsen: 0,
    eddyCoefficient: 0,
    moleFractions: new Float64Array(gases),
    numberDensities: new Float64Array(gases),
    logNumberDensities: new Float64Array(gases).fill(-Infinity),
    scaleHeights: new Float64Array(gases),
  };
}

/**
 * Works out everything that is told of the gas at one height.
 *
 *   n = p/kT,  nᵢ = Xᵢn,  H = kT/(m̄g),  Hᵢ = kT/(mᵢg),  l = 1/(√2 Σ nⱼσⱼ),  Kn = l/H
 *
 * @param level   filled anew
 * @param law     that holds at the height
 * @param height  h  [m]  geopotential height above the base
 * @param state   ln p of each present gas  [ln Pa]
 *
 * @explained level_mass_density, level_number_density, level_mean_mass, level_scale_height, level_mean_free_path,
 *            level_knudsen, level_gas_number_density, level_gas_scale_height, exobase_radius, exobase_temperature,
 *            exobase_number_density, exobase_gravity, exobase_scale_height, exobase_mean_free_path,
 *            gas_number_density, corona_exobase_number_density
 */
export function fillLevel(
  level: ColumnLevel,
  problem: ColumnProblem,
  law: StepLaw,
  height: number,
  state: Float64Array,
): void {
  const { input, present, masses, crossSections } = problem;
  const altitude = altitudeOf(problem, height);
  const temperature = temperatureOf(problem.temperature, height, altitude, law.temperaturePiece);
  const thermalEnergy = boltzmann.value * temperature;
  const logThermalEnergy = logarithm(thermalEnergy);
  const gravity = gravityAt(problem, height);
  const logPressure = setComposition(state, masses.length);
  const logDensity = logPressure - logThermalEnergy;
  const numberDensity = exponential(logDensity);

  let meanMass = 0;
  let meanCrossSection = 0;
  for (let i = 0; i < present.length; i += 1) {
    const gas = present[i];
    meanMass += fractions[i] * masses[i];
    meanCrossSection += fractions[i] * crossSections[i];
    level.moleFractions[gas] = fractions[i];
    level.logNumberDensities[gas] = state[i] - logThermalEnergy;
    level.numberDensities[gas] = exponential(state[i] - logThermalEnergy);
  }
  for (let gas = 0; gas < input.gases.length; gas += 1) {
    level.scaleHeights[gas] = thermalEnergy / (input.gases[gas].mass * gravity);
  }
  level.altitude = altitude;
  level.radius = input.radius + altitude;
  level.temperature = temperature;
  level.temperatureGradient = temperatureGradientOf(problem, height, altitude, law.temperaturePiece);
  level.pressure = exponential(logPressure);
  level.numberDensity = numberDensity;
  level.massDensity = numberDensity * meanMass;
  level.meanMass = meanMass;
  level.gravity = gravity;
  level.scaleHeight = thermalEnergy / (meanMass * gravity);
  level.meanFreePath = 1 / (Math.SQRT2 * numberDensity * meanCrossSection);
  level.knudsen = level.meanFreePath / level.scaleHeight;
  level.eddyCoefficient = eddyOf(problem.eddy, altitude, logDensity, law.isCapped, law.eddyPiece);
}
