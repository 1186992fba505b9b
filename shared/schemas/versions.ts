import { z } from "zod";
import { notebookDocumentSchema } from "../notebook/document";
import { person } from "./people";
import { keptResult } from "./results";
import { isStorable, unstorableText } from "./text";

export const keepVersionBody = z.object({
  message: z
    .string("A message is needed.")
    .trim()
    .min(1, "A message is needed: say what this version is.")
    .max(1000, "A message may have at most 1000 characters.")
    .refine(isStorable, unstorableText),
  /** Of the draft to be kept, so that nobody keeps what they have not seen. */
  revision: z.number("A revision is needed.").int().min(1),
});
export type KeepVersionBody = z.infer<typeof keepVersionBody>;

export const restoreVersionBody = z.object({ revision: z.number("A revision is needed.").int().min(1) });
export type RestoreVersionBody = z.infer<typeof restoreVersionBody>;

export const versionSummary = z.object({
  number: z.number().int(),
  message: z.string(),
  keptAt: z.iso.datetime(),
  keptBy: person,
  /** Engine version that computed its results. */
  engine: z.string(),
  /** SHA-256, in hexadecimal. */
  contentHash: z.string(),
});
export type VersionSummary = z.infer<typeof versionSummary>;

/** Newest first. */
export const versionListResponse = z.array(versionSummary);
export type VersionListResponse = z.infer<typeof versionListResponse>;

export const versionResponse = versionSummary.extend({
  document: notebookDocumentSchema,
  result: keptResult,
});
export type VersionResponse = z.infer<typeof versionResponse>;
