import { requireNonNegative, requirePositive } from "../guards";

/**
 * Largest kinetic energy that an ion picked up by a flow reaches in its gyration.
 *
 *   E = 2 m v²: at the top of the cycloid it moves at 2v;  flow and field at right angles
 *
 * @param ion.mass       m  [kg]     above zero
 * @param ion.flowSpeed  v  [m s⁻¹]  zero or more
 * @returns              E  [J]
 *
 * @assumes an ion born at rest, uniform flow and field, speeds far below that of light
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [CatlingKasting2017]
 * @explained pickup_energy
 */
export function pickupEnergy({ mass, flowSpeed }: { mass: number; flowSpeed: number }): number {
  requirePositive("mass of the ion", mass);
  requireNonNegative("flow speed", flowSpeed);
  return 2 * mass * flowSpeed * flowSpeed;
}
