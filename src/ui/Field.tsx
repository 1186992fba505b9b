import { useId } from "react";

interface FieldProps extends Omit<React.ComponentProps<"input">, "id"> {
  label: string;
  /** Under the field, quiet. */
  hint?: React.ReactNode;
  /** Under the field in its place: what is wrong and what to do. */
  fault?: string;
  /** At the end of the field: a unit, or a word to press. */
  trailing?: React.ReactNode;
  /** The label is heard but not seen, where the place says what the field is. */
  labelHidden?: boolean;
  /** Classes of the whole, label included. */
  wrapperClassName?: string;
}

/** A line to write on, with its label over it and its hint or complaint under it. */
export function Field({
  label,
  hint,
  fault,
  trailing,
  labelHidden = false,
  wrapperClassName = "",
  className = "",
  ...input
}: FieldProps) {
  const id = useId();
  const noteId = `${id}-note`;
  const hasNote = Boolean(fault ?? hint);
  return (
    <div className={wrapperClassName}>
      <label htmlFor={id} className={labelHidden ? "visually-hidden" : "block pb-3 type-label text-ink2"}>
        {label}
      </label>
      <div className="field-box" data-fault={fault ? true : undefined}>
        <input
          {...input}
          id={id}
          className={className}
          aria-invalid={fault ? true : undefined}
          aria-describedby={hasNote ? noteId : undefined}
        />
        {trailing}
      </div>
      {hasNote && (
        <p id={noteId} className={`pt-4 type-label ${fault ? "text-redline" : "text-ink3"}`}>
          {fault ?? hint}
        </p>
      )}
    </div>
  );
}
