/** The public list of the physics core. Everything else imports from here. */

export * from "./types";
export { PhysicsDomainError } from "./errors";
export * from "./guards";
export type { PhysicalConstant } from "./constants/physicalConstant";
export * from "./constants/codata2022";
export * from "./constants/iau";
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
