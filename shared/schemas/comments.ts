/** Threads of comments on the cells of a notebook. */
import { z } from "zod";
import { person } from "./people";
import { isStorable, unstorableText } from "./text";

export const commentLimits = {
  length: 10_000,
  /** Of the cell's text, kept with the thread as it was when the thread began. */
  quoted: 4_000,
  perThread: 500,
  threads: 2_000,
} as const;

const commentText = z
  .string("A comment is needed.")
  .trim()
  .min(1, "A comment is needed.")
  .max(
    commentLimits.length,
    `A comment may have at most ${commentLimits.length} characters. Say it in several, or put it in a prose cell.`,
  )
  .refine(isStorable, unstorableText);

const versionNumber = z.coerce.number("Give the number of a version.").int().min(1).max(2_147_483_647);

/** Threads of a kept version; of the draft where none is named. */
export const threadListQuery = z.object({ version: versionNumber.optional() });
export type ThreadListQuery = z.infer<typeof threadListQuery>;

export const beginThreadBody = z.object({
  cellId: z.string("Say which cell it is about.").min(1).max(64).refine(isStorable, unstorableText),
  /** null: a cell of the draft. */
  version: z.int("Give the number of a version.").min(1).max(2_147_483_647).nullable(),
  text: commentText,
});
export type BeginThreadBody = z.infer<typeof beginThreadBody>;

export const commentBody = z.object({ text: commentText });
export type CommentBody = z.infer<typeof commentBody>;

export const setResolutionBody = z.object({
  isResolved: z.boolean("Say whether the thread is resolved: true or false."),
});
export type SetResolutionBody = z.infer<typeof setResolutionBody>;

/** The last comment that one has before one's eyes: what came later stays unread. */
export const seenBody = z.object({ commentId: z.uuid("This is not the id of a comment.") });
export type SeenBody = z.infer<typeof seenBody>;

export const comment = z.object({
  id: z.string(),
  author: person,
  /** Markdown with TeX as written; empty where it was deleted. */
  text: z.string(),
  /** Whom it speaks to: each stands in the text as @ and their name. */
  mentions: z.array(person),
  createdAt: z.iso.datetime(),
  editedAt: z.iso.datetime().nullable(),
  isDeleted: z.boolean(),
  /** Written by someone else and not yet seen by the reader. */
  isUnread: z.boolean(),
  abilities: z.object({ edit: z.boolean() }),
});
export type Comment = z.infer<typeof comment>;

export const thread = z.object({
  id: z.string(),
  /** null: on the draft. */
  version: z.number().int().nullable(),
  /** The cell as it was when the thread began, its text cut to `commentLimits.quoted`. */
  cell: z.object({ id: z.string(), kind: z.string(), name: z.string(), text: z.string() }),
  comments: z.array(comment),
  resolved: z.object({ by: person, at: z.iso.datetime() }).nullable(),
  /** `resolve` also covers reopening. */
  abilities: z.object({ reply: z.boolean(), resolve: z.boolean() }),
});
export type Thread = z.infer<typeof thread>;

export const threadListResponse = z.array(thread);
export type ThreadListResponse = z.infer<typeof threadListResponse>;

/** Those who may see a notebook, and so may be spoken to in it. */
export const readersResponse = z.array(person);
export type ReadersResponse = z.infer<typeof readersResponse>;
