import type { FigureRoom } from "./figureRoom";

/** Two panels of the same altitudes: side by side, or one above the other where it is narrow. */
export interface CoronaRoom extends FigureRoom {
  isStacked: boolean;
}

const narrow = 560;
/** px of each panel's height where they are stacked, and of the axis between them. */
const stacked = { tall: 260, between: 62 };

export function coronaRoom(width: number): CoronaRoom {
  const [left, right, top, bottom] = [62, 6, 12, 46];
  const across = width - left - right;
  if (width < narrow) {
    const { tall, between } = stacked;
    const height = top + 2 * tall + between + bottom;
    return {
      width,
      height,
      left,
      right,
      top,
      bottom,
      tall,
      panel: across,
      second: across,
      gap: between,
      isStacked: true,
    };
  }
  const gap = 34;
  const panel = (across - gap) * 0.58;
  const height = 396;
  const tall = height - top - bottom;
  return {
    width,
    height,
    left,
    right,
    top,
    bottom,
    tall,
    panel,
    second: across - gap - panel,
    gap,
    isStacked: false,
  };
}

/** The room of the first panel alone, for what reads in it. */
export function firstPanel(room: CoronaRoom): FigureRoom {
  return room.isStacked ? { ...room, bottom: room.height - room.top - room.tall } : room;
}
