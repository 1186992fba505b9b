import type { Note } from "../result";
import type { QuantityName } from "./dimensions";
import { fault } from "./notes";
import { readQuantity } from "./readQuantity";
import { allOf, eachOf, type Reading } from "./reading";
import type { Scope } from "./scope";
import type { CallNode } from "./syntax";

export interface Points {
  altitudes: Float64Array;
  values: Float64Array;
}

/** `points(80 km: 140 K, 120 km: 165 K)`: altitudes ascending, values above zero. */
export function readPoints(
  call: CallNode,
  { kind, name, example }: { kind: QuantityName; name: string; example: string },
  scope: Scope,
): Reading<Points> {
  const form = `A point is an altitude and ${name}: ${example}.`;
  if (call.items.length < 2)
    return { ok: false, notes: [fault("points", call.range, `*points* needs two points at least. ${form}`)] };
  const read = eachOf(
    call.items.map(({ name: argument, label, value, range }): Reading<readonly [number, number]> => {
      if (argument !== null || label === null)
        return { ok: false, notes: value.type === "broken" ? [] : [fault("points", range, form)] };
      const point = allOf(
        readQuantity(label, { kind: "length", name: "an altitude" }, scope),
        readQuantity(value, { kind, name, above: 0 }, scope),
      );
      if (!point.ok) return point;
      const [altitude, quantity] = point.value;
      return { ok: true, value: [altitude.value, quantity.value], notes: point.notes };
    }),
  );
  if (!read.ok) return read;

  const disorder: Note[] = [];
  for (let index = 1; index < read.value.length; index += 1) {
    const [altitude] = read.value[index];
    const [before] = read.value[index - 1];
    const { range } = call.items[index].label ?? call.items[index];
    if (altitude === before)
      disorder.push(fault("points", range, "This altitude stands twice. Keep one value for it."));
    else if (altitude < before)
      disorder.push(fault("points", range, "Altitudes go upward; this one is below the one before it."));
  }
  if (disorder.length > 0) return { ok: false, notes: disorder };
  return {
    ok: true,
    value: {
      altitudes: Float64Array.from(read.value, ([altitude]) => altitude),
      values: Float64Array.from(read.value, ([, value]) => value),
    },
    notes: read.notes,
  };
}
