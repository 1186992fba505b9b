/** One cell being evaluated: its entries by key, and everything that is found out about them. */
import { changeTo, fault, inWords } from "../language/notes";
import { nearestName } from "../language/nearestName";
import type { Entry, ParsedEntries, ValueNode } from "../language/syntax";
import type { Cell } from "../document";
import type { CellSchema } from "../kinds/cellSchema";
import type { CellEvaluation, Note, TextRange, Understood } from "../result";
import type { CellModel } from "./models";
import type { RecordedSurroundings } from "./surroundings";

type Remedy = NonNullable<Note["remedy"]>;

export interface OpenCell {
  readonly name: string;
  readonly text: string;
  readonly schema: CellSchema;
  readonly unitSystem: "SI" | "cgs";
  readonly surroundings: RecordedSurroundings;
  /** What the cell handed on when it was last evaluated; to be used again only where it is sure to be the same. */
  readonly lastModel: CellModel | null;
  /** One of many points of a sweep or spread: only wanted values, models and notes are asked for. */
  readonly isDraw: boolean;
  /** In the order written; of a key that stands twice, the first. */
  readonly entries: readonly Entry[];
  readonly notes: Note[];
  /** By entry. */
  readonly understood: ReadonlyMap<string, Understood>;
  readonly defaults: CellEvaluation["defaults"];
  entry(key: string): Entry | undefined;
  /** Whether anyone asks for a value; what is costly and not wanted may be left out. */
  isWanted(name: string): boolean;
  /** Adds a note; at an entry's value, a range, or with no place on the cell as a whole. */
  say(level: Note["level"], code: string, message: string, at?: Entry | TextRange, remedy?: Remedy): void;
  understand(entry: Entry, text: string | null): void;
  /** Names an entry that was left out and what acts instead; the schema says it unless the cell knows better. */
  actByDefault(key: string, better?: { text?: string; note?: string }): void;
}

/** Makes a cell ready to be read: its entries by key, those that its schema does not know told. */
export function openCell(
  cell: Cell,
  { entries: written, notes: syntaxNotes }: ParsedEntries,
  schema: CellSchema,
  surroundings: RecordedSurroundings,
  unitSystem: "SI" | "cgs",
  lastModel: CellModel | null,
  wanted: ReadonlySet<string> | null,
): OpenCell {
  const notes: Note[] = [...syntaxNotes];
  const understood = new Map<string, Understood>();
  const defaults: CellEvaluation["defaults"] = [];
  const byKey = new Map<string, Entry>();
  for (const entry of written) byKey.set(entry.key, entry);
  if (!schema.takesAnyKey) for (const entry of byKey.values()) notes.push(...unknownKey(entry, schema));

  return {
    name: cell.name,
    text: cell.text,
    schema,
    unitSystem,
    surroundings,
    lastModel,
    isDraw: wanted !== null,
    isWanted: (name) => wanted === null || wanted.has(name),
    entries: [...byKey.values()],
    notes,
    understood,
    defaults,
    entry: (key) => byKey.get(key),
    say(level, code, message, at, remedy) {
      const range = at && ("valueRange" in at ? at.valueRange : at);
      notes.push({ level, code, message, ...(range ? { range } : {}), ...(remedy ? { remedy } : {}) });
    },
    understand(entry, text) {
      if (text === null) return;
      const said = understood.get(entry.key);
      if (said) said.text = `${said.text}, ${text}`;
      else
        understood.set(entry.key, {
          entry: entry.key,
          line: entry.endLine,
          offset: entry.valueRange.to,
          text,
        });
    },
    actByDefault(key, better = {}) {
      const standard = schema.entries.find((entry) => entry.key === key)?.default;
      if (standard)
        defaults.push({ key, text: better.text ?? standard.text, note: better.note ?? standard.meaning });
    },
  };
}

function unknownKey(entry: Entry, schema: CellSchema): Note[] {
  const keys = schema.entries.map(({ key }) => key);
  if (keys.includes(entry.key)) return [];
  const nearest = nearestName(entry.key, keys);
  const article = /^[aeiou]/.test(schema.kind) ? "an" : "a";
  const message =
    nearest === undefined
      ? `No entry *${entry.key}* in ${article} ${schema.kind}. It takes ${inWords(keys, "and")}.`
      : `No entry *${entry.key}* in ${article} ${schema.kind}. The nearest is *${nearest}*.`;
  const remedy = nearest === undefined ? undefined : changeTo(entry.keyRange, nearest);
  return [fault("unknown_key", entry.keyRange, message, remedy)];
}

/** Says which needed entries are missing; `without` are not needed in this cell after all. */
export function requireEntries(cell: OpenCell, without: readonly string[] = []): void {
  const said = new Set<string>();
  for (const { key, needed, oneOf = [key], example } of cell.schema.entries) {
    if (needed === false || without.includes(key) || oneOf.some((one) => cell.entry(one) !== undefined))
      continue;
    const words = inWords(oneOf.map((one) => `*${one}*`));
    if (said.has(words)) continue;
    said.add(words);
    cell.say("fault", "missing_key", `The entry ${words} is missing. Write, for example, ${example}.`);
  }
}

/** Says once which entries are uncertain, and that they act by their centre. */
export function sayWhichCentresAct(cell: OpenCell): void {
  const uncertain = cell.entries.filter(({ node }) => holdsUncertainty(node));
  if (uncertain.length === 0) return;
  const message = saysWhichCentresAct(uncertain.map(({ key }) => key));
  cell.say("remark", "acts_by_centre", message, uncertain[0]);
}

export function saysWhichCentresAct(keys: readonly string[]): string {
  const words = inWords(
    keys.map((key) => `*${key}*`),
    "and",
  );
  const verb = keys.length === 1 ? "acts by its centre" : "act by their centres";
  return `${words} ${verb}; results carry no ±.`;
}

/** Whether an expression holds an uncertain quantity of its own. */
export function holdsUncertainty(node: ValueNode): boolean {
  switch (node.type) {
    case "uncertain":
      return true;
    case "measured":
    case "negative":
      return holdsUncertainty(node.operand);
    case "sum":
      return node.terms.some((term) => holdsUncertainty(term.node));
    case "product":
      return node.factors.some((factor) => holdsUncertainty(factor.node));
    case "power":
      return holdsUncertainty(node.base) || holdsUncertainty(node.exponent);
    case "call":
    case "list":
      return node.items.some((item) => holdsUncertainty(item.value));
    case "number":
    case "name":
    case "variation":
    case "broken":
      return false;
  }
}
