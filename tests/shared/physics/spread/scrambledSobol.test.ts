import { describe, expect, it } from "vitest";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { scrambledSobol } from "../../../../shared/physics/spread/scrambledSobol";

function points(dimensions: number, count: number, seed = 1, scrambling = 0): number[][] {
  const sequence = scrambledSobol(dimensions, seed);
  const point = new Float64Array(dimensions);
  return Array.from({ length: count }, (_, index) => {
    sequence.pointAt(index, scrambling, point);
    return Array.from(point);
  });
}

const mean = (values: number[]) => values.reduce((sum, value) => sum + value, 0) / values.length;

describe("scrambledSobol", () => {
  it("keeps one of 2^k points in each of 2^k equal intervals, in 128 dimensions", () => {
    const drawn = points(128, 256);
    for (let d = 0; d < 128; d += 1) {
      expect(new Set(drawn.map((point) => Math.floor(point[d] * 256))).size).toBe(256);
    }
  });

  it("keeps the net of the first two dimensions: 2^8 points, one in each of 2^8 boxes of any shape", () => {
    const drawn = points(2, 256, 7, 3);
    for (let k = 0; k <= 8; k += 1) {
      const boxes = drawn.map(([x, y]) => `${Math.floor(x * 2 ** k)} ${Math.floor(y * 2 ** (8 - k))}`);
      expect(new Set(boxes).size).toBe(256);
    }
  });

  it("integrates a smooth product far better than chance, and shows by its scramblings how well", () => {
    // ∏ (1 + (u − ½)) has the mean 1; plain Monte Carlo with 1024 points would err by about 0.017
    const estimates = Array.from({ length: 16 }, (_, scrambling) =>
      mean(
        points(6, 1024, 5, scrambling).map((point) => point.reduce((product, u) => product * (u + 0.5), 1)),
      ),
    );
    const centre = mean(estimates);
    const deviation = Math.sqrt(mean(estimates.map((estimate) => (estimate - centre) ** 2)) * (16 / 15));
    expect(deviation).toBeLessThan(1e-3);
    expect(Math.abs(centre - 1)).toBeLessThan((4 * deviation) / 4);
  });

  it("makes every point uniform over scramblings and seeds", () => {
    const firsts = Array.from({ length: 2000 }, (_, i) => points(1, 1, i, i % 8)[0][0]);
    // Mean ½ and variance 1/12, four standard errors
    expect(Math.abs(mean(firsts) - 0.5)).toBeLessThan(4 / Math.sqrt(12 * 2000));
    expect(Math.abs(mean(firsts.map((u) => (u - 0.5) ** 2)) - 1 / 12)).toBeLessThan(
      4 * Math.sqrt(1 / 180 / 2000),
    );
  });

  it("leaves neighbouring dimensions without correlation", () => {
    const drawn = points(32, 1024);
    for (let d = 1; d < 32; d += 1) {
      const products = drawn.map((point) => (point[d] - 0.5) * (point[d - 1] - 0.5));
      expect(Math.abs(12 * mean(products))).toBeLessThan(4 / Math.sqrt(1024));
    }
  });

  it("gives scramblings whose estimates are independent of one another", () => {
    // Errors of the mean of u² of 16 points, of scramblings 2i and 2i + 1
    const errors = Array.from(
      { length: 800 },
      (_, scrambling) => mean(points(1, 16, 3, scrambling).map(([u]) => u * u)) - 1 / 3,
    );
    const pairs = Array.from({ length: 400 }, (_, i) => errors[2 * i] * errors[2 * i + 1]);
    expect(Math.abs(mean(pairs) / mean(errors.map((error) => error * error)))).toBeLessThan(
      4 / Math.sqrt(400),
    );
  });

  it("gives a point by its index alone, the same for fewer dimensions", () => {
    const drawn = points(5, 64);
    const point = new Float64Array(3);
    scrambledSobol(3, 1).pointAt(63, 0, point);
    expect(Array.from(point)).toEqual(drawn[63].slice(0, 3));
    expect(points(5, 64, 2)).not.toEqual(drawn);
  });

  it("stays strictly between 0 and 1", () => {
    expect(points(16, 4096).every((point) => point.every((u) => u > 0 && u < 1))).toBe(true);
  });

  it.each([-1, 0.5, NaN, 2 ** 32])("refuses a seed of %s", (seed) => {
    expect(() => scrambledSobol(1, seed)).toThrow(PhysicsDomainError);
  });
});
