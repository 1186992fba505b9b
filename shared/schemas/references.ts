/** Published references: the library, one edition's page, what other notebooks take from it. */
import { z } from "zod";
import { notebookDocumentSchema } from "../notebook/document";
import { keptResult } from "./results";
import { isStorable, line, unstorableText } from "./text";
import { vettingCheck } from "./vettings";

export const referenceStates = ["current", "superseded", "withdrawn"] as const;
export type ReferenceState = (typeof referenceStates)[number];

/** How far results have moved since they were published. */
export const drift = z.object({
  /** Largest relative change of a number; null where none moved. */
  largest: z.number().nullable(),
  /** Result with the largest change. */
  name: z.string().nullable(),
  /** Results that are there no more, or are new. */
  changed: z.number().int(),
  failure: z.string().nullable(),
});
export type Drift = z.infer<typeof drift>;

export const libraryQuery = z.object({
  /** Looks in titles, summaries, authors and pins. */
  q: z.string().max(200).refine(isStorable, unstorableText).default(""),
  state: z.enum([...referenceStates, "any"]).default("current"),
  group: z.uuid("This is not the id of a group.").optional(),
});
export type LibraryQuery = z.infer<typeof libraryQuery>;

export const referenceSummary = z.object({
  /** As it is written in a cell: "CAR4.2". */
  pin: z.string(),
  group: z.object({ id: z.string(), name: z.string(), code: z.string() }),
  number: z.number().int(),
  edition: z.number().int(),
  title: z.string(),
  summary: z.string(),
  authors: z.array(z.string()),
  state: z.enum(referenceStates),
  publishedAt: z.iso.datetime(),
  isPublic: z.boolean(),
});
export type ReferenceSummary = z.infer<typeof referenceSummary>;
export const libraryResponse = z.array(referenceSummary);

const pinLine = z.object({ pin: z.string(), title: z.string().nullable() });

export const citationForms = ["text", "bibtex", "ris", "csl"] as const;
export type CitationForm = (typeof citationForms)[number];

export const referenceResponse = referenceSummary.extend({
  licence: z.string(),
  doi: z.string().nullable(),
  document: notebookDocumentSchema,
  result: keptResult,
  engine: z.string(),
  contentHash: z.string(),
  checks: z.array(vettingCheck),
  vettedBy: z.string(),
  isVettedByOwner: z.boolean(),
  withdrawn: z.object({ at: z.iso.datetime(), reason: z.string() }).nullable(),
  recomputed: z.object({ at: z.iso.datetime(), engine: z.string(), drift }).nullable(),
  editions: z.array(
    z.object({ pin: z.string(), edition: z.number().int(), publishedAt: z.iso.datetime(), state: z.enum(referenceStates) }),
  ),
  restsOn: z.array(pinLine),
  builtUpon: z.array(pinLine),
  citations: z.record(z.enum(citationForms), z.string()),
  /** The notebook that it was published from, where the reader may open it. */
  notebookId: z.string().nullable(),
  abilities: z.object({ withdraw: z.boolean(), describe: z.boolean() }),
});
export type ReferenceResponse = z.infer<typeof referenceResponse>;

export const withdrawReferenceBody = z.object({ reason: line("A reason", 1000) });
export const describeReferenceBody = z.object({
  isPublic: z.boolean().optional(),
  doi: line("A DOI", 200).nullable().optional(),
});
export type DescribeReferenceBody = z.infer<typeof describeReferenceBody>;

export const suppliedQuery = z.object({
  /** Pins with commas between. */
  pins: z.string().max(10_000),
});

const finite = z.number();

/** What a notebook that pins an edition takes from it. */
export const suppliedReference = z.object({
  pin: z.string(),
  values: z.record(
    z.string(),
    z.object({ value: z.union([finite, z.string(), z.null()]), unit: z.string().optional() }),
  ),
  bodies: z.record(
    z.string(),
    z.object({
      kind: z.literal("body"),
      gravitationalParameter: finite,
      radius: finite,
      centrifugal: z.object({ angularSpeed: finite, latitude: finite }).nullable(),
      hillRadius: finite.nullable(),
      energyLimitedMassRate: finite.nullable(),
    }),
  ),
  newest: z.number().int(),
  withdrawn: z.string().nullable(),
});
export const suppliedResponse = z.array(suppliedReference);
