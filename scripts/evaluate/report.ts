/** A notebook's answers as text for a terminal. */
import { dimensionOfUnit } from "../../shared/notebook/evaluation/resultUnits";
import { formatPlainNumber, formatQuantity } from "../../shared/notebook/language/formatQuantity";
import type { NotebookFileReading } from "../../shared/notebook/notebookFile";
import type { CellEvaluation, CellResult, Evaluation, Note, ResultRow } from "../../shared/notebook/result";
import { alignColumns } from "./alignColumns";
import { spreadLines, sweepLines } from "./longWorkReport";

type ReadFile = Extract<NotebookFileReading, { ok: true }>;
type UnitSystem = ReadFile["document"]["unitSystem"];

const digits = 5;

export function report({ document, notes, textLines }: ReadFile, evaluation: Evaluation): string {
  const head = [document.title, ...(document.authors.length > 0 ? [document.authors.join(", ")] : [])];
  const file = notes.map((note) => noteLine(note, note.line ?? 1));
  const cells = evaluation.cells
    .filter(({ result }) => result.kind !== "prose")
    .map((cell) => cellReport(cell, textLines[cell.id], document.unitSystem));
  return [
    `${head.join("\n")}\nengine ${evaluation.engine}`,
    ...(file.length > 0 ? [file.join("\n")] : []),
    ...cells,
  ].join("\n\n");
}

/** Messages set names between asterisks; a terminal has no italics. */
export function plainMessage(message: string): string {
  return message.replace(/\*([^*\s][^*]*)\*/g, "$1");
}

function noteLine({ level, message }: Note, line: number): string {
  return `  line ${line}: ${level}: ${plainMessage(message)}`;
}

/** @param textLine line of the file on which the cell's text begins */
function cellReport(
  { result, defaults, gases }: CellEvaluation,
  textLine: number,
  unitSystem: UnitSystem,
): string {
  const byDefault = defaults.map(({ text, note }) => (note ? `${text} (${note})` : text));
  const notes = result.notes.map((note) =>
    noteLine(note, note.line === undefined ? textLine - 1 : textLine + note.line - 1),
  );
  const parts = [
    [`${result.kind} ${result.name} (${result.status})`],
    byDefault.length > 0 ? [`  By default: ${byDefault.join("; ")}`] : [],
    ...answerLines(result, gases, unitSystem),
    notes,
  ];
  return parts
    .filter((lines) => lines.length > 0)
    .map((lines) => lines.join("\n"))
    .join("\n");
}

/** Values and tables, each kind in its own way. */
function answerLines(result: CellResult, gases: readonly string[], unitSystem: UnitSystem): string[][] {
  if (result.kind === "sweep") return [sweepLines(result).map(indent)];
  if (result.kind === "spread") return [spreadLines(result, unitSystem).map(indent)];
  const { common, rows } = valuesByGas(result, gases);
  return [
    alignColumns(common.map((name) => [name, valueText(result, name, unitSystem)])).map(indent),
    rows.length > 0 ? gasTable(result, rows, gases, unitSystem) : [],
    ...Object.entries(result.tables).flatMap(([name, table]) => tableLines(name, table, gases)),
  ];
}

function indent(line: string): string {
  return line === "" ? line : `  ${line}`;
}

/** Values of an escape cell that exist for each gas go into a table of gases; the others are listed. */
function valuesByGas(
  { kind, values }: CellResult,
  gases: readonly string[],
): { common: string[]; rows: string[] } {
  const names = Object.keys(values);
  if (kind !== "escape") return { common: names, rows: [] };
  const gasOf = (name: string) => gases.find((gas) => name.startsWith(`${gas}.`));
  const quantities = names.flatMap((name) => {
    const gas = gasOf(name);
    return gas === undefined ? [] : [name.slice(gas.length + 1)];
  });
  const shown = [...new Set(quantities)].filter((quantity) => !quantity.startsWith("log10_"));
  return { common: names.filter((name) => gasOf(name) === undefined), rows: shown };
}

function gasTable(
  result: CellResult,
  quantities: string[],
  gases: readonly string[],
  unitSystem: UnitSystem,
): string[] {
  const heads = ["", ...quantities.map((quantity) => quantity.replaceAll("_", " "))];
  const rows = gases.map((gas) => [
    gas,
    ...quantities.map((quantity) => centreText(result, `${gas}.${quantity}`, unitSystem)),
  ]);
  return ["", ...alignColumns([heads, ...rows]).map(indent), ""];
}

/** A value, and where a spread watches it the range that holds 68 % of the draws. */
function valueText(result: CellResult, name: string, unitSystem: UnitSystem): string {
  const { spread, unit = "1" } = result.values[name];
  const centre = centreText(result, name, unitSystem);
  if (!spread || spread.lower === null || spread.upper === null) return centre;
  const [lower, upper] = [spread.lower, spread.upper].map((end) =>
    formatQuantity(end, dimensionOfUnit(unit), { unitSystem, digits }),
  );
  return `${centre} (68 %: ${lower} to ${upper})`;
}

function centreText(result: CellResult, name: string, unitSystem: UnitSystem): string {
  const found = result.values[name];
  if (!found) return "–";
  const { value, unit = "1" } = found;
  if (typeof value === "string") return value;
  if (value !== null) return formatQuantity(value, dimensionOfUnit(unit), { unitSystem, digits });
  const twin = result.values[name.replace(/([^.]+)$/, "log10_$1")]?.value;
  return typeof twin === "number" ? `10^${twin.toFixed(1)}${unit === "1" ? "" : ` ${unit}`}` : "below 1e-300";
}

/** A table in SI: what belongs to no gas, then each quantity of the gases side by side. */
function tableLines(name: string, table: readonly ResultRow[], gases: readonly string[]): string[][] {
  if (table.length === 0) return [];
  const columns = Object.keys(table[0]);
  const ofGas = columns.filter((column) => gases.some((gas) => column.startsWith(`${gas}.`)));
  const common = columns.filter((column) => !ofGas.includes(column));
  const quantities = [...new Set(ofGas.map((column) => column.slice(column.lastIndexOf(".") + 1)))];
  const part = (title: string, heads: string[], keys: string[]) => {
    const cells = table.map((row) => keys.map((key) => cellText(row[key])));
    return ["", `  ${title}`, ...alignColumns([heads, ...cells]).map(indent)];
  };
  return [
    part(`${name}, SI`, common, common),
    ...quantities.map((quantity) =>
      part(
        `${name}: ${quantity} of each gas, SI`,
        ["altitude", ...gases],
        ["altitude", ...gases.map((gas) => `${gas}.${quantity}`)],
      ),
    ),
    [""],
  ];
}

function cellText(value: ResultRow[string]): string {
  if (value === null) return "below 1e-300";
  return typeof value === "string" ? value : formatPlainNumber(value, digits);
}
