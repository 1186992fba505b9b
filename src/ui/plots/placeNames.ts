/** A curve in px, y counted downward. */
export interface PlacedCurve {
  key: string;
  /** Width of its name, px. */
  nameWidth: number;
  points: readonly (readonly [x: number, y: number])[];
}

export interface Box {
  left: number;
  right: number;
  top: number;
  bottom: number;
}

export interface PlacedName {
  key: string;
  /** Where the name begins (`start`) or ends (`end`), and its middle line. */
  x: number;
  y: number;
  anchor: "start" | "end";
  box: Box;
}

const nameHeight = 16;
/** px between a curve and its name. */
const gap = 7;
const stride = 9;

/** On which side of its curve a name may stand, and how far it is lifted off it, px. */
const sides = (["start", "end"] as const).flatMap((anchor) => [0, 7, -7].map((lift) => ({ anchor, lift })));

const overlaps = (a: Box, b: Box): boolean =>
  a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom;

/** px from a box to the nearest point of a curve, sampled densely between its points; 0 inside. */
function clearance(box: Box, points: PlacedCurve["points"]): number {
  let nearest = Infinity;
  for (let i = 1; i < points.length; i++) {
    const [x0, y0] = points[i - 1]!;
    const [x1, y1] = points[i]!;
    if (Math.min(y0, y1) > box.bottom + 40 || Math.max(y0, y1) < box.top - 40) continue;
    const pieces = Math.max(1, Math.ceil(Math.hypot(x1 - x0, y1 - y0) / 4));
    for (let k = 0; k <= pieces; k++) {
      const x = x0 + ((x1 - x0) * k) / pieces;
      const y = y0 + ((y1 - y0) * k) / pieces;
      const dx = Math.max(0, box.left - x, x - box.right);
      const dy = Math.max(0, box.top - y, y - box.bottom);
      nearest = Math.min(nearest, Math.hypot(dx, dy));
      if (nearest === 0) return 0;
    }
  }
  return nearest;
}

interface Candidate extends PlacedName {
  cost: number;
}

/** Places beside one curve inside the frame and clear of the obstacles, the best first. */
function candidatesFor(
  curve: PlacedCurve,
  curves: readonly PlacedCurve[],
  frame: Box,
  obstacles: readonly Box[],
): Candidate[] {
  const found: Candidate[] = [];
  for (let i = 1; i < curve.points.length; i++) {
    const [x0, y0] = curve.points[i - 1]!;
    const [x1, y1] = curve.points[i]!;
    const pieces = Math.max(1, Math.round(Math.hypot(x1 - x0, y1 - y0) / stride));
    for (let k = 0; k < pieces; k++) {
      const x = x0 + ((x1 - x0) * k) / pieces;
      const y = y0 + ((y1 - y0) * k) / pieces;
      for (const { anchor, lift } of sides) {
        const left = anchor === "start" ? x + gap : x - gap - curve.nameWidth;
        const box = {
          left,
          right: left + curve.nameWidth,
          top: y - nameHeight / 2,
          bottom: y + nameHeight / 2,
        };
        const inside =
          box.left >= frame.left &&
          box.right <= frame.right &&
          box.top >= frame.top &&
          box.bottom <= frame.bottom;
        if (!inside || obstacles.some((obstacle) => overlaps(box, obstacle))) continue;
        let cost = (anchor === "start" ? 0 : 0.6) + Math.abs(lift) * 0.05;
        for (const other of curves) {
          const distance = clearance(box, other.points);
          if (other === curve) cost += distance < 3 ? 60 : Math.max(0, 6 - distance);
          else cost += distance < 1 ? 200 : 30 * Math.exp(-distance / 5);
        }
        // The upper half is where curves stand apart, and not quite at an end.
        cost += 8 * Math.abs((y - frame.top) / (frame.bottom - frame.top) - 0.3);
        cost += 3 * Math.exp(-(box.left - frame.left) / 30);
        const edge = anchor === "start" ? x + gap : x - gap;
        found.push({ key: curve.key, x: edge, y: y - lift, anchor, box, cost });
      }
    }
  }
  return found.sort((a, b) => a.cost - b.cost);
}

/**
 * Names beside their curves: inside the frame, never on one another or on an obstacle, clear of other curves
 * where they can be. The curve with the fewest good places chooses first. A name that finds no place is left
 * out, and belongs in a legend.
 */
export function placeNames(
  curves: readonly PlacedCurve[],
  frame: Box,
  obstacles: readonly Box[],
): Map<string, PlacedName> {
  const options = curves.map((curve) => ({
    key: curve.key,
    candidates: candidatesFor(curve, curves, frame, obstacles),
  }));
  const good = ({ candidates }: (typeof options)[number]) =>
    candidates.filter(({ cost }) => cost < 30).length;
  const order = options.map((option) => ({ ...option, good: good(option) })).sort((a, b) => a.good - b.good);
  const placed = new Map<string, PlacedName>();
  for (const { key, candidates } of order) {
    const free = candidates.find(({ box }) =>
      [...placed.values()].every((other) => !overlaps(box, other.box)),
    );
    if (free) placed.set(key, { key, x: free.x, y: free.y, anchor: free.anchor, box: free.box });
  }
  return placed;
}
