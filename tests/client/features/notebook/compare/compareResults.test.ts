import { describe, expect, it } from "vitest";
import type { CellResult } from "../../../../../shared/notebook/result";
import {
  compareResults,
  type ComparedCell,
} from "../../../../../src/features/notebook/compare/compareResults";
import { resultSentence } from "../../../../../src/features/notebook/compare/comparisonWords";
import { ratioAxis, ratioPlace } from "../../../../../src/features/notebook/compare/ratioAxis";

const escape = (values: Record<string, number | string | null>): ComparedCell => ({
  gases: ["H"],
  result: {
    kind: "escape",
    name: "leak",
    status: "fine",
    values: Object.fromEntries(
      Object.entries(values).map(([name, value]) => [name, { value, unit: "1" }]),
    ) as CellResult["values"],
    tables: {},
    notes: [],
  },
});

describe("compareResults", () => {
  it("gives both values and the ratio, and counts what is equal", () => {
    const { differing, same } = compareResults(
      [escape({ "exobase.altitude": 2e5, "exobase.temperature": 400, "H.rate": 1e25, "H.log10_rate": 25 })],
      [
        escape({
          "exobase.altitude": 2.5e5,
          "exobase.temperature": 400,
          "H.rate": 2e25,
          "H.log10_rate": 25.30103,
        }),
      ],
    );
    expect(same).toBe(1);
    expect(differing.map(({ name, words }) => [name, words])).toEqual([
      ["leak.exobase.altitude", "Altitude of the exobase"],
      ["leak.H.rate", "Rate at which H leaves"],
    ]);
    expect(differing[1]!.log10Ratio).toBeCloseTo(0.30103, 12);
  });

  it("compares by the logarithm what is too small for a number", () => {
    const { differing } = compareResults(
      [escape({ "H.rate": null, "H.log10_rate": -340 })],
      [escape({ "H.rate": null, "H.log10_rate": -352.5 })],
    );
    expect(differing[0]!.log10Ratio).toBe(-12.5);
  });

  it("tells a choice that changed and a result that only one has, without a ratio", () => {
    const { differing } = compareResults(
      [escape({ regime: "jeans", "exobase.altitude": 2e5 })],
      [escape({ regime: "wind" })],
    );
    expect(differing.map(({ key, older, newer, log10Ratio }) => [key, older, newer, log10Ratio])).toEqual([
      ["regime", "jeans", "wind", null],
      ["exobase.altitude", { value: 2e5, log10: null }, null, null],
    ]);
  });

  it("takes what differs in the last digits for equal", () => {
    const { differing, same } = compareResults(
      [escape({ "exobase.altitude": 2e5 })],
      [escape({ "exobase.altitude": 2e5 * (1 + 1e-12) })],
    );
    expect([differing.length, same]).toEqual([0, 1]);
  });
});

describe("resultSentence", () => {
  const before = escape({ "exobase.altitude": 2e5, "H.rate": 1e25, "H.log10_rate": 25 });

  it.each([
    [2.37e5, 2e25, "Between the two, the exobase rises by 37\u00a0km and H leaves 2.0 times as fast."],
    [1.97e5, 1e25, "Between the two, the exobase falls by 3.0\u00a0km and H leaves as fast as before."],
  ])("of an exobase at %d m and a rate of %d", (altitude, rate, sentence) => {
    const after = escape({ "exobase.altitude": altitude, "H.rate": rate, "H.log10_rate": Math.log10(rate) });
    expect(resultSentence([before], [after])).toBe(sentence);
  });

  it("says when the exobase is gone, and nothing where there was no escape", () => {
    expect(resultSentence([before], [escape({})])).toBe("Between the two, the exobase is gone.");
    expect(resultSentence([], [])).toBe("");
  });
});

describe("ratioAxis", () => {
  it("is as close as three ratios in four allow", () => {
    expect(ratioAxis([0.001, 0.002, -0.003, 5]).ticks).toContain(1.01);
    expect(ratioAxis([0.3, -0.9, 0.8]).ticks).toContain(10);
    expect(ratioAxis([]).ticks).toContain(1);
  });

  it("has 1 in its middle", () => {
    const axis = ratioAxis([0.2]);
    expect(ratioPlace(axis, 0)).toBe(0.5);
    expect(ratioPlace(axis, axis.reach)).toBe(1);
  });
});
