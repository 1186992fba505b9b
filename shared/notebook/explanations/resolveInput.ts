/** Values that went into a result as they acted, and where each comes from. */
import { findBody, findGas, type HandbookBody } from "../../physics";
import type { CellKind } from "../document";
import { shortCitation } from "../evaluation/shortCitation";
import { namesIn } from "../evaluation/traceResults";
import type { Entry } from "../language/syntax";
import type { ResultRow, ResultValue } from "../result";
import type { ExplainedPlace } from "./conventions";
import {
  cellNamed,
  entryOf,
  entryText,
  placeNamed,
  relatedCell,
  type ExplainedCell,
  type ExplainedNotebook,
} from "./explainedNotebook";
import type { RecordInput } from "./record";
import { withSubject } from "./explanations";

/** One quantity of the formula, with its value. */
export interface ExplainedInput {
  /** TeX. */
  symbol: string;
  words: string;
  /** SI; null where the magnitude is carried by its logarithm, or where the value is a text. */
  value: number | null;
  log10: number | null;
  unit: string;
  /** Name of the result, for how it is shown. */
  name: string;
  /** What is written, where it is no bare number. */
  text: string | null;
  /** How it was understood, where that adds something: "1.242×10¹¹ m". */
  understood: string | null;
}

/** A place that a value comes from. */
export interface Origin {
  /** null where it comes from no cell of the notebook. */
  cellId: string | null;
  /** "given.T_quiet", "ilmara", "handbook". */
  name: string;
  text: string | null;
  /** What is remarked beside the entry: its source. */
  remark: string | null;
}

export interface ResolvedInput {
  input: ExplainedInput;
  origins: Origin[];
}

type Described = Pick<ExplainedInput, "symbol" | "words">;

/** The row that a number stands in, where it stands in a table. */
export type PlaceInRow = ExplainedPlace & { row: ResultRow | null; table: string | null };

/** null where the notebook does not say. */
export function resolveInput(place: PlaceInRow, wanted: RecordInput): ResolvedInput | null {
  const { notebook, cell, gas } = place;
  const described = { symbol: wanted.symbol, words: wanted.words };
  switch (wanted.from) {
    case "constant": {
      const { name, value, unit, source } = wanted.constant;
      const origin = { cellId: null, name, text: shortCitation(source), remark: null };
      return { input: numberInput(described, name, value, plainUnit(unit)), origins: [origin] };
    }
    case "gas":
      return gas === null ? null : gasMass(notebook, described, gas.replace(/\+$/, ""));
    case "row":
      return fromRow(place, described, withSubject(wanted.column, gas));
    case "entry": {
      const at = wanted.of ? relatedCell(notebook, cell, wanted.of) : cell;
      return at && fromEntry(notebook, at, described, wanted.key);
    }
    case "result": {
      const at = wanted.of ? relatedCell(notebook, cell, wanted.of) : cell;
      return at && fromResult(notebook, at, described, withSubject(wanted.name, gas));
    }
  }
}

function numberInput(described: Described, name: string, value: number | null, unit: string): ExplainedInput {
  return { ...described, name, value, log10: null, unit, text: null, understood: null };
}

function textInput(
  described: Described,
  name: string,
  text: string,
  understood: string | null = null,
): ExplainedInput {
  return { ...described, name, value: null, log10: null, unit: "1", text, understood };
}

/** "J K⁻¹" as results carry units: "J K^-1". */
function plainUnit(unit: string): string {
  const digits = "⁰¹²³⁴⁵⁶⁷⁸⁹";
  return unit.replace(/[⁻⁰¹²³⁴⁵⁶⁷⁸⁹]+/g, (raised) => {
    const plain = [...raised].map((sign) => (sign === "⁻" ? "-" : String(digits.indexOf(sign))));
    return `^${plain.join("")}`;
  });
}

export function twinOf(values: Readonly<Record<string, ResultValue>>, name: string): number | null {
  const twin = values[name.replace(/([^.]+)$/, "log10_$1")]?.value;
  return typeof twin === "number" ? twin : null;
}

