import { useState } from "react";
import { TextButton } from "../../../ui/TextButton";
import { documentLimits } from "../../../../shared/notebook/document";
import type { AnsweredCaution } from "../../../../shared/notebook/cautionAnswers";

interface AnswerLineProps {
  caution: AnsweredCaution;
  /** null where it can only be read. */
  onAnswer: ((sentence: string) => void) | null;
}

/** Under a caution in the margin: the sentence that answers it, and writing one. */
export function AnswerLine({ caution: { answer, hasLapsed, note }, onAnswer }: AnswerLineProps) {
  const [draft, setDraft] = useState<string | null>(null);
  if (draft !== null && onAnswer) {
    return (
      <form
        onSubmit={(event) => {
          event.preventDefault();
          onAnswer(draft);
          setDraft(null);
        }}
      >
        <div className="field-box">
          <input
            aria-label={`Answer to the caution: ${note.message.replaceAll("*", "")}`}
            value={draft}
            autoFocus
            maxLength={documentLimits.answerLength}
            onChange={(event) => setDraft(event.target.value)}
            onKeyDown={(event) => event.key === "Escape" && setDraft(null)}
          />
        </div>
        <TextButton type="submit">Answer</TextButton>{" "}
        <TextButton type="button" onClick={() => setDraft(null)}>
          Not now
        </TextButton>
      </form>
    );
  }
  return (
    <span className="block">
      {answer && <i>“{answer.sentence}”</i>}
      {hasLapsed && " This answer has lapsed: the numbers moved by over 1 %."}{" "}
      {onAnswer && (
        <TextButton data-print="never" onClick={() => setDraft(answer?.sentence ?? "")}>
          {answer ? "change the answer" : "answer"}
        </TextButton>
      )}
    </span>
  );
}
