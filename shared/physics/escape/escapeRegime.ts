import { requirePositive } from "../guards";
import { singleGasCorrection } from "../handbook/jeansCorrections";
import type { PhysicsNote } from "../types";

/**
 * How the gas as a whole leaves: particle by particle (`jeans`, and `jeans_estimate` where the Jeans rate is only
 * near), between particles and flow (`transition`), as a flow (`wind`).
 */
export type EscapeRegime = "jeans" | "jeans_estimate" | "transition" | "wind";

/** Lowest escape parameter of the mean mass at the exobase for each regime; below the last, a wind. */
export const escapeRegimeBounds = { jeans: 6, jeans_estimate: 3, transition: 2 } as const;

/**
 * Regime of escape by the escape parameter of the mean mass at the exobase.
 *
 *   λ̄ ≥ 6 jeans · 3 ≤ λ̄ < 6 jeans_estimate · 2 ≤ λ̄ < 3 transition · λ̄ < 2 wind
 *
 * @param bulkEscapeParameter  λ̄  [1]  above zero; `escapeParameter` of the mean mass
 * @returns                    the regime, with a caution for the middle two and a fault for a wind
 *
 * @assumes heat put in well below the exobase, and one gas or a well coupled mixture
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [Volkov2011] for 6, 3 and the transition; [Parker1958] for 2, where the sonic point of an isothermal
 *          wind, r_s = λr/2, comes to lie inside; [Opik1963] sets blow-off at 1.5
 * @explained escape_regime
 */
export function escapeRegime(bulkEscapeParameter: number): { regime: EscapeRegime; notes: PhysicsNote[] } {
  requirePositive("escape parameter of the mean mass", bulkEscapeParameter);
  const found = `The escape parameter of the mean mass at the exobase is ${bulkEscapeParameter.toFixed(2)}`;
  if (bulkEscapeParameter >= escapeRegimeBounds.jeans) return { regime: "jeans", notes: [] };
  if (bulkEscapeParameter >= escapeRegimeBounds.jeans_estimate) {
    const { low, high } = singleGasCorrection;
    const message = `${found}, below 6: Jeans rates are estimates here. Simulations of a single gas leave at ${low} to ${high} times the Jeans rate (Volkov et al. 2011).`;
    return { regime: "jeans_estimate", notes: [{ level: "caution", code: "jeans_estimate", message }] };
  }
  if (bulkEscapeParameter >= escapeRegimeBounds.transition) {
    const message = `${found}, between 2 and 3, where escape turns from single particles to a flow (Volkov et al. 2011): Jeans rates are right in order of magnitude only.`;
    return { regime: "transition", notes: [{ level: "caution", code: "escape_transition", message }] };
  }
  const message = `${found}, below 2: the sonic point of an isothermal wind (Parker 1958) lies inside, the gas flows off as a whole, and Jeans rates do not apply. Take the wind rate instead.`;
  return { regime: "wind", notes: [{ level: "fault", code: "escape_wind", message }] };
}
