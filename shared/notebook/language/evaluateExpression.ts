import { exponential, log10, logarithm, power } from "../../physics";
import type { Note, TextRange } from "../result";
import { constants, findConstant } from "./constants";
import { dimensionless, type Dimension } from "./dimensions";
import { dimensionWords } from "./dimensionWords";
import { evaluateUncertain } from "./evaluateUncertain";
import { ExpressionFault, fail } from "./expressionFault";
import {
  combineDimensions,
  isDimensionless,
  literalInSi,
  measureOf,
  sameDimension,
  scaleDimension,
  valueInSi,
} from "./measure";
import { nearestName } from "./nearestName";
import { changeTo, fault, inWords } from "./notes";
import type { Quantity } from "./quantity";
import { readPin } from "./readPin";
import { dimensionOfUnit } from "../evaluation/resultUnits";
import { languageLimits } from "./readValue";
import { functionNames, type FunctionName } from "./reservedWord";
import type { Scope } from "./scope";
import type { CallNode, MeasuredNode, NameNode, PowerNode, ProductNode, SumNode, ValueNode } from "./syntax";
import { findUnit, isCelsius, unitsForCompletion } from "./units";

export type Evaluated = { ok: true; quantity: Quantity; notes: Note[] } | { ok: false; notes: Note[] };

/** A number within the limits, or a fault. `isZero` says that 0 is the true answer and not an underflow. */
function within(value: number, range: TextRange, isZero: boolean): number {
  const size = Math.abs(value);
  if (!(size <= languageLimits.largest)) fail("out_of_range", range, "The number is beyond 1e300.");
  if (size < languageLimits.smallest && !isZero)
    fail("out_of_range", range, "The number is below 1e-300, but not zero.");
  return value + 0;
}

function evaluateName({ path, range }: NameNode, scope: Scope): Quantity {
  const constant = findConstant(path);
  if (constant) return constant;
  const found = scope.lookup(path);
  if (found === undefined) return failUnknown(path, range, scope);
  if (typeof found === "string")
    return fail("not_a_quantity", range, `*${path}* is no quantity, but *${found}*.`);
  if ("unavailable" in found) return fail("unavailable", range, found.unavailable);
  return found;
}

function failUnknown(path: string, range: TextRange, scope: Scope): never {
  const unit = findUnit(path);
  if (unit) fail("unknown_name", range, `*${path}* is a unit (${unit.name}); a number must stand before it.`);
  if ((functionNames as readonly string[]).includes(path))
    fail("unknown_name", range, `*${path}* is a function; write what it acts on in brackets.`);
  const known = [...scope.names(), ...Object.keys(constants)];
  const nearest = nearestName(path, known);
  if (nearest === undefined) fail("unknown_name", range, `Nothing above is called *${path}*.`);
  fail(
    "unknown_name",
    range,
    `Nothing above is called *${path}*. The nearest is *${nearest}*.`,
    changeTo(range, nearest),
  );
}

/** `20 °C`, with the kelvin that is meant. */
function refuseCelsius({ operand, unit }: MeasuredNode, range: TextRange, sign: 1 | -1): void {
  const [factor, second] = unit.factors;
  if (second !== undefined || !isCelsius(factor.symbol) || operand.type !== "number") return;
  const isWhole = unit.range.to === range.to && operand.powerOfTen === 0;
  const decimals = Math.max(2, operand.digits.split(".")[1]?.length ?? 0);
  const kelvin = (sign * Number(operand.digits) + 273.15).toFixed(Math.min(decimals, 20));
  const message = `*${factor.symbol}* counts from a zero of its own, so it is no unit here. Temperatures are in kelvin.`;
  fail(
    "celsius",
    unit.range,
    message,
    isWhole ? changeTo(range, `${kelvin.replace(/\.?0+$/, "")} K`) : undefined,
  );
}

function evaluateMeasured(node: MeasuredNode, scope: Scope): Quantity {
  refuseCelsius(node, node.range, 1);
  const measure = measureOf(node.unit);
  if ("level" in measure) throw new ExpressionFault([unitOrName(measure, node, scope)]);
  if (node.operand.type === "number") {
    const isZero = !/[1-9]/.test(node.operand.digits);
    return {
      value: within(literalInSi(node.operand, measure), node.range, isZero),
      dimension: measure.dimension,
    };
  }
  const operand = evaluate(node.operand, scope);
  const dimension = combineDimensions(operand.dimension, measure.dimension, 1);
  return { value: within(valueInSi(operand.value, measure), node.range, operand.value === 0), dimension };
}

