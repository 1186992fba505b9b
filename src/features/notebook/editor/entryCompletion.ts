import {
  autocompletion,
  type Completion,
  type CompletionContext,
  type CompletionResult,
} from "@codemirror/autocomplete";
import { syntaxTree } from "@codemirror/language";
import { EditorState, type Extension } from "@codemirror/state";
import type { CellKind } from "../../../../shared/notebook/document";
import { cellSchemas } from "../../../../shared/notebook/cellSchemas";
import type { EntrySchema } from "../../../../shared/notebook/kinds/cellSchema";
import { quantityKinds } from "../../../../shared/notebook/language/dimensions";
import { constantNames, functionNames } from "../../../../shared/notebook/language/reservedWord";
import { unitsForCompletion } from "../../../../shared/notebook/language/units";
import { completeReference, isInReference } from "./referenceCompletion";
import { handbookBodies, handbookGases, recombiningIons } from "../../../../shared/physics";

export interface CompletionSurroundings {
  kind: CellKind;
  /** Names of cells by kind, and of values; the cell itself among them. */
  cells: ReadonlyMap<string, CellKind>;
  names: ReadonlySet<string>;
  ownName: string;
}

/** Keys at the beginning of a line; behind `=` what the entry takes: units, gases, names, choices. */
export function entryCompletion(surroundings: CompletionSurroundings): Extension {
  const source = (context: CompletionContext) =>
    isInReference(context) ? completeReference(context) : complete(context, surroundings);
  return [
    autocompletion({ icons: false, maxRenderedOptions: 40, aboveCursor: false }),
    EditorState.languageData.of(() => [{ autocomplete: source }]),
  ];
}

function complete(context: CompletionContext, surroundings: CompletionSurroundings): CompletionResult | null {
  const word = context.matchBefore(/[A-Za-z_%][\w.%]*/);
  if (!word && !context.explicit) return null;
  const from = word?.from ?? context.pos;
  const node = syntaxTree(context.state).resolveInner(from, -1);
  if (isInside(node, "Remark")) return null;
  const key = entryKeyAt(context.state, from);
  if (key === null) {
    // A key stands first on its line.
    const line = context.state.doc.lineAt(from);
    if (context.state.sliceDoc(line.from, from).trim() !== "") return null;
    return { from, options: keysOf(context.state, surroundings.kind), validFor: /^\w*$/ };
  }
  const schema = cellSchemas[surroundings.kind].entries.find((entry) => entry.key === key);
  const isAfterNumber = /\d\s?$|\d\s*[/^(\w\s]*\/\s*$/.test(
    context.state.sliceDoc(Math.max(0, from - 24), from),
  );
  const options = isAfterNumber ? unitsFor(schema) : valuesFor(schema, surroundings);
  return options.length === 0 ? null : { from, options, validFor: /^[\w.%]*$/ };
}

interface TreeNode {
  name: string;
  parent: TreeNode | null;
}

function isInside(node: TreeNode | null, name: string): boolean {
  for (let at = node; at; at = at.parent) if (at.name === name) return true;
  return false;
}

/** Key of the entry whose value stands at a place; null where no value does. */
function entryKeyAt(state: EditorState, place: number): string | null {
  for (let node = syntaxTree(state).topNode.lastChild; node; node = node.prevSibling) {
    if (node.name !== "Entry" || node.from >= place) continue;
    const key = node.getChild("Key");
    const text = state.sliceDoc(node.from, place);
    const isOpenBelow =
      /[,(]\s*$/.test(text) || state.doc.lineAt(node.from).number === state.doc.lineAt(place).number;
    const isWithin = place <= node.to || isOpenBelow;
    return key && isWithin && text.includes("=") ? state.sliceDoc(key.from, key.to) : null;
  }
  return null;
}

function keysOf(state: EditorState, kind: CellKind): Completion[] {
  const present = new Set<string>();
  for (const node of syntaxTree(state).topNode.getChildren("Entry")) {
    const key = node.getChild("Key");
    if (key) present.add(state.sliceDoc(key.from, key.to));
  }
  return cellSchemas[kind].entries
    .filter(({ key }) => !present.has(key))
    .map(({ key, description, needed, example }) => ({
      label: key,
      detail: description,
      info: example,
      apply: `${key} = `,
      boost: needed ? 2 : 0,
    }));
}

function unitsFor(schema: EntrySchema | undefined): Completion[] {
  const wanted = schema?.dimension ? quantityKinds[schema.dimension].dimension : null;
  return unitsForCompletion.map(({ unit, name, dimension }) => ({
    label: unit,
    detail: name,
    boost: wanted && wanted.every((exponent, index) => exponent === dimension[index]) ? 9 : 0,
  }));
}

function valuesFor(
  schema: EntrySchema | undefined,
  { cells, names, ownName }: CompletionSurroundings,
): Completion[] {
  switch (schema?.form) {
    case "choice":
      return (schema.choices ?? []).map((label) => ({ label }));
    case "cell":
      return [...cells]
        .filter(([name, kind]) => kind === schema.names && name !== ownName && name !== "")
        .map(([label, detail]) => ({ label, detail }));
    case "handbook":
      return handbookBodies.map(({ name, kind }) => ({ label: `handbook(${name})`, detail: kind }));
    case "gases":
      return [
        { label: "rest", detail: "what the others leave" },
        ...gases(cells),
        ...quantities(names, ownName),
      ];
    case "gasName":
    case "gasNames":
    case "factors":
    case "pairs":
      return gases(cells);
    case "ion":
      return recombiningIons.map(({ formula: label }) => ({ label, detail: "ion" }));
    case "samples":
      return [{ label: "points(", detail: "altitude: value, …" }, ...quantities(names, ownName)];
    case "history":
      return [{ label: "points(", detail: "age: light, …" }];
    case "results":
      return quantities(names, ownName);
    case "variation":
      return [
        ...quantities(names, ownName),
        ...["from", "to", "in", "steps", "logarithmic"].map((label) => ({ label, detail: "word" })),
      ];
    case "profile":
      return [...profiles(schema), ...quantities(names, ownName)];
    default:
      return [
        ...(schema?.choices ?? []).map((label) => ({ label })),
        ...quantities(names, ownName),
        ...functionNames.map((name) => ({ label: name, apply: `${name}(`, detail: "function" })),
        ...constantNames.map((label) => ({ label, detail: "constant" })),
      ];
  }
}

function gases(cells: ReadonlyMap<string, CellKind>): Completion[] {
  const own = [...cells].filter(([name, kind]) => kind === "gas" && name !== "");
  return [
    ...own.map(([label]) => ({ label, detail: "gas cell", boost: 3 })),
    ...handbookGases.map(({ formula, name }) => ({ label: formula, detail: name })),
  ];
}

function quantities(names: ReadonlySet<string>, ownName: string): Completion[] {
  return [...names].filter((name) => name !== "" && name !== ownName).map((label) => ({ label, boost: 1 }));
}

/** The forms a profile may take, as the entry's own example and its kin write them. */
function profiles({ dimension }: EntrySchema): Completion[] {
  const points = { label: "points(", detail: "altitude: value, …" };
  return dimension === "temperature"
    ? [{ label: "bates(", detail: "base, exosphere, shape, at" }, points]
    : [{ label: "power(", detail: "base, exponent, ceiling" }, points];
}
