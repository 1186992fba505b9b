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

export const notebookActions = [
  "read",
  "export",
  "edit",
  "rename",
  "keepVersion",
  "restoreVersion",
  "delete",
  "restoreFromBin",
] as const;
export type NotebookAction = (typeof notebookActions)[number];

export const groupActions = [
  "see",
  "createNotebook",
  "addMember",
  "setRole",
  "removeMember",
  "leave",
] as const;
export type GroupAction = (typeof groupActions)[number];

/** What this person may do with this notebook, as the server decided. */
export const notebookAbilities = z.record(z.enum(notebookActions), z.boolean());
export type NotebookAbilities = z.infer<typeof notebookAbilities>;

/** What this person may do in this group, as the server decided. */
export const groupAbilities = z.record(z.enum(groupActions), z.boolean());
export type GroupAbilities = z.infer<typeof groupAbilities>;
