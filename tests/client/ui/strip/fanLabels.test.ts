import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { fanLabels, type LabelWish } from "../../../../src/ui/strip/fanLabels";

const wish = (wanted: number, weight = 1): LabelWish => ({ wanted, height: 15, weight });

describe("fanLabels", () => {
  it("leaves labels alone that do not touch", () => {
    expect(fanLabels([wish(20), wish(60), wish(200)], { from: 0, to: 400 })).toEqual([20, 60, 200]);
  });

  it("fans a crowd about its middle", () => {
    expect(fanLabels([wish(100), wish(100), wish(100)], { from: 0, to: 400 })).toEqual([85, 100, 115]);
  });

  it("lets heavy labels stand and moves the light ones", () => {
    const [base, next] = fanLabels([wish(50, 400), wish(52)], { from: 0, to: 400 });
    expect(base).toBeCloseTo(50, 0);
    expect(next! - base!).toBeCloseTo(15, 6);
  });

  it("has nothing to place where there is nothing", () => {
    expect(fanLabels([], { from: 0, to: 100 })).toEqual([]);
  });

  it("never lets two labels touch, and keeps them within bounds that have room", () => {
    const wishes = fc
      .array(
        fc.record({
          wanted: fc.double({ min: 0, max: 800, noNaN: true }),
          weight: fc.constantFrom(0.2, 1, 60),
        }),
        {
          minLength: 1,
          maxLength: 20,
        },
      )
      .map((all) =>
        all.sort((a, b) => a.wanted - b.wanted).map(({ wanted, weight }) => wish(wanted, weight)),
      );
    fc.assert(
      fc.property(wishes, (all) => {
        const centres = fanLabels(all, { from: 4, to: 796 });
        centres.forEach((centre, i) => {
          if (i > 0) expect(centre - centres[i - 1]!).toBeGreaterThanOrEqual(15 - 1e-6);
        });
        expect(centres[0]!).toBeGreaterThanOrEqual(4 + 7.5 - 1e-6);
        expect(centres.at(-1)!).toBeLessThanOrEqual(796 - 7.5 + 1e-6);
      }),
      { seed: 557 },
    );
  });
});
