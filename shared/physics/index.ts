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
