/** What a cell sees of the notebook: the cells above it, and which names stand below. */
import type { CellKind } from "../document";
import type { Quantity } from "../language/quantity";
import type { Scope, Unavailable } from "../language/scope";
import type { Entry } from "../language/syntax";
import { nothingSupplied, type SuppliedReference, type SuppliedReferences } from "../references";
import type { ResultValue } from "../result";
import type { TaskAnswer } from "../tasks";
import type { CellModel, GasModel } from "./models";
import { dimensionOfUnit } from "./resultUnits";
import { sameValue } from "./sameValue";
import { traceResults, type Trace } from "./traceResults";

/** A cell that has been evaluated, as those below see it. */
export interface CellAbove {
  id: string;
  kind: CellKind;
  name: string;
  values: Readonly<Record<string, ResultValue>>;
  /** Entries of a `values` cell by name; null where one has a fault. */
  globals: Readonly<Record<string, Quantity | null>>;
  model: CellModel | null;
  isFaulty: boolean;
  /** Its entries as read, and the names above that it used. */
  entries: readonly Entry[];
  uses: readonly string[];
}

export type FoundCell =
  { found: "above"; kind: CellKind; model: CellModel | null } | { found: "below" } | { found: "nowhere" };

/** Every question has one text as its argument, so that questions and answers can be recorded. */
export interface Surroundings {
  /** A `values` entry above, or a result of a cell above. */
  lookup(path: string): Quantity | Unavailable | string | undefined;
  /** All that `lookup` knows, in the order of the notebook. */
  names(): readonly string[];
  cell(name: string): FoundCell;
  /** Names of the cells of a kind above. */
  cellsOfKind(kind: CellKind): readonly string[];
  gas(formula: string): GasModel | null;
  /** In words, where a name is already defined above; null if it is free. */
  definedAbove(name: string): string | null;
  /** Whether a name is that of an entry of a `values` cell above; "yes" or null. */
  valuesEntry(name: string): "yes" | null;
  /** What results above rest on; their names with spaces between. */
  trace(names: string): Trace;
  /** A published reference by its pin, such as "CAR4.2", where it was supplied. */
  reference(pin: string): SuppliedReference | undefined;
  /** The answer of a sweep or spread, by the key of its task, if it has been computed. */
  taskAnswer(key: string): TaskAnswer | undefined;
}

/** What acts on a cell in place of what is written, at one point of a sweep or one draw of a spread. */
export interface Replacements {
  draw?: Scope["draw"];
  /** Value in SI of a `values` entry; undefined where what is written holds. */
  replaced?(key: string): number | undefined;
}

/** Names that the notebook defines, each with the place of its first definition. */
export type NamePlaces = ReadonlyMap<string, number>;

/** The part of the notebook above one cell. It is extended cell by cell, each state on its own. */
export interface NotebookAbove {
  cells: readonly CellAbove[];
  /** First definition of each cell name. */
  byName: ReadonlyMap<string, CellAbove>;
  /** First definition of each `values` entry, with the name of its cell. */
  globals: ReadonlyMap<string, { cell: CellAbove; quantity: Quantity | null }>;
  gases: ReadonlyMap<string, GasModel>;
}

export const nothingAbove: NotebookAbove = {
  cells: [],
  byName: new Map(),
  globals: new Map(),
  gases: new Map(),
};

export function addCell(above: NotebookAbove, cell: CellAbove): NotebookAbove {
  const byName = new Map(above.byName);
  const globals = new Map(above.globals);
  const gases = new Map(above.gases);
  const isTaken = (name: string) => above.byName.has(name) || above.globals.has(name);
  if (cell.name !== "" && cell.kind !== "prose" && !isTaken(cell.name)) {
    byName.set(cell.name, cell);
    if (cell.model?.kind === "gas") gases.set(cell.model.formula, cell.model);
  }
  for (const [name, quantity] of Object.entries(cell.globals)) {
    if (!isTaken(name)) globals.set(name, { cell, quantity });
  }
  return { cells: [...above.cells, cell], byName, globals, gases };
}

