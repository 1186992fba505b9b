import { nearestName } from "./nearestName";
import { changeTo, fault } from "./notes";
import { refused, type Reading } from "./reading";
import type { ValueNode } from "./syntax";

export interface ReferenceTargets {
  /** With its article: "a body". */
  what: string;
  /** Cells of that kind above. */
  names: readonly string[];
  /** Other cells, and what they are: { name: "given", what: "a values cell" }. */
  others?: readonly { name: string; what: string }[];
}

/** The name of a cell of one kind above. */
export function readReference(
  node: ValueNode,
  { what, names, others = [] }: ReferenceTargets,
): Reading<string> {
  if (node.type === "broken") return refused();
  if (node.type !== "name")
    return refused(fault("reference", node.range, `The name of ${what} is needed here.`));
  const { path, range } = node;
  if (names.includes(path)) return { ok: true, value: path, notes: [] };
  const other = others.find(({ name }) => name === path);
  if (other)
    return refused(
      fault("reference", range, `*${path}* is ${other.what}; the name of ${what} is needed here.`),
    );
  const kind = what.replace(/^an? /, "");
  if (names.length === 0)
    return refused(fault("reference", range, `No ${kind} stands above. Add ${what} before this cell.`));
  const nearest = nearestName(path, names) ?? (names.length === 1 ? names[0] : undefined);
  if (nearest === undefined)
    return refused(fault("reference", range, `No ${kind} above is called *${path}*.`));
  const message = `No ${kind} above is called *${path}*. The nearest is *${nearest}*.`;
  return refused(fault("reference", range, message, changeTo(range, nearest)));
}
