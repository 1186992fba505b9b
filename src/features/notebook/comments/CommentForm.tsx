import { useEffect, useId, useRef, useState } from "react";
import { commentLimits } from "../../../../shared/schemas/comments";
import type { Person } from "../../../../shared/schemas/people";
import { failureSentence } from "../../../lib/ApiError";
import { Button } from "../../../ui/Button";
import { TextButton } from "../../../ui/TextButton";
import { completionAt, completed, type Completion } from "./mentionCompletion";

interface CommentFormProps {
  /** What is being written: "Reply in thread †". */
  label: string;
  /** What sending does: "Reply". */
  verb: string;
  initial?: string;
  /** Who may be spoken to. */
  readers: readonly Person[];
  /** Rejects where it could not be sent; the text then stays. */
  onSend: (text: string) => Promise<unknown>;
  onDone: () => void;
}

/** Where a comment is written: Markdown and TeX, with names completed after an @. */
export function CommentForm({ label, verb, initial = "", readers, onSend, onDone }: CommentFormProps) {
  const [text, setText] = useState(initial);
  const [completion, setCompletion] = useState<Completion | null>(null);
  const [fault, setFault] = useState<string | null>(null);
  const [isSending, setSending] = useState(false);
  const field = useRef<HTMLTextAreaElement>(null);
  const id = useId();
  const tooLong = text.trim().length - commentLimits.length;

  useEffect(function beginWriting() {
    // In the margin the form is first put in its place; focused before, it would pull the page to where it is not.
    const frame = requestAnimationFrame(() => field.current?.focus());
    return () => cancelAnimationFrame(frame);
  }, []);

  const lookForName = (target: HTMLTextAreaElement) => {
    const isPoint = target.selectionStart === target.selectionEnd;
    const found = isPoint ? completionAt(target.value, target.selectionStart, readers) : null;
    // The caret is also looked at where it has not moved: what was chosen by key stays chosen.
    setCompletion((before) =>
      before && found?.from === before.from && found.to === before.to ? before : found,
    );
  };

  const take = (person: Person) => {
    if (!completion) return;
    const next = completed(text, completion, person);
    setText(next.text);
    setCompletion(null);
    requestAnimationFrame(() => {
      field.current?.focus();
      field.current?.setSelectionRange(next.caret, next.caret);
    });
  };

  const send = async () => {
    if (text.trim() === "" || isSending || tooLong > 0) return;
    setSending(true);
    setFault(null);
    try {
      await onSend(text.trim());
      onDone();
    } catch (error) {
      setFault(failureSentence(error));
      setSending(false);
    }
  };

  const handleKeyDown = (event: React.KeyboardEvent) => {
    event.stopPropagation();
    if (completion && completionKeys.has(event.key)) {
      event.preventDefault();
      const { people, chosen } = completion;
      if (event.key === "Escape") setCompletion(null);
      else if (event.key === "Enter" || event.key === "Tab") take(people[chosen]!);
      else {
        const step = event.key === "ArrowDown" ? 1 : -1;
        setCompletion({ ...completion, chosen: (chosen + step + people.length) % people.length });
      }
    } else if (event.key === "Enter" && (event.ctrlKey || event.metaKey)) {
      event.preventDefault();
      void send();
    } else if (event.key === "Escape") {
      onDone();
    }
  };

  return (
    <form
      className="comment-form"
      onSubmit={(event) => {
        event.preventDefault();
        void send();
      }}
    >
      <textarea
        ref={field}
        aria-label={label}
        aria-describedby={`${id}-note`}
        aria-invalid={fault !== null || tooLong > 0 || undefined}
        aria-autocomplete="list"
        aria-controls={completion ? `${id}-names` : undefined}
        aria-activedescendant={completion ? `${id}-name-${completion.chosen}` : undefined}
        placeholder="Markdown, formulas between dollar signs, @ and a name"
        rows={3}
        value={text}
        onChange={(event) => {
          setText(event.target.value);
          setFault(null);
          lookForName(event.target);
        }}
        onSelect={(event) => completion && lookForName(event.currentTarget)}
        onBlur={() => setCompletion(null)}
        onKeyDown={handleKeyDown}
      />
      {completion && (
        <ul className="comment-names" id={`${id}-names`} role="listbox" aria-label="People who may see it">
          {completion.people.map((person, index) => (
            <li
              key={person.id}
              id={`${id}-name-${index}`}
              role="option"
              aria-selected={index === completion.chosen}
              // Before the field loses the focus, and the list with it.
              onPointerDown={(event) => {
                event.preventDefault();
                take(person);
              }}
            >
              {person.name}
            </li>
          ))}
        </ul>
      )}
      <span className="visually-hidden" role="status">
        {completion &&
          `${completion.people[completion.chosen]!.name}, ${completion.chosen + 1} of ${completion.people.length}`}
      </span>
      <p id={`${id}-note`} className="comment-fault" role={fault ? "alert" : undefined}>
        {fault ?? (tooLong > 0 ? `Too long by ${tooLong} characters; put it in several comments.` : null)}
      </p>
      <div className="comment-acts">
        <Button type="submit" size="small" busy={isSending} disabled={text.trim() === "" || tooLong > 0}>
          {verb}
        </Button>
        <TextButton onClick={onDone}>Leave it</TextButton>
      </div>
    </form>
  );
}

const completionKeys = new Set(["ArrowDown", "ArrowUp", "Enter", "Tab", "Escape"]);
