import { useId } from "react";

interface TextAreaProps extends Omit<React.ComponentProps<"textarea">, "id"> {
  label: string;
  hint?: React.ReactNode;
  /** In place of the hint: what is wrong and what to do. */
  fault?: string;
  wrapperClassName?: string;
}

/** Several lines to write on, with the label over them and the hint or complaint under them. */
export function TextArea({ label, hint, fault, wrapperClassName = "", rows = 4, ...area }: TextAreaProps) {
  const id = useId();
  const noteId = `${id}-note`;
  const hasNote = Boolean(fault ?? hint);
  return (
    <div className={wrapperClassName}>
      <label htmlFor={id} className="block pb-3 type-label text-ink2">
        {label}
      </label>
      <div className="field-box" data-fault={fault ? true : undefined}>
        <textarea
          {...area}
          id={id}
          rows={rows}
          aria-invalid={fault ? true : undefined}
          aria-describedby={hasNote ? noteId : undefined}
        />
      </div>
      {hasNote && (
        <p id={noteId} className={`pt-4 type-label ${fault ? "text-redline" : "text-ink3"}`}>
          {fault ?? hint}
        </p>
      )}
    </div>
  );
}
