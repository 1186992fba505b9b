/** The public list of the physics core. Everything else imports from here. */

export * from "./types";
export { PhysicsDomainError } from "./errors";
export * from "./guards";
export { references } from "./references";

export type { PhysicalConstant } from "./constants/physicalConstant";
export * from "./constants/codata2022";
export * from "./constants/iau";

export type { Provenance } from "./handbook/provenance";
export { findBody, handbookBodies, type HandbookBody } from "./handbook/handbookBodies";
export { findGas, handbookGases, type HandbookGas } from "./handbook/handbookGases";
export { collisionRows, type CollisionRow } from "./handbook/collisionRows";
export { collisionParameter } from "./handbook/collisionParameter";

export {
  cosine,
  exponential,
  expm1,
  log10,
  log1p,
  logarithm,
  power,
  powerOfTen,
  sine,
} from "./numerics/elementary";
export { cubicSlope, cubicValue, monotoneCubic, type MonotoneCubic } from "./numerics/monotoneCubic";

export { temperatureAt } from "./temperature/temperatureAt";
export { temperatureCurve, type TemperatureCurve } from "./temperature/temperatureCurve";
export { logTemperatureSlope } from "./temperature/logTemperatureSlope";

export { angularSpeed } from "./body/angularSpeed";
export { escapeSpeed } from "./body/escapeSpeed";
export { gravity } from "./body/gravity";
export { hillRadius } from "./body/hillRadius";
export { meanDensity } from "./body/meanDensity";
export { tidalFactor } from "./body/tidalFactor";

export { crossSectionFromDiameter } from "./conversion/crossSectionFromDiameter";
export { diameterFromCrossSection } from "./conversion/diameterFromCrossSection";
export { gravitationalParameterFromMass } from "./conversion/gravitationalParameterFromMass";
export { massFromGravitationalParameter } from "./conversion/massFromGravitationalParameter";
export { meanMass } from "./conversion/meanMass";
export { numberDensityFromPressure } from "./conversion/numberDensityFromPressure";
export { pressureFromNumberDensity } from "./conversion/pressureFromNumberDensity";

export { jeansCorrections, type JeansCorrection } from "./handbook/jeansCorrections";
export { effusionVelocity, type ExobaseParticle } from "./escape/effusionVelocity";
export { escapeParameter } from "./escape/escapeParameter";
export { escapeRegime, escapeRegimeBounds, type EscapeRegime } from "./escape/escapeRegime";
export { jeansFlux, type ExobaseGas } from "./escape/jeansFlux";
export { jeansRate } from "./escape/jeansRate";
export { log10EffusionVelocity } from "./escape/log10EffusionVelocity";
export { log10JeansFlux } from "./escape/log10JeansFlux";
export { logEffusionVelocity } from "./escape/logEffusionVelocity";
export {
  largestDrift,
  looselyBound,
  thermalEscape,
  type GasEscape,
  type ThermalEscape,
  type ThermalEscapeInput,
} from "./escape/thermalEscape";
export { thermalSpeed } from "./escape/thermalSpeed";

export { diffusionCoefficient } from "./column/diffusionCoefficient";
export { defaultTolerance, solveColumn } from "./column/solveColumn";
