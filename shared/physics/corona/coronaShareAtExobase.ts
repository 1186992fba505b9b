import { requirePositive } from "../guards";
import { incompleteGamma } from "../numerics/incompleteGamma";

/**
 * Share of the full Maxwellian density that ballistic and escaping particles together make up at the exobase: the
 * step in density there between a hydrostatic column and the corona above it.
 *
 *   ζ_bal + ζ_esc = ½ [1 + P(3/2, λ_c)];  what is missing would come from above and has never left below
 *
 * @param exobaseEscapeParameter  λ_c  [1]  above zero; `escapeParameter` of the gas at the exobase
 * @returns                            [1]  between ½ and 1
 *
 * @assumes as `partitionFunctions`
 * @throws  PhysicsDomainError if the input breaks the bound above
 * @source  [Chamberlain1963]
 */
export function coronaShareAtExobase(exobaseEscapeParameter: number): number {
  requirePositive("escape parameter at the exobase", exobaseEscapeParameter);
  return 0.5 * (1 + incompleteGamma(exobaseEscapeParameter));
}
