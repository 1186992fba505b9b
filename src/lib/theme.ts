/** The light in which the pages stand: as the device, day or night. Kept on this device; `public/theme.js` reads it before the first paint. */
import { useSyncExternalStore } from "react";

export const themes = ["system", "light", "dark"] as const;
export type Theme = (typeof themes)[number];

const storageKey = "tenuity.theme";
const listeners = new Set<() => void>();

function isTheme(value: unknown): value is Theme {
  return themes.some((theme) => theme === value);
}

/** What was chosen; a device that keeps nothing has the system's light. */
export function currentTheme(): Theme {
  const chosen = document.documentElement.dataset.theme;
  return isTheme(chosen) ? chosen : "system";
}

/** Puts the pages into a light and keeps the choice where the device allows. */
export function setTheme(theme: Theme): void {
  if (theme === "system") delete document.documentElement.dataset.theme;
  else document.documentElement.dataset.theme = theme;
  try {
    if (theme === "system") localStorage.removeItem(storageKey);
    else localStorage.setItem(storageKey, theme);
  } catch {
    // Storage may be closed to this page: the choice then lasts until it is left.
  }
  listeners.forEach((listener) => listener());
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

/** The chosen light and how to change it. */
export function useTheme(): [Theme, (theme: Theme) => void] {
  return [useSyncExternalStore(subscribe, currentTheme, () => "system"), setTheme];
}
