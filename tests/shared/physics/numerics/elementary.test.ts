import { all, create, type BigNumber } from "mathjs";
import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { PhysicsDomainError } from "../../../../shared/physics/errors";
import {
  cosine,
  exponential,
  expm1,
  log10,
  log1p,
  logarithm,
  power,
  powerOfTen,
  sine,
} from "../../../../shared/physics/numerics/elementary";

const seed = 20261201;

// The independent route: mathjs's decimal arithmetic with 60 digits, fed the exact value of each double.
const decimal = create(all, { number: "BigNumber", precision: 60 });
const exact = (x: number): BigNumber => decimal.bignumber(x.toPrecision(100));

/** A fixed sequence of numbers in [0, 1). */
function sequence(): () => number {
  let state = seed;
  return () => {
    state = (state * 1103515245 + 12345) % 2147483648;
    return state / 2147483648;
  };
}

function samples(low: number, high: number, count = 150): number[] {
  const next = sequence();
  return Array.from({ length: count }, () => low + (high - low) * next());
}

function largestError(own: (x: number) => number, truth: (x: BigNumber) => BigNumber, xs: number[]): number {
  let largest = 0;
  for (const x of xs) {
    const expected = truth(exact(x));
    const error = exact(own(x)).minus(expected).div(expected).abs().toNumber();
    if (!(error <= largest)) largest = error;
  }
  return largest;
}

/** Half a unit in the last place is 1.11e-16 of the smallest mantissa; the rest is what the method may add. */
const oneRounding = 1.2e-16;
const twoRoundings = 2.3e-16;

const magnitudes = samples(-300, 300).map((x) => 10 ** x);

describe("agreement with 60-digit decimal arithmetic", () => {
  it.each([
    ["ordinary arguments", samples(-700, 700)],
    ["arguments near zero", samples(-1, 1)],
    ["tiny arguments", samples(-1e-6, 1e-6)],
  ])("exponential, %s", (_, xs) => {
    expect(largestError(exponential, (x) => x.exp(), xs)).toBeLessThan(oneRounding);
  });

  it.each([
    ["all magnitudes", magnitudes],
    ["a few units", samples(0.01, 20)],
    ["arguments near one", samples(0.93, 1.07)],
    ["arguments next to one", samples(1 - 1e-9, 1 + 1e-9)],
  ])("logarithm and log10, %s", (_, xs) => {
    expect(largestError(logarithm, (x) => x.ln(), xs)).toBeLessThan(oneRounding);
    expect(largestError(log10, (x) => x.log(10), xs)).toBeLessThan(oneRounding);
  });

  it.each([
    ["large arguments", samples(-40, 300)],
    ["a few units", samples(-3, 3)],
    ["arguments near zero", samples(-0.02, 0.02)],
    ["tiny arguments", samples(-1e-12, 1e-12)],
  ])("expm1, %s", (_, xs) => {
    expect(largestError(expm1, (x) => x.exp().minus(1), xs)).toBeLessThan(twoRoundings);
  });

  it.each([
    ["a few units", samples(-0.99, 5)],
    ["arguments near zero", samples(-0.07, 0.07)],
    ["tiny arguments", samples(-1e-12, 1e-12)],
    ["large arguments", samples(0, 30).map((x) => 10 ** x)],
  ])("log1p, %s", (_, xs) => {
    expect(largestError(log1p, (x) => x.plus(1).ln(), xs)).toBeLessThan(twoRoundings);
  });

  it("powerOfTen", () => {
    expect(largestError(powerOfTen, (x) => exact(10).pow(x), samples(-300, 300))).toBeLessThan(oneRounding);
  });

  it.each([
    ["of temperature", samples(10, 1e4), 0.774],
    ["near one with a large exponent", samples(0.999, 1.001), 3e5],
    ["at the edge of the series about one", samples(0.938, 1.062), 9000],
    ["of all magnitudes", magnitudes, -0.97],
    ["with the exponent of a cube root", magnitudes, 1 / 3],
  ])("power, %s", (_, xs, y) => {
    expect(
      largestError(
        (x) => power(x, y),
        (x) => x.pow(exact(y)),
        xs,
      ),
    ).toBeLessThan(oneRounding);
  });

  it.each([
    ["within a turn", samples(-6.3, 6.3)],
    ["of large angles", samples(-1e6, 1e6, 60)],
    ["next to quarter turns", samples(1, 400, 60).map((n) => Math.round(n) * (Math.PI / 2))],
  ])("sine and cosine, %s", (_, xs) => {
    expect(largestError(sine, (x) => x.sin(), xs)).toBeLessThan(oneRounding);
    expect(largestError(cosine, (x) => x.cos(), xs)).toBeLessThan(oneRounding);
  });
});

describe("sameness between machines", () => {
  it("holds to the last bit", () => {
    // Frozen on 2026-12-01 (Node 20, x86-64): not a check of truth, which the tests above are, but that another
    // engine or processor gives the same bits. A changed table or series changes it too; freeze it anew then.
    const functions = [exponential, expm1, sine, cosine];
    const ofPositive = [
      logarithm,
      log10,
      log1p,
      (x: number) => power(x, 0.774),
      (x: number) => powerOfTen(x / 3),
    ];
    let hash = 0xcbf29ce484222325n;
    const view = new DataView(new ArrayBuffer(8));
    const take = (value: number) => {
      view.setFloat64(0, value);
      hash = ((hash ^ view.getBigUint64(0)) * 0x100000001b3n) & 0xffffffffffffffffn;
    };
    for (const x of samples(-300, 300, 500)) functions.forEach((f) => take(f(x)));
    for (const x of samples(1e-3, 900, 500)) ofPositive.forEach((f) => take(f(x)));
    expect(hash.toString(16)).toBe("bc98e40b7dc52ab5");
  });
});

