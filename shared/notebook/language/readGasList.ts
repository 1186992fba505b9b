import type { Note, TextRange } from "../result";
import { quantityKinds } from "./dimensions";
import { dimensionWords } from "./dimensionWords";
import { evaluateExpression } from "./evaluateExpression";
import { formatPlainNumber } from "./formatQuantity";
import { isDimensionless, sameDimension } from "./measure";
import { changeTo, fault } from "./notes";
import { readByGas } from "./readByGas";
import { refused, type Reading } from "./reading";
import type { Scope } from "./scope";
import type { ValueNode } from "./syntax";

export interface GasShare {
  formula: string;
  moleFraction: number;
  range: TextRange;
}

export interface GasList {
  /** As written; the fractions add up to 1. */
  gases: GasShare[];
  /** m⁻³, of all together, where number densities are given; otherwise null. */
  numberDensity: number | null;
  /** The gas that makes up the rest, if any. */
  rest: string | null;
}

type Amount = { kind: "rest" } | { kind: "fraction" | "density"; value: number };

/** Printed fractions such as 95.3, 2.7 and 2.0 % add up to 1 within this. */
const sumTolerance = 1e-9;

const percent = (fraction: number): string => `${formatPlainNumber(fraction * 100, 6)}\u202f%`;

function readAmount(node: ValueNode, formula: string, scope: Scope): Reading<Amount> {
  if (node.type === "name" && node.path === "rest") return { ok: true, value: { kind: "rest" }, notes: [] };
  const evaluated = evaluateExpression(node, scope);
  if (!evaluated.ok) return evaluated;
  const { value, dimension } = evaluated.quantity;
  const isFraction = isDimensionless(dimension);
  if (!isFraction && !sameDimension(dimension, quantityKinds.numberDensity.dimension))
    return refused(
      fault(
        "dimension",
        node.range,
        `A fraction in % or ppm, or a number density in /cm^3, is needed here; this is ${dimensionWords(dimension)}.`,
      ),
    );
  if (!(value > 0)) {
    const what = isFraction ? "fraction" : "number density";
    const reason = value === 0 ? "Leave the gas out instead." : "";
    return refused(
      fault("bound", node.range, `The ${what} of ${formula || "a gas"} must be above zero. ${reason}`.trim()),
    );
  }
  if (isFraction && value > 1)
    return refused(
      fault(
        "bound",
        node.range,
        `A fraction is 1 at most; this is ${formatPlainNumber(value)}, or ${percent(value)}.`,
      ),
    );
  return { ok: true, value: { kind: isFraction ? "fraction" : "density", value }, notes: evaluated.notes };
}

/**
 * `CO2: rest, N2: 2.7 %, H2: 15 ppm`, or number densities for all. Fractions that miss 1 without `rest` or pass it,
 * two `rest`, a gas twice and a mixture of both ways are faults.
 */
export function readGasList(node: ValueNode, knownGases: readonly string[], scope: Scope): Reading<GasList> {
  if (node.type === "name" && knownGases.includes(node.path))
    return refused(
      fault(
        "by_gas",
        node.range,
        `A gas, a colon and its fraction are needed: ${node.path}: rest.`,
        changeTo(node.range, `${node.path}: rest`),
      ),
    );
  const read = readByGas(node, knownGases, "CO2: rest, N2: 2.7 %", (value, formula) =>
    readAmount(value, formula, scope),
  );
  if (!read.ok) return read;
  const items = read.value;
  const densities = items.filter(({ value }) => value.kind === "density");
  const rests = items.filter(({ value }) => value.kind === "rest");
  if (densities.length > 0 && densities.length < items.length) {
    const odd = items.find(({ value }) => value.kind !== items[0].value.kind) ?? items[0];
    const message =
      "Give fractions or number densities, the same way for all gases; *rest* goes with fractions.";
    return refused(fault("gases_mixed", odd.range, message));
  }
  if (rests.length > 1)
    return refused(
      fault(
        "rest_twice",
        rests[1].range,
        `Only one gas can make up the rest; *${rests[0].formula}* does already.`,
      ),
    );

  let sum = 0;
  for (const { value } of items) if (value.kind !== "rest") sum += value.value;
  if (densities.length > 0)
    return {
      ok: true,
      value: {
        gases: items.map(({ formula, value, range }) => ({
          formula,
          moleFraction: (value.kind === "rest" ? 0 : value.value) / sum,
          range,
        })),
        numberDensity: sum,
        rest: null,
      },
      notes: read.notes,
    };

  const problem = sumProblem(sum, rests[0]?.formula ?? null, node.range);
  if (problem) return refused(problem);
  return {
    ok: true,
    value: {
      gases: items.map(({ formula, value, range }) => ({
        formula,
        moleFraction: value.kind === "rest" ? 1 - sum : value.value,
        range,
      })),
      numberDensity: null,
      rest: rests[0]?.formula ?? null,
    },
    notes: read.notes,
  };
}

function sumProblem(sum: number, rest: string | null, range: TextRange): Note | null {
  if (rest !== null)
    return sum < 1
      ? null
      : fault(
          "gases_sum",
          range,
          `The other gases already make up ${percent(sum)}; nothing is left for *${rest}*.`,
        );
  if (sum > 1 + sumTolerance)
    return fault("gases_sum", range, `The fractions add up to ${percent(sum)}, above 100\u202f%.`);
  if (sum < 1 - sumTolerance)
    return fault(
      "gases_sum",
      range,
      `The fractions add up to ${percent(sum)} only. Write *rest* for the gas that makes up what is missing.`,
    );
  return null;
}
