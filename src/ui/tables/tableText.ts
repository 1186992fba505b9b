/** Lines of tab-separated cells, as a spreadsheet takes them from the clipboard. */
export function tableText(rows: readonly (readonly (string | number | null)[])[]): string {
  return rows.map((row) => row.map((cell) => cell ?? "").join("\t")).join("\n");
}
