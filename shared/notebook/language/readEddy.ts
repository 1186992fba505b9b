import type { EddyProfile } from "../../physics";
import { formatQuantity } from "./formatQuantity";
import { nearestName } from "./nearestName";
import { changeTo, fault } from "./notes";
import { readArguments } from "./readArguments";
import { readPoints } from "./readPoints";
import { readQuantity } from "./readQuantity";
import { allOf, ifGiven, refused, type Reading } from "./reading";
import { functionNames } from "./reservedWord";
import type { Scope } from "./scope";
import type { CallNode, ValueNode } from "./syntax";

function readPower(call: CallNode, scope: Scope): Reading<EddyProfile> {
  const named = readArguments(call, [
    { name: "base", isNeeded: true, example: "1e6 cm^2/s" },
    { name: "exponent", isNeeded: true, example: "0.5" },
    { name: "ceiling", isNeeded: false, example: "1e8 cm^2/s" },
  ]);
  if (!named.ok) return named;
  const ceilingNode = named.value.get("ceiling");
  const read = allOf(
    readQuantity(
      named.value.get("base")!,
      { kind: "diffusion", name: "the coefficient at the base", above: 0 },
      scope,
    ),
    readQuantity(
      named.value.get("exponent")!,
      { kind: "number", name: "the exponent", atLeast: -10, atMost: 10 },
      scope,
    ),
    ifGiven(ceilingNode, (node) =>
      readQuantity(node, { kind: "diffusion", name: "the ceiling", above: 0 }, scope),
    ),
  );
  if (!read.ok) return read;
  const [base, exponent, ceiling] = read.value;
  if (ceiling !== null && ceilingNode && ceiling.value < base.value) {
    const shown = formatQuantity(base.value, base.dimension, { unitSystem: "SI" });
    return refused(
      fault(
        "bound",
        ceilingNode.range,
        `The ceiling must be at least the coefficient at the base, ${shown}.`,
      ),
    );
  }
  return {
    ok: true,
    value: { kind: "power", base: base.value, exponent: exponent.value, ceiling: ceiling?.value ?? null },
    notes: read.notes,
  };
}

/** A diffusion coefficient (constant; 0 for none), `power(…)` or `points(…)`. */
export function readEddy(node: ValueNode, scope: Scope): Reading<EddyProfile> {
  if (node.type === "number" && !/[1-9]/.test(node.digits))
    return { ok: true, value: { kind: "none" }, notes: [] };
  if (node.type === "call" && node.name === "power") return readPower(node, scope);
  if (node.type === "call" && node.name === "points") {
    const points = readPoints(
      node,
      { kind: "diffusion", name: "a diffusion coefficient", example: "80 km: 1e6 cm^2/s" },
      scope,
    );
    if (!points.ok) return points;
    const { places, values } = points.value;
    return {
      ok: true,
      value: { kind: "points", altitudes: places, coefficients: values },
      notes: points.notes,
    };
  }
  if (node.type === "call" && node.name !== "ref" && !(functionNames as readonly string[]).includes(node.name)) {
    const nearest = nearestName(node.name, ["power", "points"]);
    const forms = "Eddy mixing is a diffusion coefficient, power(…) or points(…).";
    return refused(
      nearest === undefined
        ? fault("profile", node.nameRange, `No profile of eddy mixing *${node.name}*. ${forms}`)
        : fault(
            "profile",
            node.nameRange,
            `No profile of eddy mixing *${node.name}*. The nearest is *${nearest}*.`,
            changeTo(node.nameRange, nearest),
          ),
    );
  }
  const constant = readQuantity(node, { kind: "diffusion", name: "eddy mixing", atLeast: 0 }, scope);
  if (!constant.ok) return constant;
  const coefficient = constant.value.value;
  return {
    ok: true,
    value: coefficient === 0 ? { kind: "none" } : { kind: "constant", coefficient },
    notes: constant.notes,
  };
}
