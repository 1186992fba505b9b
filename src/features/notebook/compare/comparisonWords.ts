import type { CellResult } from "../../../../shared/notebook/result";
import { formatCount, formatFixed, formatKilometres, formatNumber, unitSpace } from "../../../lib/format";
import { plainText } from "../../../lib/richText";
import type { DocumentComparison } from "./compareDocuments";
import { compareResults, type ComparedCell, type Magnitude } from "./compareResults";

/** "Between the two, the exobase rises by 37 km and H leaves 2.0 times as fast." Empty where neither is known. */
export function resultSentence(older: readonly ComparedCell[], newer: readonly ComparedCell[]): string {
  const escape = newer.find(({ result }) => result.kind === "escape")?.result;
  if (!escape) return "";
  const before = older.find(({ result }) => result.kind === "escape" && result.name === escape.name)?.result;
  const parts = [exobaseWords(before, escape), rateWords(older, newer, escape)].filter((part) => part !== "");
  return parts.length === 0 ? "" : `Between the two, ${parts.join(" and ")}.`;
}

function exobaseWords(before: CellResult | undefined, after: CellResult): string {
  const altitude = (cell: CellResult | undefined) => cell?.values["exobase.altitude"]?.value;
  const [from, to] = [altitude(before), altitude(after)];
  if (typeof from !== "number" || typeof to !== "number") {
    if (typeof from === "number") return "the exobase is gone";
    return typeof to === "number" ? "an exobase is found" : "";
  }
  const rise = to - from;
  if (Math.abs(rise) < 50) return "the exobase stays where it is";
  const size =
    Math.abs(rise) < 9_950 ? formatFixed(Math.abs(rise) / 1000, 1) : formatKilometres(Math.abs(rise));
  return `the exobase ${rise > 0 ? "rises" : "falls"} by ${size}${unitSpace}km`;
}

/** Of the gas that leaves fastest. */
function rateWords(
  older: readonly ComparedCell[],
  newer: readonly ComparedCell[],
  escape: CellResult,
): string {
  const rates = Object.entries(escape.values).flatMap(([key, { value }]) => {
    const gas = /^([^.]+)\.rate$/.exec(key)?.[1];
    return gas !== undefined && typeof value === "number" ? [{ gas, value }] : [];
  });
  const fastest = rates.sort((a, b) => b.value - a.value)[0];
  if (!fastest) return "";
  const name = `${escape.name}.${fastest.gas}.rate`;
  const { differing } = compareResults(older, newer);
  const row = differing.find((candidate) => candidate.name === name);
  if (!row) return `${fastest.gas} leaves as fast as before`;
  if (row.log10Ratio === null) return "";
  const ratio = 10 ** row.log10Ratio;
  if (Math.abs(ratio - 1) < 0.005) return `${fastest.gas} leaves nearly as fast`;
  return `${fastest.gas} leaves ${plainText(formatNumber(ratio, 2))} times as fast`;
}

/** "Four entries differ; one cell is new." */
export function entrySentence({ fields, cells }: DocumentComparison): string {
  const entries = cells.flatMap(({ differences }) => differences);
  const changed = entries.filter(({ older, newer }) => older !== null && newer !== null).length;
  const added = entries.filter(({ older }) => older === null).length;
  const gone = entries.filter(({ newer }) => newer === null).length;
  const count = (change: "new" | "gone") => cells.filter((cell) => cell.change === change).length;
  const say = (entryCount: number, cellCount: number, singular: string, plural: string) => {
    const things = [
      ...(entryCount > 0 ? [formatCount(entryCount, "entry", "entries")] : []),
      ...(cellCount > 0 ? [formatCount(cellCount, "cell")] : []),
    ];
    if (things.length === 0) return [];
    return [`${things.join(" and ")} ${entryCount + cellCount === 1 ? singular : plural}`];
  };
  const parts = [
    ...say(changed + fields.length, 0, "differs", "differ"),
    ...say(added, count("new"), "is new", "are new"),
    ...say(gone, count("gone"), "is gone", "are gone"),
  ];
  if (parts.length === 0) return "The two say the same.";
  return `${capital(parts.join("; "))}.`;
}

/** As a sentence begins. */
export const capital = (text: string): string => text[0]!.toUpperCase() + text.slice(1);

export const isMagnitude = (value: Magnitude | string | null): value is Magnitude =>
  value !== null && typeof value !== "string";
