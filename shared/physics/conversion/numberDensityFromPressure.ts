import { boltzmann } from "../constants/codata2022";
import { requirePositive, requireNonNegative } from "../guards";

/**
 * Number density of an ideal gas; the inverse of `pressureFromNumberDensity`.
 *
 *   n = p/(k T)
 *
 * @param gas.pressure     p  [Pa]   zero or more
 * @param gas.temperature  T  [K]    above zero
 * @returns                n  [m⁻³]
 *
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [CODATA2022] for k
 * @explained base_number_density
 */
export function numberDensityFromPressure({
  pressure,
  temperature,
}: {
  pressure: number;
  temperature: number;
}): number {
  requireNonNegative("pressure", pressure);
  requirePositive("temperature", temperature);
  return pressure / (boltzmann.value * temperature);
}
