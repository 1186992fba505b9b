/** Who may see a notebook, and by which role. */
import { z } from "zod";
import { emailAddress } from "./emailAddress";
import { notebookInvitation } from "./invitations";
import { person } from "./people";
import { groupRole, shareRole } from "./roles";

export const shareBody = z.object({ email: emailAddress, role: shareRole });
export type ShareBody = z.infer<typeof shareBody>;

export const setShareRoleBody = z.object({ role: shareRole });
export type SetShareRoleBody = z.infer<typeof setShareRoleBody>;

/** null takes the share with the group back. */
export const setGroupShareBody = z.object({ role: shareRole.nullable() });
export type SetGroupShareBody = z.infer<typeof setGroupShareBody>;

export const toPersonBody = z.object({ userId: z.uuid("This is not the id of a person.") });
export type ToPersonBody = z.infer<typeof toPersonBody>;

export const moveNotebookBody = z.object({
  /** null: the owner's own shelf. */
  groupId: z.uuid("This is not the id of a group.").nullable(),
});
export type MoveNotebookBody = z.infer<typeof moveNotebookBody>;

export const sharesResponse = z.object({
  owner: person,
  people: z.array(
    z.object({
      user: person,
      role: shareRole,
      since: z.iso.datetime(),
      /** In the notebook's group; null outside it. */
      groupRole: groupRole.nullable(),
    }),
  ),
  /** Only for those who may share; empty for others. */
  invitations: z.array(notebookInvitation),
  /** The notebook's group; null on the owner's own shelf. */
  group: z
    .object({
      id: z.string(),
      name: z.string(),
      /** By which everyone in it sees the notebook; null while it is not shared with them. */
      role: shareRole.nullable(),
      people: z.number().int(),
      guests: z.number().int(),
    })
    .nullable(),
});
export type SharesResponse = z.infer<typeof sharesResponse>;
