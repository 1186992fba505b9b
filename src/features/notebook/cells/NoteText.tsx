import { noteParts } from "./noteParts";

/** A note's message, its words of the cell language in their own type. */
export function NoteText({ message }: { message: string }) {
  return noteParts(message).map(({ text, isCode }, index) =>
    isCode ? (
      <code key={index} className="font-mono text-[.94em]">
        {text}
      </code>
    ) : (
      text
    ),
  );
}
