import type { TemperatureProfile } from "../../physics";
import { nearestName } from "./nearestName";
import { changeTo, fault } from "./notes";
import { readArguments } from "./readArguments";
import { readPoints } from "./readPoints";
import { readQuantity } from "./readQuantity";
import { allOf, ifGiven, refused, type Reading } from "./reading";
import { functionNames } from "./reservedWord";
import type { Scope } from "./scope";
import type { CallNode, ValueNode } from "./syntax";

/** As the physics takes it, save that a Bates profile may leave its altitude to the column's base (null). */
export type TemperatureReading =
  | Exclude<TemperatureProfile, { kind: "bates" }>
  | { kind: "bates"; base: number; exosphere: number; shape: number; referenceAltitude: number | null };

function readBates(call: CallNode, scope: Scope): Reading<TemperatureReading> {
  const named = readArguments(call, [
    { name: "base", isNeeded: true, example: "140 K" },
    { name: "exosphere", isNeeded: true, example: "240 K" },
    { name: "shape", isNeeded: true, example: "0.03 /km" },
    { name: "at", isNeeded: false, example: "120 km" },
  ]);
  if (!named.ok) return named;
  const read = allOf(
    readQuantity(
      named.value.get("base")!,
      { kind: "temperature", name: "the base temperature", above: 0 },
      scope,
    ),
    readQuantity(
      named.value.get("exosphere")!,
      { kind: "temperature", name: "the exospheric temperature", above: 0 },
      scope,
    ),
    readQuantity(named.value.get("shape")!, { kind: "perLength", name: "the shape", above: 0 }, scope),
    ifGiven(named.value.get("at"), (node) =>
      readQuantity(node, { kind: "length", name: "the altitude" }, scope),
    ),
  );
  if (!read.ok) return read;
  const [base, exosphere, shape, altitude] = read.value;
  return {
    ok: true,
    value: {
      kind: "bates",
      base: base.value,
      exosphere: exosphere.value,
      shape: shape.value,
      referenceAltitude: altitude?.value ?? null,
    },
    notes: read.notes,
  };
}

/** A temperature (constant), `bates(…)` or `points(…)`. */
export function readTemperature(node: ValueNode, scope: Scope): Reading<TemperatureReading> {
  if (node.type === "call" && node.name === "bates") return readBates(node, scope);
  if (node.type === "call" && node.name === "points") {
    const points = readPoints(
      node,
      { kind: "temperature", name: "a temperature", example: "80 km: 140 K" },
      scope,
    );
    if (!points.ok) return points;
    const { places, values } = points.value;
    return {
      ok: true,
      value: { kind: "points", altitudes: places, temperatures: values },
      notes: points.notes,
    };
  }
  if (node.type === "call" && node.name !== "ref" && !(functionNames as readonly string[]).includes(node.name)) {
    const nearest = nearestName(node.name, ["bates", "points"]);
    const forms = "A temperature is a quantity, bates(…) or points(…).";
    return refused(
      nearest === undefined
        ? fault("profile", node.nameRange, `No temperature profile *${node.name}*. ${forms}`)
        : fault(
            "profile",
            node.nameRange,
            `No temperature profile *${node.name}*. The nearest is *${nearest}*.`,
            changeTo(node.nameRange, nearest),
          ),
    );
  }
  const constant = readQuantity(node, { kind: "temperature", name: "the temperature", above: 0 }, scope);
  if (!constant.ok) return constant;
  return { ok: true, value: { kind: "constant", temperature: constant.value.value }, notes: constant.notes };
}
