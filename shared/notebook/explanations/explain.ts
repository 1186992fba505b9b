/** What a number of the notebook is: its formula, what went into it and from where, what it rests on, where it holds. */
import type { Cell } from "../document";
import { references } from "../../physics";
import { shortCitation } from "../evaluation/shortCitation";
import { namesIn } from "../evaluation/traceResults";
import type { CellEvaluation, Note, ResultRow, ResultSpread } from "../result";
import { conventionSentences, type ExplainedPlace } from "./conventions";
import {
  cellNamed,
  entryOf,
  explainedNotebook,
  placeNamed,
  type ExplainedCell,
  type ExplainedNotebook,
} from "./explainedNotebook";
import { findRecord, withSubject, type FoundRecord } from "./explanations";
import type { ExplanationRecord } from "./record";
import {
  columnUnit,
  originOf,
  originsWithin,
  resolveInput,
  twinOf,
  type ExplainedInput,
  type Origin,
  type PlaceInRow,
} from "./resolveInput";

/** A number of the notebook: a result by its name, or one in a table, by table and column with the row that it is in. */
export interface ResultPlace {
  /** Name of the cell; empty for an entry of a `values` cell without one. */
  cell: string;
  name: string;
  /** The row where `column` has this value. */
  row?: { column: string; value: number | string };
}

export interface Explanation {
  cellId: string;
  cell: string;
  /** As an entry can name it; null in a table, whose numbers have no names. */
  name: string | null;
  /** In words, with its gas: "Jeans flux of H". */
  words: string;
  /** TeX. */
  symbol: string;
  formula: string | null;
  value: number | string | null;
  log10: number | null;
  unit: string;
  spread: ResultSpread | null;
  inputs: ExplainedInput[];
  origins: Origin[];
  restsOn: string[];
  holdsFor: string | null;
  notes: Pick<Note, "level" | "message">[];
  sources: { key: string; short: string; full: string }[];
}

/** null where the notebook has no such number now. */
export function explain(
  cells: readonly Cell[],
  evaluations: Iterable<CellEvaluation>,
  place: ResultPlace,
): Explanation | null {
  const notebook = explainedNotebook(cells, evaluations);
  const cell = cellOf(notebook, place);
  if (!cell) return null;
  return cell.cell.kind === "values"
    ? explainWritten(notebook, cell, place.name)
    : explainResult(notebook, cell, place);
}

function cellOf(notebook: ExplainedNotebook, { cell, name }: ResultPlace): ExplainedCell | null {
  const named = cell === "" ? null : cellNamed(notebook, cell);
  return named ?? placeNamed(notebook, name)?.cell ?? null;
}

function explainResult(
  notebook: ExplainedNotebook,
  cell: ExplainedCell,
  { name, row: wantedRow }: ResultPlace,
): Explanation | null {
  const found = findRecord(cell.cell.kind, name);
  if (!found) return null;
  const table = wantedRow ? name.slice(0, name.indexOf(".")) : null;
  const row = wantedRow && table !== null ? findRow(cell, table, wantedRow) : null;
  const number = table === null ? resultNumber(cell, name) : rowNumber(row, name);
  if (!number) return null;

  const gas = found.subject ?? subjectOf(cell);
  const place: PlaceInRow = { notebook, cell, gas, row, table };
  return {
    ...described(found, cell, place, gas),
    ...number,
    cellId: cell.cell.id,
    cell: cell.cell.name,
    name: table === null ? `${cell.cell.name}.${name}` : null,
  };
}

/** The gas or ion of the whole cell. */
function subjectOf(cell: ExplainedCell): string | null {
  const ion = entryOf(cell, "ion");
  if (cell.cell.kind === "nonthermal" && ion)
    return cell.cell.text.slice(ion.valueRange.from, ion.valueRange.to);
  return cell.cell.kind === "escape" || cell.cell.kind === "column"
    ? null
    : (cell.evaluation.gases[0] ?? null);
}

type NumberParts = Pick<Explanation, "value" | "log10" | "unit" | "spread">;

function resultNumber({ evaluation }: ExplainedCell, name: string): NumberParts | null {
  const { values } = evaluation.result;
  if (!Object.hasOwn(values, name)) return null;
  const { value, unit = "1", spread = null } = values[name];
  return { value, unit, spread, log10: twinOf(values, name) };
}

