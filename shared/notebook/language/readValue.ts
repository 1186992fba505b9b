/** From the parsed tree of one value to the plain nodes that are evaluated. */
import type { SyntaxNode } from "@lezer/common";
import type { Note, TextRange } from "../result";
import { changeTo, fault, quoted } from "./notes";
import { parseValue } from "./parser";
import { decimalCommaFault, fromSuperscript, readNumber } from "./readNumber";
import { syntaxFault } from "./syntaxFault";
import type { CallNode, ItemNode, NameNode, UnitFactor, UnitNode, ValueNode } from "./syntax";

export const languageLimits = {
  /** Characters an entry. */
  entryLength: 10_000,
  /** Brackets and powers within one another. */
  depth: 64,
  /** |exponent| of a unit. */
  unitExponent: 24,
  /** Magnitudes of every number on the way to a result. */
  largest: 1e300,
  smallest: 1e-300,
} as const;

export const tooDeep = (range: TextRange): Note =>
  fault(
    "too_deep",
    range,
    `Brackets and powers may stand ${languageLimits.depth} deep, not deeper. Give a part a name of its own in a values cell.`,
  );

interface Conversion {
  text: string;
  shift: number;
  notes: Note[];
  paths: Map<string, number>;
}

const subscripts = "₀₁₂₃₄₅₆₇₈₉";

/** "CO₂" as "CO2". */
export const plainDigits = (name: string): string =>
  name.replace(/[₀-₉]/g, (digit) => String(subscripts.indexOf(digit)));

/** Nodes that only mark punctuation. */
const punctuation = new Set([
  "Comma",
  "Open",
  "Close",
  "Remark",
  "Caret",
  "DoubleStar",
  "Between",
  "And",
  "Within",
  "Factor",
  "From",
  "To",
  "In",
  "Steps",
  "=",
  ":",
]);

function partsOf(node: SyntaxNode): SyntaxNode[] {
  const parts: SyntaxNode[] = [];
  for (let child = node.firstChild; child; child = child.nextSibling)
    if (!punctuation.has(child.name)) parts.push(child);
  return parts;
}

const textOf = (conversion: Conversion, node: SyntaxNode): string =>
  conversion.text.slice(node.from, node.to);

const rangeOf = (conversion: Conversion, node: { from: number; to: number }): TextRange => ({
  from: node.from + conversion.shift,
  to: node.to + conversion.shift,
});

function uniquePath(conversion: Conversion, path: string): string {
  const count = (conversion.paths.get(path) ?? 0) + 1;
  conversion.paths.set(path, count);
  return count === 1 ? path : `${path}[${count}]`;
}

function convertName(conversion: Conversion, node: SyntaxNode): NameNode {
  const path = plainDigits(textOf(conversion, node)).replace("⁺", "+");
  return { type: "name", path, range: rangeOf(conversion, node) };
}

function unitExponent(conversion: Conversion, node: SyntaxNode): number {
  const text = textOf(conversion, node);
  const plain =
    node.name === "Superscript" ? fromSuperscript(text) : text.replace(/[() \u00a0\u2009\u202f]/g, "");
  return Number(plain.replace("−", "-"));
}

function collectUnit(conversion: Conversion, node: SyntaxNode, sign: 1 | -1, factors: UnitFactor[]): void {
  if (node.name === "UnitFactor") {
    const [name, exponentNode] = partsOf(node);
    if (exponentNode && conversion.text.slice(name.to, exponentNode.from).includes("**"))
      conversion.notes.push(doubleStarFault(conversion, name.to, exponentNode.from));
    const exponent = exponentNode ? unitExponent(conversion, exponentNode) : 1;
    const range = rangeOf(conversion, node);
    if (!(Math.abs(exponent) <= languageLimits.unitExponent)) {
      conversion.notes.push(
        fault(
          "unit_exponent",
          range,
          `The exponent of a unit may be ${languageLimits.unitExponent} at most.`,
        ),
      );
      return;
    }
    factors.push({
      symbol: textOf(conversion, name),
      exponent: sign * exponent,
      range: rangeOf(conversion, name),
    });
    return;
  }
  const inner = node.name === "Quotient" ? (-sign as 1 | -1) : sign;
  for (const part of partsOf(node))
    if (part.name !== "Per" && part.name !== "Join") collectUnit(conversion, part, inner, factors);
}

function convertUnit(conversion: Conversion, node: SyntaxNode): UnitNode {
  const factors: UnitFactor[] = [];
  collectUnit(conversion, node, 1, factors);
  return { factors, text: textOf(conversion, node), range: rangeOf(conversion, node) };
}

function doubleStarFault(conversion: Conversion, from: number, to: number): Note {
  const at = conversion.text.indexOf("**", from);
  const range = rangeOf(conversion, { from: at, to: Math.min(at + 2, to) });
  return fault("double_star", range, "A power is written with *^*.", changeTo(range, "^"));
}

function convertItem(conversion: Conversion, node: SyntaxNode, path: string, depth: number): ItemNode {
  const range = rangeOf(conversion, node);
  const [first, second] = partsOf(node);
  if (node.name === "Named") {
    const text = textOf(conversion, first);
    return {
      name: { text, range: rangeOf(conversion, first) },
      label: null,
      value: convert(conversion, second, `${path}.${text}`, depth),
      range,
    };
  }
  if (node.name === "Labelled") {
    const label = plainDigits(textOf(conversion, first).replace(/\s+/g, "_"));
    return {
      name: null,
      label: convert(conversion, first, path, depth),
      value: convert(conversion, second, `${path}.${label}`, depth),
      range,
    };
  }
  return { name: null, label: null, value: convert(conversion, node, path, depth), range };
}

