import type { ShareRole } from "../../../shared/schemas/roles";
import type { Letter } from "../../commands/postLetter";
import { composeLetter } from "./composeLetter";

/** A notebook is shared with somebody who has an account. */
export function notebookShared(
  to: { address: string; userId: string },
  { title, role, sharedBy, href }: { title: string; role: ShareRole; sharedBy: string; href: string },
): Letter {
  return composeLetter(to, {
    kind: "notebook_invitation",
    subject: `${sharedBy} shares “${title}” with you`,
    paragraphs: [`${sharedBy} shares the notebook “${title}” with you, as a ${role}.`],
    link: { label: "Open the notebook", href },
    foot: "You can switch these letters off on your account page.",
  });
}
