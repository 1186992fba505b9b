import { power } from "./elementary";

/**
 * The next step of a method of order 8 with error estimate of order 7, from the errors of the last two
 * steps: the smaller of a proportional–integral and a predictive control, so that it neither oscillates nor
 * runs into a region where the error is already growing.
 *
 *   f_PI = 0.85 e⁻¹ᐟ⁸ e₋⁰·⁰²,   f_pred = 0.85 (h/h₋) e⁻¹ᐟ⁸ (e₋/e)¹ᐟ⁸
 *
 * @source [Gustafsson1994]; exponents and limits found by trial on columns of gases
 */

export interface StepMemory {
  /** Length of the last accepted step, above zero; 0 before the first. */
  step: number;
  /** Its error over the tolerance. */
  error: number;
}

const safety = 0.85;
const largestGrowth = 4;
const smallestGrowth = 0.1;
/** Below it an error is rounding, and says nothing about the step. */
const smallestError = 1e-10;

/** Factor for the step after an accepted one. */
export function growthAfter(step: number, error: number, last: StepMemory): number {
  const e = Math.max(error, smallestError);
  const plain = safety / eighthRoot(e);
  if (last.step === 0) return limited(plain, largestGrowth);
  const damped = plain * power(last.error, 0.02);
  const predictive = (plain * (step / last.step) * eighthRoot(last.error)) / eighthRoot(e);
  return limited(Math.min(damped, predictive), largestGrowth);
}

/** Factor for another try of a rejected step; `error` may be NaN. */
export function shrinkAfter(error: number): number {
  return error > 1 && error < Infinity ? limited(safety / eighthRoot(error), 0.9) : smallestGrowth;
}

/** Remembers an accepted step. */
export function rememberStep(memory: StepMemory, step: number, error: number): void {
  memory.step = step;
  memory.error = Math.max(error, smallestError);
}

function eighthRoot(x: number): number {
  return Math.sqrt(Math.sqrt(Math.sqrt(x)));
}

function limited(factor: number, largest: number): number {
  return Math.min(largest, Math.max(smallestGrowth, factor));
}
