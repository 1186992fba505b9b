import { useEffect, useRef } from "react";

/** Puts the focus on the page when another one is gone to, so that keyboard and screen reader begin at its top. */
export function useFocusOnNewPage(pathname: string): void {
  const shown = useRef(pathname);
  useEffect(
    function focusPage() {
      if (shown.current === pathname) return;
      shown.current = pathname;
      document.getElementById("page")?.focus({ preventScroll: true });
    },
    [pathname],
  );
}
