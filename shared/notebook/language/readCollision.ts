import { fault } from "./notes";
import { readArguments } from "./readArguments";
import { readByGas, type ByGas } from "./readByGas";
import { readQuantity } from "./readQuantity";
import { allOf, refused, type Reading } from "./reading";
import type { Scope } from "./scope";
import type { ValueNode } from "./syntax";

/** b(T) = A (T/1 K)^s; A in m⁻¹ s⁻¹. */
export interface CollisionReading {
  coefficient: number;
  exponent: number;
}

const example = "binary(A = 8.4e17 /(cm s), s = 0.597)";

function readBinary(node: ValueNode, scope: Scope): Reading<CollisionReading> {
  if (node.type === "broken") return refused();
  if (node.type !== "call" || node.name !== "binary")
    return refused(fault("collision", node.range, `A collision parameter is written ${example}.`));
  const named = readArguments(node, [
    { name: "A", isNeeded: true, example: "8.4e17 /(cm s)" },
    { name: "s", isNeeded: true, example: "0.597" },
  ]);
  if (!named.ok) return named;
  const read = allOf(
    readQuantity(named.value.get("A")!, { kind: "collision", name: "the coefficient A", above: 0 }, scope),
    readQuantity(
      named.value.get("s")!,
      { kind: "number", name: "the exponent s", atLeast: -5, atMost: 5 },
      scope,
    ),
  );
  if (!read.ok) return read;
  const [coefficient, exponent] = read.value;
  return { ok: true, value: { coefficient: coefficient.value, exponent: exponent.value }, notes: read.notes };
}

/** `CO2: binary(A = 8.4e17 /(cm s), s = 0.597), …`: collision parameters with other gases. */
export function readCollision(
  node: ValueNode,
  knownGases: readonly string[],
  scope: Scope,
): Reading<ByGas<CollisionReading>[]> {
  return readByGas(node, knownGases, `CO2: ${example}`, (value) => readBinary(value, scope));
}
