import { invitationDays } from "../../../shared/schemas/invitations";
import type { GroupRole } from "../../../shared/schemas/roles";
import type { Letter } from "../../commands/postLetter";
import { composeLetter, type LetterTo } from "./composeLetter";

/** Somebody is asked to join a group. */
export function groupInvitation(
  to: LetterTo,
  { group, role, invitedBy, href }: { group: string; role: GroupRole; invitedBy: string; href: string },
): Letter {
  return composeLetter(to, {
    kind: "group_invitation",
    subject: `${invitedBy} invites you to ${group}`,
    paragraphs: [
      `${invitedBy} invites you to ${group}, a group on Tenuity, as a ${role}.`,
      "Tenuity is a calculator for upper atmospheres: groups share their notebooks and references there.",
      `The invitation is for ${to.address} and can be accepted once, within ${invitationDays} days.`,
    ],
    link: { label: "See the invitation", href },
    foot: "You have this letter because someone wrote your address in an invitation. If you do nothing, nothing happens.",
  });
}
