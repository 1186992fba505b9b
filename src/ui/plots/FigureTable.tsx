import { memo, useDeferredValue } from "react";
import { displayScale, formatNumber, kilometreScale, type UnitSystem } from "../../lib/format";
import { plainText } from "../../lib/richText";
import type { CsvColumn } from "./figureCsv";

interface FigureTableProps {
  label: string;
  columns: readonly CsvColumn[];
  unitSystem: UnitSystem;
}

/** Rows read aloud; a figure has hundreds, of which a dozen tell the course of every curve. */
const rowsTold = 12;

const unitOf = (head: string): string => /\(([^)]*)\)/.exec(head)?.[1] ?? "1";

function cellText(value: CsvColumn["values"][number], factor: number): string {
  if (value === null) return "–";
  return typeof value === "string" ? value : plainText(formatNumber(value * factor));
}

/** The curves as a short table, for those who do not see the figure; it comes after what is seen. */
export function FigureTable(props: FigureTableProps) {
  return <Table {...useDeferredValue(props)} />;
}

const Table = memo(function Table({ label, columns, unitSystem }: FigureTableProps) {
  const count = columns[0]?.values.length ?? 0;
  const told = Math.min(rowsTold, count);
  const rows = Array.from({ length: told }, (_, i) => Math.round((i * (count - 1)) / Math.max(1, told - 1)));
  const scales = columns.map(({ head }) =>
    head.startsWith("altitude") ? kilometreScale : displayScale(unitOf(head), unitSystem, 1),
  );
  // A table keeps the width of its columns whatever it is told; what hides it is a box around it.
  return (
    <div className="visually-hidden">
      <table>
        <caption>{label}</caption>
        <thead>
          <tr>
            {columns.map(({ head }, i) => (
              <th key={head} scope="col">
                {head.replace(/\(.*\)/, `(${scales[i]!.unit})`)}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row}>
              {columns.map(({ head, values }, i) => (
                <td key={head}>{cellText(values[row] ?? null, scales[i]!.factor)}</td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
});
