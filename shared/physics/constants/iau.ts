import type { PhysicalConstant } from "./physicalConstant";

/**
 * Constants fixed by the International Astronomical Union. All are exact by definition: nominal values are
 * conversion factors, not the best estimate of a body's true size or mass.
 */

const exact = (
  symbol: string,
  name: string,
  value: number,
  unit: string,
  source: string,
): PhysicalConstant => ({
  symbol,
  name,
  value,
  unit,
  uncertainty: 0,
  source,
});

export const julianYear = exact("yr", "Julian year", 31557600, "s", "IAU1976");

export const astronomicalUnit = exact("au", "astronomical unit", 149597870700, "m", "IAU2012B2");

export const nominalSolarGravitationalParameter = exact(
  "(GM)_S",
  "nominal solar mass parameter",
  1.3271244e20,
  "m³ s⁻²",
  "IAU2015B3",
);
export const nominalSolarRadius = exact("R_S", "nominal solar radius", 6.957e8, "m", "IAU2015B3");
export const nominalSolarLuminosity = exact("L_S", "nominal solar luminosity", 3.828e26, "W", "IAU2015B3");
export const nominalSolarIrradiance = exact(
  "S_S",
  "nominal total solar irradiance",
  1361,
  "W m⁻²",
  "IAU2015B3",
);
export const nominalEarthGravitationalParameter = exact(
  "(GM)_E",
  "nominal terrestrial mass parameter",
  3.986004e14,
  "m³ s⁻²",
  "IAU2015B3",
);
export const nominalEarthRadius = exact(
  "R_E",
  "nominal terrestrial equatorial radius",
  6.3781e6,
  "m",
  "IAU2015B3",
);
export const nominalJupiterGravitationalParameter = exact(
  "(GM)_J",
  "nominal jovian mass parameter",
  1.2668653e17,
  "m³ s⁻²",
  "IAU2015B3",
);
export const nominalJupiterRadius = exact(
  "R_J",
  "nominal jovian equatorial radius",
  7.1492e7,
  "m",
  "IAU2015B3",
);

export const iau: readonly PhysicalConstant[] = [
  julianYear,
  astronomicalUnit,
  nominalSolarGravitationalParameter,
  nominalSolarRadius,
  nominalSolarLuminosity,
  nominalSolarIrradiance,
  nominalEarthGravitationalParameter,
  nominalEarthRadius,
  nominalJupiterGravitationalParameter,
  nominalJupiterRadius,
];
