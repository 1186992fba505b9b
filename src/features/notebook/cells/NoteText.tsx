import { noteParts } from "./noteParts";

/** A note's message: words of the cell language in their own type, digits of gases low. */
export function NoteText({ message }: { message: string }) {
  return noteParts(message).map(({ text, setting }, index) => {
    if (setting === "low") return <sub key={index}>{text}</sub>;
    if (setting === "plain") return text;
    return (
      <code key={index} className="font-mono text-[.94em]">
        {text}
      </code>
    );
  });
}
