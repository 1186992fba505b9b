import { z } from "zod";

/** The kinds of cell that a notebook may hold, in the order of the menu. */
export const cellKinds = ["prose", "values", "body", "gas", "column", "escape"] as const;
export type CellKind = (typeof cellKinds)[number];

/** Bounds on a document, the same for the editor, the file, the API and the database. */
export const documentLimits = {
  titleLength: 300,
  cells: 500,
  cellLength: 1_000_000,
  documentLength: 4_000_000,
} as const;

export const cellSchema = z.object({
  /** Stable through edits and moves; never written in the file. */
  id: z.string().min(1).max(64),
  kind: z.enum(cellKinds),
  name: z.string().max(64),
  /** Entries, or Markdown for prose; kept exactly as typed. */
  text: z.string().max(documentLimits.cellLength),
});

export const notebookDocumentSchema = z.object({
  format: z.literal(1),
  title: z.string().max(documentLimits.titleLength),
  unitSystem: z.enum(["SI", "cgs"]),
  /** Up to three names of results, such as `leak.exobase.altitude`. */
  headline: z.array(z.string().max(200)).max(3),
  authors: z.array(z.string().max(200)).max(100),
  cells: z.array(cellSchema).max(documentLimits.cells),
});

export type Cell = z.infer<typeof cellSchema>;
export type NotebookDocument = z.infer<typeof notebookDocumentSchema>;