/** A result, with the entry that states it, if one does; else with what its cell is made of. */
function fromResult(
  notebook: ExplainedNotebook,
  at: ExplainedCell,
  described: Described,
  name: string,
): ResolvedInput | null {
  const { values } = at.evaluation.result;
  if (!Object.hasOwn(values, name)) return null;
  const { value, unit = "1" } = values[name];
  const input =
    typeof value === "string"
      ? textInput(described, name, value.replace(/_/g, " "))
      : { ...numberInput(described, name, value, unit), log10: twinOf(values, name) };
  return { input, origins: statedBy(notebook, at, described, name)?.origins ?? originsOfCell(notebook, at) };
}

/** The entry that a result of a body or the base of a column repeats, or the handbook. */
function statedBy(
  notebook: ExplainedNotebook,
  at: ExplainedCell,
  described: Described,
  name: string,
): ResolvedInput | null {
  const keys = statingKeys[at.cell.kind]?.[name] ?? [];
  const written = keys.find((key) => entryOf(at, key));
  if (written !== undefined) return fromEntry(notebook, at, described, written);
  return fromHandbookBody(at, described, name);
}

const statingKeys: Readonly<Partial<Record<CellKind, Readonly<Record<string, readonly string[]>>>>> = {
  body: { mass: ["mass", "gm"], gm: ["mass", "gm"], radius: ["radius"], xuv_flux: ["xuv_flux"] },
  column: { "base.altitude": ["base"] },
};

/** The cell itself and all that it uses: a result of it comes from all of them. */
function originsOfCell(notebook: ExplainedNotebook, at: ExplainedCell): Origin[] {
  const { id, name } = at.cell;
  return [{ cellId: id, name, text: null, remark: null }, ...originsOfNames(notebook, at.evaluation.uses)];
}

function fromEntry(
  notebook: ExplainedNotebook,
  at: ExplainedCell,
  described: Described,
  key: string,
): ResolvedInput | null {
  const written = entryOf(at, key);
  if (!written) return byDefault(notebook, at, described, key) ?? fromHandbookBody(at, described, key);
  return {
    input: writtenInput(notebook, at, described, written),
    origins: [originOf(at, written), ...originsWithin(notebook, written)],
  };
}

/** What is written, or the number of the result that it names. */
function writtenInput(
  notebook: ExplainedNotebook,
  at: ExplainedCell,
  described: Described,
  written: Entry,
): ExplainedInput {
  const named = written.node.type === "name" ? placeNamed(notebook, written.node.path) : null;
  if (named) {
    const { values } = named.cell.evaluation.result;
    const { value, unit = "1" } = values[named.name];
    if (typeof value !== "string")
      return {
        ...numberInput(described, named.name, value, unit),
        log10: twinOf(values, named.name),
      };
  }
  const understood = at.evaluation.understood.find(({ entry }) => entry === written.key)?.text ?? null;
  return textInput(described, written.key, shortened(entryText(at, written)), understood);
}

/** Long lists are not set out in full. */
const longestText = 88;

function shortened(text: string): string {
  return text.length <= longestText ? text : `${text.slice(0, longestText).replace(/[,\s]*\S*$/, "")} …`;
}

export function originOf(at: ExplainedCell, written: Entry): Origin {
  const { id, name } = at.cell;
  return {
    cellId: id,
    name: name === "" ? written.key : `${name}.${written.key}`,
    text: shortened(entryText(at, written)),
    remark: written.remark,
  };
}

/** Of the names that an expression uses. */
export function originsWithin(notebook: ExplainedNotebook, { node }: Entry): Origin[] {
  return originsOfNames(notebook, namesIn(node));
}

/** Of cells, of results, and of entries of `values` cells. */
function originsOfNames(notebook: ExplainedNotebook, names: readonly string[]): Origin[] {
  return [...new Set(names)].flatMap((path): Origin[] => {
    const found = placeNamed(notebook, path);
    const cell = found?.cell ?? cellNamed(notebook, path);
    if (!cell) return [];
    const entry = found && cell.cell.kind === "values" ? entryOf(cell, found.name) : undefined;
    return [entry ? originOf(cell, entry) : { cellId: cell.cell.id, name: path, text: null, remark: null }];
  });
}

