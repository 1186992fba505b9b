import { Chevron } from "./Chevron";
import { Menu, MenuChoice } from "./Menu";

interface WordMenuProps<Value extends string> {
  /** What the word decides, for those who listen. */
  label: string;
  value: Value;
  options: readonly { value: Value; label: string; hint?: string }[];
  onChange: (value: Value) => void;
  disabled?: boolean;
}

/** A word of a sentence that can be exchanged for another: how lists are filtered and roles are set. */
export function WordMenu<Value extends string>({
  label,
  value,
  options,
  onChange,
  disabled,
}: WordMenuProps<Value>) {
  const current = options.find((option) => option.value === value)?.label ?? value;
  return (
    <Menu
      trigger={
        <button type="button" className="word-menu" disabled={disabled} aria-label={`${label}: ${current}`}>
          {current}
          <Chevron />
        </button>
      }
    >
      <MenuChoice value={value} options={options} onChange={onChange} />
    </Menu>
  );
}
