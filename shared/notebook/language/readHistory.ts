import { evaluateExpression } from "./evaluateExpression";
import { isDimensionless } from "./measure";
import { nearestName } from "./nearestName";
import { changeTo, fault } from "./notes";
import { readPoints, type PointPlaces } from "./readPoints";
import { refused, type Reading } from "./reading";
import type { Scope } from "./scope";
import type { ValueNode } from "./syntax";

/** XUV light against the star's age. Only ratios of the light matter. */
export interface HistoryReading {
  /** s, above zero, ascending. */
  ages: Float64Array;
  fluxes: Float64Array;
}

const againstAge: PointPlaces = {
  expected: { kind: "time", name: "an age", above: 0 },
  twice: "This age stands twice. Keep one value for it.",
  disorder: "Ages go upward; this one is below the one before it.",
};

/** `points(0.1 Gyr: 90, 4.6 Gyr: 1)`: energy fluxes, or numbers without unit for all. */
export function readHistory(node: ValueNode, scope: Scope): Reading<HistoryReading> {
  if (node.type === "broken") return refused();
  const form = "A history is written points(0.1 Gyr: 90, 1 Gyr: 6.2, 4.6 Gyr: 1).";
  if (node.type !== "call") return refused(fault("profile", node.range, form));
  if (node.name !== "points") {
    const nearest = nearestName(node.name, ["points"]);
    const remedy = nearest === undefined ? undefined : changeTo(node.nameRange, nearest);
    return refused(fault("profile", node.nameRange, `No history *${node.name}*. ${form}`, remedy));
  }
  const [first] = node.items;
  const evaluated = first && evaluateExpression(first.value, scope);
  const isRelative = evaluated?.ok === true && isDimensionless(evaluated.quantity.dimension);
  const points = readPoints(
    node,
    isRelative
      ? { kind: "number", name: "a number for the light", example: "0.1 Gyr: 90" }
      : { kind: "energyFlux", name: "an energy flux", example: "0.1 Gyr: 500 mW/m^2" },
    scope,
    againstAge,
  );
  if (!points.ok) return points;
  const { places, values } = points.value;
  return { ok: true, value: { ages: places, fluxes: values }, notes: points.notes };
}
