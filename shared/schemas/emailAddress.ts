import { z } from "zod";

/** An e-mail address in the one form by which it is kept and looked up. */
export const emailAddress = z
  .string("An e-mail address is needed.")
  .trim()
  .toLowerCase()
  .max(320, "An e-mail address may have at most 320 characters.")
  .pipe(z.email("This is not an e-mail address; write it as name@place.example."));
