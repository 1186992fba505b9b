/** What a notebook answers, as kept with a version: values, tables and notes; no profiles. */
import { z } from "zod";
import { cellKinds } from "../notebook/document";

const textRange = z.object({ from: z.number().int(), to: z.number().int() });

/** A remark, caution or fault. */
export const note = z.object({
  level: z.enum(["remark", "caution", "fault"]),
  code: z.string(),
  message: z.string(),
  entry: z.string().optional(),
  line: z.number().int().optional(),
  range: textRange.optional(),
  remedy: z.object({ label: z.string(), range: textRange, replacement: z.string() }).optional(),
});

const scalar = z.union([z.number(), z.string(), z.null()]);

const magnitude = z.number().nullable();

/** Quantiles of a result that a spread cell watches. */
const spread = z.object({
  median: magnitude,
  lower: magnitude,
  upper: magnitude,
  q2_5: magnitude,
  q97_5: magnitude,
  cell: z.string(),
  isPartial: z.literal(true).optional(),
});

export const cellResult = z.object({
  kind: z.enum(cellKinds),
  name: z.string(),
  status: z.enum(["fine", "caution", "fault"]),
  values: z.record(
    z.string(),
    z.object({ value: scalar, unit: z.string().optional(), spread: spread.optional() }),
  ),
  tables: z.record(z.string(), z.array(z.record(z.string(), scalar))),
  notes: z.array(note),
});

export const keptResult = z.object({ engine: z.string(), title: z.string(), cells: z.array(cellResult) });
export type KeptResult = z.infer<typeof keptResult>;
