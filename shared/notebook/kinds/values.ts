import { checkName } from "../evaluation/checkName";
import type { OpenCell } from "../evaluation/openCell";
import { measured } from "../evaluation/resultValue";
import { evaluateExpression } from "../language/evaluateExpression";
import { siUnitText } from "../language/formatQuantity";
import type { Quantity } from "../language/quantity";
import type { Scope } from "../language/scope";
import { understoodText } from "../language/understoodText";
import type { CellResult } from "../result";
import type { CellAnswer } from "./cellAnswer";
import type { CellSchema } from "./cellSchema";

/** Named quantities, known in all cells below, and in the entries below within the cell. */
export const valuesSchema: CellSchema = {
  kind: "values",
  group: "write",
  description: "named quantities, with their uncertainty",
  naming: "name",
  takesAnyKey: true,
  entries: [],
};

export function evaluateValues(cell: OpenCell): CellAnswer {
  const globals: Record<string, Quantity | null> = {};
  const values: CellResult["values"] = {};
  const scope = withEntriesAbove(cell, globals);

  for (const entry of cell.entries) {
    const isFree = checkName(cell, entry.key, entry.keyRange);
    const evaluated = evaluateExpression(entry.node, scope);
    cell.notes.push(...evaluated.notes);
    if (!isFree) continue;
    globals[entry.key] = evaluated.ok ? evaluated.quantity : null;
    if (!evaluated.ok) continue;
    const { quantity } = evaluated;
    values[entry.key] = measured(quantity.value, siUnitText(quantity.dimension));
    cell.understand(entry, understoodText(entry.node, quantity, cell));
  }
  return { values, globals };
}

/** The cells above, and the entries of this cell that stand above the one being read. */
function withEntriesAbove(cell: OpenCell, globals: Readonly<Record<string, Quantity | null>>): Scope {
  const { surroundings } = cell;
  const own = new Set(cell.entries.map(({ key }) => key));
  return {
    lookup(path) {
      const earlier = Object.hasOwn(globals, path) ? globals[path] : undefined;
      if (earlier) return earlier;
      if (earlier === null) return { unavailable: `*${path}* has a fault itself; put that right first.` };
      const above = surroundings.lookup(path);
      if (above === undefined && own.has(path)) {
        return {
          unavailable: `*${path}* is not defined above this line; an entry sees only what stands above it.`,
        };
      }
      return above;
    },
    names: () => [...Object.keys(globals), ...surroundings.names()],
  };
}
