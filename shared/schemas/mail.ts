/** Kinds of mail, and which of them a person wants. */
import { z } from "zod";

/** Kinds that a person may do without. */
export const choosableMailKinds = [
  "group_invitation",
  "notebook_invitation",
  "mention",
  "reply",
  "vetting_requested",
  "vetting_returned",
  "vetting_approved",
  "new_edition",
] as const;
export type ChoosableMailKind = (typeof choosableMailKinds)[number];

/** Kinds that keep an account safe, and are always sent. */
export const securityMailKinds = ["address_confirmation", "password_reset"] as const;

export const mailKinds = [...choosableMailKinds, ...securityMailKinds] as const;
export type MailKind = (typeof mailKinds)[number];

/** Each kind with whether it is wanted. */
export const mailChoicesResponse = z.record(z.enum(choosableMailKinds), z.boolean());
export type MailChoicesResponse = z.infer<typeof mailChoicesResponse>;

export const setMailChoiceBody = z.object({
  kind: z.enum(
    choosableMailKinds,
    "This is not a kind of mail that can be switched off. Letters that keep an account safe are always sent.",
  ),
  isWanted: z.boolean("Say whether this mail is wanted: true or false."),
});
export type SetMailChoiceBody = z.infer<typeof setMailChoiceBody>;

/** What would have been sent, for a look in development. */
export const keptMailResponse = z.array(
  z.object({
    id: z.string(),
    to: z.string(),
    subject: z.string(),
    plain: z.string(),
    takenAt: z.iso.datetime(),
  }),
);
export type KeptMailResponse = z.infer<typeof keptMailResponse>;
