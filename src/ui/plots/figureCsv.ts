/** One column of a table that leaves the page: SI, every digit. */
export interface CsvColumn {
  /** Name and unit: "H.number_density (m^-3)". */
  head: string;
  /** null where there is no value; words stand as they are. */
  values: readonly (number | string | null)[];
}

const quote = (text: string): string => (/[",\n]/.test(text) ? `"${text.replace(/"/g, '""')}"` : text);

/** Comma-separated values, lines ended as RFC 4180 has it; shortest digits that give back the same number. */
export function figureCsv(columns: readonly CsvColumn[]): string {
  const count = Math.max(0, ...columns.map(({ values }) => values.length));
  const lines = [columns.map(({ head }) => quote(head)).join(",")];
  for (let row = 0; row < count; row++) {
    lines.push(columns.map(({ values }) => quote(String(values[row] ?? ""))).join(","));
  }
  return `${lines.join("\r\n")}\r\n`;
}
