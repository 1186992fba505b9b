/** What a list shows of a notebook, computed on the server after a save. */
import { z } from "zod";

/** The altitude strip of one column, sampled finely enough to draw it small or large. Altitudes in m. */
export const stripSchema = z.object({
  column: z.string(),
  base: z.number(),
  /** About 2.3 times the exobase, or the column's top where there is none. */
  top: z.number(),
  exobase: z.number().nullable(),
  /** Kn = 0.1 and 10. */
  lower: z.number().nullable(),
  upper: z.number().nullable(),
  gases: z.array(z.string()),
  homopauses: z.array(z.object({ gas: z.string(), altitude: z.number() })),
  altitude: z.array(z.number()),
  temperature: z.array(z.number()),
  log10NumberDensity: z.array(z.number()),
  log10Knudsen: z.array(z.number()),
  /** moleFractions[gas][level] */
  moleFractions: z.array(z.array(z.number())),
});
export type Strip = z.infer<typeof stripSchema>;

export const headlineItemSchema = z.object({
  /** Result name, such as `leak.exobase.altitude`. */
  name: z.string(),
  /** Label in plain words: "Exobase", "Hydrogen leaves". */
  label: z.string(),
  /** SI; a string where there is no number ("none: a wind instead"). */
  value: z.union([z.number(), z.string(), z.null()]),
  log10: z.number().nullable(),
  unit: z.string(),
  gas: z.string().nullable(),
  /** The convention in a few words: "bulk, l = H". */
  note: z.string(),
  /** Middle 68 % where a spread watches the value, in its unit. */
  spread: z
    .object({ lower: z.number(), upper: z.number(), cell: z.string(), isPartial: z.literal(true).optional() })
    .optional(),
});
export type HeadlineItem = z.infer<typeof headlineItemSchema>;

export const notebookSummarySchema = z.object({
  engine: z.string(),
  headline: z.array(headlineItemSchema).max(3),
  faults: z.number().int(),
  cautions: z.number().int(),
  remarks: z.number().int(),
  bodies: z.array(z.string()),
  strip: stripSchema.nullable(),
});
export type NotebookSummary = z.infer<typeof notebookSummarySchema>;
