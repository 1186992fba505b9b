/** What an escape cell says of each gas at an exobase. */
import {
  log10,
  magnitude,
  thermalEscape,
  type ColumnLevel,
  type GasEscape,
  type ThermalEscape,
} from "../../physics";
import type { CellResult } from "../result";
import type { LeavingGas } from "./escapeLimits";
import type { ColumnModel } from "./models";
import { carried, measured } from "./resultValue";

/** Factors on the Jeans rate by formula, as `correction` gives them. */
export type Corrections = Readonly<Record<string, number>>;

/** Thermal escape of all gases of a column from a level. */
export function escapeFrom({ column, body }: ColumnModel, level: ColumnLevel): ThermalEscape {
  return thermalEscape({
    gravitationalParameter: body.gravitationalParameter,
    radius: level.radius,
    temperature: level.temperature,
    meanMass: level.meanMass,
    hillRadius: body.hillRadius,
    gases: column.input.gases.map(({ formula, mass }, index) => ({
      formula,
      mass,
      logNumberDensity: level.logNumberDensities[index],
    })),
  });
}

/** All gases with their rates, in the order of the column. */
export function leavingGases({ gases }: ThermalEscape, corrections: Corrections): LeavingGas[] {
  return gases.map(({ formula, log10Rate }, index) => {
    const factor = corrections[formula];
    return { formula, index, log10Rate: factor === undefined ? log10Rate : log10Rate + log10(factor) };
  });
}

/** Of a gas where it flows off with the others as a wind: no rate of its own. */
export function boundValues(gas: GasEscape, numberDensity: number): CellResult["values"] {
  const { formula } = gas;
  return {
    [`${formula}.number_density`]: measured(numberDensity === 0 ? null : numberDensity, "m^-3"),
    [`${formula}.escape_parameter`]: measured(gas.escapeParameter, "1"),
    [`${formula}.thermal_speed`]: measured(gas.thermalSpeed, "m s^-1"),
  };
}

/** Velocity and flux without the correction factor, rates with it. */
export function gasValues(
  gas: GasEscape,
  numberDensity: number,
  factor: number | undefined,
): CellResult["values"] {
  const { formula } = gas;
  const corrected = (value: number | null, log10Value: number) =>
    factor === undefined
      ? { value, log10: log10Value }
      : {
          value: magnitude((log10Value + log10(factor)) * Math.LN10),
          log10: log10Value + log10(factor),
        };
  const rate = corrected(gas.rate, gas.log10Rate);
  const massRate = corrected(gas.massRate, gas.log10MassRate);
  return {
    ...boundValues(gas, numberDensity),
    [`${formula}.effusion_velocity`]: measured(gas.effusionVelocity, "m s^-1"),
    [`${formula}.log10_effusion_velocity`]: measured(gas.log10EffusionVelocity, "1"),
    [`${formula}.jeans_flux`]: measured(gas.jeansFlux, "m^-2 s^-1"),
    [`${formula}.log10_jeans_flux`]: measured(gas.log10JeansFlux, "1"),
    [`${formula}.rate`]: measured(rate.value, "s^-1"),
    [`${formula}.log10_rate`]: measured(rate.log10, "1"),
    ...carried(`${formula}.mass_rate`, massRate.value, massRate.log10, "kg s^-1"),
  };
}
