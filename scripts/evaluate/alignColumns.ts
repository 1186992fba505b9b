/** Rows of texts as lines: the first column to the left, the others to the right, two spaces between. */
export function alignColumns(rows: readonly (readonly string[])[]): string[] {
  const widths: number[] = [];
  for (const row of rows)
    row.forEach((text, index) => (widths[index] = Math.max(widths[index] ?? 0, [...text].length)));
  return rows.map((row) =>
    row
      .map((text, index) => {
        const space = " ".repeat(widths[index] - [...text].length);
        return index === 0 ? text + space : space + text;
      })
      .join("  ")
      .trimEnd(),
  );
}
