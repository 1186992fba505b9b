import type { CellResult, ResultValue } from "../result";

/** Below this a magnitude has no value of its own; its `log10_…` twin carries it. */
export const smallestMagnitude = 1e-300;

export function measured(value: number | null, unit: string): ResultValue {
  return { value: value === null ? null : numberOrNull(value), unit };
}

/** null for a magnitude that is not zero and below `smallestMagnitude`. */
export function numberOrNull(value: number): number | null {
  return value !== 0 && Math.abs(value) < smallestMagnitude ? null : value;
}

/** A value under its name, with a `log10_…` twin only where it is too small or too large to have one itself. */
export function carried(
  name: string,
  value: number | null,
  log10: number,
  unit: string,
): CellResult["values"] {
  if (value !== null) return { [name]: measured(value, unit) };
  const cut = name.lastIndexOf(".") + 1;
  return {
    [name]: { value: null, unit },
    [`${name.slice(0, cut)}log10_${name.slice(cut)}`]: measured(log10, "1"),
  };
}
