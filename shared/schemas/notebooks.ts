import { z } from "zod";
import { documentLimits, notebookDocumentSchema } from "../notebook/document";
import { notebookSummarySchema } from "../notebook/summary";
import { person } from "./people";
import { problem } from "./problem";
import { note } from "./results";
import { notebookAbilities, notebookRole } from "./roles";
import { isStorable, line, unstorableText } from "./text";

/** A document that the server will keep: sound in shape, each cell once, not too long, of characters that survive. */
export const savedDocument = notebookDocumentSchema.superRefine((document, context) => {
  const complain = (path: (string | number)[], message: string) =>
    context.addIssue({ code: "custom", path, message });
  const seen = new Set<string>();
  let length = document.title.length;

  if (!isStorable(document.title)) complain(["title"], unstorableText);
  document.headline.forEach((name, index) => {
    if (!isStorable(name)) complain(["headline", index], unstorableText);
  });
  document.authors.forEach((author, index) => {
    if (!isStorable(author)) complain(["authors", index], unstorableText);
  });
  document.cells.forEach((cell, index) => {
    length += cell.text.length;
    if (seen.has(cell.id)) complain(["cells", index, "id"], "Two cells have the same id; give each its own.");
    seen.add(cell.id);
    if (!isStorable(cell.id)) complain(["cells", index, "id"], unstorableText);
    if (!isStorable(cell.name)) complain(["cells", index, "name"], unstorableText);
    if (!isStorable(cell.text)) complain(["cells", index, "text"], unstorableText);
  });
  if (length > documentLimits.documentLength) {
    complain(
      [],
      `A notebook may hold at most ${documentLimits.documentLength} characters; this one has ${length}.`,
    );
  }
});

const revision = z.number("A revision is needed.").int().min(1);
const title = line("A title", documentLimits.titleLength);
const groupId = z.uuid("This is not the id of a group.").nullable();

export const createNotebookBody = z.object({ title, groupId, document: savedDocument.optional() });
export type CreateNotebookBody = z.infer<typeof createNotebookBody>;

/** Where the copy goes: a group, or one's own shelf. */
export const duplicateNotebookBody = z.object({ groupId });
export type DuplicateNotebookBody = z.infer<typeof duplicateNotebookBody>;

export const importNotebookBody = z.object({
  text: z.string("The text of a notebook file is needed.").max(documentLimits.documentLength + 100_000),
  groupId,
});
export type ImportNotebookBody = z.infer<typeof importNotebookBody>;

export const renameNotebookBody = z.object({ title });
export type RenameNotebookBody = z.infer<typeof renameNotebookBody>;

export const saveDraftBody = z.object({ revision, document: savedDocument });
export type SaveDraftBody = z.infer<typeof saveDraftBody>;

export const saveDraftResponse = z.object({ revision: z.number().int(), savedAt: z.iso.datetime() });
export type SaveDraftResponse = z.infer<typeof saveDraftResponse>;

/** The draft as it is, sent along when a change was made on an older one. */
export const draftState = z.object({
  revision: z.number().int(),
  document: notebookDocumentSchema,
  savedAt: z.iso.datetime(),
  savedBy: person,
});
export type DraftState = z.infer<typeof draftState>;

/** Answer 409, code `stale_revision`: the draft has moved on. */
export const staleDraftProblem = problem.extend({ code: z.literal("stale_revision"), current: draftState });
export type StaleDraftProblem = z.infer<typeof staleDraftProblem>;

export const notebookListQuery = z.object({
  /** Looks in titles and owners' names. */
  q: z.string().max(200).refine(isStorable, unstorableText).default(""),
  order: z.enum(["changed", "title"]).default("changed"),
  /** `archived`: put away, to be read only; `bin`: one's own deleted notebooks, kept 30 days. */
  place: z.enum(["shelf", "archived", "bin"]).default("shelf"),
});
export type NotebookListQuery = z.infer<typeof notebookListQuery>;

const notebookGroup = z.object({ id: z.string(), name: z.string(), code: z.string() }).nullable();

export const notebookListItem = z.object({
  id: z.string(),
  title: z.string(),
  owner: person,
  coAuthors: z.array(person),
  group: notebookGroup,
  role: notebookRole,
  revision: z.number().int(),
  savedAt: z.iso.datetime(),
  lastVersion: z.number().int().nullable(),
  /** Put away by its owner, to be read only. */
  isArchived: z.boolean(),
  /** As last computed after a save; null until then. */
  summary: notebookSummarySchema.nullable(),
  deletedAt: z.iso.datetime().nullable(),
  abilities: notebookAbilities,
});
export type NotebookListItem = z.infer<typeof notebookListItem>;

export const notebookListResponse = z.object({ notebooks: z.array(notebookListItem) });
export type NotebookListResponse = z.infer<typeof notebookListResponse>;

export const notebookResponse = z.object({
  id: z.string(),
  title: z.string(),
  owner: person,
  group: notebookGroup,
  role: notebookRole,
  /** How many people besides the owner may see it. */
  sharedWith: z.number().int(),
  revision: z.number().int(),
  savedAt: z.iso.datetime(),
  savedBy: person,
  document: notebookDocumentSchema,
  lastVersion: z.number().int().nullable(),
  /** Put away by its owner, to be read only. */
  isArchived: z.boolean(),
  abilities: notebookAbilities,
});
export type NotebookResponse = z.infer<typeof notebookResponse>;

/** An imported notebook, with what there is to say of its file. */
export const importNotebookResponse = notebookResponse.extend({ notes: z.array(note) });
export type ImportNotebookResponse = z.infer<typeof importNotebookResponse>;
