/** What a solved column answers: values, levels, profiles and its strip. */
import { log10, type Column, type ColumnLevel } from "../../physics";
import type { CellResult, ResultRow } from "../result";
import type { Strip } from "../summary";
import { profileAltitudes } from "./profileAltitudes";
import { measured, numberOrNull } from "./resultValue";

export function columnValues(column: Column): CellResult["values"] {
  const { input, homopauses, topAltitude } = column;
  const base = column.levelAt(input.baseAltitude);
  const values: CellResult["values"] = {
    "base.altitude": measured(input.baseAltitude, "m"),
    "base.number_density": measured(base.numberDensity, "m^-3"),
    "base.pressure": measured(base.pressure, "Pa"),
  };
  homopauses.forEach((homopause, index) => {
    if (!homopause.found) return;
    values[`${input.gases[index].formula}.homopause.altitude`] = measured(homopause.altitude, "m");
  });
  values["top.altitude"] = measured(topAltitude, "m");
  return values;
}

/** One row of the table `levels`. */
export function levelRow(column: Column, altitude: number): ResultRow {
  const level = column.levelAt(altitude);
  const row: ResultRow = {
    altitude: level.altitude,
    temperature: level.temperature,
    pressure: numberOrNull(level.pressure),
    mass_density: numberOrNull(level.massDensity),
    number_density: numberOrNull(level.numberDensity),
    mean_mass: level.meanMass,
    gravity: level.gravity,
    scale_height: level.scaleHeight,
    mean_free_path: level.meanFreePath,
    knudsen: level.knudsen,
  };
  column.input.gases.forEach(({ formula }, index) => {
    row[`${formula}.number_density`] = numberOrNull(level.numberDensities[index]);
    row[`${formula}.mole_fraction`] = numberOrNull(level.moleFractions[index]);
    row[`${formula}.scale_height`] = level.scaleHeights[index];
  });
  return row;
}

export function columnProfiles(column: Column): Record<string, number[]> {
  const profiles = column.profilesAt(profileAltitudes(column));
  const arrays: Record<string, Float64Array> = {
    altitude: profiles.altitude,
    temperature: profiles.temperature,
    pressure: profiles.pressure,
    mass_density: profiles.massDensity,
    number_density: profiles.numberDensity,
    mean_mass: profiles.meanMass,
    gravity: profiles.gravity,
    scale_height: profiles.scaleHeight,
    mean_free_path: profiles.meanFreePath,
    knudsen: profiles.knudsen,
  };
  column.input.gases.forEach(({ formula }, index) => {
    const gas = profiles.gases[index];
    arrays[`${formula}.number_density`] = gas.numberDensity;
    arrays[`${formula}.mole_fraction`] = gas.moleFraction;
    arrays[`${formula}.scale_height`] = gas.scaleHeight;
  });
  return Object.fromEntries(Object.entries(arrays).map(([name, array]) => [name, Array.from(array)]));
}

/** Levels of a strip: enough for a band as tall as a window. */
const stripLevels = 121;

/** How far above its base a strip goes, over the height of the exobase above the base. */
const stripReach = 2.3;

export function columnStrip(name: string, column: Column): Strip {
  const { input, exobase, topAltitude: columnTop } = column;
  const base = input.baseAltitude;
  const exobaseAltitude = exobase.found ? exobase.level.altitude : null;
  const wanted = exobaseAltitude === null ? columnTop : base + stripReach * (exobaseAltitude - base);
  const top = Math.min(wanted, columnTop);
  const altitudes = Float64Array.from({ length: stripLevels }, (_, index) =>
    index === stripLevels - 1 ? top : base + ((top - base) * index) / (stripLevels - 1),
  );
  const profiles = column.profilesAt(altitudes);
  return {
    column: name,
    base,
    top,
    exobase: exobaseAltitude,
    lower: exobase.found ? exobase.lower : null,
    upper: exobase.found ? exobase.upper : null,
    gases: input.gases.map(({ formula }) => formula),
    homopauses: column.homopauses.flatMap((homopause, index) =>
      homopause.found ? [{ gas: input.gases[index].formula, altitude: homopause.altitude }] : [],
    ),
    altitude: Array.from(altitudes),
    temperature: Array.from(profiles.temperature),
    log10NumberDensity: Array.from(profiles.numberDensity, log10),
    log10Knudsen: Array.from(profiles.knudsen, log10),
    moleFractions: profiles.gases.map(({ moleFraction }) => Array.from(moleFraction)),
  };
}

/** What an escape cell says of the level where the exobase lies. */
export function exobaseValues(
  level: ColumnLevel,
  lower: number | null,
  upper: number | null,
): CellResult["values"] {
  const values: CellResult["values"] = {
    "exobase.altitude": measured(level.altitude, "m"),
    "exobase.radius": measured(level.radius, "m"),
    "exobase.temperature": measured(level.temperature, "K"),
    "exobase.number_density": measured(level.numberDensity, "m^-3"),
    "exobase.gravity": measured(level.gravity, "m s^-2"),
    "exobase.scale_height": measured(level.scaleHeight, "m"),
    "exobase.mean_free_path": measured(level.meanFreePath, "m"),
  };
  if (lower !== null) values["exobase.lower"] = measured(lower, "m");
  if (upper !== null) values["exobase.upper"] = measured(upper, "m");
  return values;
}
