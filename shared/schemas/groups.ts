import { z } from "zod";
import { person } from "./people";
import { groupAbilities, groupRole } from "./roles";
import { line } from "./text";

/** Stands in each reference of the group; set when the group is founded. */
export const groupCode = z
  .string("A code is needed.")
  .regex(/^[A-Z]{2,5}$/, "A code is 2 to 5 capital letters, such as CAR.");

export const createGroupBody = z.object({ name: line("A name", 120), code: groupCode });
export type CreateGroupBody = z.infer<typeof createGroupBody>;

export const renameGroupBody = z.object({ name: line("A name", 120) });
export type RenameGroupBody = z.infer<typeof renameGroupBody>;

export const setMemberRoleBody = z.object({ role: groupRole });
export type SetMemberRoleBody = z.infer<typeof setMemberRoleBody>;

export const groupSummary = z.object({
  id: z.string(),
  name: z.string(),
  code: z.string(),
  /** Of the person who asks. */
  role: groupRole,
  /** How many members. */
  members: z.number().int(),
  abilities: groupAbilities,
});
export type GroupSummary = z.infer<typeof groupSummary>;

export const groupListResponse = z.array(groupSummary);
export type GroupListResponse = z.infer<typeof groupListResponse>;

export const groupMember = z.object({ user: person, role: groupRole, joinedAt: z.iso.datetime() });
export type GroupMember = z.infer<typeof groupMember>;

export const groupResponse = groupSummary.extend({
  foundedAt: z.iso.datetime(),
  /** Leads first, then by name. */
  memberList: z.array(groupMember),
});
export type GroupResponse = z.infer<typeof groupResponse>;

/** What becomes of a member's notebooks in the group when they go: told before they do. */
export const memberNotebooks = z.object({ notebooks: z.number().int(), goTo: person });
export type MemberNotebooks = z.infer<typeof memberNotebooks>;
