import type { TextRange } from "../result";
import { dimensionWords } from "./dimensionWords";
import type { Dimension } from "./dimensions";
import { evaluateExpression } from "./evaluateExpression";
import { isBareNumber, unitAtEnd } from "./evaluateUncertain";
import { formatPlainNumber } from "./formatQuantity";
import { isDimensionless, sameDimension } from "./measure";
import { nearestName } from "./nearestName";
import { changeTo, fault } from "./notes";
import type { Quantity } from "./quantity";
import { allOf, refused, type Reading } from "./reading";
import type { Scope } from "./scope";
import type { ItemNode, NameNode, ValueNode, VariationNode } from "./syntax";

/** A quantity that a sweep takes from one value to another. */
export interface Variation {
  /** Name of the quantity. */
  name: string;
  nameRange: TextRange;
  dimension: Dimension;
  /** SI, at both ends. */
  first: number;
  last: number;
  /** One less than the number of points. */
  steps: number;
  spacing: "linear" | "logarithmic";
}

const example = "T_quiet from 180 K to 350 K in 40 steps";

/**
 * `T_quiet from 180 K to 350 K in 40 steps`, and `, logarithmic` behind it.
 *
 * @param mostSteps  of one sweep
 */
export function readVariation(node: ValueNode, mostSteps: number, scope: Scope): Reading<Variation> {
  if (node.type === "broken") return refused();
  const [variation, ...words]: ItemNode[] =
    node.type === "list" ? node.items : [{ name: null, label: null, value: node, range: node.range }];
  if (variation.value.type !== "variation" || variation.label !== null || variation.name !== null) {
    const message = `Say what is varied, from where to where, and in how many steps: ${example}.`;
    return refused(fault("variation", variation.range, message));
  }
  const spacing = readSpacing(words);
  const { subject, steps: stepsNode } = variation.value;
  const subjectName = readSubject(subject);
  const steps = readSteps(stepsNode, mostSteps, scope);
  const ends = allOf(subjectName, readEnds(variation.value, scope));
  const read = allOf(spacing, steps, ends);
  if (!read.ok) return read;
  const [spaced, count, [name, { first, last }]] = read.value;
  const broken =
    differingEnds(name, variation.value, first, last, scope) ??
    (spaced === "logarithmic" ? aboveZero(variation.value, first, last) : null);
  if (broken) return refused(broken);
  return {
    ok: true,
    value: {
      name: name.path,
      nameRange: name.range,
      dimension: first.dimension,
      first: first.value,
      last: last.value,
      steps: count,
      spacing: spaced,
    },
    notes: [],
  };
}

function readSpacing(words: readonly ItemNode[]): Reading<Variation["spacing"]> {
  const [word, second] = words;
  if (word === undefined) return { ok: true, value: "linear", notes: [] };
  if (second) return refused(fault("variation", second.range, "Nothing more can stand here."));
  const path = word.value.type === "name" && word.label === null && word.name === null ? word.value.path : "";
  if (path === "linear" || path === "logarithmic") return { ok: true, value: path, notes: [] };
  const nearest = nearestName(path, ["logarithmic", "linear"]);
  const message = `Behind the steps only *logarithmic* can stand; without it they are linear.`;
  return refused(
    fault(
      "variation",
      word.range,
      message,
      nearest === undefined ? undefined : changeTo(word.range, nearest),
    ),
  );
}

function readSubject(node: ValueNode): Reading<NameNode> {
  if (node.type === "broken") return refused();
  if (node.type === "name") return { ok: true, value: node, notes: [] };
  const message = "What is varied has a name: an entry of a values cell above.";
  return refused(fault("variation", node.range, message));
}

/** Both ends, the first in the unit of the last where it has none of its own. */
function readEnds(node: VariationNode, scope: Scope): Reading<{ first: Quantity; last: Quantity }> {
  const unit = unitAtEnd(node.last);
  const first: ValueNode =
    unit !== null && isBareNumber(node.first)
      ? { type: "measured", operand: node.first, unit, range: node.first.range }
      : node.first;
  const [from, to] = [first, node.last].map((end) => evaluateExpression(end, scope));
  if (!from.ok || !to.ok) return refused(...from.notes, ...to.notes);
  return { ok: true, value: { first: from.quantity, last: to.quantity }, notes: [] };
}

function readSteps(node: ValueNode, mostSteps: number, scope: Scope): Reading<number> {
  const evaluated = evaluateExpression(node, scope);
  if (!evaluated.ok) return evaluated;
  const { value, dimension } = evaluated.quantity;
  if (!isDimensionless(dimension) || !Number.isInteger(value) || value < 1) {
    return refused(fault("steps", node.range, "The number of steps is whole, 1 or more, and has no unit."));
  }
  if (value > mostSteps) {
    const limit = formatPlainNumber(mostSteps + 1, 9);
    const message = `A sweep may have ${limit} points at most; these are ${formatPlainNumber(value + 1, 9)}.`;
    return refused(fault("too_many", node.range, message));
  }
  return { ok: true, value, notes: [] };
}

function differingEnds(name: NameNode, node: VariationNode, first: Quantity, last: Quantity, scope: Scope) {
  const varied = scope.lookup(name.path);
  const own = typeof varied === "object" && "dimension" in varied ? varied.dimension : first.dimension;
  for (const [{ dimension }, end] of [[first, node.first] as const, [last, node.last] as const]) {
    if (sameDimension(dimension, own)) continue;
    const message = `*${name.path}* is ${dimensionWords(own)}; this is ${dimensionWords(dimension)}.`;
    return fault("dimension", end.range, message);
  }
  if (first.value !== last.value) return null;
  const range = { from: node.first.range.from, to: node.last.range.to };
  return fault("same_ends", range, "Both ends are the same, so nothing is varied.");
}

function aboveZero(node: VariationNode, first: Quantity, last: Quantity) {
  const low = first.value > 0 ? (last.value > 0 ? null : node.last) : node.first;
  if (low === null) return null;
  const message = "Logarithmic steps need both ends above zero. Without *logarithmic* the steps are linear.";
  return fault("logarithmic", low.range, message);
}
