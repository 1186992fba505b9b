import { findGas } from "../physics";
import type { NotebookDocument } from "./document";
import { formatPlainNumber, thinSpace } from "./language/formatQuantity";
import type { CellEvaluation, Evaluation, NoteLevel, ResultSpread } from "./result";
import type { HeadlineItem, NotebookSummary, Strip } from "./summary";

/** What a list shows of a notebook: its headline, how many notes of each level, its bodies, the strip of a column. */
export function summariseNotebook(document: NotebookDocument, evaluation: Evaluation): NotebookSummary {
  const results = evaluation.cells.map(({ result }) => result);
  const count = (level: NoteLevel) =>
    results.reduce((sum, { notes }) => sum + notes.filter((note) => note.level === level).length, 0);
  return {
    engine: evaluation.engine,
    headline: headlineOf(document, evaluation),
    faults: count("fault"),
    cautions: count("caution"),
    remarks: count("remark"),
    bodies: results
      .filter(({ kind, values }) => kind === "body" && "radius" in values)
      .map(({ name }) => name),
    strip: firstStrip(evaluation),
  };
}

/** The first column, as what escapes leaves it where an escape cell says so. */
function firstStrip({ cells }: Evaluation): Strip | null {
  const atRest = cells.find(({ strip }) => strip)?.strip;
  if (!atRest) return null;
  return cells.find(({ column }) => column?.strip.column === atRest.column)?.column!.strip ?? atRest;
}

/** What the notebook names, or of its first escape cell the exobase and the gas that leaves fastest. */
function headlineOf({ headline }: NotebookDocument, evaluation: Evaluation): HeadlineItem[] {
  if (headline.length > 0) return headline.map((name) => namedItem(evaluation, name));
  const escape = evaluation.cells.find(({ result }) => result.kind === "escape");
  if (!escape) return [];
  const { result } = escape;
  if (!("exobase.altitude" in result.values)) return noExobase(escape);
  const fastest = fastestGas(escape);
  const names = ["exobase.altitude", ...(fastest ? [`${fastest}.rate`, `${fastest}.escape_parameter`] : [])];
  return names.map((name) => itemOf(escape, name));
}

/** The gas with the largest rate of particles. */
function fastestGas({ result, gases }: CellEvaluation): string | null {
  let fastest: string | null = null;
  let largest = -Infinity;
  for (const gas of gases) {
    const rate = result.values[`${gas}.log10_rate`]?.value;
    if (typeof rate !== "number" || rate <= largest) continue;
    fastest = gas;
    largest = rate;
  }
  return fastest;
}

function noExobase({ result, convention }: CellEvaluation): HeadlineItem[] {
  const { name, notes, values } = result;
  const reason = notes.find(({ code }) => code.startsWith("no_exobase_"));
  if (!reason) return [];
  const value = values.regime?.value === "wind" ? "none: a wind instead" : "none";
  return [
    {
      name: `${name}.exobase.altitude`,
      label: "Exobase",
      value,
      log10: null,
      unit: "m",
      gas: null,
      note: convention?.criterion ?? "",
    },
  ];
}

function namedItem(evaluation: Evaluation, path: string): HeadlineItem {
  const [cellName, ...rest] = path.split(".");
  const name = rest.join(".");
  const cell =
    name === ""
      ? evaluation.cells.find(
          ({ result }) => result.kind === "values" && Object.hasOwn(result.values, cellName),
        )
      : evaluation.cells.find(({ result }) => result.name === cellName && Object.hasOwn(result.values, name));
  if (cell) return itemOf(cell, name === "" ? cellName : name);
  return { name: path, label: path, value: "no such result", log10: null, unit: "", gas: null, note: "" };
}

function itemOf(cell: CellEvaluation, name: string): HeadlineItem {
  const { result } = cell;
  const { value, unit, spread } = result.values[name];
  const twin = result.values[name.replace(/([^.]+)$/, "log10_$1")]?.value;
  const [first, last] = [name.split(".")[0], name.slice(name.lastIndexOf(".") + 1)];
  const gas = last !== first && first !== "exobase" && first !== "base" && first !== "top" ? first : null;
  return {
    name: result.kind === "values" ? name : `${result.name}.${name}`,
    label: labelOf(name, gas),
    value,
    log10: typeof twin === "number" ? twin : null,
    unit: unit ?? "",
    gas,
    note: conventionOf(cell, name),
    ...(spread ? spreadOf(spread) : {}),
  };
}

/** Left out where an end is too small to have a value. */
function spreadOf({ lower, upper, cell, isPartial }: ResultSpread): Pick<HeadlineItem, "spread"> {
  if (lower === null || upper === null) return {};
  return { spread: { lower, upper, cell, ...(isPartial ? { isPartial } : {}) } };
}

/** Names of results in words; what is not listed is read as it is written. */
const words: Readonly<Record<string, string>> = {
  "exobase.altitude": "Exobase",
  bulk_escape_parameter: "Escape parameter of the mean mass",
  surface_escape_speed: "Escape speed at the surface",
};

function labelOf(name: string, gas: string | null): string {
  if (gas === null) return words[name] ?? sentence(name.replaceAll(".", " "));
  const quantity = name.slice(gas.length + 1);
  if (quantity === "rate") return `${sentence(findGas(gas)?.name ?? gas)} leaves`;
  return `${sentence(quantity.replaceAll(".", " "))} of ${gas}`;
}

function sentence(text: string): string {
  const spaced = text.replaceAll("_", " ");
  return spaced.charAt(0).toUpperCase() + spaced.slice(1);
}

/** The convention that a number rests on, in a few words. */
function conventionOf({ result, convention }: CellEvaluation, name: string): string {
  const { kind, name: cell, values } = result;
  if (kind !== "escape" || !convention) return cell;
  const { criterion, coupling } = convention;
  const numberOf = (key: string) => {
    const value = values[key]?.value;
    return typeof value === "number" ? value : null;
  };
  if (name.startsWith("exobase.")) {
    const kilometres = (altitude: number) => formatPlainNumber(Math.round(altitude / 1000), 6);
    const [lower, upper] = [numberOf("exobase.lower"), numberOf("exobase.upper")];
    if (lower === null) return criterion;
    return upper === null
      ? `${criterion}; Kn 0.1 at ${kilometres(lower)}${thinSpace}km`
      : `${criterion}; Kn 0.1–10 at ${kilometres(lower)}–${kilometres(upper)}${thinSpace}km`;
  }
  const bulk = numberOf("bulk_escape_parameter");
  if (name.endsWith("escape_parameter") && bulk !== null) {
    const regime = String(values.regime?.value ?? "").replaceAll("_", " ");
    return `regime ${regime}, bulk λ ${formatPlainNumber(bulk, 3)}`;
  }
  if (name === "energy_limited_mass_rate") return "energy limit";
  if (name === "wind_mass_rate") return "isothermal wind";
  if (name.endsWith("diffusion_limit")) return "Hunten's limit";
  return coupling === "open" ? "Jeans, open column" : "Jeans, coupled column";
}
