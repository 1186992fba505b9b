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
/** px between the rows at which curves are looked at; a name may stand at every third. */
const rowStep = 4;
/** Further than this a curve does not disturb a name, px. */
const reach = 24;

/** On which side of its curve a name may stand, and how far it is lifted off it, px. */
const sides = (["start", "end"] as const).flatMap((anchor) => [0, 7, -7].map((lift) => ({ anchor, lift })));

const overlaps = (a: Box, b: Box): boolean =>
  a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom;

/** Where a curve runs within each row of `rowStep` px, since altitude only grows along it; NaN where it does not. */
interface CurveRows {
  left: Float64Array;
  right: Float64Array;
}

function rowsOf({ points }: PlacedCurve, height: number): CurveRows {
  const count = Math.ceil(height / rowStep) + 1;
  const rows = { left: new Float64Array(count).fill(NaN), right: new Float64Array(count).fill(NaN) };
  const reached = (row: number, x: number) => {
    if (row < 0 || row >= count) return;
    rows.left[row] = Number.isNaN(rows.left[row]!) ? x : Math.min(rows.left[row]!, x);
    rows.right[row] = Number.isNaN(rows.right[row]!) ? x : Math.max(rows.right[row]!, x);
  };
  for (let i = 1; i < points.length; i++) {
    const [[x0, y0], [x1, y1]] = [points[i - 1]!, points[i]!];
    const pieces = Math.max(1, Math.ceil((2 * Math.abs(y1 - y0)) / rowStep));
    for (let k = 0; k <= pieces; k++) {
      const row = Math.floor((y0 + ((y1 - y0) * k) / pieces) / rowStep);
      reached(row, x0 + ((x1 - x0) * k) / pieces);
    }
  }
  return rows;
}

/** px from a box to a curve, no further than `reach`. */
function clearance(box: Box, { left, right }: CurveRows): number {
  let nearest = reach;
  const from = Math.max(0, Math.floor((box.top - reach) / rowStep));
  const to = Math.min(left.length - 1, Math.ceil((box.bottom + reach) / rowStep));
  for (let row = from; row <= to; row++) {
    if (Number.isNaN(left[row]!)) continue;
    const dx = Math.max(0, box.left - right[row]!, left[row]! - box.right);
    const dy = Math.max(0, box.top - (row + 1) * rowStep, row * rowStep - box.bottom);
    nearest = Math.min(nearest, Math.sqrt(dx * dx + dy * dy));
    if (nearest === 0) break;
  }
  return nearest;
}

interface Candidate extends PlacedName {
  cost: number;
}

/** How badly a box stands: on or near curves, near the axis, far from the upper third where curves part. */
function costOf(box: Box, own: CurveRows, all: readonly CurveRows[], frame: Box): number {
  let cost = 3 * Math.exp(-(box.left - frame.left) / 30);
  cost += 8 * Math.abs(((box.top + box.bottom) / 2 - frame.top) / (frame.bottom - frame.top) - 0.3);
  for (const other of all) {
    const distance = clearance(box, other);
    if (other === own) cost += distance < 3 ? 60 : Math.max(0, 6 - distance);
    else cost += distance < 1 ? 200 : 30 * Math.exp(-distance / 5);
  }
  return cost;
}

/** Places beside one curve inside the frame and clear of the obstacles, the best first. */
function candidatesFor(
  curve: PlacedCurve,
  own: CurveRows,
  all: readonly CurveRows[],
  frame: Box,
  obstacles: readonly Box[],
): Candidate[] {
  const found: Candidate[] = [];
  for (let row = 0; row < own.left.length; row += 3) {
    if (Number.isNaN(own.left[row]!)) continue;
    const curveY = (row + 0.5) * rowStep;
    for (const { anchor, lift } of sides) {
      const x = anchor === "start" ? own.right[row]! + gap : own.left[row]! - gap;
      const y = curveY - lift;
      const left = anchor === "start" ? x : x - curve.nameWidth;
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
      const cost = costOf(box, own, all, frame) + (anchor === "start" ? 0 : 0.6) + Math.abs(lift) * 0.05;
      found.push({ key: curve.key, x, y, anchor, box, cost });
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
  const rows = curves.map((curve) => rowsOf(curve, frame.bottom));
  const options = curves.map((curve, i) => ({
    key: curve.key,
    candidates: candidatesFor(curve, rows[i]!, rows, frame, obstacles),
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
