import { evaluateExpression } from "../../../../shared/notebook/language/evaluateExpression";
import { parseEntries } from "../../../../shared/notebook/language/parseEntries";
import type { Quantity } from "../../../../shared/notebook/language/quantity";
import type { Scope } from "../../../../shared/notebook/language/scope";
import type { ValueNode } from "../../../../shared/notebook/language/syntax";
import type { Note } from "../../../../shared/notebook/result";

/** A scope that knows these quantities and nothing else. */
export function scopeOf(quantities: Record<string, ReturnType<Scope["lookup"]>> = {}): Scope {
  return {
    lookup: (path) => (Object.hasOwn(quantities, path) ? quantities[path] : undefined),
    names: () => Object.keys(quantities),
    reference: () => undefined,
  };
}

/** Node of one value, and the notes of reading it. */
export function nodeOf(value: string, key = "x"): { node: ValueNode; notes: Note[]; text: string } {
  const text = `${key} = ${value}`;
  const { entries, notes } = parseEntries(text);
  if (entries.length !== 1) throw new Error(`"${text}" gives ${entries.length} entries`);
  return { node: entries[0].node, notes, text };
}

export function quantityOf(value: string, scope: Scope = scopeOf()): Quantity {
  const { node, notes } = nodeOf(value);
  const evaluated = evaluateExpression(node, scope);
  if (!evaluated.ok)
    throw new Error(`"${value}": ${[...notes, ...evaluated.notes].map((note) => note.message).join(" ")}`);
  return evaluated.quantity;
}

/** The faults of reading and evaluating one value, with the characters that each points at. */
export function faultsOf(
  value: string,
  scope: Scope = scopeOf(),
): { code: string; at: string; message: string; remedied: string | null }[] {
  const { node, notes, text } = nodeOf(value);
  const evaluated = evaluateExpression(node, scope);
  const all = evaluated.ok ? notes : [...notes, ...evaluated.notes];
  return all.map((note) => describe(note, text));
}

export function describe(note: Note, text: string) {
  const { range, remedy } = note;
  return {
    code: note.code,
    at: range ? text.slice(range.from, range.to) : "",
    message: note.message,
    remedied: remedy
      ? text.slice(0, remedy.range.from) + remedy.replacement + text.slice(remedy.range.to)
      : null,
  };
}
