import { describe, expect, it } from "vitest";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import type { Distribution } from "../../../../shared/physics/spread/distribution";
import { normalProbability } from "../../../../shared/physics/spread/normalProbability";
import { truncatedDistribution } from "../../../../shared/physics/spread/truncatedDistribution";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";

const free = { lower: -Infinity, upper: Infinity };
const positive = { lower: 0, upper: Infinity };
const normal = (mean: number, deviation: number): Distribution => ({ form: "normal", mean, deviation });
const uniform = (lower: number, upper: number): Distribution => ({ form: "uniform", lower, upper });
const logNormal = (median: number, factor: number): Distribution => ({ form: "log_normal", median, factor });

/** Mean by the midpoint rule over the quantiles. */
function meanOf(distribution: Distribution, bounds = free): number {
  const { quantile } = truncatedDistribution(distribution, bounds)!;
  const count = 20_000;
  let sum = 0;
  for (let i = 0; i < count; i += 1) sum += quantile((i + 0.5) / count);
  return sum / count;
}

describe("truncatedDistribution", () => {
  it("leaves a distribution within its bounds as it is", () => {
    const whole = truncatedDistribution(normal(240, 30), free)!;
    expect(whole.cut).toBe(0);
    // Table 26.5, p = 0.16: 0.994457883209753 deviations
    expect(whole.quantile(0.84)).toAgreeWith({
      what: "q84 of 240 ± 30",
      unit: "1",
      published: 240 + 30 * 0.994457883209753,
      within: { relative: 1e-14 },
      source: "AbramowitzStegun1964",
      mark: "published",
    });
    expect(whole.quantile(0.16)).toAgreeWith({
      what: "q16 of 240 ± 30",
      unit: "1",
      published: 240 - 30 * 0.994457883209753,
      within: { relative: 1e-14 },
      source: "AbramowitzStegun1964",
      mark: "published",
    });
    expect(truncatedDistribution(uniform(180, 350), positive)!.quantile(0.25)).toBe(222.5);
    expect(truncatedDistribution(logNormal(2.5e11, 2), free)!.quantile(0.5)).toBeCloseToRelative(
      2.5e11,
      1e-15,
    );
    // One sigma above the median is the factor itself.
    const oneSigma = normalProbability(1);
    expect(truncatedDistribution(logNormal(3, 2), positive)!.quantile(oneSigma)).toBeCloseToRelative(
      6,
      1e-14,
    );
  });

  it("has the mean of a truncated normal distribution in closed form", () => {
    // Eq. 13.134:
    // mean + σ (φ(α) − φ(β))/(Φ(β) − Φ(α)); φ(−1) = 0.2419707245191434
    const share = 1 - normalProbability(-1);
    expect(meanOf(normal(1, 1), positive)).toAgreeWith({
      what: "mean of 1 ± 1 truncated to positive numbers",
      unit: "1",
      published: 1 + 0.2419707245191434 / share,
      within: { relative: 2e-5 },
      source: "JohnsonKotzBalakrishnan1994",
      mark: "computed independently",
    });
    const both = 1 - 2 * normalProbability(-1);
    expect(meanOf(normal(0.5, 0.5), { lower: 0, upper: 1 })).toBeCloseToRelative(0.5, 1e-12);
    expect(truncatedDistribution(normal(0.5, 0.5), { lower: 0, upper: 1 })!.cut).toBeCloseToRelative(
      1 - both,
      1e-14,
    );
  });

  it("holds its own shares: F(x(u)) = u, also in tails far from the mean", () => {
    for (const [mean, lower, upper] of [
      [0, -1, 0.5],
      [0, 3, Infinity],
      [0, 12, 13],
      [0, -Infinity, -8],
    ]) {
      const { quantile } = truncatedDistribution(normal(mean, 1), { lower, upper })!;
      // Shares above, where both bounds lie above the mean, so that they keep their digits.
      const shareOf = (x: number) => (lower > 0 ? normalProbability(-x) : normalProbability(x));
      const ends = [lower, upper].map((x) => (Number.isFinite(x) ? shareOf(x) : x > 0 === lower > 0 ? 0 : 1));
      for (const u of [0.001, 0.3, 0.9, 0.999]) {
        const x = quantile(u);
        expect(x >= lower && x <= upper).toBe(true);
        expect((shareOf(x) - ends[0]) / (ends[1] - ends[0])).toBeCloseToRelative(u, 1e-10);
      }
    }
  });

  it("never piles draws up on a bound", () => {
    const { quantile } = truncatedDistribution(normal(0, 1), positive)!;
    const drawn = Array.from({ length: 1000 }, (_, i) => quantile((i + 0.5) / 1000));
    expect(new Set(drawn).size).toBe(1000);
    expect(Math.min(...drawn)).toBeGreaterThan(0);
  });

  it("grows with u for any distribution", () => {
    for (const distribution of [normal(5, 3), uniform(-1, 8), logNormal(2, 5)]) {
      const { quantile } = truncatedDistribution(distribution, { lower: 0.5, upper: 7 })!;
      let last = 0.5;
      for (let u = 0.01; u < 1; u += 0.01) {
        expect(quantile(u)).toBeGreaterThanOrEqual(last);
        last = quantile(u);
      }
      expect(last).toBeLessThanOrEqual(7);
    }
  });

  it("is null where nothing is left", () => {
    expect(truncatedDistribution(uniform(-5, -2), positive)).toBeNull();
    expect(truncatedDistribution(normal(-100, 1), positive)).toBeNull();
    expect(truncatedDistribution(normal(-1, 0), positive)).toBeNull();
    expect(truncatedDistribution(logNormal(1, 2), { lower: -2, upper: 0 })).toBeNull();
  });

  it("takes a deviation of zero and a range without width for a certain number", () => {
    expect(truncatedDistribution(normal(7, 0), positive)!.quantile(0.3)).toBe(7);
    expect(truncatedDistribution(uniform(7, 7), positive)!.quantile(0.3)).toBe(7);
  });

  it.each([
    [normal(NaN, 1), free],
    [normal(0, -1), free],
    [uniform(2, 1), free],
    [logNormal(0, 2), free],
    [logNormal(1, 1), free],
    [normal(0, 1), { lower: 1, upper: 1 }],
  ])("refuses %j within %j", (distribution, bounds) => {
    expect(() => truncatedDistribution(distribution, bounds)).toThrow(PhysicsDomainError);
  });
});
