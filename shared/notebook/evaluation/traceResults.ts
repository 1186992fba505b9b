/** What results rest on: cells and `values` entries, back to the uncertain numbers written in them. */
import { cellSchemas } from "../cellSchemas";
import type { CallNode, Entry, ListNode, ValueNode } from "../language/syntax";
import { rolesIn, type PhysicalRole } from "./physicalRole";
import type { CellAbove, NotebookAbove } from "./surroundings";

/** A cell, or one entry of a `values` cell. */
export interface TraceNode {
  cellId: string;
  /** Key of the entry; null for a whole cell. */
  entry: string | null;
  /** Places in the list of nodes that it rests on directly. */
  uses: number[];
}

/** An uncertain number as it is written. */
export interface UncertainInput {
  /** `T_quiet`, or `dayside.temperature.exosphere`. */
  name: string;
  cellId: string;
  /** Within its cell. */
  path: string;
  /** Of every entry that uses it as it is. */
  roles: PhysicalRole[];
}

export interface Trace {
  /** Text of everything that the results rest on, remarks and spaces aside. */
  key: string;
  /** In the order of the notebook. */
  nodes: TraceNode[];
  /** In the order of the notebook. */
  inputs: UncertainInput[];
  /** Every name that they use, as it is written. */
  names: string[];
  /** Name of a sweep or spread among what the results rest on. */
  longWork: string | null;
}

interface Place {
  cell: CellAbove;
  entry: Entry | null;
}

/** @param names results and `values` entries above; those that do not exist rest on nothing */
export function traceResults(above: NotebookAbove, names: readonly string[]): Trace {
  const places = inOrder(above, reachable(above, names));
  const indexOf = new Map(places.map((place, index) => [keyOf(place), index]));
  const nodes = places.map((place): TraceNode => {
    const uses = usesOf(above, place).map((used) => indexOf.get(keyOf(used))!);
    return { cellId: place.cell.id, entry: place.entry?.key ?? null, uses };
  });
  return {
    key: places.map(textOf).join("\n"),
    nodes,
    inputs: uncertainInputs(above, places),
    names: [...new Set(places.flatMap(namesOf))],
    longWork: places.find(({ cell }) => cell.kind === "sweep" || cell.kind === "spread")?.cell.name ?? null,
  };
}

function reachable(above: NotebookAbove, names: readonly string[]): Map<string, Place> {
  const found = new Map<string, Place>();
  const left = names.flatMap((name) => placeOf(above, name) ?? []);
  for (let place = left.pop(); place; place = left.pop()) {
    if (found.has(keyOf(place))) continue;
    found.set(keyOf(place), place);
    left.push(...usesOf(above, place));
  }
  return found;
}

function inOrder(above: NotebookAbove, places: ReadonlyMap<string, Place>): Place[] {
  return above.cells.flatMap((cell) => {
    const whole = places.get(keyOf({ cell, entry: null }));
    const entries = cell.entries.flatMap((entry) => places.get(keyOf({ cell, entry })) ?? []);
    return whole ? [whole] : entries;
  });
}

function keyOf({ cell, entry }: Place): string {
  return entry ? `${cell.id} ${entry.key}` : cell.id;
}

/** A name as the cells below resolve it. */
function placeOf(above: NotebookAbove, name: string): Place | null {
  const global = above.globals.get(name);
  if (global) return entryOf(global.cell, name);
  const [cellName = "", ...rest] = name.split(".");
  const cell = above.byName.get(cellName);
  if (!cell) return null;
  return cell.kind === "values" ? entryOf(cell, rest.join(".")) : { cell, entry: null };
}

function entryOf(cell: CellAbove, key: string): Place | null {
  const entry = cell.entries.find((candidate) => candidate.key === key);
  return entry ? { cell, entry } : null;
}

function usesOf(above: NotebookAbove, at: Place): Place[] {
  const used = namesOf(at).flatMap((name) => placeOf(above, name) ?? []);
  return used.filter(({ cell, entry }) => cell !== at.cell || (at.entry !== null && entry !== at.entry));
}

/** What a cell did not look up as it stands, it may look up at another point; so all that it writes counts. */
function namesOf({ cell, entry }: Place): string[] {
  const written = (entry ? [entry] : cell.entries).flatMap(({ node }) => namesIn(node));
  return entry ? written : [...new Set([...cell.uses, ...written])];
}

export function namesIn(node: ValueNode): string[] {
  return partsOf(node).flatMap((part) => (part.type === "name" ? [part.path] : []));
}

/** The node and all nodes within it. */
function partsOf(node: ValueNode): ValueNode[] {
  return [node, ...childrenOf(node).flatMap(partsOf)];
}

function childrenOf(node: ValueNode): ValueNode[] {
  switch (node.type) {
    case "measured":
    case "negative":
      return [node.operand];
    case "sum":
      return node.terms.map((term) => term.node);
    case "product":
      return node.factors.map((factor) => factor.node);
    case "power":
      return [node.base, node.exponent];
    case "uncertain":
      return [node.first, node.second];
    case "variation":
      return [node.subject, node.first, node.last, node.steps];
    case "call":
      // What stands in ref(…) is named in the reference, not here.
      return node.name === "ref" ? [] : itemsOf(node);
    case "list":
      return itemsOf(node);
    case "number":
    case "name":
    case "broken":
      return [];
  }
}

function itemsOf(node: CallNode | ListNode): ValueNode[] {
  return node.items.flatMap(({ label, value }) => (label ? [label, value] : [value]));
}

function uncertainInputs(above: NotebookAbove, places: readonly Place[]): UncertainInput[] {
  const inputs = new Map<string, UncertainInput>();
  for (const { cell, entry } of places) {
    for (const { node } of entry ? [entry] : cell.entries) {
      for (const part of partsOf(node)) {
        if (part.type !== "uncertain") continue;
        const name = entry ? part.path : `${cell.name}.${part.path}`;
        inputs.set(`${cell.id} ${part.path}`, { name, cellId: cell.id, path: part.path, roles: [] });
      }
    }
  }
  for (const { cell, entry } of places) {
    if (entry) continue;
    for (const written of cell.entries) {
      const schema = cellSchemas[cell.kind].entries.find(({ key }) => key === written.key);
      for (const part of schema ? rolesIn(schema, written.node) : [])
        giveRole(above, inputs, cell, part.node, part.role);
    }
  }
  return [...inputs.values()];
}

/** To the uncertain number itself, or to the one that a name stands for without any arithmetic. */
function giveRole(
  above: NotebookAbove,
  inputs: ReadonlyMap<string, UncertainInput>,
  cell: CellAbove,
  node: ValueNode,
  role: PhysicalRole,
): void {
  if (node.type === "uncertain") inputs.get(`${cell.id} ${node.path}`)?.roles.push(role);
  if (node.type !== "name") return;
  const place = placeOf(above, node.path);
  if (place?.entry && place.entry.node !== node) giveRole(above, inputs, place.cell, place.entry.node, role);
}

const texts = new WeakMap<Entry, string>();

function textOf({ cell, entry }: Place): string {
  const entries = entry ? [entry] : cell.entries;
  return `${cell.kind} ${cell.name}: ${entries.map(entryText).join("; ")}`;
}

/** An entry as it was read: the same for the same meaning, wherever it stands. */
export function entryText(entry: Entry): string {
  const known = texts.get(entry);
  if (known !== undefined) return known;
  const text = `${entry.key} = ${JSON.stringify(entry.node, (key, value: unknown) =>
    key === "range" || key === "nameRange" ? undefined : value,
  )}`;
  texts.set(entry, text);
  return text;
}
