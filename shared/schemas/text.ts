/** Text as people send it: what can be kept, and how it is tidied. */
import { z } from "zod";

/** A null character or half of a surrogate pair: no database, file or hash can carry them faithfully. */
export function isStorable(text: string): boolean {
  return !/\u0000|\p{Surrogate}/u.test(text);
}

export const unstorableText =
  "This text holds a null or a broken character that cannot be kept; take it out.";

/** One line of text, its ends trimmed, from 1 to `longest` characters. `what` begins the message: "A title". */
export function line(what: string, longest: number) {
  return z
    .string(`${what} is needed.`)
    .trim()
    .min(1, `${what} is needed.`)
    .max(longest, `${what} may have at most ${longest} characters.`)
    .refine(isStorable, unstorableText);
}
