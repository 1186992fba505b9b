import type { Note } from "../result";
import type { QuantityName } from "./dimensions";
import { fault } from "./notes";
import { readQuantity, type ExpectedQuantity } from "./readQuantity";
import { allOf, eachOf, type Reading } from "./reading";
import type { Scope } from "./scope";
import type { CallNode } from "./syntax";

export interface Points {
  /** Altitudes in m, or ages in s. */
  places: Float64Array;
  values: Float64Array;
}

/** What points are given against. */
export interface PointPlaces {
  expected: ExpectedQuantity & { name: string };
  /** Said of a place that stands twice, and of one out of order. */
  twice: string;
  disorder: string;
}

const againstAltitude: PointPlaces = {
  expected: { kind: "length", name: "an altitude" },
  twice: "This altitude stands twice. Keep one value for it.",
  disorder: "Altitudes go upward; this one is below the one before it.",
};

/** `points(80 km: 140 K, 120 km: 165 K)`: altitudes (or other places) ascending, values above zero. */
export function readPoints(
  call: CallNode,
  { kind, name, example }: { kind: QuantityName; name: string; example: string },
  scope: Scope,
  { expected, twice, disorder }: PointPlaces = againstAltitude,
): Reading<Points> {
  const form = `A point is ${expected.name} and ${name}: ${example}.`;
  if (call.items.length < 2)
    return { ok: false, notes: [fault("points", call.range, `*points* needs two points at least. ${form}`)] };
  const read = eachOf(
    call.items.map(({ name: argument, label, value, range }): Reading<readonly [number, number]> => {
      if (argument !== null || label === null)
        return { ok: false, notes: value.type === "broken" ? [] : [fault("points", range, form)] };
      const point = allOf(
        readQuantity(label, expected, scope),
        readQuantity(value, { kind, name, above: 0 }, scope),
      );
      if (!point.ok) return point;
      const [place, quantity] = point.value;
      return { ok: true, value: [place.value, quantity.value], notes: point.notes };
    }),
  );
  if (!read.ok) return read;

  const unsorted: Note[] = [];
  for (let index = 1; index < read.value.length; index += 1) {
    const [place] = read.value[index];
    const [before] = read.value[index - 1];
    const { range } = call.items[index].label ?? call.items[index];
    if (place === before) unsorted.push(fault("points", range, twice));
    else if (place < before) unsorted.push(fault("points", range, disorder));
  }
  if (unsorted.length > 0) return { ok: false, notes: unsorted };
  return {
    ok: true,
    value: {
      places: Float64Array.from(read.value, ([place]) => place),
      values: Float64Array.from(read.value, ([, value]) => value),
    },
    notes: read.notes,
  };
}
