import { describe, expect, it } from "vitest";

import { solveSymmetric } from "../../../../shared/physics/numerics/solveSymmetric";
import "../../../toBeCloseToRelative";
import { seededRandom } from "../seededRandom";

/** Solves by elimination with pivoting: the other route. */
function eliminate(matrix: number[][], vector: number[]): number[] {
  const rows = matrix.map((row, i) => [...row, vector[i]]);
  const n = rows.length;
  for (let j = 0; j < n; j += 1) {
    let best = j;
    for (let i = j; i < n; i += 1) if (Math.abs(rows[i][j]) > Math.abs(rows[best][j])) best = i;
    [rows[j], rows[best]] = [rows[best], rows[j]];
    for (let i = 0; i < n; i += 1) {
      if (i === j) continue;
      const factor = rows[i][j] / rows[j][j];
      for (let k = j; k <= n; k += 1) rows[i][k] -= factor * rows[j][k];
    }
  }
  return rows.map((row, i) => row[n] / row[i]);
}

function solve(matrix: number[][], vector: number[], stride = matrix.length): number[] {
  const n = matrix.length;
  const flat = new Float64Array(stride * n).fill(NaN);
  for (let i = 0; i < n; i += 1) for (let j = 0; j <= i; j += 1) flat[i * stride + j] = matrix[i][j];
  const x = Float64Array.from(vector);
  solveSymmetric(flat, stride, n, x);
  return [...x];
}

describe("solveSymmetric", () => {
  it("solves a system that can be solved by hand", () => {
    expect(
      solve(
        [
          [4, 2],
          [2, 3],
        ],
        [10, 9],
      ),
    ).toEqual([1.5, 2]);
  });

  it.each([1, 2, 3, 5, 8, 13])(
    "agrees with elimination on %i unknowns, reading the lower triangle only",
    (n) => {
      const random = seededRandom(n);
      const root = Array.from({ length: n }, () => Array.from({ length: n }, () => random() - 0.5));
      const matrix = root.map((_, i) =>
        root.map((__, j) => root.reduce((sum, row) => sum + row[i] * row[j], i === j ? 0.1 : 0)),
      );
      const vector = root.map(() => random() - 0.5);
      const expected = eliminate(matrix, vector);
      solve(matrix, vector, n + 3).forEach((x, i) => expect(x).toBeCloseToRelative(expected[i], 1e-10));
    },
  );

  it("keeps its digits when friction is 1e16 times what drives it", () => {
    // Two gases in a third: N = −(1 + κ/b), (1 − X + κS)/X. For equal b the answer is s X/(1 + κ/b) summed by hand.
    const kappa = 1e16;
    const [x1, x2] = [0.2, 1e-9];
    const resistance = (x: number) => 1 - x;
    const diagonal = (x: number) => (1 - x + kappa * resistance(x)) / x;
    const off = -(1 + kappa);
    const [s1, s2] = [1, -3];
    const [q1, q2] = solve(
      [
        [diagonal(x1), off],
        [off, diagonal(x2)],
      ],
      [s1, s2],
    );
    // With equal b, y′ = (s + κ Σ X y′)/(1 + κ) and Σ X y′ = 0, the third gas following from Σ X s = 0.
    const s3 = -(x1 * s1 + x2 * s2) / (1 - x1 - x2);
    expect(q1).toBeCloseToRelative((x1 * (s1 - s3)) / (1 + kappa), 1e-14);
    expect(q2).toBeCloseToRelative((x2 * (s2 - s3)) / (1 + kappa), 1e-14);
  });
});
