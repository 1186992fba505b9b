import { quantityKinds, type QuantityName } from "./dimensions";
import { dimensionWords } from "./dimensionWords";
import { evaluateExpression } from "./evaluateExpression";
import { formatQuantity } from "./formatQuantity";
import { isDimensionless, sameDimension } from "./measure";
import { fault, type Remedy } from "./notes";
import type { Quantity } from "./quantity";
import { refused, type Reading } from "./reading";
import type { Scope } from "./scope";
import type { ValueNode } from "./syntax";

export interface ExpectedQuantity {
  kind: QuantityName;
  /** What it is called in a message: "the base temperature". */
  name?: string;
  /** Bounds in SI, on the value that acts; `above` and `below` leave the bound itself out. */
  above?: number;
  atLeast?: number;
  below?: number;
  atMost?: number;
}

const capital = (text: string): string => `${text.charAt(0).toUpperCase()}${text.slice(1)}`;

/** A unit that is sure to be meant, where a bare number stands. */
function missingUnit(node: ValueNode, kind: QuantityName): Remedy | undefined {
  const { unit } = quantityKinds[kind];
  if (kind !== "temperature" || node.type !== "number") return undefined;
  return {
    label: `Write ${unit}`,
    range: { from: node.range.to, to: node.range.to },
    replacement: ` ${unit}`,
  };
}

/** Why a number breaks its bounds, in the words of the entry; null where it keeps them. */
function brokenBound(
  value: number,
  { kind, name, above, atLeast, below, atMost }: ExpectedQuantity,
): string | null {
  const { dimension } = quantityKinds[kind];
  const shown = (number: number): string =>
    number === 0 && kind !== "temperature" ? "zero" : formatQuantity(number, dimension, { unitSystem: "SI" });
  const bound =
    above !== undefined && !(value > above)
      ? `above ${shown(above)}`
      : atLeast !== undefined && !(value >= atLeast)
        ? `${shown(atLeast)} or more`
        : below !== undefined && !(value < below)
          ? `below ${shown(below)}`
          : atMost !== undefined && !(value <= atMost)
            ? `${shown(atMost)} or less`
            : null;
  if (bound === null) return null;
  const subject =
    name === undefined ? capital(quantityKinds[kind].words.replace(" without unit", "")) : capital(name);
  return `${subject} must be ${bound}${name === undefined ? " here" : ""}; this is ${shown(value)}.`;
}

/** An expression of the expected dimension within its bounds. */
export function readQuantity(node: ValueNode, expected: ExpectedQuantity, scope: Scope): Reading<Quantity> {
  const evaluated = evaluateExpression(node, scope);
  if (!evaluated.ok) return evaluated;
  const { quantity, notes } = evaluated;
  const { dimension, words, unit } = quantityKinds[expected.kind];
  if (!sameDimension(quantity.dimension, dimension)) {
    const needed = unit === "" ? capital(words) : `${capital(words)} in ${unit}`;
    const isBare = isDimensionless(quantity.dimension);
    const found = isBare ? "this has no unit" : `this is ${dimensionWords(quantity.dimension)}`;
    return refused(
      fault("dimension", node.range, `${needed} is needed here; ${found}.`, missingUnit(node, expected.kind)),
    );
  }
  const message = brokenBound(quantity.value, expected);
  if (message !== null) return refused(fault("bound", node.range, message));
  return { ok: true, value: quantity, notes };
}
