import type { ContourPoint } from "./contourLines";

export interface LabelledContour {
  level: number;
  /** px, y counted downward. */
  lines: readonly (readonly ContourPoint[])[];
  /** px */
  labelWidth: number;
}

export interface ContourLabel {
  level: number;
  x: number;
  y: number;
  /** Degrees clockwise, such that it reads from left to right. */
  angle: number;
}

interface Frame {
  width: number;
  height: number;
}

/** px between labels, and between a label and what must stay clear. */
const apart = 14;
const labelHeight = 16;

/**
 * Labels on their contours: where the line runs straight for the width of its label, near the middle of its longest
 * piece, clear of one another and of the places given. A contour that offers no such place goes without; the colour bar
 * names it.
 */
export function contourLabels(
  contours: readonly LabelledContour[],
  frame: Frame,
  clear: readonly ContourPoint[],
): ContourLabel[] {
  const placed: (ContourLabel & { reach: number })[] = [];
  for (const contour of contours) {
    const candidates = contour.lines
      .flatMap((line) => candidatesOn(line, contour, frame))
      .sort((a, b) => a.cost - b.cost);
    const free = candidates.find(
      ({ x, y }) =>
        placed.every(
          (other) => distance([x, y], [other.x, other.y]) > other.reach + contour.labelWidth / 2 + apart,
        ) && clear.every((place) => distance([x, y], place) > contour.labelWidth / 2 + apart),
    );
    if (free)
      placed.push({
        level: contour.level,
        x: free.x,
        y: free.y,
        angle: free.angle,
        reach: contour.labelWidth / 2,
      });
  }
  return placed.map(({ level, x, y, angle }) => ({ level, x, y, angle }));
}

const distance = ([x0, y0]: ContourPoint, [x1, y1]: ContourPoint): number => Math.hypot(x1 - x0, y1 - y0);

function candidatesOn(line: readonly ContourPoint[], { level, labelWidth }: LabelledContour, frame: Frame) {
  const lengths = [0];
  for (let i = 1; i < line.length; i++) lengths.push(lengths[i - 1]! + distance(line[i - 1]!, line[i]!));
  const whole = lengths.at(-1)!;
  const found: (ContourLabel & { cost: number })[] = [];
  if (whole < 1.6 * labelWidth) return found;
  for (let at = labelWidth / 2; at <= whole - labelWidth / 2; at += 6) {
    const [from, middle, to] = [at - labelWidth / 2, at, at + labelWidth / 2].map((length) =>
      pointAt(line, lengths, length),
    );
    const [x, y] = middle!;
    const [dx, dy] = [to![0] - from![0], to![1] - from![1]];
    const bend = 1 - Math.hypot(dx, dy) / labelWidth;
    const angle = (Math.atan2(dy, dx) * 180) / Math.PI;
    const upright = angle > 90 ? angle - 180 : angle <= -90 ? angle + 180 : angle;
    const reachX = (Math.abs(Math.cos((upright * Math.PI) / 180)) * labelWidth + labelHeight) / 2;
    const reachY = (Math.abs(Math.sin((upright * Math.PI) / 180)) * labelWidth + labelHeight) / 2;
    if (x < reachX || x > frame.width - reachX || y < reachY || y > frame.height - reachY) continue;
    const offCentre = Math.abs(at / whole - 0.5);
    // A long line is the better one to speak for its level.
    const cost = 40 * bend + 2 * offCentre + 60 / whole + 0.004 * Math.abs(upright);
    found.push({ level, x, y, angle: upright, cost });
  }
  return found;
}

function pointAt(line: readonly ContourPoint[], lengths: readonly number[], length: number): ContourPoint {
  const next = Math.max(
    1,
    lengths.findIndex((reached) => reached >= length),
  );
  const [a, b] = [line[next - 1]!, line[next] ?? line[next - 1]!];
  const span = lengths[next]! - lengths[next - 1]! || 1;
  const share = Math.min(1, Math.max(0, (length - lengths[next - 1]!) / span));
  return [a[0] + share * (b[0] - a[0]), a[1] + share * (b[1] - a[1])];
}
