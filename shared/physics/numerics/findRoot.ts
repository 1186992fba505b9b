import { PhysicsDomainError } from "../errors";

/** A root, or why there is none. */
export type RootOutcome =
  | { converged: true; root: number; iterations: number }
  | {
      converged: false;
      reason: "no_sign_change" | "not_a_number" | "too_many_iterations";
      lastBracket: readonly [number, number];
      iterations: number;
    };

export interface RootTolerance {
  /** Done when |f| is no larger. */
  value: number;
  /** Done when the bracket is no wider, or as narrow as numbers allow. */
  bracket: number;
}

/**
 * Root of a continuous function between two abscissae at which its signs differ, by the Illinois variant
 * of the false position: superlinear, never leaves the bracket; and by halving the bracket where that is slow.
 *
 * @param f          the function
 * @param left       one end of the bracket
 * @param right      the other end
 * @param tolerance  the first of the two that is reached ends the search
 *
 * @source [DowellJarratt1971]
 */
export function findRoot(
  f: (x: number) => number,
  left: number,
  right: number,
  tolerance: RootTolerance,
): RootOutcome {
  let a = left;
  let b = right;
  let fa = f(a);
  let fb = f(b);
  if (Number.isNaN(fa) || Number.isNaN(fb)) return failure("not_a_number", a, b, 0);
  if (Math.abs(fa) <= tolerance.value) return { converged: true, root: a, iterations: 0 };
  if (Math.abs(fb) <= tolerance.value) return { converged: true, root: b, iterations: 0 };
  if (fa > 0 === fb > 0) return failure("no_sign_change", a, b, 0);

  let widthBefore = Math.abs(b - a);
  for (let iterations = 1; iterations <= iterationLimit; iterations += 1) {
    const slanted = b - (fb * (b - a)) / (fb - fa);
    const isInside = slanted > Math.min(a, b) && slanted < Math.max(a, b);
    let isSlow = false;
    if (iterations % patience === 0) {
      isSlow = Math.abs(b - a) > widthBefore / 2;
      widthBefore = Math.abs(b - a);
    }
    const x = isInside && !isSlow ? slanted : a + (b - a) / 2;
    const fx = f(x);
    if (Number.isNaN(fx)) return failure("not_a_number", a, b, iterations);
    const hasChangedSide = fx > 0 !== fb > 0;
    if (hasChangedSide) {
      a = b;
      fa = fb;
    } else {
      fa /= 2; // the end that has stayed twice loses weight
    }
    b = x;
    fb = fx;
    const narrowest = Math.max(tolerance.bracket, roundingWidth * Math.abs(b));
    if (Math.abs(fx) <= tolerance.value || Math.abs(b - a) <= narrowest) {
      return { converged: true, root: x, iterations };
    }
  }
  return failure("too_many_iterations", a, b, iterationLimit);
}

/**
 * The root of an outcome that is known to have one.
 *
 * @param quantity  what the root is, for the error
 * @throws          PhysicsDomainError if the search did not converge
 */
export function rootOf(quantity: string, outcome: RootOutcome): number {
  if (outcome.converged) return outcome.root;
  const [a, b] = outcome.lastBracket;
  throw new PhysicsDomainError(quantity, (a + b) / 2, `a root that the search can reach (${outcome.reason})`);
}

/** After so many steps the bracket should have halved. */
const patience = 4;
/** At worst every second round of so many halves the bracket; from 1 to two units in the last place that takes 51. */
const iterationLimit = 2 * patience * 52;
/** Two units in the last place. */
const roundingWidth = 4.5e-16;

function failure(
  reason: "no_sign_change" | "not_a_number" | "too_many_iterations",
  a: number,
  b: number,
  iterations: number,
): RootOutcome {
  return { converged: false, reason, lastBracket: [a, b], iterations };
}
