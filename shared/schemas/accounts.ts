import { z } from "zod";
import { emailAddress } from "./emailAddress";
import { invitationToken } from "./invitations";
import { passwordLimits } from "./session";
import { line } from "./text";

export const createAccountBody = z.object({
  name: line("A name", 120),
  email: emailAddress,
  password: z
    .string("A password is needed.")
    .min(passwordLimits.shortest, `A password needs at least ${passwordLimits.shortest} characters.`)
    .max(passwordLimits.longest, `A password may have at most ${passwordLimits.longest} characters.`),
  /** The token of an invitation to this address, accepted in the same act. */
  invitation: invitationToken.optional(),
});
export type CreateAccountBody = z.infer<typeof createAccountBody>;
