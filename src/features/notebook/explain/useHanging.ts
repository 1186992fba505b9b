import { useCallback, useEffect, useLayoutEffect, useState, type RefObject } from "react";

/** Where a panel hangs, in px within its desk. */
export interface Hanging {
  left: number;
  top: number;
  width: number;
  /** Of the line to the number, from the panel's left edge. */
  line: number;
}

const widest = 600;
/** Length of the line between number and panel. */
const drop = 20;
/** Under this width of the window the panel takes all of it. */
const narrow = 640;
/** How far left of its number a panel begins, where it has the choice. */
const overhang = 126;

/**
 * Hangs a panel under a number, over the margin rather than over the strip. It follows the number as the page changes,
 * and stays where it was while the number is not to be seen.
 */
export function useHanging(
  desk: RefObject<HTMLElement | null>,
  findNumber: () => HTMLElement | null,
): Hanging | null {
  const [hanging, setHanging] = useState<Hanging | null>(null);

  const measure = useCallback(() => {
    const number = findNumber();
    if (!desk.current || !number) return;
    const at = number.getBoundingClientRect();
    if (at.width === 0) return;
    const next = hangingAt(at, blockBottom(number), desk.current.getBoundingClientRect(), sheetLeft(number));
    setHanging((before) => (before && isSame(before, next) ? before : next));
  }, [desk, findNumber]);

  useLayoutEffect(measure);
  useEffect(
    function followNumber() {
      const observer = typeof ResizeObserver === "undefined" ? null : new ResizeObserver(measure);
      if (desk.current) observer?.observe(desk.current);
      window.addEventListener("resize", measure);
      // A table that is wider than the page scrolls by itself.
      document.addEventListener("scroll", measure, { capture: true, passive: true });
      return () => {
        observer?.disconnect();
        window.removeEventListener("resize", measure);
        document.removeEventListener("scroll", measure, { capture: true });
      };
    },
    [desk, measure],
  );
  return hanging;
}

const sheetLeft = (number: HTMLElement): number =>
  number.closest(".sheet-body, .sheet-head")?.getBoundingClientRect().left ?? 0;

/** A number of the headline has a line under it, which is left free. */
const blockBottom = (number: HTMLElement): number =>
  (number.closest(".headline > div") ?? number).getBoundingClientRect().bottom;

function hangingAt(number: DOMRect, bottom: number, desk: DOMRect, sheet: number): Hanging {
  const centre = number.left + number.width / 2 - desk.left;
  const gap = desk.width < narrow ? 12 : 24;
  const width = Math.min(desk.width < narrow ? Infinity : widest, desk.width - 2 * gap);
  const least = Math.max(gap, desk.width < narrow ? gap : sheet - desk.left - 18);
  const most = desk.width - gap - width;
  const left = Math.min(Math.max(least, centre - overhang), Math.max(gap, most));
  return {
    left: Math.round(left),
    top: Math.round(bottom - desk.top + drop),
    width: Math.round(width),
    line: Math.round(Math.min(Math.max(centre - left, 10), width - 10)),
  };
}

const isSame = (one: Hanging, other: Hanging): boolean =>
  one.left === other.left && one.top === other.top && one.width === other.width && one.line === other.line;
