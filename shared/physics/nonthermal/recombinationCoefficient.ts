import { requirePositive } from "../guards";
import type { RecombiningIon } from "../handbook/recombination";
import { power } from "../numerics/elementary";

/**
 * Rate coefficient of the recombination of an ion with electrons, all channels together.
 *
 *   α = A (T₀/T_e)^s,  by the piece that the temperature falls in
 *
 * @param ion                  see `recombiningIons`
 * @param electronTemperature  T_e  [K]       above zero
 * @returns                    α    [m³ s⁻¹]
 *
 * @throws  PhysicsDomainError if the temperature is not above zero
 * @source  each ion's own, in `recombiningIons`
 */
export function recombinationCoefficient(
  ion: Pick<RecombiningIon, "rate">,
  electronTemperature: number,
): number {
  requirePositive("electron temperature", electronTemperature);
  const { pieces } = ion.rate;
  const piece = pieces.find(({ upTo }) => electronTemperature <= upTo) ?? pieces[pieces.length - 1];
  return piece.coefficient * power(piece.referenceTemperature / electronTemperature, piece.exponent);
}
