import { nearestName } from "./nearestName";
import { changeTo, fault } from "./notes";
import { refused, type Reading } from "./reading";
import type { ValueNode } from "./syntax";

/**
 * `O2+`: a singly charged ion.
 *
 * @param ions  formulas of all ions that may stand here, each with its plus sign
 */
export function readIon(node: ValueNode, ions: readonly string[]): Reading<string> {
  if (node.type === "broken") return refused();
  if (node.type !== "name")
    return refused(fault("ion", node.range, "The formula of an ion is needed here, such as O2+."));
  const { path, range } = node;
  if (ions.includes(path)) return { ok: true, value: path, notes: [] };
  if (ions.includes(`${path}+`)) {
    const message = `*${path}* is a neutral gas; its ion is written ${path}+.`;
    return refused(fault("ion", range, message, changeTo(range, `${path}+`)));
  }
  const nearest = nearestName(path, ions);
  if (nearest === undefined)
    return refused(
      fault("ion", range, `No ion *${path}*. An ion is a gas of the handbook with a plus sign, such as O2+.`),
    );
  return refused(
    fault("ion", range, `No ion *${path}*. The nearest is *${nearest}*.`, changeTo(range, nearest)),
  );
}
