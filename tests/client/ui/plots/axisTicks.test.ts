import { describe, expect, it } from "vitest";
import { axisScale, axisTicks, spansDecades } from "../../../../src/ui/plots/axisTicks";

const even = { isLog: false };
const decades = { isLog: true };

describe("ticks of an axis", () => {
  it("stand at round numbers, with the digits that tell them apart", () => {
    expect(axisTicks(even, [280, 580], 560, 46).texts).toEqual(["300", "350", "400", "450", "500", "550"]);
    expect(axisTicks(even, [0, 0.2], 300, 46).texts).toEqual(["0.00", "0.05", "0.10", "0.15", "0.20"]);
    expect(axisTicks(even, [1.1e7, 1.3e7], 300, 60).texts[0]).toMatch(/^1\.10\s×\s10<sup>7<\/sup>$/);
  });

  it("are whole decades where there are several, every second where room is short", () => {
    expect(axisTicks(decades, [-1.2, 2.1], 400, 46).texts).toEqual(["0.1", "1", "10", "100"]);
    expect(axisTicks(decades, [22, 26], 100, 46).places).toEqual([22, 24, 26]);
  });

  it("are round factors within a decade", () => {
    expect(axisTicks(decades, [Math.log10(15), Math.log10(80)], 200, 30).texts).toEqual([
      "20",
      "30",
      "50",
      "70",
    ]);
  });
});

describe("the scale of an axis", () => {
  it.each([true, false])("leads back to what is placed on it (decades: %s)", (isLog) => {
    const { place, valueAt } = axisScale(isLog, 1e-3);
    expect(valueAt(place(239_200))).toBeCloseTo(239_200, 6);
  });

  it("is of decades for what is positive and spans more than a factor 10", () => {
    expect(spansDecades([1, 10.1])).toBe(true);
    expect(spansDecades([1, 9.9])).toBe(false);
    expect(spansDecades([0, 100])).toBe(false);
    expect(spansDecades([])).toBe(false);
  });
});
