import { describe, expect, it } from "vitest";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { histogram } from "../../../../shared/physics/spread/histogram";
import { rankCorrelation, ranks } from "../../../../shared/physics/spread/rankCorrelation";
import { sampleQuantile } from "../../../../shared/physics/spread/sampleQuantile";
import "../../../toAgreeWith";

describe("sampleQuantile", () => {
  it("follows definition 5", () => {
    // Hyndman and Fan (1996): p_k = (k − ½)/n, linear between; of 1, 2, 3, 4 the quartile is 1.5
    expect(sampleQuantile([1, 2, 3, 4], 0.25)).toAgreeWith({
      what: "quartile of 1, 2, 3, 4 by definition 5",
      unit: "1",
      published: 1.5,
      within: { relative: 0 },
      source: "HyndmanFan1996",
      mark: "computed independently",
    });
    expect(sampleQuantile([1, 2, 3, 4], 0.5)).toBe(2.5);
    expect(sampleQuantile([1, 2, 3, 4], 0.125)).toBe(1);
    expect(sampleQuantile([10, 20, 40], 0.75)).toBe(35);
  });

  it("is exact for evenly spaced shares of a uniform distribution", () => {
    const sorted = Float64Array.from({ length: 1000 }, (_, i) => (i + 0.5) / 1000);
    for (const p of [0.025, 0.16, 0.5, 0.84, 0.975]) expect(sampleQuantile(sorted, p)).toBeCloseTo(p, 12);
  });

  it("ends at the outermost values", () => {
    expect(sampleQuantile([3, 5], 0)).toBe(3);
    expect(sampleQuantile([3, 5], 1)).toBe(5);
    expect(sampleQuantile([3], 0.5)).toBe(3);
  });

  it.each([
    [[], 0.5],
    [[1], -0.1],
    [[1], NaN],
  ])("refuses %j at %s", (sample, probability) => {
    expect(() => sampleQuantile(sample, probability)).toThrow(PhysicsDomainError);
  });
});

describe("rankCorrelation", () => {
  it("gives a published worked example", () => {
    // IQ and hours of television of ten people: ρ = −29/165 = −0.17575757…
    const iq = [106, 100, 86, 101, 99, 103, 97, 113, 112, 110];
    const hours = [7, 27, 2, 50, 28, 29, 20, 12, 6, 17];
    expect(rankCorrelation(iq, hours)).toAgreeWith({
      what: "Spearman's ρ of a worked example, −29/165",
      unit: "1",
      published: -29 / 165,
      within: { absolute: 5e-15 },
      source: "Textbook",
      mark: "published",
    });
  });

  it("sees only the order", () => {
    const x = [0.1, 5, 2, 9, 3.3];
    expect(
      rankCorrelation(
        x,
        x.map((value) => value ** 3),
      ),
    ).toBeCloseTo(1, 15);
    expect(
      rankCorrelation(
        x,
        x.map((value) => -Math.sqrt(value)),
      ),
    ).toBeCloseTo(-1, 15);
  });

  it("shares ranks among equals", () => {
    expect(Array.from(ranks([10, 20, 10, 30, 20, 20]))).toEqual([1.5, 4, 1.5, 6, 4, 4]);
  });

  it("is null where one side never changes", () => {
    expect(rankCorrelation([1, 1, 1], [1, 2, 3])).toBeNull();
    expect(rankCorrelation([1], [2])).toBeNull();
  });

  it("refuses samples of different length", () => {
    expect(() => rankCorrelation([1, 2], [1])).toThrow(PhysicsDomainError);
  });
});

describe("histogram", () => {
  const sorted = Float64Array.from({ length: 1000 }, (_, i) => i / 999);

  it("counts every value once, in bins without a gap", () => {
    const bins = histogram(sorted);
    expect(bins.reduce((sum, { count }) => sum + count, 0)).toBe(1000);
    bins.slice(1).forEach(({ from }, k) => expect(from).toBe(bins[k].to));
    expect([bins[0].from, bins[bins.length - 1].to]).toEqual([0, 1]);
  });

  it("takes the width of Freedman and Diaconis", () => {
    // 2 · 0.5 · 1000^(−1/3) = 0.1: ten bins, an eleventh where rounding asks for it
    expect([10, 11]).toContain(histogram(sorted).length);
  });

  it("keeps to 8 and 64 bins, and to one where all is the same", () => {
    expect(histogram([1, 2, 3])).toHaveLength(8);
    expect(histogram([...Array.from(sorted), 1000])).toHaveLength(64);
    expect(histogram([5, 5, 5])).toEqual([{ from: 5, to: 5, count: 3 }]);
  });

  it("refuses an empty sample", () => {
    expect(() => histogram([])).toThrow(PhysicsDomainError);
  });
});
