import type { Person } from "../../../../shared/schemas/people";

/** Names offered after an @, and where in the text they would stand. */
export interface Completion {
  /** From the @ to the caret. */
  from: number;
  to: number;
  people: readonly Person[];
  /** Index of the one that is taken next. */
  chosen: number;
}

const mostOffered = 6;

/** What can be completed at the caret: people with a name, or a part of one, that begins like what follows the @. */
export function completionAt(text: string, caret: number, readers: readonly Person[]): Completion | null {
  const begun = /(?:^|[^\p{L}\p{N}_.@])@([^@\n]{0,60})$/u.exec(text.slice(0, caret));
  if (!begun) return null;
  const written = begun[1]!.toLowerCase();
  const people = readers
    .filter(({ name }) => {
      const known = name.toLowerCase();
      return known !== written && (known.startsWith(written) || known.includes(` ${written}`));
    })
    .slice(0, mostOffered);
  return people.length === 0 ? null : { from: caret - begun[1]!.length - 1, to: caret, people, chosen: 0 };
}

/** The text with a name taken, and where the caret goes. */
export function completed(
  text: string,
  { from, to }: Pick<Completion, "from" | "to">,
  { name }: Person,
): { text: string; caret: number } {
  const rest = text.slice(to);
  const written = `@${name}${/^[\s.,;:!?)]/.test(rest) ? "" : " "}`;
  return { text: text.slice(0, from) + written + rest, caret: from + written.length };
}
