import type { Quantity } from "./quantity";
import { readByGas, type ByGas } from "./readByGas";
import { readQuantity } from "./readQuantity";
import type { Reading } from "./reading";
import type { Scope } from "./scope";
import type { ValueNode } from "./syntax";

/** `H: 1.5 ± 0.2, H2: 1.2`: a factor above zero for each gas. */
export function readGasFactors(
  node: ValueNode,
  knownGases: readonly string[],
  scope: Scope,
): Reading<ByGas<Quantity>[]> {
  return readByGas(node, knownGases, "H: 1.5", (value, formula) =>
    readQuantity(value, { kind: "number", name: `the factor of ${formula}`, above: 0 }, scope),
  );
}
