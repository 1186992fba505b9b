import { checkName } from "./checkName";
import { sayWhichCentresAct, type OpenCell } from "./openCell";
import { measured } from "./resultValue";
import { evaluateExpression } from "../language/evaluateExpression";
import { siUnitText } from "../language/formatQuantity";
import type { Quantity } from "../language/quantity";
import type { Scope } from "../language/scope";
import { understoodText } from "../language/understoodText";
import type { CellResult } from "../result";
import type { CellAnswer } from "./cellAnswer";

export function evaluateValues(cell: OpenCell): CellAnswer {
  if (cell.name !== "") checkName(cell, cell.name);
  const globals: Record<string, Quantity | null> = {};
  const values: CellResult["values"] = {};
  const scope = withEntriesAbove(cell, globals);

  for (const entry of cell.entries) {
    const isFree = checkName(cell, entry.key, entry.keyRange);
    const evaluated = evaluateExpression(entry.node, scope);
    cell.notes.push(...evaluated.notes);
    if (!isFree) continue;
    const quantity = evaluated.ok ? asItActs(cell, entry.key, evaluated.quantity) : null;
    globals[entry.key] = quantity;
    if (!quantity) continue;
    values[entry.key] = measured(quantity.value, siUnitText(quantity.dimension));
    if (!cell.isDraw) cell.understand(entry, understoodText(entry.node, quantity, cell));
  }
  sayWhichCentresAct(cell);
  return { values, globals };
}

/** As written, or as a sweep has it. */
function asItActs({ surroundings }: OpenCell, key: string, { value, ...rest }: Quantity): Quantity {
  return { ...rest, value: surroundings.replaced?.(key) ?? value };
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
    reference: (pin) => surroundings.reference(pin),
    draw: surroundings.draw,
  };
}
