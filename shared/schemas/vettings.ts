/** Requests for vetting, the checks that a version must pass, and the lead's decision. */
import { z } from "zod";
import { documentLimits } from "../notebook/document";
import { person } from "./people";
import { isStorable, line, unstorableText } from "./text";
import { versionResponse } from "./versions";

export const vettingStates = ["requested", "returned", "approved", "taken_back"] as const;

/** Several lines, from 1 to `longest` characters. */
const words = (what: string, longest: number) =>
  z
    .string(`${what} is needed.`)
    .trim()
    .min(1, `${what} is needed.`)
    .max(longest, `${what} may have at most ${longest} characters.`)
    .refine(isStorable, unstorableText);

export const requestVettingBody = z.object({
  message: words("A message to the lead", 4000),
  summary: words("A summary", 4000),
  authors: z
    .array(line("An author", documentLimits.authorLength))
    .min(1, "Name at least one author.")
    .max(documentLimits.authors),
  licence: line("A licence", 200),
  /** Number of the group's reference that this is a new edition of; null for a new reference. */
  editionOf: z.number().int().min(1).nullable(),
});
export type RequestVettingBody = z.infer<typeof requestVettingBody>;

export const returnVettingBody = z.object({ remarks: words("What is asked for", 4000) });
export const approveVettingBody = z.object({
  /** Whether it can be read without an account. */
  isPublic: z.boolean("Say whether it may be read without an account: true or false."),
  doi: line("A DOI", 200).nullable().default(null),
});
export type ApproveVettingBody = z.infer<typeof approveVettingBody>;
export const acceptAnswersBody = z.object({ accepted: z.array(z.string().max(300)).max(documentLimits.answers) });

/** What computing a version again on the server gave. */
export const recomputation = z.object({
  engine: z.string(),
  /** How many numbers and words were compared. */
  compared: z.number().int(),
  /** Names of results that differ in any bit, the first few. */
  differing: z.array(z.string()),
  /** Why it could not be computed; null where it was. */
  failure: z.string().nullable(),
});
export type Recomputation = z.infer<typeof recomputation>;

export const checkCodes = [
  "same_numbers",
  "no_faults",
  "cautions_answered",
  "sources",
  "no_open_threads",
  "data_present",
  "not_own_alone",
] as const;

export const vettingCheck = z.object({
  code: z.enum(checkCodes),
  /** to_judge: what is left is the lead's to accept. */
  verdict: z.enum(["holds", "to_judge", "fails"]),
  reason: z.string(),
  cautions: z
    .array(
      z.object({
        key: z.string(),
        cell: z.string(),
        message: z.string(),
        sentence: z.string().nullable(),
        isAccepted: z.boolean(),
      }),
    )
    .optional(),
});
export type VettingCheck = z.infer<typeof vettingCheck>;

export const vettingSummary = z.object({
  id: z.string(),
  notebookId: z.string(),
  versionNumber: z.number().int(),
  title: z.string(),
  owner: person,
  group: z.object({ id: z.string(), name: z.string(), code: z.string() }),
  message: z.string(),
  requestedBy: person,
  requestedAt: z.iso.datetime(),
  state: z.enum(vettingStates),
  /** "CAR 4, edition 2" or "a new reference of CAR". */
  wouldBecome: z.string(),
  remarks: z.string().nullable(),
  decidedBy: person.nullable(),
  decidedAt: z.iso.datetime().nullable(),
});
export type VettingSummary = z.infer<typeof vettingSummary>;
export const vettingListResponse = z.array(vettingSummary);

export const vettingResponse = vettingSummary.extend({
  summary: z.string(),
  authors: z.array(z.string()),
  licence: z.string(),
  checks: z.array(vettingCheck),
  version: versionResponse,
  /** Pin of the last edition, where this would supersede one. */
  lastEdition: z.string().nullable(),
  abilities: z.object({ vet: z.boolean(), takeBack: z.boolean() }),
});
export type VettingResponse = z.infer<typeof vettingResponse>;
