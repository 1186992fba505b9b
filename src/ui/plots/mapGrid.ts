import type { AxisScale } from "./axisTicks";
import type { SweepAxis } from "./sweepResult";
import { sweepScale } from "./sweepPlot";

/** One watched quantity over two varied ones, in places along their axes, ascending either way. */
export interface MapGrid {
  x: number[];
  y: number[];
  /** z[row][column]; null where there is no answer. */
  z: (number | null)[][];
  /** Index of each point among those of the sweep. */
  index: number[][];
}

const ascending = (places: readonly number[]): number[] =>
  places.map((_, index) => index).sort((a, b) => places[a]! - places[b]!);

/** @param values  SI, point by point, the first axis fastest */
export function mapGrid(
  [first, second]: readonly SweepAxis[],
  values: readonly (number | null)[],
  scale: AxisScale,
): MapGrid {
  const [xs, ys] = [first!, second!].map((axis) => axis.values.map(sweepScale(axis).place)) as [
    number[],
    number[],
  ];
  const [columns, rows] = [ascending(xs), ascending(ys)];
  const index = rows.map((row) => columns.map((column) => row * xs.length + column));
  const placeOf = (value: number | null | undefined): number | null => {
    const place = value === null || value === undefined ? NaN : scale.place(value);
    return Number.isFinite(place) ? place : null;
  };
  return {
    x: columns.map((column) => xs[column]!),
    y: rows.map((row) => ys[row]!),
    z: index.map((line) => line.map((point) => placeOf(values[point]))),
    index,
  };
}

/** A mesh between four points; its lower left one. */
interface Mesh {
  column: number;
  row: number;
}

/** Meshes that lack a corner: there the map says nothing. */
export function emptyMeshes({ x, y, z }: MapGrid): Mesh[] {
  const found: Mesh[] = [];
  for (let row = 0; row + 1 < y.length; row++)
    for (let column = 0; column + 1 < x.length; column++)
      if (!isWhole(z, column, row)) found.push({ column, row });
  return found;
}

function isWhole(z: MapGrid["z"], column: number, row: number): boolean {
  return [z[row]![column], z[row]![column + 1], z[row + 1]![column], z[row + 1]![column + 1]].every(
    (place) => place !== null && place !== undefined,
  );
}

/**
 * The same with points without an answer filled from their neighbours, so that bands run on up to the hatching that
 * covers them.
 */
export function filledGrid({ z }: MapGrid): number[][] {
  let filled: (number | null)[][] = z.map((line) => [...line]);
  const isDone = () => filled.every((line) => line.every((place) => place !== null));
  if (filled.every((line) => line.every((place) => place === null)))
    return filled.map((line) => line.map(() => 0));
  while (!isDone()) {
    const before = filled;
    filled = before.map((line, row) =>
      line.map(
        (place, column) =>
          place ??
          meanOf([line[column - 1], line[column + 1], before[row - 1]?.[column], before[row + 1]?.[column]]),
      ),
    );
  }
  return filled as number[][];
}

function meanOf(places: readonly (number | null | undefined)[]): number | null {
  const known = places.filter((place): place is number => place !== null && place !== undefined);
  return known.length === 0 ? null : known.reduce((sum, place) => sum + place, 0) / known.length;
}
