import { fault } from "./notes";
import { eachOf, refused, type Reading } from "./reading";
import type { ItemNode, NameNode, ValueNode } from "./syntax";

/** More than a figure or a table can show. */
export const mostWatched = 24;

/** `leak.H.rate, leak.exobase.altitude`: names of results, each once. */
export function readWatch(node: ValueNode): Reading<NameNode[]> {
  if (node.type === "broken") return refused();
  const items: ItemNode[] =
    node.type === "list" ? node.items : [{ name: null, label: null, value: node, range: node.range }];
  if (items.length > mostWatched) {
    const message = `A cell may watch ${mostWatched} results at most.`;
    return refused(fault("too_many", items[mostWatched].range, message));
  }
  const seen = new Set<string>();
  return eachOf(
    items.map(({ name, label, value, range }): Reading<NameNode> => {
      if (value.type === "broken") return refused();
      if (value.type !== "name" || name !== null || label !== null) {
        const message =
          "Names of results stand here, with commas between: leak.H.rate, leak.exobase.altitude.";
        return refused(fault("watch", range, message));
      }
      if (seen.has(value.path)) return refused(fault("watch", range, `*${value.path}* stands twice.`));
      seen.add(value.path);
      return { ok: true, value, notes: [] };
    }),
  );
}
