import { PhysicsDomainError } from "../errors";
import { requireFinite } from "../guards";

/**
 * Angular speed of a rotating body.
 *
 *   ω = 2π/P
 *
 * @param rotation.rotationPeriod  P  [s]        not zero; sidereal, negative where the body turns backwards
 * @returns                        ω  [rad s⁻¹]  with the sign of P
 *
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [Archinal2018] for the sense of rotation
 */
export function angularSpeed({ rotationPeriod }: { rotationPeriod: number }): number {
  requireFinite("rotation period", rotationPeriod);
  if (rotationPeriod === 0)
    throw new PhysicsDomainError("rotation period", rotationPeriod, "other than zero");
  return (2 * Math.PI) / rotationPeriod;
}
