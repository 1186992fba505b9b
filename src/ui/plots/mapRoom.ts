/** Room of a map with its colour bar, px. */
export interface MapRoom {
  width: number;
  height: number;
  left: number;
  right: number;
  top: number;
  bottom: number;
  /** Width and height of the map itself. */
  panel: number;
  tall: number;
  /** Colour bar: its distance from the map and its width. */
  gap: number;
  bar: number;
}

const narrow = 560;

export function mapRoom(width: number): MapRoom {
  const isNarrow = width < narrow;
  const [left, top, bottom, gap, bar] = isNarrow ? [54, 12, 50, 14, 12] : [66, 12, 50, 29, 14];
  // Right of the bar stand its numbers.
  const right = isNarrow ? 44 : 62;
  const panel = width - left - right - gap - bar;
  const tall = Math.round(Math.min(436, Math.max(230, 0.8 * panel)));
  return { width, height: top + tall + bottom, left, right, top, bottom, panel, tall, gap, bar };
}
