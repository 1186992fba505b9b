import { logarithm } from "../numerics/elementary";
import type { EscapingColumn } from "./escapingColumn";
import { findCoupledExobase, type CoupledExobase } from "./findCoupledExobase";
import { guessExobase } from "./guessExobase";

/** What the walk found, and all marches it took. */
export interface Walk {
  found: Extract<CoupledExobase, { converged: true }> | null;
  marches: number;
}

/** Escape in so many times its strength is solved first: far from the fold where exobases end, then from the other side. */
const starts = [3, 0.7];
/** Marches allowed for the first solution of a walk, and for each further one. */
const firstLimit = 40;
const furtherLimit = 15;
/** A step in ln of the strength no longer than this leads no further: the exobases end there. */
const shortest = 0.03;
/** Of ln p, on the way. */
const looseTolerance = 1e-6;

/**
 * Looks for the coupled exobase where the search from the guess failed: all escape is made stronger or weaker by one
 * factor, for which there may be a solution, and the factor is led back to 1 in steps, from solution to solution.
 */
export function walkToExobase(column: EscapingColumn, tolerance: number): Walk {
  let marches = 0;
  for (const start of starts) {
    const walk = walkFrom(column, logarithm(start), tolerance);
    marches += walk.marches;
    if (walk.found !== null) return { found: walk.found, marches };
  }
  return { found: null, marches };
}

function walkFrom(column: EscapingColumn, start: number, tolerance: number): Walk {
  const first = withStrength(column, start);
  const guess = guessExobase(first);
  if (!guess.hasCrossing) return { found: null, marches: 1 };
  let here = findCoupledExobase(first, guess, looseTolerance, firstLimit);
  let marches = 1 + here.marches;
  let strength = start;
  let step = start / 2;
  while (here.converged && strength !== 0 && Math.abs(step) > shortest) {
    const isLast = Math.abs(step) >= Math.abs(strength);
    const wanted = isLast ? 0 : strength - step;
    const stronger = withStrength(column, wanted);
    const next = findCoupledExobase(stronger, here, isLast ? tolerance : looseTolerance, furtherLimit);
    marches += next.marches;
    if (next.converged) {
      here = next;
      strength = wanted;
    } else step /= 2;
  }
  return { found: here.converged && strength === 0 ? here : null, marches };
}

/** The column with its escape made e^strength times as strong. */
function withStrength(column: EscapingColumn, strength: number): EscapingColumn {
  return { ...column, logSpeeds: column.logSpeeds.map((value) => value + strength) };
}
