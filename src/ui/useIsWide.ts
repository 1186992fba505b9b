import { useSyncExternalStore } from "react";

/** From here up a page has room beside its sheet; the same number as the `wide` screen of the theme. */
const wideFrom = "(min-width: 1000px)";

function subscribe(listener: () => void): () => void {
  const media = window.matchMedia(wideFrom);
  media.addEventListener("change", listener);
  return () => media.removeEventListener("change", listener);
}

/** Whether the window is at least 1000 px wide. Where styles can decide, let them. */
export function useIsWide(): boolean {
  return useSyncExternalStore(
    subscribe,
    () => window.matchMedia(wideFrom).matches,
    () => true,
  );
}
