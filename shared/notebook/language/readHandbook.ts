import { nearestName } from "./nearestName";
import { changeTo, fault, inWords } from "./notes";
import { refused, type Reading } from "./reading";
import type { ValueNode } from "./syntax";

/** `handbook(Mars)`: the name of an entry of the handbook. */
export function readHandbook(node: ValueNode, names: readonly string[]): Reading<string> {
  if (node.type === "broken") return refused();
  const example = names[0] ?? "Mars";
  const form = `A body of the handbook is written handbook(${example}).`;
  if (node.type === "name" && names.includes(node.path))
    return refused(fault("handbook", node.range, form, changeTo(node.range, `handbook(${node.path})`)));
  if (node.type !== "call" || node.name !== "handbook") return refused(fault("handbook", node.range, form));
  const [item, second] = node.items;
  if (item === undefined || item.name !== null || item.label !== null || item.value.type !== "name")
    return refused(fault("handbook", node.range, form));
  if (second !== undefined)
    return refused(fault("handbook", second.range, "The handbook gives one body at a time."));
  const { path, range } = item.value;
  if (names.includes(path)) return { ok: true, value: path, notes: [] };
  const nearest = nearestName(path, names);
  if (nearest === undefined)
    return refused(
      fault("handbook", range, `The handbook has no *${path}*. It has ${inWords(names, "and")}.`),
    );
  return refused(
    fault(
      "handbook",
      range,
      `The handbook has no *${path}*. The nearest is *${nearest}*.`,
      changeTo(range, nearest),
    ),
  );
}
