/** Entries of a cell, read as its schema says; whatever is wrong goes to the notes of the cell. */
import { handbookGases } from "../../physics";
import type { CellKind } from "../document";
import { evaluateExpression } from "../language/evaluateExpression";
import { nearestName } from "../language/nearestName";
import { changeTo, inWords } from "../language/notes";
import { readQuantity } from "../language/readQuantity";
import { readPin } from "../language/readPin";
import { readReference } from "../language/readReference";
import type { Reading } from "../language/reading";
import type { CallNode, Entry, ValueNode } from "../language/syntax";
import { understoodText } from "../language/understoodText";
import type { BodyModel, CellModel } from "./models";
import type { OpenCell } from "./openCell";

/** undefined where the entry is missing or has a fault. */
export function readEntry<Value>(
  cell: OpenCell,
  key: string,
  read: (node: ValueNode) => Reading<Value>,
): Value | undefined {
  const entry = cell.entry(key);
  if (!entry) return undefined;
  const reading = read(entry.node);
  cell.notes.push(...reading.notes);
  return reading.ok ? reading.value : undefined;
}

/** A number in SI, within the bounds of the schema, and shown as understood. */
export function readQuantityEntry(cell: OpenCell, key: string): number | undefined {
  const schema = cell.schema.entries.find((entry) => entry.key === key);
  if (!schema?.dimension) return undefined;
  const expected = { kind: schema.dimension, name: `*${key}*`, ...schema.bounds };
  const quantity = readEntry(cell, key, (node) => readQuantity(node, expected, cell.surroundings));
  if (quantity === undefined) return undefined;
  const entry = cell.entry(key)!;
  if (!cell.isDraw) cell.understand(entry, understoodText(entry.node, quantity, cell));
  return quantity.value;
}

/** Shows the number of an entry that takes a profile, where it is one number for all altitudes. */
export function understandConstant(cell: OpenCell, key: string): void {
  const entry = cell.entry(key);
  if (!entry || cell.isDraw) return;
  const evaluated = evaluateExpression(entry.node, cell.surroundings);
  if (evaluated.ok) cell.understand(entry, understoodText(entry.node, evaluated.quantity, cell));
}

/** The model of a cell of one kind above, named by an entry. */
export function readCellEntry<Kind extends CellModel["kind"]>(
  cell: OpenCell,
  key: Kind,
): Extract<CellModel, { kind: Kind }> | undefined {
  const { surroundings } = cell;
  const entry = cell.entry(key);
  if (!entry) return undefined;
  if (entry.node.type === "call" && entry.node.name === "ref" && key === "body")
    return readReferenceBody(cell, entry.node) as Extract<CellModel, { kind: Kind }> | undefined;
  const path = entry.node.type === "name" ? entry.node.path : "";
  const target = path === "" ? undefined : surroundings.cell(path);
  if (target?.found === "below") {
    const message = `*${path}* stands further down. A cell sees only what stands above it; move one of the two.`;
    cell.say("fault", "reference_below", message, entry);
    return undefined;
  }
  const others =
    target?.found === "above" && target.kind !== key ? [{ name: path, what: `a ${target.kind} cell` }] : [];
  const targets = { what: withArticle(key), names: surroundings.cellsOfKind(key), others };
  const name = readEntry(cell, key, (node) => readReference(node, targets));
  if (name === undefined || target?.found !== "above") return undefined;
  if (target.model?.kind === key) return target.model as Extract<CellModel, { kind: Kind }>;
  cell.say("fault", "reference_without_answer", withoutAnswer(name, key), entry);
  return undefined;
}

/** `body = ref(CAR4.2, ilmara)`: a body as its reference was published. */
function readReferenceBody(cell: OpenCell, node: CallNode): BodyModel | undefined {
  const pin = readPin(node, cell.surroundings.reference);
  cell.notes.push(...pin.notes);
  if (!pin.ok) return undefined;
  const { reference, name, range } = pin.value;
  if (Object.hasOwn(reference.bodies, name)) return reference.bodies[name];
  const bodies = Object.keys(reference.bodies);
  const nearest = nearestName(name, bodies) ?? (bodies.length === 1 ? bodies[0] : undefined);
  const message =
    nearest === undefined
      ? `${reference.pin} has no body *${name}*.`
      : `${reference.pin} has no body *${name}*. It has *${nearest}*.`;
  cell.say("fault", "reference_body", message, range, nearest === undefined ? undefined : changeTo(range, nearest));
  return undefined;
}

function withArticle(kind: CellKind): string {
  return /^[aeiou]/.test(kind) ? `an ${kind}` : `a ${kind}`;
}

function withoutAnswer(name: string, kind: CellKind): string {
  return `The ${kind} *${name}* has a fault and gives nothing to build on; put that right first.`;
}

/** Formulas that a list of gases may use: those of the handbook and of gas cells above. */
export function knownGases(cell: OpenCell): string[] {
  const handbook = handbookGases.map(({ formula }) => formula);
  const own = cell.surroundings.cellsOfKind("gas").filter((formula) => !handbook.includes(formula));
  return [...handbook, ...own];
}

/** Says that of several entries only one may stand, on the later one. */
export function sayIfBothStand(cell: OpenCell, keys: readonly [string, string], reason: string): void {
  const both = keys.map((key) => cell.entry(key)).filter((entry): entry is Entry => entry !== undefined);
  if (both.length < 2) return;
  const [first, second] = both.sort((a, b) => a.range.from - b.range.from);
  const words = inWords([`*${first.key}*`, `*${second.key}*`], "and");
  cell.say("fault", "both_given", `${words} both stand here. ${reason}`, second.keyRange);
}
