import type { Letter } from "../../commands/postLetter";
import { composeLetter } from "./composeLetter";

interface To {
  address: string;
  userId: string;
}

const foot = "You can switch these letters off on your account page.";

/** A lead is asked to vet a version. */
export function vettingRequested(
  to: To,
  { title, group, message, requestedBy, href }: Record<"title" | "group" | "message" | "requestedBy" | "href", string>,
): Letter {
  return composeLetter(to, {
    kind: "vetting_requested",
    subject: `${requestedBy} asks for “${title}” to be vetted`,
    paragraphs: [`${requestedBy} asks you, as a lead of ${group}, to vet a version of “${title}”.`, message],
    link: { label: "See the checks", href },
    foot,
  });
}

/** Whoever asked is told what is asked of them. */
export function vettingReturned(
  to: To,
  { title, remarks, by, href }: Record<"title" | "remarks" | "by" | "href", string>,
): Letter {
  return composeLetter(to, {
    kind: "vetting_returned",
    subject: `${by} returned “${title}” with remarks`,
    paragraphs: [`${by} looked at “${title}” and returned it with these remarks.`, remarks],
    link: { label: "Open the notebook", href },
    foot,
  });
}

/** Whoever asked is told that it is published. */
export function vettingApproved(
  to: To,
  { title, pin, by, href }: Record<"title" | "pin" | "by" | "href", string>,
): Letter {
  return composeLetter(to, {
    kind: "vetting_approved",
    subject: `“${title}” is published as ${pin}`,
    paragraphs: [`${by} approved “${title}”. It is published as ${pin}.`],
    link: { label: "See the reference", href },
    foot,
  });
}
