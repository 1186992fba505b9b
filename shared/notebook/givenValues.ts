/** Which values of a notebook are given rather than computed, and which of those say where they come from. */
import type { CellKind, NotebookDocument } from "./document";
import { parseEntries } from "./language/parseEntries";
import type { ValueNode } from "./language/syntax";

export interface GivenValue {
  /** Name of the cell, or its kind where it has none. */
  cell: string;
  key: string;
  hasSource: boolean;
}

/** Entries that say how to compute, not what is so. */
const settings: ReadonlySet<string> = new Set(["top", "levels", "reach", "samples", "seed"]);
const kindsWithoutGivens: ReadonlySet<CellKind> = new Set(["prose", "sweep", "spread"]);

/**
 * Every entry that states a number of its own: one with a unit, an uncertain one, or one that no name enters. Its
 * source is the remark beside it; what `handbook(…)` and `ref(…)` give brings its own.
 */
export function givenValues({ cells }: Pick<NotebookDocument, "cells">): GivenValue[] {
  return cells
    .filter(({ kind }) => !kindsWithoutGivens.has(kind))
    .flatMap(({ kind, name, text }) =>
      parseEntries(text)
        .entries.filter(({ key, node }) => (kind === "values" || !settings.has(key)) && statesNumber(node))
        .map(({ key, remark }) => ({ cell: name || kind, key, hasSource: (remark ?? "").trim() !== "" })),
    );
}

function statesNumber(node: ValueNode): boolean {
  const parts = found(node);
  return parts.hasGiven || (parts.hasNumber && !parts.hasName);
}

interface Found {
  hasGiven: boolean;
  hasNumber: boolean;
  hasName: boolean;
}

function found(node: ValueNode): Found {
  switch (node.type) {
    case "number":
      return { hasGiven: false, hasNumber: true, hasName: false };
    case "name":
      return { hasGiven: false, hasNumber: false, hasName: true };
    case "measured":
    case "uncertain":
      return { hasGiven: true, hasNumber: true, hasName: false };
    case "negative":
      return found(node.operand);
    case "sum":
      return joined(node.terms.map((term) => term.node));
    case "product":
      return joined(node.factors.map((factor) => factor.node));
    case "power":
      return joined([node.base, node.exponent]);
    case "call":
      if (node.name === "ref" || node.name === "handbook")
        return { hasGiven: false, hasNumber: false, hasName: true };
      return joined(node.items.map(({ value }) => value));
    case "list": {
      // Each member stands for itself: a label is a gas, not a name that enters a number.
      const members = node.items.map(({ value }) => value);
      return { ...joined(members), hasGiven: members.some(statesNumber) };
    }
    case "variation":
    case "broken":
      return { hasGiven: false, hasNumber: false, hasName: false };
  }
}

function joined(nodes: readonly ValueNode[]): Found {
  const all = nodes.map(found);
  return {
    hasGiven: all.some(({ hasGiven }) => hasGiven),
    hasNumber: all.some(({ hasNumber }) => hasNumber),
    hasName: all.some(({ hasName }) => hasName),
  };
}
