/** Names of the roles a person may have and of what they may be allowed to do. */
import { z } from "zod";

/** In a group, from most to least. */
export const groupRoles = ["lead", "researcher", "guest"] as const;
export const groupRole = z.enum(groupRoles);
export type GroupRole = z.infer<typeof groupRole>;

/** Roles by which a notebook is shared, from most to least. */
export const shareRoles = ["co-author", "commenter", "reader"] as const;
export const shareRole = z.enum(shareRoles);
export type ShareRole = z.infer<typeof shareRole>;

/** A person's part in one notebook, from most to least. */
export const notebookRoles = ["owner", ...shareRoles] as const;
export const notebookRole = z.enum(notebookRoles);
export type NotebookRole = z.infer<typeof notebookRole>;

/** What can be done with a notebook and has a route, so that the page is told of it. */
export const servedNotebookActions = [
  "read",
  "export",
  "seeShares",
  "duplicate",
  "comment",
  "resolveOwnThread",
  "resolveAnyThread",
  "edit",
  "rename",
  "keepVersion",
  "restoreVersion",
  "leave",
  "share",
  "handOver",
  "move",
  "archive",
  "unarchive",
  "delete",
  "restoreFromBin",
] as const;

export const notebookActions = [
  ...servedNotebookActions,
  "fork",
  "offer",
  "takeOffers",
  "answerCautions",
  "requestVetting",
  "readVersionInVetting",
  "vet",
  "publish",
] as const;
export type NotebookAction = (typeof notebookActions)[number];

/** What can be done in a group and has a route, so that the page is told of it. */
export const servedGroupActions = [
  "see",
  "createNotebook",
  "rename",
  "invite",
  "revokeInvitation",
  "setRole",
  "removeMember",
  "handOver",
  "leave",
  "seeAudit",
] as const;

export const groupActions = [...servedGroupActions, "seeReferences", "seeQueue"] as const;
export type GroupAction = (typeof groupActions)[number];

export const referenceActions = ["read", "cite", "use", "supersede", "withdraw"] as const;
export type ReferenceAction = (typeof referenceActions)[number];

/** What this person may do with this notebook, as the server decided. */
export const notebookAbilities = z.record(z.enum(servedNotebookActions), z.boolean());
export type NotebookAbilities = z.infer<typeof notebookAbilities>;

/** What this person may do in this group, as the server decided. */
export const groupAbilities = z.record(z.enum(servedGroupActions), z.boolean());
export type GroupAbilities = z.infer<typeof groupAbilities>;