function byDefault(
  notebook: ExplainedNotebook,
  at: ExplainedCell,
  described: Described,
  key: string,
): ResolvedInput | null {
  const standard = at.evaluation.defaults.find((one) => one.key === key);
  if (!standard) return null;
  const text = standard.text.replace(/^[^=]*=\s*/, "");
  const { id, name } = at.cell;
  const same = Object.hasOwn(at.evaluation.result.values, text)
    ? fromResult(notebook, at, described, text)?.input
    : undefined;
  return {
    input: same ?? textInput(described, key, text),
    origins: [{ cellId: id, name: `${name}.${key}`, text: standard.text, remark: "by default" }],
  };
}

/** Entries of a body that the handbook knows, by their keys there. */
const handbookKeys: Readonly<Record<string, { key: keyof HandbookBody["sources"]; unit: string }>> = {
  gm: { key: "gravitationalParameter", unit: "m^3 s^-2" },
  mass: { key: "gravitationalParameter", unit: "m^3 s^-2" },
  radius: { key: "radius", unit: "m" },
  star_distance: { key: "starDistance", unit: "m" },
  star_mass: { key: "starMass", unit: "kg" },
  xuv_radius: { key: "radius", unit: "m" },
};

function fromHandbookBody(at: ExplainedCell, described: Described, key: string): ResolvedInput | null {
  const like = entryOf(at, "like");
  const known = handbookKeys[key];
  if (at.cell.kind !== "body" || !like || !known) return null;
  const body = findBody(namesIn(like.node)[0] ?? "");
  const value = body?.[known.key];
  if (!body || typeof value !== "number") return null;
  const source = body.sources[known.key];
  const text = source ? citation(source) : null;
  return {
    input: numberInput(described, key, value, known.unit),
    origins: [originOf(at, like), { cellId: null, name: `handbook, ${body.name}`, text, remark: null }],
  };
}

function citation({ source, mark }: { source: string; mark: string }): string {
  return `${shortCitation(source)}${mark === "from memory" ? ", from memory" : ""}`;
}

/** Of its gas cell where that gives a mass, else of the handbook. */
function gasMass(notebook: ExplainedNotebook, described: Described, formula: string): ResolvedInput | null {
  const own = notebook.cells.find(({ cell }) => cell.kind === "gas" && cell.name === formula);
  if (own && entryOf(own, "mass")) return fromEntry(notebook, own, described, "mass");
  const gas = findGas(formula);
  if (!gas) return null;
  const text = [...new Set(gas.sources.mass.map(citation))].join("; ");
  return {
    input: numberInput(described, "mass", gas.mass, "kg"),
    origins: [{ cellId: null, name: `handbook, ${formula}`, text, remark: null }],
  };
}

function fromRow(
  { notebook, row, cell, table }: PlaceInRow,
  described: Described,
  column: string,
): ResolvedInput | null {
  const value = row?.[column];
  if (value === undefined) return null;
  const unit = columnUnit(`${table}.${column}`);
  const input =
    typeof value === "string"
      ? textInput(described, column, value)
      : numberInput(described, column, value, unit);
  return { input, origins: originsOfCell(notebook, cell) };
}

/** Units of the columns of tables, by table and by the last word of the column. */
const columnUnits: Readonly<Record<string, string>> = {
  "levels.altitude": "m",
  "levels.radius": "m",
  "levels.temperature": "K",
  "levels.pressure": "Pa",
  "levels.mass_density": "kg m^-3",
  "levels.number_density": "m^-3",
  "levels.mean_mass": "kg",
  "levels.gravity": "m s^-2",
  "levels.scale_height": "m",
  "levels.mean_free_path": "m",
  "levels.ballistic": "m^-3",
  "levels.satellite": "m^-3",
  "levels.escaping": "m^-3",
  "levels.limb_column": "m^-2",
  "levels.overhead_column": "m^-2",
  "history.age": "s",
  "history.rate": "s^-1",
  "channels.energy": "J",
};

/** @param name table and column, `levels.O.number_density` */
export function columnUnit(name: string): string {
  const parts = name.split(".");
  return columnUnits[`${parts[0]}.${parts[parts.length - 1]}`] ?? "1";
}
