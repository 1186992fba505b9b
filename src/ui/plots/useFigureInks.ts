import { useSyncExternalStore } from "react";
import { askMedia } from "../../lib/askMedia";

/** Colours as a figure needs them, resolved: it cannot read custom properties. */
export type FigureInks = Record<string, string>;

/** Counts changes of the theme, so that figures resolve their colours anew. */
let themeRevision = 0;
/** On paper every figure is as by day. */
let isPrinting = false;

/** Whether the page is being laid out for paper, when nothing may be put off. */
export const isPagePrinting = (): boolean => isPrinting;

function subscribeToTheme(onChange: () => void): () => void {
  const handle = () => {
    themeRevision += 1;
    onChange();
  };
  const handlePrint = ({ type }: Event) => {
    isPrinting = type === "beforeprint";
    handle();
  };
  window.addEventListener("beforeprint", handlePrint);
  window.addEventListener("afterprint", handlePrint);
  const observer = new MutationObserver(handle);
  observer.observe(document.documentElement, { attributes: true, attributeFilter: ["data-theme", "class"] });
  const preference = askMedia("(prefers-color-scheme: dark)");
  preference?.addEventListener("change", handle);
  return () => {
    window.removeEventListener("beforeprint", handlePrint);
    window.removeEventListener("afterprint", handlePrint);
    observer.disconnect();
    preference?.removeEventListener("change", handle);
  };
}

/**
 * Resolves CSS colours as they are at the page, or as they are by day for figures that leave it.
 *
 * @param values  CSS colours by key, such as { ink: "var(--ink)", H: "var(--g-H)" }
 */
export function resolveInks(values: Readonly<Record<string, string>>, light: "page" | "day"): FigureInks {
  const probe = document.createElement("span");
  probe.hidden = true;
  if (light === "day" || isPrinting) probe.style.colorScheme = "light";
  document.body.append(probe);
  const style = getComputedStyle(probe);
  const inks = Object.fromEntries(
    Object.entries(values).map(([key, value]) => {
      probe.style.color = value;
      return [key, style.color];
    }),
  );
  probe.remove();
  return inks;
}

/** A number that changes with the theme; what is resolved from CSS is memoised by it. */
export function useThemeRevision(): number {
  return useSyncExternalStore(
    subscribeToTheme,
    () => themeRevision,
    () => 0,
  );
}
