import type { TextRange } from "../result";
import { nearestName } from "./nearestName";
import { changeTo, fault } from "./notes";
import { eachOf, refused, type Reading } from "./reading";
import type { ItemNode, ValueNode } from "./syntax";

export interface NamedGas {
  formula: string;
  range: TextRange;
}

/** The formula of a gas of the handbook or of a `gas` cell above. */
export function readGasName(node: ValueNode, knownGases: readonly string[]): Reading<string> {
  if (node.type === "broken") return refused();
  if (node.type !== "name")
    return refused(fault("gas", node.range, "The formula of a gas is needed here, such as CO2."));
  const { path, range } = node;
  if (knownGases.includes(path)) return { ok: true, value: path, notes: [] };
  const nearest = nearestName(path, knownGases);
  if (nearest !== undefined) {
    const message = `No gas *${path}*. The nearest is *${nearest}*.`;
    return refused(fault("gas", range, message, changeTo(range, nearest)));
  }
  return refused(
    fault("gas", range, `No gas *${path}* in the handbook. A gas cell of that name above would bring it in.`),
  );
}

/** `H, H2`: formulas, none twice. */
export function readGasNames(node: ValueNode, knownGases: readonly string[]): Reading<NamedGas[]> {
  if (node.type === "broken") return refused();
  const items: ItemNode[] =
    node.type === "list" ? node.items : [{ name: null, label: null, value: node, range: node.range }];
  const seen = new Set<string>();
  return eachOf(
    items.map(({ name, label, value, range }): Reading<NamedGas> => {
      if (name !== null || label !== null)
        return refused(fault("gas", range, "Only formulas stand here, with commas between: H, H2."));
      const read = readGasName(value, knownGases);
      if (!read.ok) return read;
      if (seen.has(read.value))
        return refused(fault("gas_twice", range, `*${read.value}* stands twice. Keep one.`));
      seen.add(read.value);
      return { ok: true, value: { formula: read.value, range }, notes: read.notes };
    }),
  );
}
