import type { MonotoneCubic } from "./monotoneCubic";

/**
 * A piecewise cubic whose pieces are known by number, for integrators that land on every knot and so know
 * in which piece they are. Piece 0 lies below the first knot and piece n above the last of the n knots;
 * both are constant. Piece k lies between knots k − 1 and k.
 */
export interface PiecewiseCubic {
  /** Ascending. */
  knots: Float64Array;
  /** Four a piece, of powers of the distance to its lower knot. */
  coefficients: Float64Array;
}

/** A monotone cubic cut into its pieces. */
export function piecewiseCubic({
  abscissae: knots,
  ordinates: values,
  slopes,
}: MonotoneCubic): PiecewiseCubic {
  const n = knots.length;
  const coefficients = new Float64Array(4 * (n + 1));
  coefficients[0] = values[0];
  for (let k = 1; k < n; k += 1) {
    const width = knots[k] - knots[k - 1];
    const chord = (values[k] - values[k - 1]) / width;
    coefficients[4 * k] = values[k - 1];
    coefficients[4 * k + 1] = slopes[k - 1];
    coefficients[4 * k + 2] = (3 * chord - 2 * slopes[k - 1] - slopes[k]) / width;
    coefficients[4 * k + 3] = (slopes[k - 1] + slopes[k] - 2 * chord) / (width * width);
  }
  coefficients[4 * n] = values[n - 1];
  return { knots, coefficients };
}

/** The piece in which x lies; of the two that meet at a knot, the upper one if `upward`. */
export function pieceAt(knots: Float64Array, x: number, upward: boolean): number {
  let below = 0;
  let above = knots.length;
  while (below < above) {
    const middle = (below + above) >> 1;
    if (upward ? knots[middle] <= x : knots[middle] < x) below = middle + 1;
    else above = middle;
  }
  return below;
}

/** Value of one piece at x. */
export function pieceValue({ knots, coefficients }: PiecewiseCubic, piece: number, x: number): number {
  const u = x - knots[piece > 0 ? piece - 1 : 0];
  const at = 4 * piece;
  return (
    coefficients[at] + u * (coefficients[at + 1] + u * (coefficients[at + 2] + u * coefficients[at + 3]))
  );
}

/** Slope of one piece at x. */
export function pieceSlope({ knots, coefficients }: PiecewiseCubic, piece: number, x: number): number {
  const u = x - knots[piece > 0 ? piece - 1 : 0];
  const at = 4 * piece;
  return coefficients[at + 1] + u * (2 * coefficients[at + 2] + 3 * u * coefficients[at + 3]);
}
