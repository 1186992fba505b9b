import { differingPart } from "./differingPart";

/** So much of what two long texts have alike is shown on either side of where they differ. */
const alikeShown = 140;

function shortened(text: string, end: "before" | "after"): string {
  if (text.length <= alikeShown) return text;
  return end === "before" ? `… ${text.slice(-alikeShown)}` : `${text.slice(0, alikeShown)} …`;
}

/** A text with what differs from the other state washed. */
export function MarkedText({ text, other }: { text: string; other: string }) {
  const { before, part, after } = differingPart(text, other);
  return (
    <code className="conflict-text">
      {shortened(before, "before")}
      {part !== "" && <mark>{part}</mark>}
      {shortened(after, "after")}
    </code>
  );
}
