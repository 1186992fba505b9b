import { requirePositive } from "../guards";

/**
 * Largest radius on which an ion picked up by a flow gyrates.
 *
 *   r_g = m v/(q B);  flow and field at right angles
 *
 * @param ion.mass           m    [kg]     above zero
 * @param ion.charge         q    [C]      above zero; `elementaryCharge` for a single charge
 * @param ion.flowSpeed      v    [m s⁻¹]  above zero
 * @param ion.magneticField  B    [T]      above zero
 * @returns                  r_g  [m]
 *
 * @assumes an ion born at rest, uniform flow and field, speeds far below that of light
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [CatlingKasting2017]
 * @explained pickup_gyroradius
 */
export function pickupGyroradius({
  mass,
  charge,
  flowSpeed,
  magneticField,
}: {
  mass: number;
  charge: number;
  flowSpeed: number;
  magneticField: number;
}): number {
  requirePositive("mass of the ion", mass);
  requirePositive("charge of the ion", charge);
  requirePositive("flow speed", flowSpeed);
  requirePositive("magnetic field", magneticField);
  return (mass * flowSpeed) / (charge * magneticField);
}
