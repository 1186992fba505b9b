import { requireNonNegative } from "../guards";
import { exponential } from "./elementary";
import { scaledErfc } from "./scaledErfc";

/** 1/Γ(5/2) = 4/(3√π) */
const inverseGamma = 0.7522527780636751;
/** Below this the series is taken, above it the complement. */
const seriesEnd = 2;

/**
 * Share of a Maxwellian's particles whose energy is below x kT: the regularised lower incomplete gamma function.
 *
 *   P(3/2, x) = (2/√π) ∫₀ˣ √t e^{−t} dt
 *
 *   x < 2: x^{3/2} e^{−x} Σ x^k/Γ(5/2 + k);  else 1 − e^{−x} Q̂(x), Q̂ as in `scaledUpperGamma`
 *
 * @param x  [1]  zero or more
 * @returns       [1]  between 0 and 1; within 1e-15 relative
 *
 * @throws  PhysicsDomainError if the input breaks the bound above
 * @source  [DLMF] §8.2, §8.7
 */
export function incompleteGamma(x: number): number {
  requireNonNegative("argument of the incomplete gamma function", x);
  if (x >= seriesEnd) return 1 - exponential(-x) * scaledUpperGamma(x);
  let term = 1;
  let sum = 1;
  for (let k = 1; term > sum * 1e-17; k += 1) {
    term *= x / (1.5 + k);
    sum += term;
  }
  return inverseGamma * x * Math.sqrt(x) * exponential(-x) * sum;
}

/**
 * Share of a Maxwellian's particles whose energy is above x kT, without its decay.
 *
 *   Q̂(x) = e^x Q(3/2, x) = 2√(x/π) + erfcx √x,   Q = 1 − P
 *
 * @param x  [1]  zero or more
 * @returns       [1]  1 or more; within 1e-15 relative
 *
 * @throws  PhysicsDomainError if the input breaks the bound above
 * @source  [DLMF] §8.4, §8.8
 */
export function scaledUpperGamma(x: number): number {
  requireNonNegative("argument of the incomplete gamma function", x);
  return 2 * Math.sqrt(x / Math.PI) + scaledErfc(Math.sqrt(x));
}
