import type { CellSchema } from "./cellSchema";

/** Named quantities, known in all cells below, and in the entries below within the cell. */
export const valuesSchema: CellSchema = {
  kind: "values",
  group: "write",
  description: "named quantities, with their uncertainty",
  naming: "name",
  takesAnyKey: true,
  entries: [],
};