describe("exact values", () => {
  it("are met where a double holds them", () => {
    expect([exponential(0), expm1(0), logarithm(1), log1p(0), sine(0), cosine(0)]).toEqual([
      1, 0, 0, 0, 0, 1,
    ]);
    expect([power(7, 0), power(1, -3.5), power(2, 10), power(-2, 3), power(-3, 2)]).toEqual([
      1, 1, 1024, -8, 9,
    ]);
  });

  it("of powers of ten both ways", () => {
    for (let n = -307; n <= 308; n += 1) expect(log10(Number(`1e${n}`))).toBe(n);
    for (let n = -22; n <= 22; n += 1) expect(powerOfTen(n)).toBe(Number(`1e${n}`));
  });

  it("of powers of two, down to the smallest double", () => {
    for (let n = -1074; n <= 1023; n += 1) expect(power(2, n)).toBe(2 ** n);
  });
});

describe("the ends of the range", () => {
  it("overflow to Infinity and underflow through subnormal numbers to zero", () => {
    expect(exponential(709.782712893384)).toBeCloseTo(1.797693134862273e308, -295);
    expect(exponential(709.79)).toBe(Infinity);
    expect(exponential(-744)).toBe(Math.exp(-744));
    expect(exponential(-745.2)).toBe(0);
    expect([exponential(Infinity), exponential(-Infinity)]).toEqual([Infinity, 0]);
    expect([powerOfTen(309), powerOfTen(-324)]).toEqual([Infinity, 0]);
    expect([expm1(710), expm1(-1000), expm1(-Infinity)]).toEqual([Infinity, -1, -1]);
    expect([power(10, 400), power(10, -400), power(0.5, 1e300)]).toEqual([Infinity, 0, 0]);
  });

  it("logarithms of subnormal numbers keep their digits", () => {
    const xs = [5e-324, 3e-320, 1e-310, 2.2250738585072014e-308];
    expect(largestError(logarithm, (x) => x.ln(), xs)).toBeLessThan(oneRounding);
    expect(largestError(log10, (x) => x.log(10), xs)).toBeLessThan(oneRounding);
  });

  it("zero and infinity", () => {
    expect([logarithm(0), log10(0), log1p(-1)]).toEqual([-Infinity, -Infinity, -Infinity]);
    expect([logarithm(Infinity), log10(Infinity), log1p(Infinity)]).toEqual([Infinity, Infinity, Infinity]);
    expect([power(0, 2), power(0, -1), power(Infinity, 0.5), power(Infinity, -1)]).toEqual([
      0,
      Infinity,
      Infinity,
      0,
    ]);
  });

  it("NaN passes through", () => {
    const results = [exponential, expm1, logarithm, log10, log1p, powerOfTen, sine, cosine].map((f) =>
      f(NaN),
    );
    expect([...results, power(NaN, 2), power(2, NaN)]).toEqual(Array(10).fill(NaN));
  });
});

describe("refusals", () => {
  it.each([
    ["logarithm", () => logarithm(-1)],
    ["log10", () => log10(-1e-300)],
    ["log1p", () => log1p(-1.5)],
    ["power", () => power(-2, 0.5)],
    ["sine", () => sine(2e6)],
    ["cosine", () => cosine(-Infinity)],
  ])("%s refuses what has no answer", (_, call) => {
    expect(call).toThrow(PhysicsDomainError);
  });
});

describe("laws", () => {
  const argument = fc.double({ min: -340, max: 340, noNaN: true });
  const positive = fc.double({ min: 1e-200, max: 1e200, noNaN: true });

  it("e^(a+b) = e^a e^b, as far as a + b is a number", () => {
    fc.assert(
      fc.property(argument, argument, (a, b) => {
        const sum = a + b;
        const lost = a - (sum - b) + (b - (sum - (sum - b)));
        const product = exponential(a) * exponential(b);
        return Math.abs(exponential(sum) * (1 + lost) - product) <= 1e-15 * product;
      }),
      { seed },
    );
  });

  it("the exponential undoes the logarithm", () => {
    fc.assert(
      fc.property(positive, (x) => Math.abs(exponential(logarithm(x)) - x) <= 1.2e-16 * (2 + 500) * x),
      { seed },
    );
  });

  it("exponential and logarithm never fall as their argument grows", () => {
    fc.assert(
      fc.property(positive, (x) => {
        const next = x * (1 + 2 ** -52);
        return logarithm(next) >= logarithm(x) && exponential(-1 / next) >= exponential(-1 / x);
      }),
      { seed },
    );
  });

  it("sin² + cos² = 1", () => {
    const angle = fc.double({ min: -1e6, max: 1e6, noNaN: true });
    fc.assert(
      fc.property(angle, (x) => Math.abs(sine(x) * sine(x) + cosine(x) * cosine(x) - 1) <= 4e-16),
      { seed },
    );
  });
});
