/** Room of the figure of a sweep of one quantity, px: panels one above the other on one axis. */
export interface SweepRoom {
  width: number;
  height: number;
  left: number;
  right: number;
  top: number;
  bottom: number;
  /** Width of the panels. */
  panel: number;
  /** Height of all panels with the gaps between them. */
  tall: number;
  /** From the top, each panel's upper edge and height within `tall`. */
  panels: { from: number; tall: number }[];
}

const gap = 26;
const narrow = 560;
/** Height of the only panel, and of one among several. */
const alone = 300;
const among = 156;

/** @param names  width of the widest name beside the curves, px */
export function sweepRoom(width: number, count: number, names: number): SweepRoom {
  const isNarrow = width < narrow;
  const each = count === 1 ? alone : among;
  const tall = count * each + (count - 1) * gap;
  const [left, top, bottom] = [isNarrow ? 56 : 66, 12, 50];
  const right = Math.min(isNarrow ? 92 : 150, Math.max(18, names + 12));
  return {
    width,
    height: top + tall + bottom,
    left,
    right,
    top,
    bottom,
    panel: width - left - right,
    tall,
    panels: Array.from({ length: count }, (_, index) => ({ from: index * (each + gap), tall: each })),
  };
}
