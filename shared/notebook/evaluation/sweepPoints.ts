import { log10, powerOfTen } from "../../physics";
import type { Variation } from "../language/readVariation";

/** Values of the varied quantities at a point, SI; the first axis varies fastest. */
export function sweepPoint(axes: readonly Variation[], index: number): number[] {
  let left = index;
  return axes.map((axis) => {
    const count = axis.steps + 1;
    const step = left % count;
    left = Math.floor(left / count);
    return valueAt(axis, step);
  });
}

/** Both ends are as written, to the last bit. */
function valueAt({ first, last, steps, spacing }: Variation, step: number): number {
  if (step === 0) return first;
  if (step === steps) return last;
  const share = step / steps;
  if (spacing === "linear") return first + (last - first) * share;
  return powerOfTen(log10(first) + (log10(last) - log10(first)) * share);
}
