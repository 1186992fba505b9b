/** Invitations by a link in a letter: to a group, or to a notebook. */
import { z } from "zod";
import { emailAddress } from "./emailAddress";
import { person } from "./people";
import { groupRole, shareRole } from "./roles";

/** Days that an invitation can be accepted. */
export const invitationDays = 14;

/** What stands in the link: 32 random bytes in base64url. */
export const invitationToken = z
  .string("The link of an invitation is needed.")
  .regex(/^[\w-]{43}$/, "This link is not whole. Open it from the letter again.");

export const invitationTokenBody = z.object({ token: invitationToken });
export type InvitationTokenBody = z.infer<typeof invitationTokenBody>;

export const inviteToGroupBody = z.object({ email: emailAddress, role: groupRole });
export type InviteToGroupBody = z.infer<typeof inviteToGroupBody>;

export const setInvitedGroupRoleBody = z.object({ role: groupRole });
export const setInvitedShareRoleBody = z.object({ role: shareRole });

/** An invitation without an answer yet, as those who may send them see it. */
const openInvitation = z.object({
  id: z.string(),
  email: z.string(),
  invitedBy: person,
  invitedAt: z.iso.datetime(),
  expiresAt: z.iso.datetime(),
  /** Its days are over; it can be sent again. */
  hasLapsed: z.boolean(),
});

export const groupInvitation = openInvitation.extend({ role: groupRole });
export type GroupInvitation = z.infer<typeof groupInvitation>;

export const groupInvitationList = z.array(groupInvitation);

export const notebookInvitation = openInvitation.extend({ role: shareRole });
export type NotebookInvitation = z.infer<typeof notebookInvitation>;

/** An invitation as whoever holds its link sees it, signed in or not. */
export const invitationResponse = z.object({
  to: z.enum(["group", "notebook"]),
  /** Of the group, or the title of the notebook. */
  name: z.string(),
  role: z.union([groupRole, shareRole]),
  email: z.string(),
  invitedBy: z.string(),
  expiresAt: z.iso.datetime(),
});
export type InvitationResponse = z.infer<typeof invitationResponse>;

export const acceptedInvitation = z.object({ to: z.enum(["group", "notebook"]), id: z.string() });
export type AcceptedInvitation = z.infer<typeof acceptedInvitation>;
