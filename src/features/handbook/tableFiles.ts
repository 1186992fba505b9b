import { engineVersion } from "../../../shared/notebook/engine";
import { references } from "../../../shared/physics";
import { rowSources, type HandbookTable, type TableRow } from "./handbookTable";

const quote = (text: string): string => (/[",\r\n]/.test(text) ? `"${text.replace(/"/g, '""')}"` : text);
const citation = (source: string): string => references[source] ?? source;

const hasOwnUnits = (rows: readonly TableRow[], key: string): boolean =>
  rows.some(({ values }) => values[key]?.unit !== undefined);
const hasUncertainty = (rows: readonly TableRow[], key: string): boolean =>
  rows.some(({ values }) => values[key]?.uncertainty !== undefined);

/** Comma-separated values in SI with every digit, lines ended as RFC 4180 has it. */
export function tableCsv({ columns, rows, rowHead }: HandbookTable): string {
  const hasStanding = rows.some(({ standing }) => standing);
  const hasActing = rows.some(({ acts }) => acts !== undefined);
  const head = [
    rowHead.toLowerCase(),
    ...columns.flatMap(({ key, unit }) => [
      unit === "" || unit === "1" ? key : `${key} (${unit})`,
      ...(hasUncertainty(rows, key) ? [`${key}_uncertainty`] : []),
      ...(hasOwnUnits(rows, key) ? [`${key}_unit`] : []),
    ]),
    ...(hasStanding ? ["standing"] : []),
    ...(hasActing ? ["acts"] : []),
    "sources",
  ];
  const lines = rows.map((row) => [
    row.name,
    ...columns.flatMap(({ key }) => {
      const { value = null, uncertainty, unit } = row.values[key] ?? {};
      return [
        String(value ?? ""),
        ...(hasUncertainty(rows, key) ? [String(uncertainty ?? "")] : []),
        ...(hasOwnUnits(rows, key) ? [unit ?? ""] : []),
      ];
    }),
    ...(hasStanding ? [row.standing?.word ?? ""] : []),
    ...(hasActing ? [row.acts ? "yes" : "no"] : []),
    [...new Set(rowSources({ columns }, row).map(({ source }) => citation(source)))].join(" "),
  ]);
  return [head, ...lines].map((cells) => `${cells.map(quote).join(",")}\r\n`).join("");
}

/** The same with the source of each number, and the engine whose handbook it is. */
export function tableJson({ id, columns, rows }: HandbookTable): string {
  const sources = rows.flatMap((row) => rowSources({ columns }, row).map(({ source }) => source));
  const table = {
    engine: engineVersion,
    table: id,
    rows: rows.map((row) => ({
      name: row.name,
      values: Object.fromEntries(
        columns.map(({ key, unit }) => {
          const { value = null, uncertainty, unit: own, sources: from } = row.values[key] ?? {};
          return [
            key,
            {
              value,
              ...(uncertainty !== undefined && { uncertainty }),
              ...((own ?? unit) && { unit: own ?? unit }),
              ...(from && { sources: from }),
            },
          ];
        }),
      ),
      ...(row.standing && { standing: row.standing.word }),
      ...(row.acts !== undefined && { acts: row.acts }),
      ...(row.sources && { sources: row.sources }),
    })),
    references: Object.fromEntries([...new Set(sources)].map((source) => [source, citation(source)])),
  };
  return `${JSON.stringify(table, null, 2)}\n`;
}
