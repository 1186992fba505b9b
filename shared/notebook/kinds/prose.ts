import type { CellSchema } from "./cellSchema";

/** Text in Markdown with TeX; it has no entries and answers nothing. */
export const proseSchema: CellSchema = {
  kind: "prose",
  group: "write",
  description: "text, with formulas",
  naming: "none",
  takesAnyKey: false,
  entries: [],
};
