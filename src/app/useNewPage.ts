import { useEffect, useRef } from "react";
import { NavigationType, useLocation, useNavigationType } from "react-router-dom";

/**
 * Begins each page that is gone to at its top, for the eye and for the keyboard. Going back leaves the place to the
 * browser, which remembers it; a change of filters is no new page.
 */
export function useNewPage(): void {
  const { pathname } = useLocation();
  const kind = useNavigationType();
  const shown = useRef(pathname);

  useEffect(
    function beginAtTop() {
      if (shown.current === pathname) return;
      shown.current = pathname;
      if (kind !== NavigationType.Pop) window.scrollTo(0, 0);
      document.getElementById("page")?.focus({ preventScroll: true });
    },
    [pathname, kind],
  );
}
