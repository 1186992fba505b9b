import type { TextRange } from "../result";
import { fault } from "./notes";
import { readGasName } from "./readGasName";
import { eachOf, refused, type Reading } from "./reading";
import type { ItemNode, ValueNode } from "./syntax";

export interface ByGas<Value> {
  formula: string;
  value: Value;
  /** Of the whole item, `CO2: rest`. */
  range: TextRange;
}

/**
 * A list with one item a gas: `H: …, H2: …`; no gas twice.
 *
 * @param example  of a whole item: "CO2: rest"
 */
export function readByGas<Value>(
  node: ValueNode,
  knownGases: readonly string[],
  example: string,
  readItem: (value: ValueNode, formula: string) => Reading<Value>,
): Reading<ByGas<Value>[]> {
  if (node.type === "broken") return refused();
  const items: ItemNode[] =
    node.type === "list" ? node.items : [{ name: null, label: null, value: node, range: node.range }];
  const seen = new Set<string>();
  return eachOf(
    items.map(({ label, value, range }): Reading<ByGas<Value>> => {
      if (label === null)
        return refused(fault("by_gas", range, `A gas, a colon and its value are needed: ${example}.`));
      const gas = readGasName(label, knownGases);
      const read = readItem(value, gas.ok ? gas.value : "");
      if (!gas.ok || !read.ok) return { ok: false, notes: [...gas.notes, ...read.notes] };
      if (seen.has(gas.value))
        return refused(fault("gas_twice", range, `*${gas.value}* stands twice. Keep one.`));
      seen.add(gas.value);
      return { ok: true, value: { formula: gas.value, value: read.value, range }, notes: read.notes };
    }),
  );
}
