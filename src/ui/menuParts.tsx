/** The parts of a menu, fetched when the first one is opened; `Menu.tsx` is what pages use. */
import { DropdownMenu } from "radix-ui";
import { Link } from "react-router-dom";
import type { MenuChoiceProps, MenuItemProps, MenuLinkProps, MenuProps } from "./Menu";

const item =
  "block cursor-pointer px-18 py-4 font-sans text-[14.5px]/[20px] text-ink no-underline outline-none select-none data-[highlighted]:bg-airglow-wash data-[disabled]:cursor-not-allowed data-[disabled]:text-ink3";

export function OpenedMenu({ trigger, children, align = "start", modal = false }: MenuProps) {
  return (
    <DropdownMenu.Root modal={modal} defaultOpen>
      <DropdownMenu.Trigger asChild>{trigger}</DropdownMenu.Trigger>
      <DropdownMenu.Portal>
        <DropdownMenu.Content
          align={align}
          sideOffset={8}
          collisionPadding={12}
          className="z-40 min-w-180 rounded border border-rule2 bg-raised py-8 shadow-float"
        >
          {children}
        </DropdownMenu.Content>
      </DropdownMenu.Portal>
    </DropdownMenu.Root>
  );
}

export function Item({ children, onSelect, disabled, tone = "ink" }: MenuItemProps) {
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

export function LinkItem({ to, children, download }: MenuLinkProps) {
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

export function Label({ children }: { children: React.ReactNode }) {
  return <DropdownMenu.Label className="px-18 pt-4 pb-2 type-label text-ink3">{children}</DropdownMenu.Label>;
}

export function Rule() {
  return <DropdownMenu.Separator className="my-8 h-1 bg-rule" />;
}

export function Choice({ value, options, onChange }: MenuChoiceProps<string>) {
  return (
    <DropdownMenu.RadioGroup value={value} onValueChange={onChange}>
      {options.map((option) => (
        <DropdownMenu.RadioItem key={option.value} value={option.value} className={`${item} group`}>
          <span className="border-b-2 border-transparent group-data-[state=checked]:border-airglow group-data-[state=checked]:font-semibold">
            {option.label}
          </span>
          {option.hint && <span className="block max-w-[36ch] pt-3 type-label text-ink3">{option.hint}</span>}
        </DropdownMenu.RadioItem>
      ))}
    </DropdownMenu.RadioGroup>
  );
}
