import { describe, expect, it } from "vitest";
import { placeThreads, type MarginItem } from "../../../../../src/features/notebook/comments/placeThreads";

const item = (id: string, anchor: number, height = 100, weight = 1): MarginItem => ({
  id,
  anchor,
  height,
  weight,
});
const place = (items: MarginItem[], floor = 0): number[] => [
  ...placeThreads(items, { floor, gap: 20 }).values(),
];

describe("threads in the margin", () => {
  it("stand at their cells where they do not meet", () => {
    expect(place([item("a", 40), item("b", 160), item("c", 900)])).toEqual([40, 160, 900]);
  });

  it("that meet share the displacement, so that neither goes far", () => {
    expect(place([item("a", 300), item("b", 300)])).toEqual([240, 360]);
  });

  it("give way to the one in use, which stays beside its cell", () => {
    expect(place([item("a", 300), item("b", 300, 100, 1e6)])).toEqual([180, 300]);
  });

  it("never stand above the floor, nor over one another, whatever their anchors", () => {
    // Anchors and heights from a linear congruence, seed 7, so that each run has the same.
    let state = 7;
    const next = (range: number): number => {
      state = (state * 48_271) % 2_147_483_647;
      return state % range;
    };
    for (let round = 0; round < 200; round += 1) {
      const items = Array.from({ length: 1 + next(12) }, (_, index) =>
        item(String(index), next(2_000) - 300, 20 + next(400), next(5) === 0 ? 10_000 : 1),
      );
      const tops = place(items, 30);
      expect(tops[0]).toBeGreaterThanOrEqual(30);
      for (let index = 1; index < items.length; index += 1) {
        expect(tops[index]! - tops[index - 1]!).toBeGreaterThanOrEqual(items[index - 1]!.height + 19);
      }
    }
  });

  it("cannot be placed with less displacement by any small move of a pair that meets", () => {
    const anchors = [100, 130, 400];
    const tops = place(anchors.map((anchor, index) => item(String(index), anchor)));
    const cost = (shift: number): number =>
      (tops[0]! + shift - anchors[0]!) ** 2 + (tops[1]! + shift - anchors[1]!) ** 2;
    expect(cost(0)).toBeLessThanOrEqual(Math.min(cost(-1), cost(1)));
    expect(tops[2]).toBe(400);
  });
});
