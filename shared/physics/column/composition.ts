import { exponential, logarithm } from "../numerics/elementary";

/** The largest number of gases in a column. */
export const maximumGases = 32;

/** Mole fractions of the state that `setComposition` was last given. */
export const fractions = new Float64Array(maximumGases);

/**
 * Works out the mole fractions of a state, into `fractions`.
 *
 * @param state  ln p of each gas
 * @param size   number of gases
 * @returns      ln of the total pressure
 */
export function setComposition(state: Float64Array, size: number): number {
  let peak = state[0];
  for (let i = 1; i < size; i += 1) if (state[i] > peak) peak = state[i];
  let sum = 0;
  for (let i = 0; i < size; i += 1) {
    fractions[i] = exponential(state[i] - peak);
    sum += fractions[i];
  }
  for (let i = 0; i < size; i += 1) fractions[i] /= sum;
  return peak + logarithm(sum);
}
