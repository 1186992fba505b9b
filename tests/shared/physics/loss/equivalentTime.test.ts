import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { julianYear } from "../../../../shared/physics/constants/iau";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { equivalentTime, type LossSpan } from "../../../../shared/physics/loss/equivalentTime";
import { lossHistory } from "../../../../shared/physics/loss/lossHistory";
import { relativeXuv } from "../../../../shared/physics/loss/relativeXuv";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";

const seed = 20261201;
const gyr = 1e9 * julianYear.value;
const sunlike: LossSpan = {
  history: { kind: "power", exponent: 1.23, saturationAge: 0.1 * gyr },
  exponent: 1,
  begin: 0.05 * gyr,
  end: 4.56 * gyr,
  now: 4.56 * gyr,
};
const table = {
  kind: "table",
  ages: [0.3 * gyr, gyr, 2 * gyr, 4 * gyr],
  fluxes: [90, 30, 11, 5],
} as const;

/** ∫ (XUV/XUV_now)^x dt in equal ratios of age, by Simpson's rule; pieces between the ages where the law changes. */
function bySimpson({ history, exponent, begin, end, now }: LossSpan, corners: number[]): number {
  const ends = [begin, ...corners.filter((age) => age > begin && age < end), end];
  let sum = 0;
  for (let piece = 1; piece < ends.length; piece += 1) {
    const [from, to] = [ends[piece - 1], ends[piece]];
    const parts = 400;
    const width = Math.log(to / from) / parts;
    for (let i = 0; i <= parts; i += 1) {
      const age = i === parts ? to : from * Math.exp(i * width);
      const weight = i === 0 || i === parts ? 1 : i % 2 === 1 ? 4 : 2;
      sum += (weight * width * age * relativeXuv(history, age, now) ** exponent) / 3;
    }
  }
  return sum;
}

describe("equivalentTime", () => {
  it.each([0.3, 1, 1 / 1.23, 2, -0.5])("with a power of %s is the integral over the ages", (exponent) => {
    const span = { ...sunlike, exponent };
    expect(equivalentTime(span)).toBeCloseToRelative(bySimpson(span, [0.1 * gyr]), 1e-9);
  });

  it.each([0.5, 1, 2.6])("by a table, with a power of %s, is the integral over the ages", (exponent) => {
    const span = { ...sunlike, history: table, exponent, end: 6 * gyr };
    expect(equivalentTime(span)).toBeCloseToRelative(bySimpson(span, [...table.ages]), 1e-9);
  });

  it("makes 4.3e25 O/s of 1 Gyr at today's rate 9.31 mbar, and several times that with the Sun's past", () => {
    // Lillis et al. (2017): 4.3e25 s⁻¹, 13 mbar over 1 Gyr and 189 mbar over 3 Gyr with x = 2.6 in ionisation. The
    // rate alone is 9.31 mbar; the growth from 1 to 3 Gyr back is a factor 14.5, and
    // here, where the Sun's whole XUV stands for ionising light, of the same order.
    const back = (age: number) =>
      equivalentTime({ ...sunlike, exponent: 2.6, begin: (4.56 - age) * gyr }) / gyr;
    const lillis = { unit: "1", source: "Lillis2017", mark: "published" } as const;
    expect(back(1)).toAgreeWith({
      ...lillis,
      what: "growth of the O lost from Mars in 1 Gyr by the Sun's past, 13/9.31",
      within: { range: [1.3, 1.7] },
    });
    expect(back(3) / back(1)).toAgreeWith({
      ...lillis,
      what: "O lost from Mars in 3 Gyr over that in 1 Gyr, 189/13, to a factor 2",
      within: { range: [7, 29] },
    });
  });

  it("is the span itself for a rate that never changed", () => {
    expect(equivalentTime({ ...sunlike, exponent: 0 })).toBe(4.56 * gyr - 0.05 * gyr);
    expect(equivalentTime({ ...sunlike, end: sunlike.begin })).toBe(0);
    const short = equivalentTime({ ...sunlike, begin: 4.56 * gyr * (1 - 1e-6) });
    expect(short).toBeCloseToRelative(4560 * julianYear.value, 1e-5);
  });

  it("passes the logarithm, where x β is 1, without a step", () => {
    const at = (exponent: number) =>
      equivalentTime({ ...sunlike, history: { kind: "power", exponent, saturationAge: 0 } });
    expect(at(1)).toBeCloseToRelative(4.56 * gyr * Math.log(4.56 / 0.05), 1e-13);
    for (const near of [1 - 1e-9, 1 + 1e-9]) expect(at(near)).toBeCloseToRelative(at(1), 1e-8);
  });

  it("from birth on is finite with saturation, or where the rise is slow", () => {
    const fromBirth = equivalentTime({ ...sunlike, begin: 0 });
    const flat = 0.05 * gyr * relativeXuv(sunlike.history, 0.05 * gyr, sunlike.now);
    expect(fromBirth).toBeCloseToRelative(equivalentTime(sunlike) + flat, 1e-14);
    const slow = {
      ...sunlike,
      begin: 0,
      history: { kind: "power", exponent: 0.5, saturationAge: 0 },
    } as const;
    expect(equivalentTime(slow)).toBeCloseToRelative(2 * 4.56 * gyr, 1e-14);
  });

  it("adds up over spans", () => {
    const age = fc.double({ min: 0.06, max: 4.5, noNaN: true });
    const power = fc.double({ min: -2, max: 4, noNaN: true });
    fc.assert(
      fc.property(age, power, fc.constantFrom(sunlike.history, table), (cut, exponent, history) => {
        const span = { ...sunlike, exponent, history };
        const parts =
          equivalentTime({ ...span, end: cut * gyr }) + equivalentTime({ ...span, begin: cut * gyr });
        return Math.abs(parts / equivalentTime(span) - 1) < 1e-12;
      }),
      { seed },
    );
  });

  it.each([
    { exponent: NaN },
    { begin: -1 },
    { end: 0.04 * gyr },
    { end: Infinity },
    { now: 0 },
    { begin: 0, history: { kind: "power", exponent: 1.23, saturationAge: 0 } } as const,
  ])("refuses %o", (wrong) => {
    expect(() => equivalentTime({ ...sunlike, ...wrong })).toThrow(PhysicsDomainError);
  });
});

