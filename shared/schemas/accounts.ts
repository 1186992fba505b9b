import { z } from "zod";
import { passwordLimits } from "./session";
import { line } from "./text";

/** An e-mail address in the one form by which it is kept and looked up. */
export const emailAddress = z
  .string("An e-mail address is needed.")
  .trim()
  .toLowerCase()
  .max(320, "An e-mail address may have at most 320 characters.")
  .pipe(z.email("This is not an e-mail address; write it as name@place.example."));

export const createAccountBody = z.object({
  name: line("A name", 120),
  email: emailAddress,
  password: z
    .string("A password is needed.")
    .min(passwordLimits.shortest, `A password needs at least ${passwordLimits.shortest} characters.`)
    .max(passwordLimits.longest, `A password may have at most ${passwordLimits.longest} characters.`),
});
export type CreateAccountBody = z.infer<typeof createAccountBody>;
