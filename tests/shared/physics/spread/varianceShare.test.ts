import { describe, expect, it } from "vitest";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { normalQuantile } from "../../../../shared/physics/spread/normalQuantile";
import { rankCorrelation } from "../../../../shared/physics/spread/rankCorrelation";
import { scrambledSobol } from "../../../../shared/physics/spread/scrambledSobol";
import { varianceShare } from "../../../../shared/physics/spread/varianceShare";
import "../../../toAgreeWith";

const groups = 8;

/** Coordinates by input and responses of a model of `count` draws in eight scramblings. */
function draws(inputs: number, count: number, model: (u: Float64Array) => number) {
  const sequence = scrambledSobol(inputs, 1);
  const point = new Float64Array(inputs);
  const coordinates = Array.from({ length: inputs }, () => new Float64Array(count));
  const responses = new Float64Array(count);
  for (let i = 0; i < count; i += 1) {
    sequence.pointAt(Math.floor(i / groups), i % groups, point);
    point.forEach((u, input) => (coordinates[input][i] = u));
    responses[i] = model(point);
  }
  return { coordinates, responses };
}

/** Within four of its own standard errors, and those below `largest`. */
function expectShare(
  found: ReturnType<typeof varianceShare>,
  exact: number,
  largest: number,
  told: { what: string; source: string } | null = null,
) {
  expect(found!.error!).toBeLessThan(largest);
  const absolute = 4 * found!.error! + 1e-3;
  if (told) {
    const mark = "computed independently";
    expect(found!.share).toAgreeWith({ ...told, unit: "1", published: exact, within: { absolute }, mark });
  } else expect(Math.abs(found!.share - exact)).toBeLessThan(absolute);
}

describe("varianceShare", () => {
  it("gives the first-order indices of the Ishigami function", () => {
    // a = 7, b = 0.1, in closed form
    const { coordinates, responses } = draws(3, 4096, (u) => {
      const [x, y, z] = [...u].map((v) => (2 * v - 1) * Math.PI);
      return Math.sin(x) + 7 * Math.sin(y) ** 2 + 0.1 * z ** 4 * Math.sin(x);
    });
    [0.3139, 0.4424, 0].forEach((exact, input) =>
      expectShare(varianceShare(coordinates[input], responses, groups), exact, 0.008, {
        what: `variance share of input ${input + 1} of the Ishigami function, within four standard errors`,
        source: "IshigamiHomma1990",
      }),
    );
  });

  it("gives those of Sobol's g-function", () => {
    // g = ∏ (|4u − 2| + a)/(1 + a), V_i = 1/(3 (1 + a)²), S_i = V_i/(∏ (1 + V_i) − 1)
    const a = [0, 1, 4.5, 9, 99];
    const { coordinates, responses } = draws(5, 4096, (u) =>
      u.reduce((product, v, i) => (product * (Math.abs(4 * v - 2) + a[i])) / (1 + a[i]), 1),
    );
    const parts = a.map((value) => 1 / (3 * (1 + value) ** 2));
    const whole = parts.reduce((product, part) => product * (1 + part), 1) - 1;
    parts.forEach((part, input) =>
      expectShare(varianceShare(coordinates[input], responses, groups), part / whole, 0.01, {
        what: `variance share of input ${input + 1} of Sobol's g-function, within four standard errors`,
        source: "SaltelliSobol1995",
      }),
    );
  });

  it("shares the variance of a sum as the squares of its terms, and adds up to one", () => {
    // y = 3 x₁ + 2 x₂ + x₃ of standard normal x: shares 9/14, 4/14, 1/14
    const { coordinates, responses } = draws(3, 4096, (u) =>
      [...u].reduce((sum, v, i) => sum + (3 - i) * normalQuantile(v), 0),
    );
    const shares = coordinates.map((u) => varianceShare(u, responses, groups)!);
    [9, 4, 1].forEach((part, i) => expectShare(shares[i], part / 14, 0.01));
    expect(shares.reduce((sum, { share }) => sum + share, 0)).toBeCloseTo(1, 2);
    // Spearman's of two normal variables: (6/π) asin(ρ/2); ρ = 3/√14
    const exact = (6 / Math.PI) * Math.asin(3 / Math.sqrt(14) / 2);
    expect(rankCorrelation(coordinates[0], responses)).toAgreeWith({
      what: "Spearman's of two normal variables, ρ = 3/√14",
      unit: "1",
      published: exact,
      within: { absolute: 0.003 },
      source: "Pearson1907",
      mark: "computed independently",
    });
  });

  it("sees no effect of one input where only the product of two acts", () => {
    const { coordinates, responses } = draws(2, 2048, ([a, b]) => (a - 0.5) * (b - 0.5));
    for (const u of coordinates) expectShare(varianceShare(u, responses, groups), 0, 0.01);
  });

  it("does not move with scale or origin of the response, nor with the lack of some draws", () => {
    const { coordinates, responses } = draws(2, 1024, ([a, b]) => a * a + b);
    const plain = varianceShare(coordinates[0], responses, groups)!.share;
    const scaled = varianceShare(
      coordinates[0],
      responses.map((y) => 1e30 * y + 7e28),
      groups,
    )!.share;
    expect(scaled).toBeCloseTo(plain, 12);
    const gaps = responses.map((y, i) => (i % 5 === 3 ? NaN : y));
    expect(varianceShare(coordinates[0], gaps, groups)!.share).toBeCloseTo(plain, 1);
  });

  it("is null where nothing varies or nothing is known", () => {
    expect(varianceShare([0.1, 0.9], [1, 1], 2)).toBeNull();
    expect(varianceShare([0.1, 0.9], [NaN, NaN], 2)).toBeNull();
    expect(varianceShare([0.1, 0.9], [1, 2], 2)).toBeNull();
  });

  it("refuses unequal lengths and fewer than two groups", () => {
    expect(() => varianceShare([0.1], [1, 2], 2)).toThrow(PhysicsDomainError);
    expect(() => varianceShare([0.1], [1], 1)).toThrow(PhysicsDomainError);
  });
});