describe("lossHistory", () => {
  const loss = { ...sunlike, rate: 1e27 };

  it("ends at the loss in all, from nothing", () => {
    const { ages, lost } = lossHistory(loss, 50);
    expect([ages[0], lost[0], ages[49]]).toEqual([loss.begin, 0, loss.end]);
    expect(lost[49]).toBeCloseToRelative(1e27 * equivalentTime(sunlike), 1e-12);
  });

  it("loses between two ages what the trapezoidal rule finds", () => {
    const { ages, rates, lost } = lossHistory(loss, 2000);
    let sum = 0;
    for (let i = 1; i < 2000; i += 1) sum += 0.5 * (rates[i] + rates[i - 1]) * (ages[i] - ages[i - 1]);
    expect(lost[1999]).toBeCloseToRelative(sum, 1e-5);
  });

  it("had six times today's rate 3.5 Gyr ago", () => {
    // Ribas et al. (2005), abstract.
    const { rates } = lossHistory({ ...loss, begin: 1.06 * gyr }, 2);
    expect(rates[0]).toBeCloseToRelative(6e27, 0.07);
    expect(rates[1]).toBeCloseToRelative(1e27, 1e-14);
  });

  it("goes in equal steps from birth", () => {
    const { ages, rates } = lossHistory({ ...loss, begin: 0 }, 5);
    expect([...ages]).toEqual([0, 0.25, 0.5, 0.75, 1].map((share) => share * loss.end));
    expect(rates[0]).toBeGreaterThan(rates[1]);
    expect([...lossHistory({ ...loss, rate: 0 }, 3).lost]).toEqual([0, 0, 0]);
  });

  it("never loses less as time goes on", () => {
    const power = fc.double({ min: -2, max: 4, noNaN: true });
    fc.assert(
      fc.property(power, (exponent) => {
        const { lost } = lossHistory({ ...loss, exponent }, 30);
        return lost.every((n, i) => i === 0 || n > lost[i - 1]);
      }),
      { seed },
    );
  });

  it.each([1, 2.5, NaN, Infinity])("refuses %s points", (points) => {
    expect(() => lossHistory(loss, points)).toThrow(PhysicsDomainError);
  });

  it.each([{ rate: -1 }, { rate: NaN }, { end: 0.05 * gyr }])("refuses %o", (wrong) => {
    expect(() => lossHistory({ ...loss, ...wrong }, 5)).toThrow(PhysicsDomainError);
  });
});
