import { useId } from "react";

export interface TwoWayOption<Value extends string> {
  value: Value;
  label: string;
}

interface TwoWayProps<Value extends string> {
  /** What is chosen between, for those who listen. */
  label: string;
  value: Value;
  options: readonly TwoWayOption<Value>[];
  onChange: (value: Value) => void;
  /** Quiet until pointed at or in use; always at full strength under touch. */
  quiet?: boolean;
  className?: string;
}

/** A choice of two words, or three: the chosen one stands on a glow line. */
export function TwoWay<Value extends string>({
  label,
  value,
  options,
  onChange,
  quiet = false,
  className = "",
}: TwoWayProps<Value>) {
  const name = useId();
  return (
    <span
      role="radiogroup"
      aria-label={label}
      className={`two-way ${className}`}
      data-quiet={quiet || undefined}
    >
      {options.map((option) => (
        <label key={option.value} className="two-way-word">
          <input
            type="radio"
            className="visually-hidden"
            name={name}
            value={option.value}
            checked={option.value === value}
            onChange={() => onChange(option.value)}
          />
          <span>{option.label}</span>
        </label>
      ))}
    </span>
  );
}
