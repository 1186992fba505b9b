import { useEffect, useState } from "react";
import { Field } from "./Field";

interface SearchFieldProps {
  /** What it looks in: "Search titles and owners". */
  label: string;
  value: string;
  onChange: (value: string) => void;
}

/** How long typing must rest before the list is asked for, ms. */
const rest = 220;

/** A word to look for, asked once typing rests. */
export function SearchField({ label, value, onChange }: SearchFieldProps) {
  const [text, setText] = useState(value);
  const [shown, setShown] = useState(value);
  if (value !== shown) {
    // The address changed by other means, such as the back button.
    setShown(value);
    setText(value);
  }

  useEffect(
    function askWhenAtRest() {
      if (text === shown) return;
      const timer = window.setTimeout(() => {
        setShown(text);
        onChange(text);
      }, rest);
      return () => window.clearTimeout(timer);
    },
    [text, shown, onChange],
  );

  return (
    <Field
      label={label}
      labelHidden
      type="search"
      placeholder={label}
      autoComplete="off"
      maxLength={200}
      value={text}
      onChange={(event) => setText(event.target.value)}
      wrapperClassName="min-w-0 flex-1 wide:w-340 wide:flex-none"
    />
  );
}
