import { DropdownMenu } from "radix-ui";
import { Link } from "react-router-dom";

const item =
  "block cursor-pointer px-18 py-4 type-control font-normal text-ink no-underline outline-none select-none data-[highlighted]:bg-airglow-wash data-[disabled]:cursor-not-allowed data-[disabled]:text-ink3";

interface MenuProps {
  /** The button or word that opens it. */
  trigger: React.ReactNode;
  children: React.ReactNode;
  align?: "start" | "end";
  /** False lets the page behind be scrolled and pressed while the menu is open. */
  modal?: boolean;
}

/** A menu of verbs, hanging from its word. */
export function Menu({ trigger, children, align = "start", modal = false }: MenuProps) {
  return (
    <DropdownMenu.Root modal={modal}>
      <DropdownMenu.Trigger asChild>{trigger}</DropdownMenu.Trigger>
      <DropdownMenu.Portal>
        <DropdownMenu.Content
          align={align}
          sideOffset={6}
          collisionPadding={12}
          className="z-40 min-w-180 rounded border border-rule2 bg-raised py-8 shadow-float"
        >
          {children}
        </DropdownMenu.Content>
      </DropdownMenu.Portal>
    </DropdownMenu.Root>
  );
}

interface MenuItemProps {
  children: React.ReactNode;
  onSelect: () => void;
  disabled?: boolean;
  tone?: "ink" | "fault";
}

/** One verb of a menu. */
export function MenuItem({ children, onSelect, disabled, tone = "ink" }: MenuItemProps) {
  return (
    <DropdownMenu.Item
      className={`${item} ${tone === "fault" && !disabled ? "text-redline" : ""}`}
      onSelect={onSelect}
      disabled={disabled}
    >
      {children}
    </DropdownMenu.Item>
  );
}

/** A page to go to, or a file to take, from a menu. */
export function MenuLink({
  to,
  children,
  download,
}: {
  to: string;
  children: React.ReactNode;
  download?: boolean;
}) {
  return (
    <DropdownMenu.Item className={item} asChild>
      {download ? (
        <a href={to} download>
          {children}
        </a>
      ) : (
        <Link to={to}>{children}</Link>
      )}
    </DropdownMenu.Item>
  );
}

/** Words over a group of a menu. */
export function MenuLabel({ children }: { children: React.ReactNode }) {
  return <DropdownMenu.Label className="px-18 pt-4 pb-2 type-label text-ink3">{children}</DropdownMenu.Label>;
}

/** A hairline between groups of a menu. */
export function MenuRule() {
  return <DropdownMenu.Separator className="my-8 h-1 bg-rule" />;
}

interface MenuChoiceProps<Value extends string> {
  value: Value;
  options: readonly { value: Value; label: string; hint?: string }[];
  onChange: (value: Value) => void;
}

/** One of several within a menu: the current one is in bold on a glow line. */
export function MenuChoice<Value extends string>({ value, options, onChange }: MenuChoiceProps<Value>) {
  return (
    <DropdownMenu.RadioGroup value={value} onValueChange={(next) => onChange(next as Value)}>
      {options.map((option) => (
        <DropdownMenu.RadioItem key={option.value} value={option.value} className={`${item} group`}>
          <span className="border-b-2 border-transparent group-data-[state=checked]:border-airglow group-data-[state=checked]:font-semibold">
            {option.label}
          </span>
          {option.hint && <span className="block max-w-[36ch] type-label text-ink3">{option.hint}</span>}
        </DropdownMenu.RadioItem>
      ))}
    </DropdownMenu.RadioGroup>
  );
}
