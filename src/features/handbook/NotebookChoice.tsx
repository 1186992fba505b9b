import type { UseQueryResult } from "@tanstack/react-query";
import { useId } from "react";
import { Link } from "react-router-dom";
import type { NotebookListItem } from "../../../shared/schemas/notebooks";
import { failureSentence } from "../../lib/ApiError";
import { Message } from "../../ui/Message";
import { TextButton } from "../../ui/TextButton";

interface NotebookChoiceProps {
  notebooks: UseQueryResult<NotebookListItem[]>;
  value: string;
  onChange: (id: string) => void;
}

/** One of the notebooks that one may write in. */
export function NotebookChoice({ notebooks, value, onChange }: NotebookChoiceProps) {
  const name = useId();
  if (notebooks.isError)
    return (
      <Message
        state="fault"
        live="polite"
        action={<TextButton onClick={() => void notebooks.refetch()}>Try again</TextButton>}
      >
        {failureSentence(notebooks.error)}
      </Message>
    );
  if (!notebooks.data)
    return (
      <p role="status" className="opening type-meta text-ink3">
        Looking for notebooks…
      </p>
    );
  if (notebooks.data.length === 0)
    return (
      <p className="type-meta text-ink2">
        There is no notebook that you may write in. <Link to="/notebooks">Begin one</Link>, or copy the
        entries.
      </p>
    );
  return (
    <fieldset className="min-w-0">
      <legend className="pb-3 type-label text-ink2">Notebook</legend>
      <ul className="max-h-[22vh] overflow-y-auto border-y border-rule py-4">
        {notebooks.data.map(({ id, title, owner, role }) => (
          <li key={id}>
            <label className="flex cursor-pointer items-baseline gap-8 px-4 py-3 text-[16px]/[22px] has-checked:bg-airglow-wash">
              <input
                type="radio"
                className="radio-dot translate-y-2"
                name={name}
                value={id}
                checked={id === value}
                onChange={() => onChange(id)}
              />
              <span className="min-w-0">
                {title}
                {role !== "owner" && <span className="type-label text-ink3"> {owner.name}’s</span>}
              </span>
            </label>
          </li>
        ))}
      </ul>
    </fieldset>
  );
}
