import type { ResultValue } from "../result";

/** Below this a magnitude has no value of its own; its `log10_…` twin carries it. */
export const smallestMagnitude = 1e-300;

export function measured(value: number | null, unit: string): ResultValue {
  return { value: value === null ? null : numberOrNull(value), unit };
}

/** null for a magnitude that is not zero and below `smallestMagnitude`. */
export function numberOrNull(value: number): number | null {
  return value !== 0 && Math.abs(value) < smallestMagnitude ? null : value;
}
