import { useId } from "react";

interface RadioLineProps<Value extends string> {
  label: string;
  value: Value;
  options: readonly { value: Value; label: string }[];
  onChange: (value: Value) => void;
}

/** One of several, written out on a line. */
export function RadioLine<Value extends string>({ label, value, options, onChange }: RadioLineProps<Value>) {
  const name = useId();
  return (
    <div
      role="radiogroup"
      aria-label={label}
      className="flex flex-wrap gap-x-18 gap-y-4 font-sans text-[14.5px]/[22px]"
    >
      {options.map((option) => (
        <label
          key={option.value}
          className="inline-flex cursor-pointer items-center gap-7 has-checked:font-semibold"
        >
          <input
            type="radio"
            className="radio-dot"
            name={name}
            value={option.value}
            checked={option.value === value}
            onChange={() => onChange(option.value)}
          />
          {option.label}
        </label>
      ))}
    </div>
  );
}
