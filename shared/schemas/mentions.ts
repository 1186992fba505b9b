/** Whom a comment speaks to: each stands in its text as @ and their name in full. */
import type { Person } from "./people";

/** One stretch of text, and the name in it where it is a mention. */
export interface MentionPiece {
  text: string;
  /** As given, whatever its case in the text; null in between. */
  name: string | null;
}

/** Text cut into mentions of these names and what lies between. Where one name begins another, the longer counts. */
export function splitMentions(text: string, names: readonly string[]): MentionPiece[] {
  const given = new Map(names.filter((name) => name !== "").map((name) => [name.toLowerCase(), name]));
  if (given.size === 0 || !text.includes("@")) return [{ text, name: null }];
  const longestFirst = [...given.values()].sort((one, other) => other.length - one.length).map(escaped);
  // Not within a word, so that an e-mail address is no mention.
  const mention = new RegExp(
    `(?<![\\p{L}\\p{N}_.@])@(?:${longestFirst.join("|")})(?![\\p{L}\\p{N}_])`,
    "giu",
  );
  const pieces: MentionPiece[] = [];
  let end = 0;
  for (const { 0: found, index } of text.matchAll(mention)) {
    if (index > end) pieces.push({ text: text.slice(end, index), name: null });
    pieces.push({ text: found, name: given.get(found.slice(1).toLowerCase()) ?? found.slice(1) });
    end = index + found.length;
  }
  if (end < text.length) pieces.push({ text: text.slice(end), name: null });
  return pieces;
}

/** Those of these people whom a text speaks to. Who share a name are all meant. */
export function mentionedIn<Someone extends Person>(text: string, people: readonly Someone[]): Someone[] {
  const pieces = splitMentions(
    text,
    people.map(({ name }) => name),
  );
  const names = new Set(pieces.flatMap(({ name }) => (name === null ? [] : [name.toLowerCase()])));
  return people.filter(({ name }) => names.has(name.toLowerCase()));
}

const escaped = (name: string): string => name.replace(/[.*+?^${}()|[\]\\]/g, "\\$&");
