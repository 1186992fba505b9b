import { boltzmann } from "../constants/codata2022";
import { requirePositive, requireNonNegative } from "../guards";

/**
 * Pressure of an ideal gas; the inverse of `numberDensityFromPressure`.
 *
 *   p = n k T
 *
 * @param gas.numberDensity  n  [m⁻³]  zero or more
 * @param gas.temperature    T  [K]    above zero
 * @returns                  p  [Pa]
 *
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [CODATA2022] for k
 * @explained base_pressure
 */
export function pressureFromNumberDensity({
  numberDensity,
  temperature,
}: {
  numberDensity: number;
  temperature: number;
}): number {
  requireNonNegative("number density", numberDensity);
  requirePositive("temperature", temperature);
  return numberDensity * (boltzmann.value * temperature);
}
