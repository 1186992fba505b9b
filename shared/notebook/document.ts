import { z } from "zod";

/** The kinds of cell that a notebook may hold, in the order of the menu. */
export const cellKinds = [
  "prose",
  "values",
  "body",
  "gas",
  "column",
  "escape",
  "corona",
  "nonthermal",
  "sweep",
  "spread",
  "loss",
] as const;
export type CellKind = (typeof cellKinds)[number];

/** Bounds on a document, the same for the editor, the file, the API and the database. */
export const documentLimits = {
  titleLength: 300,
  nameLength: 64,
  headlineItems: 3,
  headlineLength: 200,
  authors: 100,
  authorLength: 200,
  cells: 500,
  answers: 500,
  answerLength: 1000,
  cellLength: 1_000_000,
  documentLength: 4_000_000,
} as const;

/** Text on one line: no line ends, tabs or other control characters, which a title or a name has no use for. */
function singleLine(longest: number) {
  return z
    .string()
    .max(longest)
    .refine((text) => !/\p{Cc}/u.test(text), "This must be one line, without control characters.");
}

export const cellSchema = z.object({
  /** Stable through edits and moves; never written in the file. */
  id: z.string().min(1).max(64),
  kind: z.enum(cellKinds),
  name: singleLine(documentLimits.nameLength),
  /** Entries, or Markdown for prose; kept exactly as typed. */
  text: z.string().max(documentLimits.cellLength),
});

/** Why a caution is right to stand, in a sentence; kept under the cell's name, the caution's code and its entry. */
export const cautionAnswerSchema = z.object({
  cell: singleLine(documentLimits.nameLength),
  code: singleLine(64).min(1),
  /** Empty where the caution is about the cell as a whole. */
  entry: singleLine(documentLimits.nameLength),
  /** Numbers of the caution as answered; the answer lapses when one moves by over 1 %. */
  numbers: z.array(z.number()).max(100),
  sentence: singleLine(documentLimits.answerLength).min(1),
});
export type CautionAnswer = z.infer<typeof cautionAnswerSchema>;

export const notebookDocumentSchema = z.object({
  format: z.literal(1),
  title: singleLine(documentLimits.titleLength),
  unitSystem: z.enum(["SI", "cgs"]),
  /** Up to three names of results, such as `leak.exobase.altitude`. */
  headline: z.array(singleLine(documentLimits.headlineLength).min(1)).max(documentLimits.headlineItems),
  authors: z.array(singleLine(documentLimits.authorLength).min(1)).max(documentLimits.authors),
  cells: z.array(cellSchema).max(documentLimits.cells),
  /** Left out where no caution has been answered. */
  answers: z.array(cautionAnswerSchema).max(documentLimits.answers).optional(),
});

export type Cell = z.infer<typeof cellSchema>;
export type NotebookDocument = z.infer<typeof notebookDocumentSchema>;
