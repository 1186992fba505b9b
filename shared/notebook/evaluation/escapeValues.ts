/** What an escape cell says of each gas at an exobase. */
import type { GasEscape } from "../../physics";
import type { CellResult } from "../result";
import { carried, measured } from "./resultValue";
import type { LeavingGas } from "./solveEscape";

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
  { rate, log10Rate, massRate, log10MassRate }: LeavingGas,
): CellResult["values"] {
  const { formula } = gas;
  return {
    ...boundValues(gas, numberDensity),
    [`${formula}.effusion_velocity`]: measured(gas.effusionVelocity, "m s^-1"),
    [`${formula}.log10_effusion_velocity`]: measured(gas.log10EffusionVelocity, "1"),
    [`${formula}.jeans_flux`]: measured(gas.jeansFlux, "m^-2 s^-1"),
    [`${formula}.log10_jeans_flux`]: measured(gas.log10JeansFlux, "1"),
    [`${formula}.rate`]: measured(rate, "s^-1"),
    [`${formula}.log10_rate`]: measured(log10Rate, "1"),
    ...carried(`${formula}.mass_rate`, massRate, log10MassRate, "kg s^-1"),
  };
}
