import { fault } from "./notes";
import { readQuantity } from "./readQuantity";
import { eachOf, refused, type Reading } from "./reading";
import type { Scope } from "./scope";
import type { ItemNode, ValueNode } from "./syntax";

/** More rows than anyone reads; a longer list is a slip. */
const mostLevels = 1000;

/** `100 km, 200 km`, or `100, 200, 300 km` with the unit at the end for all: altitudes in m, as written. */
export function readLevels(node: ValueNode, scope: Scope): Reading<number[]> {
  const items: ItemNode[] =
    node.type === "list" ? node.items : [{ name: null, label: null, value: node, range: node.range }];
  if (items.length > mostLevels)
    return refused(
      fault("too_many", items[mostLevels].range, `There may be ${mostLevels} altitudes at most.`),
    );
  const last = items[items.length - 1].value;
  const read = eachOf(
    items.map(({ name, label, value, range }) => {
      if (name !== null || label !== null)
        return refused(fault("levels", range, "Altitudes stand with commas between: 100 km, 200 km."));
      const takesUnit = value.type === "number" && last.type === "measured";
      const measured: ValueNode = takesUnit
        ? { type: "measured", operand: value, unit: last.unit, range }
        : value;
      return readQuantity(measured, { kind: "length", name: "the altitude" }, scope);
    }),
  );
  if (!read.ok) return read;
  return { ok: true, value: read.value.map(({ value }) => value), notes: read.notes };
}
