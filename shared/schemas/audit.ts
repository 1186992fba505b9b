/** The audit trail of a group: who did what to what. */
import { z } from "zod";
import { person } from "./people";

/** Names of acts, by what they concern: "people" or "notebooks". */
export const actKinds = {
  people: [
    "group_founded",
    "group_renamed",
    "invitation_sent",
    "invitation_sent_again",
    "invitation_changed",
    "invitation_revoked",
    "invitation_accepted",
    "role_set",
    "member_removed",
    "member_left",
    "lead_handed_over",
  ],
  notebooks: [
    "notebook_shared",
    "share_changed",
    "share_taken_back",
    "share_given_up",
    "group_share_set",
    "group_share_taken_back",
    "notebook_invitation_sent",
    "notebook_invitation_sent_again",
    "notebook_invitation_changed",
    "notebook_invitation_revoked",
    "notebook_invitation_accepted",
    "notebook_handed_over",
    "notebook_duplicated",
    "notebook_archived",
    "notebook_unarchived",
    "notebook_moved_in",
    "notebook_moved_out",
    "notebook_deleted",
    "notebook_restored",
    "vetting_requested",
    "vetting_taken_back",
    "vetting_returned",
    "vetting_approved",
    "reference_withdrawn",
    "reference_described",
  ],
} as const;

export const actNames = [...actKinds.people, ...actKinds.notebooks] as const;
export type ActName = (typeof actNames)[number];

export const actSubjects = ["group", "person", "notebook"] as const;
export type ActSubject = (typeof actSubjects)[number];

/** What else there is to say: whom it was with, the role given and the one before, the name before. */
export const actDetails = z.object({
  with: z.string().optional(),
  role: z.string().optional(),
  before: z.string().optional(),
  /** How many notebooks went along. */
  notebooks: z.number().int().optional(),
});
export type ActDetails = z.infer<typeof actDetails>;

export const auditQuery = z.object({
  person: z.uuid("This is not the id of a person.").optional(),
  kind: z.enum(["people", "notebooks"], "A kind is people or notebooks.").optional(),
  /** From this moment on. */
  from: z.iso.datetime({ offset: true, error: "Write a moment as 2026-06-01T00:00:00Z." }).optional(),
  /** Before this moment. */
  to: z.iso.datetime({ offset: true, error: "Write a moment as 2026-06-01T00:00:00Z." }).optional(),
  /** Where the last page ended: its `next`. */
  before: z.coerce
    .number("A page begins where the last one ended; send its `next`.")
    .int()
    .min(1)
    .max(Number.MAX_SAFE_INTEGER)
    .optional(),
});
export type AuditQuery = z.infer<typeof auditQuery>;

export const auditLine = z.object({
  id: z.number().int(),
  at: z.iso.datetime(),
  /** null for the server itself. */
  by: person.nullable(),
  act: z.enum(actNames),
  /** null for a notebook that the reader of the trail may not see: that something was done to it is all they learn. */
  subject: z.object({ kind: z.enum(actSubjects), id: z.string(), name: z.string() }).nullable(),
  details: actDetails,
});
export type AuditLine = z.infer<typeof auditLine>;

export const auditResponse = z.object({
  lines: z.array(auditLine),
  /** How many lines there are under the filters, on every page together. */
  total: z.number().int(),
  /** What to send as `before` for the next page; null on the last. */
  next: z.number().int().nullable(),
});
export type AuditResponse = z.infer<typeof auditResponse>;
