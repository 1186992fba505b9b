import { useEffect, useState } from "react";

/** Whether any part of an element is on the screen now. */
export function useOnScreen<Element extends HTMLElement>(ref: React.RefObject<Element | null>): boolean {
  const [isOnScreen, setOnScreen] = useState(true);
  useEffect(
    function watchScreen() {
      const element = ref.current;
      if (!element || typeof IntersectionObserver === "undefined") return;
      const observer = new IntersectionObserver((entries) => {
        setOnScreen(entries.at(-1)?.isIntersecting ?? true);
      });
      observer.observe(element);
      return () => observer.disconnect();
    },
    [ref],
  );
  return isOnScreen;
}