function convertCall(conversion: Conversion, node: SyntaxNode, path: string, depth: number): CallNode {
  const [name, list] = partsOf(node);
  return {
    type: "call",
    name: textOf(conversion, name),
    nameRange: rangeOf(conversion, name),
    items: partsOf(list).map((item) => convertItem(conversion, item, path, depth)),
    range: rangeOf(conversion, node),
  };
}

function convert(conversion: Conversion, node: SyntaxNode, path: string, depth: number): ValueNode {
  const range = rangeOf(conversion, node);
  if (depth > languageLimits.depth) {
    conversion.notes.push(tooDeep(range));
    return { type: "broken", range };
  }
  const inside = (part: SyntaxNode): ValueNode => convert(conversion, part, path, depth);
  const deeper = (part: SyntaxNode): ValueNode => convert(conversion, part, path, depth + 1);
  const parts = partsOf(node);
  switch (node.name) {
    case "Number": {
      const read = readNumber(textOf(conversion, node), range);
      if ("type" in read) return read;
      conversion.notes.push(read);
      return { type: "broken", range };
    }
    case "DecimalComma":
      conversion.notes.push(decimalCommaFault(textOf(conversion, node), range));
      return { type: "broken", range };
    case "String": {
      const plain = textOf(conversion, node).slice(1, -1);
      const message = "There are no strings here; write names plainly.";
      const isName = /^[A-Za-z][A-Za-z0-9_.]*$/.test(plain);
      conversion.notes.push(fault("string", range, message, isName ? changeTo(range, plain) : undefined));
      return { type: "broken", range };
    }
    case "Name":
      return convertName(conversion, node);
    case "Call":
      return convertCall(conversion, node, path, depth + 1);
    case "Group":
    case "Positive":
      return deeper(parts[parts.length - 1]);
    case "Negative":
      return { type: "negative", operand: deeper(parts[1]), range };
    case "Measured":
      return { type: "measured", operand: inside(parts[0]), unit: convertUnit(conversion, parts[1]), range };
    case "Power": {
      const between = conversion.text.slice(parts[0].to, parts[1].from);
      if (between.includes("**"))
        conversion.notes.push(doubleStarFault(conversion, parts[0].to, parts[1].from));
      return { type: "power", base: inside(parts[0]), exponent: deeper(parts[1]), range };
    }
    case "Raised": {
      const exponent = readNumber(
        fromSuperscript(textOf(conversion, parts[1])).replace("-", ""),
        rangeOf(conversion, parts[1]),
      );
      const isNegative = textOf(conversion, parts[1]).startsWith("⁻");
      if (!("type" in exponent)) return { type: "broken", range };
      return {
        type: "power",
        base: inside(parts[0]),
        exponent: isNegative ? { type: "negative", operand: exponent, range: exponent.range } : exponent,
        range,
      };
    }
    case "Sum": {
      const terms: { sign: 1 | -1; node: ValueNode }[] = [{ sign: 1, node: inside(parts[0]) }];
      for (let index = 1; index < parts.length; index += 2)
        terms.push({ sign: parts[index].name === "Minus" ? -1 : 1, node: inside(parts[index + 1]) });
      return { type: "sum", terms, range };
    }
    case "Product": {
      const factors: { operation: "times" | "over"; node: ValueNode }[] = [
        { operation: "times", node: inside(parts[0]) },
      ];
      for (let index = 1; index < parts.length; index += 2)
        factors.push({
          operation: parts[index].name === "Over" ? "over" : "times",
          node: inside(parts[index + 1]),
        });
      return { type: "product", factors, range };
    }
    case "PlusMinus":
    case "Range":
    case "WithinFactor": {
      const form = node.name === "PlusMinus" ? "plus_minus" : node.name === "Range" ? "between" : "factor";
      const name = uniquePath(conversion, path);
      return {
        type: "uncertain",
        form,
        first: inside(parts[0]),
        second: inside(parts[1]),
        path: name,
        range,
      };
    }
    case "Variation": {
      const [subject, first, last, steps] = parts.map(inside);
      return { type: "variation", subject, first, last, steps, range };
    }
    default:
      conversion.notes.push(
        fault("unexpected", range, `*${quoted(textOf(conversion, node))}* can't stand here.`),
      );
      return { type: "broken", range };
  }
}

/**
 * Reads what stands right of one `=`.
 *
 * @param text   the value, with spaces in place of remarks and line ends
 * @param shift  where it begins in the cell
 * @param key    names the draws of uncertain parts
 */
export function readValue(text: string, shift: number, key: string): { node: ValueNode; notes: Note[] } {
  const range = { from: shift, to: shift + text.length };
  const parsed = parseValue(text);
  if ("stoppedAt" in parsed)
    return { node: { type: "broken", range }, notes: [syntaxFault(text, parsed.stoppedAt, shift)] };

  const conversion: Conversion = { text, shift, notes: [], paths: new Map() };
  const items = partsOf(parsed.tree.topNode).map((item) => convertItem(conversion, item, key, 0));
  const [first] = items;
  const isList = items.length > 1 || first?.label !== null || first.name !== null;
  const node: ValueNode = isList ? { type: "list", items, range } : first.value;
  return conversion.notes.length > 0
    ? { node: { type: "broken", range }, notes: conversion.notes }
    : { node, notes: [] };
}
