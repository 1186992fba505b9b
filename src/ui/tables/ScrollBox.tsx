import { useEffect, useRef, useState, type PropsWithChildren } from "react";
import "./tables.css";

/** A table wider than its page can be drawn past, by hand or, then, by key. */
export function ScrollBox({ label, children }: PropsWithChildren<{ label: string }>) {
  const ref = useRef<HTMLDivElement>(null);
  const [isWide, setIsWide] = useState(false);
  useEffect(() => {
    const box = ref.current;
    if (!box || typeof ResizeObserver === "undefined") return undefined;
    // Asked after layout, so that no key that changes a number waits for one.
    const observer = new ResizeObserver(() => setIsWide(box.scrollWidth > box.clientWidth + 1));
    observer.observe(box);
    if (box.firstElementChild) observer.observe(box.firstElementChild);
    return () => observer.disconnect();
  }, []);
  return (
    <div
      ref={ref}
      className="table-scroll"
      role={isWide ? "region" : undefined}
      aria-label={isWide ? label : undefined}
      tabIndex={isWide ? 0 : undefined}
    >
      {children}
    </div>
  );
}
