import type { NoticeKind } from "../../../shared/schemas/notices";
import type { Letter } from "../../commands/postLetter";
import { composeLetter, type LetterTo } from "./composeLetter";

/** Longest part of a comment that a letter repeats, in characters. */
const longest = 1_000;

/** Somebody was spoken to in a comment, or answered in a thread of theirs. */
export function commentLetter(
  to: LetterTo,
  comment: { kind: NoticeKind; title: string; cell: string; text: string; writtenBy: string; href: string },
): Letter {
  const { kind, title, cell, text, writtenBy, href } = comment;
  const did = kind === "mention" ? "mentions you" : "replies";
  const characters = Array.from(text);
  const said = characters.length > longest ? `${characters.slice(0, longest).join("")} …` : text;
  return composeLetter(to, {
    kind,
    subject: `${writtenBy} ${did} in “${title}”`,
    paragraphs: [`${writtenBy} ${did} in a thread on ${cell} of the notebook “${title}”:`, said],
    link: { label: "Open the thread", href },
    foot: "You can switch these letters off on your account page.",
  });
}
