/** Room of a figure in px, the same for all, so that figures below each other stand in line. */
export interface FigureRoom {
  width: number;
  height: number;
  left: number;
  right: number;
  top: number;
  bottom: number;
  /** Width of the main panel, and of the second one with the gap before it; 0 where there is none. */
  panel: number;
  second: number;
  gap: number;
  /** Height of the panels. */
  tall: number;
}

/** Under this a figure gives up its second panel. */
const narrow = 560;

export type FigureShape = "two panels" | "one panel";

export function figureRoom(width: number, highestKm: number, shape: FigureShape): FigureRoom {
  const isNarrow = width < narrow;
  const height = isNarrow ? 430 : shape === "two panels" ? 486 : 396;
  const hasSecond = shape === "two panels" && !isNarrow;
  const [second, gap] = hasSecond ? [132, 26] : [0, 0];
  const [left, right, top, bottom] = [highestKm >= 1000 ? 56 : 48, hasSecond ? 6 : 4, 12, 46];
  return {
    width,
    height,
    left,
    right,
    top,
    bottom,
    second,
    gap,
    panel: width - left - right - second - gap,
    tall: height - top - bottom,
  };
}