/** `2 T_quiet`: what stands where a unit stands is a name; so the missing sign is the fault. */
function unitOrName(unknown: Note, node: MeasuredNode, scope: Scope): Note {
  const symbol = node.unit.factors.find(({ range }) => range.from === unknown.range?.from)?.symbol ?? "";
  const isName = scope.lookup(symbol) !== undefined || findConstant(symbol) !== undefined;
  if (!isName || unknown.range === undefined) return unknown;
  const at = node.operand.range.to;
  return fault(
    "side_by_side",
    unknown.range,
    `A multiplication sign is missing before the name *${symbol}*.`,
    {
      label: "Multiply",
      range: { from: at, to: at },
      replacement: " *",
    },
  );
}

function evaluateSum(node: SumNode, scope: Scope): Quantity {
  let total = 0;
  let largest = 0;
  let dimension: Dimension | null = null;
  for (const { sign, node: term } of node.terms) {
    const quantity = evaluate(term, scope);
    if (dimension !== null && !sameDimension(dimension, quantity.dimension))
      fail(
        "dimension",
        term.range,
        `Only like can be added to like: this is ${dimensionWords(quantity.dimension)}, what stands before it ${dimensionWords(dimension)}.`,
      );
    dimension = quantity.dimension;
    total += sign * quantity.value;
    largest = Math.max(largest, Math.abs(quantity.value));
  }
  return { value: within(total, node.range, total === 0), dimension: dimension ?? dimensionless };
}

function evaluateProduct(node: ProductNode, scope: Scope): Quantity {
  let value = 1;
  let isZero = false;
  let dimension: Dimension = dimensionless;
  for (const { operation, node: factor } of node.factors) {
    const quantity = evaluate(factor, scope);
    if (operation === "over") {
      if (quantity.value === 0)
        fail("division_by_zero", factor.range, "This is zero, and nothing can be divided by zero.");
      value /= quantity.value;
    } else {
      value *= quantity.value;
      isZero ||= quantity.value === 0;
    }
    value = within(value, node.range, isZero);
    dimension = combineDimensions(dimension, quantity.dimension, operation === "over" ? -1 : 1);
  }
  return { value, dimension };
}

function raise(base: number, exponent: number): number {
  if (!Number.isInteger(exponent) || Math.abs(exponent) > 400) return power(base, exponent);
  if (base === 10) return Number(`1e${exponent}`);
  if (Math.abs(exponent) > 32) return power(base, exponent);
  let product = 1;
  for (let count = 0; count < Math.abs(exponent); count += 1) product *= base;
  return exponent < 0 ? 1 / product : product;
}

function evaluatePower(node: PowerNode, scope: Scope): Quantity {
  const base = evaluate(node.base, scope);
  const exponent = evaluate(node.exponent, scope);
  if (!isDimensionless(exponent.dimension))
    fail(
      "dimension",
      node.exponent.range,
      `An exponent is a number without unit; this is ${dimensionWords(exponent.dimension)}.`,
    );
  if (base.value === 0 && exponent.value < 0)
    fail("division_by_zero", node.range, "Zero has no negative power.");
  if (base.value < 0 && !Number.isInteger(exponent.value))
    fail("domain", node.range, "A negative number has only whole powers.");
  const value = raise(base.value, exponent.value);
  return {
    value: within(value, node.range, base.value === 0),
    dimension: scaleDimension(base.dimension, exponent.value),
  };
}

function requirePure(name: string, node: ValueNode, quantity: Quantity): number {
  if (!isDimensionless(quantity.dimension))
    fail(
      "dimension",
      node.range,
      `*${name}* takes a number without unit; this is ${dimensionWords(quantity.dimension)}. Divide by a unit first.`,
    );
  return quantity.value;
}

function applyFunction(name: FunctionName, node: CallNode, values: Quantity[]): Quantity {
  const [first] = values;
  const argument = node.items[0].value;
  const pure = (value: number, isZero: boolean): Quantity => ({
    value: within(value, node.range, isZero),
    dimension: dimensionless,
  });
  switch (name) {
    case "abs":
      return { value: Math.abs(first.value), dimension: first.dimension };
    case "sqrt":
      if (first.value < 0) fail("domain", argument.range, "A negative number has no square root.");
      return { value: Math.sqrt(first.value), dimension: scaleDimension(first.dimension, 0.5) };
    case "exp":
      return pure(exponential(requirePure(name, argument, first)), false);
    case "ln":
    case "log10": {
      const value = requirePure(name, argument, first);
      if (!(value > 0)) fail("domain", argument.range, "Only a number above zero has a logarithm.");
      return pure(name === "ln" ? logarithm(value) : log10(value), value === 1);
    }
    case "min":
    case "max": {
      let chosen = first;
      for (const [index, quantity] of values.entries()) {
        if (!sameDimension(first.dimension, quantity.dimension))
          fail(
            "dimension",
            node.items[index].range,
            `*${name}* compares like with like: this is ${dimensionWords(quantity.dimension)}, the first ${dimensionWords(first.dimension)}.`,
          );
        if (name === "min" ? quantity.value < chosen.value : quantity.value > chosen.value) chosen = quantity;
      }
      return { value: chosen.value, dimension: chosen.dimension };
    }
  }
}