function findRow(
  { evaluation }: ExplainedCell,
  table: string,
  { column, value }: NonNullable<ResultPlace["row"]>,
): ResultRow | null {
  return evaluation.result.tables[table]?.find((row) => row[column] === value) ?? null;
}

function rowNumber(row: ResultRow | null, name: string): NumberParts | null {
  const value = row?.[name.slice(name.indexOf(".") + 1)];
  return value === undefined ? null : { value, unit: columnUnit(name), spread: null, log10: null };
}

type DescribedParts = Pick<
  Explanation,
  "words" | "symbol" | "formula" | "inputs" | "origins" | "restsOn" | "holdsFor" | "notes" | "sources"
>;

function described(
  { record, isLogarithm }: FoundRecord,
  cell: ExplainedCell,
  place: PlaceInRow,
  gas: string | null,
): DescribedParts {
  const resolved = record.with.flatMap((input) => resolveInput(place, input) ?? []);
  const words = withSubject(record.words, gas);
  const formula = formulaOf(record, cell);
  return {
    words: isLogarithm ? `Decimal logarithm: ${words.charAt(0).toLowerCase()}${words.slice(1)}` : words,
    symbol: isLogarithm ? `\\log_{10} ${record.symbol}` : record.symbol,
    formula,
    inputs: resolved.map(({ input }) => input),
    origins: elsewhere(distinct(resolved.flatMap(({ origins }) => origins)), cell),
    restsOn: conventionSentences(record.conventions, place),
    holdsFor: record.validity,
    notes: notesOn(record, place),
    sources: record.sources.map((key) => ({ key, short: shortCitation(key), full: references[key] ?? key })),
  };
}

/** By the word or call of an entry, where the formula goes by it. */
function formulaOf({ formula, forms }: ExplanationRecord, cell: ExplainedCell): string | null {
  const node = forms && entryOf(cell, forms.entry)?.node;
  const word = node?.type === "name" ? node.path : node?.type === "call" ? node.name : "";
  return forms?.formulas[word] ?? formula;
}

/** Notes of the cell that say whether the result holds here; of those that name a gas, the ones that name its own. */
function notesOn(
  { notes: codes = [] }: ExplanationRecord,
  { cell, gas }: ExplainedPlace,
): Explanation["notes"] {
  const { gases, result } = cell.evaluation;
  return result.notes
    .filter(({ code }) => codes.includes(code))
    .filter(({ message }) => {
      const words = message.split(/[^A-Za-z0-9]+/);
      const named = gases.filter((one) => words.includes(one));
      return gas === null || named.length === 0 || named.includes(gas);
    })
    .map(({ level, message }) => ({ level, message }));
}

function distinct(origins: readonly Origin[]): Origin[] {
  const byName = new Map<string, Origin>();
  for (const origin of origins) {
    const key = `${origin.cellId ?? ""} ${origin.name}`;
    if (!byName.has(key)) byName.set(key, origin);
  }
  // An entry of a cell tells more than the cell alone.
  const all = [...byName.values()];
  return all.filter(
    ({ cellId, name }) => !all.some((other) => other.cellId === cellId && other.name.startsWith(`${name}.`)),
  );
}

/** That a result comes from its own cell needs no words, but for the entries there. */
function elsewhere(origins: readonly Origin[], { cell }: ExplainedCell): Origin[] {
  return origins.filter(({ cellId, name }) => cellId !== cell.id || name !== cell.name);
}

/** An entry of a `values` cell: what is written, and the values of the names in it. */
function explainWritten(notebook: ExplainedNotebook, cell: ExplainedCell, name: string): Explanation | null {
  const number = resultNumber(cell, name);
  const written = entryOf(cell, name);
  if (!number || !written) return null;
  const inputs = [...new Set(namesIn(written.node))].flatMap((path): ExplainedInput[] => {
    const found = placeNamed(notebook, path);
    const parts = found && resultNumber(found.cell, found.name);
    if (!found || !parts || typeof parts.value === "string") return [];
    const { value, log10, unit } = parts;
    return [{ symbol: "", words: path, name: found.name, value, log10, unit, text: null, understood: null }];
  });
  return {
    ...number,
    cellId: cell.cell.id,
    cell: cell.cell.name,
    name,
    words: name.replace(/_/g, " "),
    symbol: "",
    formula: null,
    inputs,
    origins: distinct([originOf(cell, written), ...originsWithin(notebook, written)]),
    restsOn: [],
    holdsFor: null,
    notes: [],
    sources: [],
  };
}
