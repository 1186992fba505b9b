/** What an uncertain number can be at all, by the entry that uses it. */
import type { PhysicalBounds } from "../../physics";
import type { EntrySchema } from "../kinds/cellSchema";
import { quantityKinds, type Dimension } from "../language/dimensions";
import { isDimensionless, sameDimension } from "../language/measure";
import type { ItemNode, ValueNode } from "../language/syntax";

/**
 * bounds: those of the entry. amount: of a profile or a list, by its dimension: lengths and pure numbers (altitudes,
 * exponents) are free, all else is zero or more. fraction: the same, but a pure number lies between 0 and 1.
 */
export type PhysicalRole = { kind: "bounds"; lower: number; upper: number } | { kind: "amount" | "fraction" };

/** No gas of any use to this model is colder, K. */
const coldest = 1;

const free: PhysicalBounds = { lower: -Infinity, upper: Infinity };

/** The parts of an entry that are numbers by themselves, each with its role. */
export function rolesIn(schema: EntrySchema, node: ValueNode): { node: ValueNode; role: PhysicalRole }[] {
  switch (schema.form) {
    case "quantity":
      return [{ node, role: roleOfQuantity(schema) }];
    case "profile":
    case "samples":
    case "history":
    case "factors":
      return numbersIn(node).map((part) => ({ node: part, role: { kind: "amount" } }));
    case "pairs":
      return numbersIn(node)
        .flatMap(numbersIn)
        .map((part) => ({ node: part, role: { kind: "amount" } }));
    case "gases":
      return numbersIn(node).map((part) => ({ node: part, role: { kind: "fraction" } }));
    default:
      return [];
  }
}

function numbersIn(node: ValueNode): ValueNode[] {
  const items: readonly ItemNode[] | null = node.type === "call" || node.type === "list" ? node.items : null;
  return items ? items.map(({ value }) => value) : [node];
}

function roleOfQuantity({ bounds = {}, dimension }: EntrySchema): PhysicalRole {
  const { above = -Infinity, atLeast = -Infinity, below = Infinity, atMost = Infinity } = bounds;
  const lower = Math.max(above, atLeast, dimension === "temperature" ? coldest : -Infinity);
  return { kind: "bounds", lower, upper: Math.min(below, atMost) };
}

/** Where all the roles of a number leave it. */
export function boundsOf(roles: readonly PhysicalRole[], dimension: Dimension): PhysicalBounds {
  return roles.reduce((bounds, role) => {
    const { lower, upper } = role.kind === "bounds" ? role : boundsOfAmount(role.kind, dimension);
    return { lower: Math.max(bounds.lower, lower), upper: Math.min(bounds.upper, upper) };
  }, free);
}

function boundsOfAmount(kind: "amount" | "fraction", dimension: Dimension): PhysicalBounds {
  if (isDimensionless(dimension)) return kind === "fraction" ? { lower: 0, upper: 1 } : free;
  if (sameDimension(dimension, quantityKinds.length.dimension)) return free;
  const isTemperature = sameDimension(dimension, quantityKinds.temperature.dimension);
  return { lower: isTemperature ? coldest : 0, upper: Infinity };
}
