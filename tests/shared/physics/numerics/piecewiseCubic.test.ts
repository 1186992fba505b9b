import { describe, expect, it } from "vitest";

import { cubicSlope, cubicValue, monotoneCubic } from "../../../../shared/physics/numerics/monotoneCubic";
import {
  pieceAt,
  pieceSlope,
  pieceValue,
  piecewiseCubic,
} from "../../../../shared/physics/numerics/piecewiseCubic";
import "../../../toBeCloseToRelative";

const curve = monotoneCubic([0, 1, 1.5, 4, 9], [3, 5, 9, 8.5, 1]);
const cubic = piecewiseCubic(curve);

describe("piecewiseCubic", () => {
  it("is the monotone cubic it was cut from, in value and slope, ends included", () => {
    for (let x = -2; x <= 11; x += 0.137) {
      const piece = pieceAt(cubic.knots, x, true);
      expect(pieceValue(cubic, piece, x)).toBeCloseToRelative(cubicValue(curve, x), 1e-13);
      expect(Math.abs(pieceSlope(cubic, piece, x) - cubicSlope(curve, x))).toBeLessThan(1e-12);
    }
  });

  it("is one constant for a single point", () => {
    const single = piecewiseCubic(monotoneCubic([2], [7]));
    expect([0, 1].map((piece) => pieceValue(single, piece, 5))).toEqual([7, 7]);
    expect([0, 1].map((piece) => pieceSlope(single, piece, 5))).toEqual([0, 0]);
  });

  it("joins at every knot, in value and slope", () => {
    cubic.knots.forEach((knot, k) => {
      expect(pieceValue(cubic, k, knot)).toBeCloseToRelative(pieceValue(cubic, k + 1, knot), 1e-14);
      expect(Math.abs(pieceSlope(cubic, k, knot) - pieceSlope(cubic, k + 1, knot))).toBeLessThan(1e-13);
    });
  });
});

describe("pieceAt", () => {
  it.each([
    [-1, 0, 0],
    [0, 1, 0],
    [0.5, 1, 1],
    [1, 2, 1],
    [4, 4, 3],
    [9, 5, 4],
    [10, 5, 5],
  ])("puts %d into piece %i going up and %i going down", (x, up, down) => {
    expect(pieceAt(cubic.knots, x, true)).toBe(up);
    expect(pieceAt(cubic.knots, x, false)).toBe(down);
  });
});
