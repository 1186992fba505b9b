import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { placeNames, type Box, type PlacedCurve } from "../../../../src/ui/plots/placeNames";

const frame: Box = { left: 0, right: 500, top: 0, bottom: 400 };
const straight = (key: string, from: number, to: number): PlacedCurve => ({
  key,
  nameWidth: 22,
  points: Array.from({ length: 41 }, (_, i) => [from + ((to - from) * i) / 40, 400 - i * 10] as const),
});
const touch = (a: Box, b: Box) =>
  a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom;

describe("placeNames", () => {
  it("sets each name beside its own curve and clear of the others", () => {
    const curves = [straight("O", 400, 100), straight("H", 200, 180), straight("CO2", 480, 20)];
    const placed = placeNames(curves, frame, []);
    expect([...placed.keys()].sort()).toEqual(["CO2", "H", "O"]);
    for (const { key, points } of curves) {
      const { box, x } = placed.get(key)!;
      const middle = (box.top + box.bottom) / 2;
      const nearest = points.reduce((a, b) => (Math.abs(b[1] - middle) < Math.abs(a[1] - middle) ? b : a));
      expect(Math.abs(nearest[0] - x)).toBeLessThan(24);
      for (const other of curves) {
        const inside = other.points.some(
          ([px, py]) => px > box.left && px < box.right && py > box.top && py < box.bottom,
        );
        expect(inside).toBe(false);
      }
    }
  });

  it("keeps off lettering that is there already", () => {
    const obstacle: Box = { left: 0, right: 500, top: 40, bottom: 200 };
    const { box } = placeNames([straight("O", 400, 100)], frame, [obstacle]).get("O")!;
    expect(touch(box, obstacle)).toBe(false);
  });

  it("leaves out a name for which there is no room", () => {
    expect(placeNames([straight("O", 900, 800)], frame, []).size).toBe(0);
  });

  it("never sets two names on one another, nor one outside the frame", () => {
    const ends = fc.array(fc.tuple(fc.integer({ min: -50, max: 550 }), fc.integer({ min: -50, max: 550 })), {
      minLength: 1,
      maxLength: 10,
    });
    fc.assert(
      fc.property(ends, (pairs) => {
        const curves = pairs.map(([from, to], i) => straight(`G${i}`, from, to));
        const boxes = [...placeNames(curves, frame, []).values()].map(({ box }) => box);
        for (const [i, a] of boxes.entries()) {
          expect(a.left >= frame.left && a.right <= frame.right && a.top >= 0 && a.bottom <= 400).toBe(true);
          for (const b of boxes.slice(0, i)) expect(touch(a, b)).toBe(false);
        }
      }),
      { seed: 589, numRuns: 60 },
    );
  });
});
