/** Menus of verbs. Their parts are fetched when a menu is first pointed at, so that no page waits for them. */
import { cloneElement, lazy, Suspense, useState } from "react";
import { fetchPart } from "../lib/fetchPart";

export interface MenuProps {
  /** The button or word that opens it. */
  trigger: React.ReactElement<React.ComponentProps<"button">>;
  children: React.ReactNode;
  align?: "start" | "end";
  /** False lets the page behind be scrolled and pressed while the menu is open. */
  modal?: boolean;
}

export interface MenuItemProps {
  children: React.ReactNode;
  onSelect: () => void;
  disabled?: boolean;
  tone?: "ink" | "fault";
}

export interface MenuLinkProps {
  to: string;
  children: React.ReactNode;
  /** The address is a file to take, not a page. */
  download?: boolean;
}

export interface MenuChoiceProps<Value extends string> {
  value: Value;
  options: readonly { value: Value; label: string; hint?: string }[];
  onChange: (value: Value) => void;
}

const fetchParts = () => fetchPart(() => import("./menuParts"));
const OpenedMenu = lazy(() => fetchParts().then((parts) => ({ default: parts.OpenedMenu })));

/** One verb of a menu. */
export const MenuItem = lazy(() => fetchParts().then((parts) => ({ default: parts.Item })));
/** A page to go to, or a file to take, from a menu. */
export const MenuLink = lazy(() => fetchParts().then((parts) => ({ default: parts.LinkItem })));
/** Words over a group of a menu. */
export const MenuLabel = lazy(() => fetchParts().then((parts) => ({ default: parts.Label })));
/** A hairline between groups of a menu. */
export const MenuRule = lazy(() => fetchParts().then((parts) => ({ default: parts.Rule })));

const AnyChoice = lazy(() => fetchParts().then((parts) => ({ default: parts.Choice })));

/** One of several within a menu: the current one stands on a glow line. */
export function MenuChoice<Value extends string>({ value, options, onChange }: MenuChoiceProps<Value>) {
  return <AnyChoice value={value} options={options} onChange={(next) => onChange(next as Value)} />;
}

/** A menu, hanging from its word. */
export function Menu(props: MenuProps) {
  const [isWanted, setWanted] = useState(false);
  const { trigger } = props;
  if (isWanted) {
    return (
      <Suspense fallback={trigger}>
        <OpenedMenu {...props} />
      </Suspense>
    );
  }
  const prefetch = (): void => void fetchParts();
  return cloneElement(trigger, {
    "aria-haspopup": "menu",
    "aria-expanded": false,
    onPointerEnter: prefetch,
    onFocus: prefetch,
    onClick: () => setWanted(true),
    onKeyDown: (event: React.KeyboardEvent) => {
      if (event.key !== "ArrowDown") return;
      event.preventDefault();
      setWanted(true);
    },
  });
}
