import { expect } from "vitest";

/** `expect(actual).toBeCloseToRelative(expected, 1e-9)`: |actual − expected| ≤ 1e-9 |expected|. */
expect.extend({
  toBeCloseToRelative(actual: number, expected: number, tolerance: number) {
    const error = actual === expected ? 0 : Math.abs(actual - expected) / Math.abs(expected);
    return {
      pass: error <= tolerance,
      message: () =>
        `expected ${actual} ${this.isNot ? "not " : ""}to lie within ${tolerance} of ${expected}; it is off by ${error}`,
    };
  },
});

declare module "vitest" {
  // The type parameter must be spelled as vitest spells it for the two declarations to merge.
  // eslint-disable-next-line @typescript-eslint/no-explicit-any
  interface Matchers<T = any> {
    toBeCloseToRelative(expected: number, tolerance: number): T;
  }
}