export function surroundingsOf(
  above: NotebookAbove,
  places: NamePlaces,
  place: number,
  taskAnswer: Surroundings["taskAnswer"],
  references: SuppliedReferences = nothingSupplied,
): Surroundings {
  const isBelow = (name: string) => (places.get(name) ?? -1) > place;
  return {
    lookup(path) {
      const global = above.globals.get(path);
      if (global) {
        return (
          global.quantity ?? {
            unavailable: `*${path}* has a fault in cell *${global.cell.name}*; put that right first.`,
          }
        );
      }
      const [name = "", ...rest] = path.split(".");
      const cell = above.byName.get(name);
      if (cell && rest.length === 0) return kindInWords(cell.kind);
      if (cell) return resultOf(cell, rest.join("."), path);
      if (isBelow(name)) {
        return {
          unavailable: `*${name}* is defined further down. A cell sees only what stands above it; move one of the two.`,
        };
      }
      return undefined;
    },
    names() {
      const results = above.cells
        .filter((cell) => above.byName.get(cell.name) === cell)
        .flatMap((cell) => Object.keys(cell.values).map((value) => `${cell.name}.${value}`));
      return [...above.globals.keys(), ...results];
    },
    cell(name) {
      const cell = above.byName.get(name);
      if (cell) return { found: "above", kind: cell.kind, model: cell.model };
      return { found: isBelow(name) ? "below" : "nowhere" };
    },
    cellsOfKind: (kind) =>
      [...above.byName.values()].filter((cell) => cell.kind === kind).map(({ name }) => name),
    gas: (formula) => above.gases.get(formula) ?? null,
    definedAbove(name) {
      const cell = above.byName.get(name);
      if (cell) return kindInWords(cell.kind);
      const global = above.globals.get(name);
      return global ? `an entry of the values cell ${global.cell.name}`.trimEnd() : null;
    },
    valuesEntry: (name) => (above.globals.has(name) ? "yes" : null),
    trace: (names) => traceResults(above, names.split(" ")),
    reference: (pin) => references.get(pin),
    taskAnswer,
  };
}

function kindInWords(kind: CellKind): string {
  return `${/^[aeiou]/.test(kind) ? "an" : "a"} ${kind} cell`;
}

function resultOf(cell: CellAbove, name: string, path: string): Quantity | Unavailable | string | undefined {
  const result = Object.hasOwn(cell.values, name) ? cell.values[name] : undefined;
  if (!result) {
    if (cell.kind === "escape" && cell.isFaulty && !Object.hasOwn(cell.values, "exobase.altitude")) {
      return { unavailable: `*${cell.name}* has no exobase, so there is no *${path}*.` };
    }
    const hasNone = Object.keys(cell.values).length === 0;
    if (hasNone && cell.kind === "spread" && !cell.isFaulty)
      return { unavailable: `*${cell.name}* is still to be computed.` };
    if (hasNone && cell.isFaulty)
      return { unavailable: `*${cell.name}* has no results because of a fault; put that right first.` };
    return undefined;
  }
  if (typeof result.value === "string") return result.value;
  if (result.value === null) {
    return {
      unavailable: `*${path}* lies outside 1e-300 to 1e300 and has no value; use *${twinOf(cell, name)}* instead.`,
    };
  }
  return { value: result.value, dimension: dimensionOfUnit(result.unit ?? "1") };
}

/** `CO2.rate` → `leak.CO2.log10_rate`. */
function twinOf(cell: CellAbove, name: string): string {
  const cut = name.lastIndexOf(".") + 1;
  const twin = `${name.slice(0, cut)}log10_${name.slice(cut)}`;
  if (Object.hasOwn(cell.values, twin)) return `${cell.name}.${twin}`;
  return `${cell.name}.${name.slice(0, cut)}log10_rate`;
}

/** A question that a cell asked of its surroundings, with the answer that it got. */
interface Question {
  ask: keyof Surroundings;
  about: string;
  answer: unknown;
}

export interface RecordedSurroundings extends Surroundings, Replacements {
  readonly questions: readonly Question[];
}

/** Surroundings that keep a record, so that a later evaluation can tell whether anything the cell used has changed. */
export function recordQuestions(surroundings: Surroundings): RecordedSurroundings {
  const questions = new Map<string, Question>();
  const asking =
    <Answer>(ask: keyof Surroundings, method: (about: string) => Answer) =>
    (about = ""): Answer => {
      const answer = method(about);
      questions.set(`${ask} ${about}`, { ask, about, answer });
      return answer;
    };
  return {
    lookup: asking("lookup", surroundings.lookup),
    names: asking("names", surroundings.names),
    cell: asking("cell", surroundings.cell),
    cellsOfKind: asking("cellsOfKind", surroundings.cellsOfKind as (kind: string) => readonly string[]),
    gas: asking("gas", surroundings.gas),
    definedAbove: asking("definedAbove", surroundings.definedAbove),
    valuesEntry: asking("valuesEntry", surroundings.valuesEntry),
    trace: asking("trace", surroundings.trace),
    reference: asking("reference", surroundings.reference),
    taskAnswer: asking("taskAnswer", surroundings.taskAnswer),
    get questions() {
      return [...questions.values()];
    },
  };
}

/** Whether every question would get the same answer in other surroundings. */
export function answersTheSame(questions: readonly Question[], surroundings: Surroundings): boolean {
  return questions.every(({ ask, about, answer }) =>
    sameValue((surroundings[ask] as (about: string) => unknown)(about), answer),
  );
}

/** The names above that the questions were about, as far as they exist: cells, and `values` entries. */
export function usedNames(questions: readonly Question[]): string[] {
  const used = questions.flatMap(({ ask, about, answer }) => {
    if (ask === "lookup" && answer !== undefined) return [about];
    if (ask === "cell" && (answer as FoundCell).found === "above") return [about];
    if (ask === "gas" && answer !== null) return [about];
    return [];
  });
  return [...new Set(used)];
}