/** `ref(CAR4.2, leak.H.rate)`: a result of a published reference, as it was published. */
function evaluateReference(node: CallNode, scope: Scope): Quantity {
  const pin = readPin(node, scope.reference);
  if (!pin.ok) throw new ExpressionFault(pin.notes);
  const { reference, name, range } = pin.value;
  const found = Object.hasOwn(reference.values, name) ? reference.values[name] : undefined;
  if (!found) {
    const nearest = nearestName(name, Object.keys(reference.values));
    const message = `${reference.pin} has no result *${name}*.`;
    if (nearest === undefined) return fail("reference_result", range, message);
    return fail("reference_result", range, `${message} The nearest is *${nearest}*.`, changeTo(range, nearest));
  }
  if (typeof found.value === "string")
    return fail("not_a_quantity", range, `*${name}* of ${reference.pin} is no quantity, but *${found.value}*.`);
  if (found.value === null)
    return fail("unavailable", range, `*${name}* of ${reference.pin} lies outside 1e-300 to 1e300; use its log10.`);
  return { value: found.value, dimension: dimensionOfUnit(found.unit ?? "1") };
}

function evaluateCall(node: CallNode, scope: Scope): Quantity {
  if (node.name === "ref") return evaluateReference(node, scope);
  const name = functionNames.find((candidate) => candidate === node.name);
  if (name === undefined) {
    const unit = unitsForCompletion.some(({ unit: symbol }) => symbol === node.name);
    const nearest = unit ? undefined : nearestName(node.name, functionNames);
    return fail(
      "unknown_function",
      node.nameRange,
      nearest === undefined
        ? `No function *${node.name}* gives a quantity. There are ${inWords(functionNames, "and")}.`
        : `No function *${node.name}*. The nearest is *${nearest}*.`,
      nearest === undefined ? undefined : changeTo(node.nameRange, nearest),
    );
  }
  const takesMany = name === "min" || name === "max";
  for (const item of node.items)
    if (item.name !== null || item.label !== null)
      fail("arguments", item.range, `*${name}* takes plain values.`);
  if (node.items.length === 0) fail("arguments", node.range, `*${name}* needs a value in its brackets.`);
  if (!takesMany && node.items.length > 1)
    fail("arguments", node.items[1].range, `*${name}* takes one value; this is a second.`);
  return applyFunction(
    name,
    node,
    node.items.map((item) => evaluate(item.value, scope)),
  );
}

/** Throws an ExpressionFault. */
function evaluate(node: ValueNode, scope: Scope): Quantity {
  switch (node.type) {
    case "number": {
      const isZero = !/[1-9]/.test(node.digits);
      return {
        value: within(Number(`${node.digits}e${node.powerOfTen}`), node.range, isZero),
        dimension: dimensionless,
      };
    }
    case "name":
      return evaluateName(node, scope);
    case "measured":
      return evaluateMeasured(node, scope);
    case "negative": {
      if (node.operand.type === "measured") refuseCelsius(node.operand, node.range, -1);
      const { value, dimension } = evaluate(node.operand, scope);
      return { value: 0 - value, dimension };
    }
    case "sum":
      return evaluateSum(node, scope);
    case "product":
      return evaluateProduct(node, scope);
    case "power":
      return evaluatePower(node, scope);
    case "call":
      return evaluateCall(node, scope);
    case "uncertain":
      return evaluateUncertain(node, scope, evaluate);
    case "list":
      return fail("not_a_quantity", node.range, "One quantity is needed here; this is a list.");
    case "variation":
      return fail(
        "not_a_quantity",
        node.range,
        "One quantity is needed here; this varies one, as only *vary* and *against* of a sweep do.",
      );
    case "broken":
      throw new ExpressionFault([]);
  }
}

/**
 * Value of an expression in SI, dimensions checked. Uncertain parts act by their centre, or by the scope's draw.
 * Never throws; a broken node gives no notes, since the reading of the cell already said what is wrong with it.
 */
export function evaluateExpression(node: ValueNode, scope: Scope): Evaluated {
  try {
    return { ok: true, quantity: evaluate(node, scope), notes: [] };
  } catch (error) {
    if (error instanceof ExpressionFault) return { ok: false, notes: error.notes };
    throw error;
  }
}
