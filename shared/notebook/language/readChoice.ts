import { nearestName } from "./nearestName";
import { changeTo, fault, inWords } from "./notes";
import { refused, type Reading } from "./reading";
import type { ValueNode } from "./syntax";

/**
 * One of a few words.
 *
 * @param what  what is chosen, without article: "criterion"
 */
export function readChoice<Choice extends string>(
  node: ValueNode,
  choices: readonly Choice[],
  what: string,
): Reading<Choice> {
  if (node.type === "broken") return refused();
  const among = `The ${what} is ${inWords(choices)}.`;
  if (node.type !== "name") return refused(fault("choice", node.range, among));
  const chosen = choices.find((choice) => choice === node.path);
  if (chosen !== undefined) return { ok: true, value: chosen, notes: [] };
  const nearest = nearestName(node.path, choices);
  if (nearest === undefined)
    return refused(fault("choice", node.range, `No ${what} *${node.path}*. ${among}`));
  const message = `No ${what} *${node.path}*. The nearest is *${nearest}*.`;
  return refused(fault("choice", node.range, message, changeTo(node.range, nearest)));
}
