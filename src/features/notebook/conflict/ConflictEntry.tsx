import type { Conflict, Side } from "../draft/mergeDocuments";
import { entryValue } from "./entryValue";
import { MarkedText } from "./MarkedText";

interface ConflictEntryProps {
  conflict: Conflict;
  /** Who wrote the other state. */
  other: string;
  side: Side;
  onChoose: (conflictId: string, side: Side) => void;
}

/** One entry in its two states, on either side of its name; the one that stands is on a glow line. */
export function ConflictEntry({ conflict, other, side, onChoose }: ConflictEntryProps) {
  return (
    <div className="conflict-entry" role="radiogroup" aria-label={conflict.label}>
      <SideButton
        conflict={conflict}
        of="theirs"
        owner={`${other}’s`}
        isStanding={side === "theirs"}
        onChoose={onChoose}
      />
      <span className="conflict-label">{conflict.label}</span>
      <SideButton
        conflict={conflict}
        of="mine"
        owner="yours"
        isStanding={side === "mine"}
        onChoose={onChoose}
      />
    </div>
  );
}

interface SideButtonProps {
  conflict: Conflict;
  of: Side;
  owner: string;
  isStanding: boolean;
  onChoose: (conflictId: string, side: Side) => void;
}

function SideButton({ conflict, of, owner, isStanding, onChoose }: SideButtonProps) {
  const text = entryValue(conflict[of], conflict.label);
  const opposite = entryValue(conflict[of === "mine" ? "theirs" : "mine"], conflict.label);
  return (
    <button
      type="button"
      role="radio"
      aria-checked={isStanding}
      className="conflict-side"
      data-side={of}
      onClick={() => onChoose(conflict.id, of)}
    >
      {text === null ? (
        <i className="conflict-nothing">{conflict.label === "cell" ? "removed" : "no such entry"}</i>
      ) : (
        <MarkedText text={text} other={opposite ?? ""} />
      )}
      <span className="conflict-standing">{isStanding ? `${owner} stands` : "take this one"}</span>
    </button>
  );
}
