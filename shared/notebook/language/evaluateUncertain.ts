import { dimensionWords } from "./dimensionWords";
import { fail } from "./expressionFault";
import { isDimensionless, sameDimension } from "./measure";
import { formatPlainNumber } from "./formatQuantity";
import type { Quantity, Uncertainty } from "./quantity";
import { languageLimits } from "./readValue";
import type { Scope } from "./scope";
import type { UncertainNode, UnitNode, ValueNode } from "./syntax";

/** Evaluates a part; throws an ExpressionFault. */
type Evaluate = (node: ValueNode, scope: Scope) => Quantity;

/** Whether it is written with numbers alone, so that the unit at the end is its unit too. */
export function isBareNumber(node: ValueNode): boolean {
  switch (node.type) {
    case "number":
      return true;
    case "negative":
      return isBareNumber(node.operand);
    case "power":
      return isBareNumber(node.base) && isBareNumber(node.exponent);
    case "product":
      return node.factors.every((factor) => isBareNumber(factor.node));
    case "sum":
      return node.terms.every((term) => isBareNumber(term.node));
    default:
      return false;
  }
}

const isPercentage = (unit: UnitNode): boolean =>
  unit.factors.length === 1 && unit.factors[0].symbol === "%" && unit.factors[0].exponent === 1;

/** The unit at the end of an expression, a sign before it aside. */
export function unitAtEnd(node: ValueNode): UnitNode | null {
  if (node.type === "negative") return unitAtEnd(node.operand);
  return node.type === "measured" ? node.unit : null;
}

/** The first part, in the unit at the end where it has none of its own. */
function evaluateFirst({ first, second }: UncertainNode, scope: Scope, evaluate: Evaluate): Quantity {
  const unit = unitAtEnd(second);
  if (unit === null || !isBareNumber(first)) return evaluate(first, scope);
  return evaluate({ type: "measured", operand: first, unit, range: first.range }, scope);
}

function failUnlike(node: UncertainNode, first: Quantity, second: Quantity): never {
  const isUnitMissing = isBareNumber(node.second) && !isDimensionless(first.dimension);
  fail(
    "dimension",
    node.second.range,
    isUnitMissing
      ? `The unit stands at the end, for both: 240 ± 30 K.`
      : `Both parts of an uncertain value must be alike: this is ${dimensionWords(second.dimension)}, the first ${dimensionWords(first.dimension)}.`,
  );
}

function plusMinus(node: UncertainNode, scope: Scope, evaluate: Evaluate): [Quantity, Uncertainty] {
  const mean = evaluateFirst(node, scope, evaluate);
  const deviation = evaluate(node.second, scope);
  const isOwnPercentage =
    isBareNumber(node.first) || (node.first.type === "measured" && isDimensionless(mean.dimension));
  const unit = unitAtEnd(node.second);
  const isRelative = unit !== null && isPercentage(unit) && !isOwnPercentage;
  if (!isRelative && !sameDimension(mean.dimension, deviation.dimension)) failUnlike(node, mean, deviation);
  if (deviation.value < 0)
    fail("uncertainty", node.second.range, "What follows ± is a deviation; it can't be below zero.");
  const size = isRelative ? Math.abs(mean.value) * deviation.value : deviation.value;
  if (!(size <= languageLimits.largest))
    fail("out_of_range", node.second.range, "The number is beyond 1e300.");
  return [mean, { form: "normal", mean: mean.value, deviation: size }];
}

function between(node: UncertainNode, scope: Scope, evaluate: Evaluate): [Quantity, Uncertainty] {
  const lower = evaluateFirst(node, scope, evaluate);
  const upper = evaluate(node.second, scope);
  if (!sameDimension(lower.dimension, upper.dimension)) failUnlike(node, lower, upper);
  if (lower.value > upper.value)
    fail(
      "uncertainty",
      node.range,
      "The lower end of the range comes first; these two stand the wrong way round.",
    );
  const centre = { value: (lower.value + upper.value) / 2, dimension: lower.dimension };
  return [centre, { form: "uniform", lower: lower.value, upper: upper.value }];
}

function withinFactor(node: UncertainNode, scope: Scope, evaluate: Evaluate): [Quantity, Uncertainty] {
  const median = evaluate(node.first, scope);
  const factor = evaluate(node.second, scope);
  if (!isDimensionless(factor.dimension))
    fail(
      "dimension",
      node.second.range,
      `The factor is a number without unit; this is ${dimensionWords(factor.dimension)}.`,
    );
  if (!(factor.value > 1))
    fail(
      "uncertainty",
      node.second.range,
      `The factor must be above 1; this is ${formatPlainNumber(factor.value)}.`,
    );
  if (!(median.value > 0))
    fail("uncertainty", node.first.range, "Only a quantity above zero can lie within a factor.");
  return [median, { form: "log_normal", median: median.value, factor: factor.value }];
}

/** An uncertain value by its centre (mean, midpoint, median), or by the scope's draw. */
export function evaluateUncertain(node: UncertainNode, scope: Scope, evaluate: Evaluate): Quantity {
  const forms = { plus_minus: plusMinus, between, factor: withinFactor };
  const [centre, uncertainty] = forms[node.form](node, scope, evaluate);
  const value = scope.draw ? scope.draw(node.path, uncertainty, centre.dimension) : centre.value;
  if (value === null)
    fail(
      "nothing_possible",
      node.range,
      "No part of this uncertain value lies where it is physically possible.",
    );
  return { value, dimension: centre.dimension, uncertainty };
}
