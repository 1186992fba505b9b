import { PhysicsDomainError } from "../errors";
import {
  requireAscending,
  requireFinite,
  requireFraction,
  requireNonNegative,
  requirePositive,
} from "../guards";
import { cosine } from "../numerics/elementary";
import type { ColumnInput, EddyProfile, TemperatureProfile } from "../types";
import { maximumGases } from "./composition";

/** How far the mole fractions may be from adding up to 1: rounding, not a forgotten gas. */
export const fractionSumTolerance = 1e-9;

/**
 * Refuses a column that no atmosphere can have.
 *
 * @throws  PhysicsDomainError with the first quantity that breaks its bound
 */
export function requireColumnInput(input: ColumnInput): void {
  requirePositive("gravitational parameter", input.gravitationalParameter);
  requirePositive("radius", input.radius);
  requireFinite("base altitude", input.baseAltitude);
  requirePositive("distance of the base from the centre", input.radius + input.baseAltitude);
  requirePositive("number density at the base", input.baseNumberDensity);
  requireGases(input);
  requireTemperature(input.temperature, input);
  requireEddy(input.eddy);
  requireTop(input);
}

function requireGases({ gases, collisionParameters }: ColumnInput): void {
  if (gases.length < 1 || gases.length > maximumGases) {
    throw new PhysicsDomainError("number of gases", gases.length, `between 1 and ${maximumGases}`);
  }
  let sum = 0;
  for (const gas of gases) {
    requirePositive(`mass of ${gas.formula}`, gas.mass);
    requirePositive(`collision diameter of ${gas.formula}`, gas.collisionDiameter);
    requireFinite(`thermal diffusion factor of ${gas.formula}`, gas.thermalDiffusionFactor);
    requireFraction(`mole fraction of ${gas.formula}`, gas.moleFraction);
    sum += gas.moleFraction;
  }
  if (!(Math.abs(sum - 1) <= fractionSumTolerance)) {
    throw new PhysicsDomainError("sum of the mole fractions", sum, "1");
  }
  if (collisionParameters.length !== gases.length) {
    throw new PhysicsDomainError(
      "number of rows of collision parameters",
      collisionParameters.length,
      `one a gas, ${gases.length}`,
    );
  }
  for (let i = 0; i < gases.length; i += 1) {
    for (let j = 0; j < i; j += 1) {
      const pair = `${gases[i].formula} in ${gases[j].formula}`;
      const { coefficient, exponent } = collisionParameters[i][j];
      requirePositive(`collision parameter of ${pair}`, coefficient);
      requireFinite(`exponent of the collision parameter of ${pair}`, exponent);
      const mirrored = collisionParameters[j][i];
      if (mirrored.coefficient !== coefficient || mirrored.exponent !== exponent) {
        const requirement = "the same in both directions";
        throw new PhysicsDomainError(`collision parameter of ${pair}`, mirrored.coefficient, requirement);
      }
    }
  }
}

function requireTemperature(profile: TemperatureProfile, { radius }: ColumnInput): void {
  switch (profile.kind) {
    case "constant":
      requirePositive("temperature", profile.temperature);
      return;
    case "bates":
      requirePositive("temperature at the reference altitude", profile.base);
      requirePositive("temperature of the exosphere", profile.exosphere);
      requirePositive("shape of the temperature profile", profile.shape);
      requireFinite("reference altitude", profile.referenceAltitude);
      requirePositive(
        "distance of the reference altitude from the centre",
        radius + profile.referenceAltitude,
      );
      return;
    case "points":
      requirePoints("temperature", profile.altitudes, profile.temperatures);
  }
}

function requireEddy(profile: EddyProfile): void {
  switch (profile.kind) {
    case "none":
      return;
    case "constant":
      requireNonNegative("eddy coefficient", profile.coefficient);
      return;
    case "power":
      requireNonNegative("eddy coefficient at the base", profile.base);
      requireFinite("exponent of the eddy coefficient", profile.exponent);
      if (profile.ceiling !== null) requirePositive("ceiling of the eddy coefficient", profile.ceiling);
      return;
    case "points":
      requirePoints("eddy coefficient", profile.altitudes, profile.coefficients);
  }
}

function requirePoints(quantity: string, altitudes: Float64Array, values: Float64Array): void {
  if (altitudes.length < 1 || altitudes.length !== values.length) {
    throw new PhysicsDomainError(
      `number of altitudes of the ${quantity}`,
      altitudes.length,
      `one a value, ${values.length}`,
    );
  }
  requireAscending(`altitudes of the ${quantity}`, altitudes);
  for (const value of values) requirePositive(quantity, value);
}

function requireTop(input: ColumnInput): void {
  const { centrifugal, gravitationalParameter, radius, baseAltitude, top } = input;
  if (top !== "auto" && !(top > baseAltitude && top < Infinity)) {
    throw new PhysicsDomainError("top of the column", top, `above the base, ${baseAltitude}`);
  }
  if (!centrifugal) return;
  requireFinite("angular speed", centrifugal.angularSpeed);
  requireFinite("latitude", centrifugal.latitude);
  const spin = centrifugal.angularSpeed * cosine(centrifugal.latitude);
  const weightless = (r: number) => (spin * spin * r * r * r) / gravitationalParameter;
  const share = weightless(radius + baseAltitude);
  if (!(share < 1)) {
    throw new PhysicsDomainError("centrifugal part of gravity at the base", share, "less than 1");
  }
  if (top !== "auto" && !(weightless(radius + top) < largestCentrifugalShare)) {
    const requirement = "below the altitude where the centrifugal term cancels gravity";
    throw new PhysicsDomainError("top of the column", top, requirement);
  }
}

/** The column ends where the centrifugal term has taken this share of gravity. */
export const largestCentrifugalShare = 0.999;
