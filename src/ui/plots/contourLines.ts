import type { MapGrid } from "./mapGrid";

export type ContourPoint = readonly [x: number, y: number];

interface Segment {
  /** Edges of the meshes that it joins. */
  ends: readonly [string, string];
  points: readonly [ContourPoint, ContourPoint];
}

/**
 * Lines along which a grid has a value, by marching squares: straight within each mesh, joined from mesh to mesh. Meshes
 * that lack a corner have none.
 */
export function contourLines(grid: MapGrid, level: number): ContourPoint[][] {
  return joined(segmentsOf(grid, level));
}

function segmentsOf({ x, y, z }: MapGrid, level: number): Segment[] {
  const segments: Segment[] = [];
  for (let row = 0; row + 1 < y.length; row++) {
    for (let column = 0; column + 1 < x.length; column++) {
      const corners = [
        z[row]![column]!,
        z[row]![column + 1]!,
        z[row + 1]![column + 1]!,
        z[row + 1]![column]!,
      ];
      if (corners.some((corner) => corner === null || corner === undefined)) continue;
      const crossings = meshCrossings(
        corners,
        level,
        [x[column]!, x[column + 1]!],
        [y[row]!, y[row + 1]!],
        column,
        row,
      );
      for (const [a, b] of pairs(crossings, corners, level))
        segments.push({ ends: [a.edge, b.edge], points: [a.point, b.point] });
    }
  }
  return segments;
}

interface Crossing {
  edge: string;
  point: ContourPoint;
}

/** Where the level passes the edges of a mesh: below, right, above, left. */
function meshCrossings(
  [a, b, c, d]: readonly number[],
  level: number,
  [x0, x1]: readonly [number, number],
  [y0, y1]: readonly [number, number],
  column: number,
  row: number,
): (Crossing | null)[] {
  const share = (from: number, to: number) => (level - from) / (to - from);
  const passes = (from: number, to: number) => from < level !== to < level;
  const across = (from: number, to: number, y: number, at: number): Crossing | null =>
    passes(from, to) ? { edge: `h${column} ${at}`, point: [x0 + share(from, to) * (x1 - x0), y] } : null;
  const upright = (from: number, to: number, x: number, at: number): Crossing | null =>
    passes(from, to) ? { edge: `v${at} ${row}`, point: [x, y0 + share(from, to) * (y1 - y0)] } : null;
  return [
    across(a!, b!, y0, row),
    upright(b!, c!, x1, column + 1),
    across(d!, c!, y1, row + 1),
    upright(a!, d!, x0, column),
  ];
}

/** Two crossings are one line; four are a saddle, told apart by the middle of the mesh. */
function pairs(
  crossings: readonly (Crossing | null)[],
  corners: readonly number[],
  level: number,
): [Crossing, Crossing][] {
  const found = crossings.filter((crossing) => crossing !== null);
  if (found.length === 2) return [[found[0]!, found[1]!]];
  if (found.length < 4) return [];
  const [below, right, above, left] = found as [Crossing, Crossing, Crossing, Crossing];
  const middle = corners.reduce((sum, corner) => sum + corner / 4, 0);
  const isFirstJoined = middle < level === corners[0]! < level;
  return isFirstJoined
    ? [
        [below, right],
        [above, left],
      ]
    : [
        [below, left],
        [above, right],
      ];
}

function joined(segments: readonly Segment[]): ContourPoint[][] {
  const byEnd = new Map<string, Segment[]>();
  for (const segment of segments)
    for (const end of segment.ends) byEnd.set(end, [...(byEnd.get(end) ?? []), segment]);
  const left = new Set(segments);
  const follow = (end: string): ContourPoint[] => {
    const points: ContourPoint[] = [];
    let at = end;
    for (;;) {
      const next = byEnd.get(at)?.find((candidate) => left.has(candidate));
      if (!next) return points;
      left.delete(next);
      const side = next.ends[0] === at ? 1 : 0;
      points.push(next.points[side]);
      at = next.ends[side];
    }
  };
  const lines: ContourPoint[][] = [];
  for (const segment of segments) {
    if (!left.delete(segment)) continue;
    const forward = follow(segment.ends[1]);
    const backward = follow(segment.ends[0]);
    lines.push([...backward.reverse(), segment.points[0], segment.points[1], ...forward]);
  }
  return lines;
}
