/** Room of the figure of a spread, px: histograms, beside each other where there is room, and under them what drives them. */
export interface SpreadRoom {
  width: number;
  height: number;
  left: number;
  right: number;
  top: number;
  bottom: number;
  /** Width and height between the margins. */
  across: number;
  tall: number;
  /** Place of each histogram, from the upper left. */
  histograms: Box[];
  /** Place of the axis from 0 to 1 with its rows, and over them the key. */
  shares: Box;
  /** Names of entries stand over their rows instead of before them. */
  isStacked: boolean;
  /** Height of a row. */
  row: number;
  /** Lines of the key. */
  keyLines: number;
}

interface Box {
  left: number;
  top: number;
  width: number;
  height: number;
}

const narrow = 560;
const histogram = 124;
/** Under a histogram: ticks, quantiles, title. */
const under = 84;
const between = 44;
const keyLine = 22;

interface Contents {
  histograms: number;
  inputs: number;
  /** Width of the widest name of an entry. */
  names: number;
  /** Widths of the names in the key. */
  key: readonly number[];
}

export function spreadRoom(width: number, { histograms: count, inputs, names, key }: Contents): SpreadRoom {
  const isNarrow = width < narrow;
  const [left, right, top, bottom] = [8, 14, 8, 48];
  const across = width - left - right;
  const columns = isNarrow || count < 2 ? 1 : 2;
  const each = (across - (columns - 1) * between) / columns;
  const histograms = Array.from({ length: count }, (_, index) => ({
    left: (index % columns) * (each + between),
    top: Math.floor(index / columns) * (histogram + under),
    width: each,
    height: histogram,
  }));
  const isStacked = names > 0.36 * across;
  const row = isStacked ? 42 : 34;
  const begin = isStacked ? 0 : Math.max(96, names + 24);
  const shares = { left: begin, width: across - begin };
  const keyLines = Math.max(1, ...keyPlaces(key, shares.width).map(({ line }) => line + 1));
  const from = Math.ceil(count / columns) * (histogram + under);
  const height = keyLines * keyLine + inputs * row;
  const tall = from + height;
  return {
    width,
    height: top + tall + bottom,
    left,
    right,
    top,
    bottom,
    across,
    tall,
    histograms,
    shares: { ...shares, top: from, height },
    isStacked,
    row,
    keyLines,
  };
}

/** Where each mark of the key stands, line by line. */
export function keyPlaces(widths: readonly number[], room: number): { left: number; line: number }[] {
  let [left, line] = [6, 0];
  return widths.map((width) => {
    const whole = width + 34;
    if (left > 6 && left + whole > room) [left, line] = [6, line + 1];
    const place = { left, line };
    left += whole;
    return place;
  });
}

/** px over the rows at which a line of the key stands, and at which the key ends. */
export const keyHeight = (line: number, lines: number): number => (lines - 0.5 - line) * keyLine;
export const keyEnd = (lines: number): number => lines * keyLine;
