import { describe, expect, it } from "vitest";

import { solveLinear } from "../../../../shared/physics/numerics/solveLinear";
import { seededRandom } from "../seededRandom";

describe("solveLinear", () => {
  it.each([1, 2, 5, 13, 33])("solves %d random equations for several right-hand sides", (size) => {
    const random = seededRandom(size);
    const columns = 3;
    const matrix = Float64Array.from({ length: size * size }, () => random() - 0.5);
    const expected = Float64Array.from({ length: size * columns }, () => random() - 0.5);
    const vectors = new Float64Array(size * columns);
    for (let i = 0; i < size; i += 1) {
      for (let c = 0; c < columns; c += 1) {
        for (let k = 0; k < size; k += 1) {
          vectors[i * columns + c] += matrix[i * size + k] * expected[k * columns + c];
        }
      }
    }
    expect(solveLinear(matrix, size, vectors, columns)).toBe(true);
    // Random matrices of this size have condition numbers up to some 1e3.
    vectors.forEach((value, k) => expect(value).toBeCloseTo(expected[k], 10));
  });

  it("exchanges rows where the first pivot is zero", () => {
    const vector = Float64Array.of(3, 2);
    expect(solveLinear(Float64Array.of(0, 1, 1, 0), 2, vector, 1)).toBe(true);
    expect([...vector]).toEqual([2, 3]);
  });

  it.each([
    ["singular", [1, 2, 2, 4]],
    ["without any number", [NaN, 1, 1, 1]],
    ["infinite", [Infinity, 1, 1, 1]],
  ])("says that a matrix that is %s has no solution", (_, entries) => {
    expect(solveLinear(Float64Array.from(entries), 2, Float64Array.of(1, 1), 1)).toBe(false);
  });

  it("says so where a right-hand side is not a number", () => {
    expect(solveLinear(Float64Array.of(1, 0, 0, 1), 2, Float64Array.of(1, NaN), 1)).toBe(false);
  });
});
