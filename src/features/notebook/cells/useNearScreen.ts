import { useEffect, useState } from "react";

/** True from when the element first comes within a window's height of the screen. */
export function useNearScreen<Element extends HTMLElement>(ref: React.RefObject<Element | null>): boolean {
  const [isNear, setNear] = useState(typeof IntersectionObserver === "undefined");

  useEffect(
    function watchScreen() {
      const element = ref.current;
      if (isNear || !element) return;
      const observer = new IntersectionObserver(
        (entries) => {
          if (entries.some((entry) => entry.isIntersecting)) setNear(true);
        },
        { rootMargin: "100% 0%" },
      );
      observer.observe(element);
      return () => observer.disconnect();
    },
    [isNear, ref],
  );
  return isNear;
}
