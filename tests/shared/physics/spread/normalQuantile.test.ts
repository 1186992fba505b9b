import { describe, expect, it } from "vitest";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { normalProbability } from "../../../../shared/physics/spread/normalProbability";
import { normalQuantile } from "../../../../shared/physics/spread/normalQuantile";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";

/** [p, x], x to 17 digits by Newton's method on erfc with 60 digits (mpmath 1.3). */
const table: [number, number][] = [
  [0.5001, 0.00025066283008800747],
  [0.16, -0.9944578832097531],
  [0.84, 0.994457883209753],
  [0.025, -1.9599639845400543],
  [0.975, 1.9599639845400538],
  [0.92499, 1.4394608308216257],
  [0.075, -1.439531470938456],
  [0.07, -1.4757910281791706],
  [0.001, -3.0902323061678136],
  [1e-6, -4.753424308822899],
  [1.4e-11, -6.656723091518184],
  [1e-12, -7.034483825301132],
  [1e-50, -14.933337534788489],
  [1e-300, -37.0470962993612],
];

/** [x, Φ(x)] with 60 digits (mpmath 1.3). */
const probabilities: [number, number][] = [
  [-37, 5.725571222524577e-300],
  [-20, 2.7536241186062337e-89],
  [-10, 7.619853024160525e-24],
  [-6, 9.86587645037698e-10],
  [-3, 0.0013498980316300946],
  [-1, 0.15865525393145705],
  [-0.5, 0.3085375387259869],
  [-0.001, 0.49960105778608893],
  [0.3, 0.6179114221889527],
  [1.7, 0.955434537241457],
  [4, 0.9999683287581669],
  [9, 1.0],
];

describe("normalQuantile", () => {
  it("gives the check values of its publication", () => {
    const what = "normal quantile, check values of AS 241";
    const told = {
      what,
      unit: "1",
      within: { relative: 1e-15 },
      source: "Wichura1988",
      mark: "published",
    } as const;
    expect(normalQuantile(0.25)).toAgreeWith({ ...told, published: -0.6744897501960817 });
    expect(normalQuantile(0.001)).toAgreeWith({ ...told, published: -3.090232306167814 });
    expect(normalQuantile(1e-20)).toAgreeWith({ ...told, published: -9.262340089798408 });
  });

  it.each(table)("lies at %s where it should", (probability, quantile) => {
    expect(normalQuantile(probability)).toAgreeWith({
      what: "normal quantile, 1e-300 to 0.975",
      unit: "1",
      published: quantile,
      within: { relative: 1e-15 },
      source: "MPMath",
      mark: "computed independently",
    });
  });

  it("is the inverse of the probability", () => {
    for (let x = -8; x <= 0; x += 0.37) {
      expect(normalQuantile(normalProbability(x))).toBeCloseToRelative(x, 2e-15);
    }
  });

  it("is odd about one half and grows", () => {
    expect(normalQuantile(0.5)).toBe(0);
    let last = -Infinity;
    for (let i = 1; i < 1024; i += 1) {
      const x = normalQuantile(i / 1024);
      expect(x).toBe(-normalQuantile(1 - i / 1024) + 0);
      expect(x).toBeGreaterThan(last);
      last = x;
    }
  });

  it.each([0, 1, -0.1, 1.1, NaN])("refuses a probability of %s", (probability) => {
    expect(() => normalQuantile(probability)).toThrow(PhysicsDomainError);
  });
});

describe("normalProbability", () => {
  it.each(probabilities)("is right %s standard deviations away", (x, probability) => {
    expect(normalProbability(x)).toAgreeWith({
      what: "normal probability, −37 to 9 standard deviations",
      unit: "1",
      published: probability,
      within: { relative: (1 + (x * x) / 4) * 1e-15 },
      source: "MPMath",
      mark: "computed independently",
    });
  });

  it("gives the shares that everyone knows", () => {
    // Table 26.1
    const what = "normal probability at 1 and 2 standard deviations";
    const told = {
      what,
      unit: "1",
      within: { relative: 1e-15 },
      source: "AbramowitzStegun1964",
      mark: "published",
    } as const;
    expect(normalProbability(1)).toAgreeWith({ ...told, published: 0.841344746068543 });
    expect(normalProbability(2)).toAgreeWith({ ...told, published: 0.977249868051821 });
  });

  it("adds up to one and never falls", () => {
    let last = 0;
    for (let x = -10; x <= 10; x += 0.125) {
      expect(normalProbability(x) + normalProbability(-x)).toBeCloseToRelative(1, 1e-15);
      expect(normalProbability(x)).toBeGreaterThanOrEqual(last);
      last = normalProbability(x);
    }
  });

  it("is one half in the middle and nothing far below", () => {
    expect(normalProbability(0)).toBeCloseToRelative(0.5, 1e-15);
    expect(normalProbability(-40)).toBe(0);
  });

  it.each([NaN, Infinity])("refuses %s", (x) => {
    expect(() => normalProbability(x)).toThrow(PhysicsDomainError);
  });
});
