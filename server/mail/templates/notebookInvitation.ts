import { invitationDays } from "../../../shared/schemas/invitations";
import type { ShareRole } from "../../../shared/schemas/roles";
import type { Letter } from "../../commands/postLetter";
import { composeLetter } from "./composeLetter";

/** A notebook is shared with somebody who has no account yet. */
export function notebookInvitation(
  address: string,
  { title, role, invitedBy, href }: { title: string; role: ShareRole; invitedBy: string; href: string },
): Letter {
  return composeLetter(
    { address, userId: null },
    {
      kind: "notebook_invitation",
      subject: `${invitedBy} shares “${title}” with you`,
      paragraphs: [
        `${invitedBy} shares the notebook “${title}” with you, as a ${role}.`,
        "It is on Tenuity, a calculator for upper atmospheres. To open it, create an account with this address.",
        `The invitation is for ${address} and can be accepted once, within ${invitationDays} days.`,
      ],
      link: { label: "See the invitation", href },
      foot: "You have this letter because someone wrote your address in an invitation. If you do nothing, nothing happens.",
    },
  );
}
