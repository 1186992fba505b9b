import type { QuantityName } from "./dimensions";
import { nearestName } from "./nearestName";
import { changeTo, fault } from "./notes";
import { readPoints } from "./readPoints";
import { readQuantity } from "./readQuantity";
import { refused, type Reading } from "./reading";
import { functionNames } from "./reservedWord";
import type { Scope } from "./scope";
import type { ValueNode } from "./syntax";

/** Altitudes in m; values in SI, above zero. */
export type Samples =
  { kind: "constant"; value: number } | { kind: "points"; altitudes: Float64Array; values: Float64Array };

export interface ExpectedSamples {
  kind: QuantityName;
  /** With its article: "an ion density". */
  name: string;
  /** Of a point: "200 km: 8e3 /cm^3". */
  example: string;
}

/** One value for all altitudes, or `points(200 km: 8e3 /cm^3, …)`. */
export function readSamples(node: ValueNode, expected: ExpectedSamples, scope: Scope): Reading<Samples> {
  if (node.type === "call" && node.name === "points") {
    const points = readPoints(node, expected, scope);
    if (!points.ok) return points;
    const { places, values } = points.value;
    return { ok: true, value: { kind: "points", altitudes: places, values }, notes: points.notes };
  }
  if (node.type === "call" && node.name !== "ref" && !(functionNames as readonly string[]).includes(node.name)) {
    const nearest = nearestName(node.name, ["points"]);
    const message = `No profile *${node.name}* here. Write one value, or points(${expected.example}, …).`;
    const remedy = nearest === undefined ? undefined : changeTo(node.nameRange, nearest);
    return refused(fault("profile", node.nameRange, message, remedy));
  }
  const constant = readQuantity(node, { kind: expected.kind, name: expected.name, above: 0 }, scope);
  if (!constant.ok) return constant;
  return { ok: true, value: { kind: "constant", value: constant.value.value }, notes: constant.notes };
}
