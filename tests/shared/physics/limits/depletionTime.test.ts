import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { julianYear } from "../../../../shared/physics/constants/iau";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { depletionTime } from "../../../../shared/physics/limits/depletionTime";
import { supplyFraction } from "../../../../shared/physics/limits/supplyFraction";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";

const seed = 20261201;

describe("depletionTime", () => {
  it("of a metre of water on Mars at 1e8 H cm⁻² s⁻¹ is 2.1 Gyr", () => {
    // 9.652082e42 atoms of H in 1 m, and 0.472 m in 1 Gyr from 1.44371391e14 m².
    const { time } = depletionTime({
      logParticles: Math.log(9.652082e42),
      log10Rate: Math.log10(1e12 * 1.44371391e14),
    });
    expect((time ?? NaN) / (1e9 * julianYear.value)).toAgreeWith({
      what: "time to lose 1 m of water from Mars at 1e8 H cm⁻² s⁻¹",
      unit: "Gyr",
      published: 1 / 0.472024,
      within: { relative: 1e-5 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("is when a rate that stays has taken all", () => {
    let [left, seconds] = [1000, 0];
    for (; left > 0; seconds += 1) left -= 4;
    const { time } = depletionTime({ logParticles: Math.log(1000), log10Rate: Math.log10(4) });
    expect(time).toBeCloseToRelative(seconds, 1e-14);
  });

  it("beyond what a number holds is told by its logarithm", () => {
    const never = depletionTime({ logParticles: 90, log10Rate: -800 });
    expect(never.time).toBeNull();
    expect(never.log10Time).toBeCloseTo(90 / Math.LN10 + 800, 10);
  });

  it("doubles as the rate halves", () => {
    const logarithm = fc.double({ min: -200, max: 200, noNaN: true });
    fc.assert(
      fc.property(logarithm, (log10Rate) => {
        const one = depletionTime({ logParticles: 80, log10Rate }).log10Time;
        const two = depletionTime({ logParticles: 80, log10Rate: log10Rate - Math.log10(2) }).log10Time;
        return Math.abs(two - one - Math.log10(2)) < 1e-12;
      }),
      { seed },
    );
  });

  it.each([NaN, Infinity, -Infinity])("refuses %s", (wrong) => {
    expect(() => depletionTime({ logParticles: wrong, log10Rate: 1 })).toThrow(PhysicsDomainError);
    expect(() => depletionTime({ logParticles: 1, log10Rate: wrong })).toThrow(PhysicsDomainError);
  });
});

describe("supplyFraction", () => {
  const escape = { log10Rate: 26, diffusionLimit: 1e13, exobaseRadius: 3.6e6 };

  it("is rate over limit times area, in plain numbers", () => {
    const { share } = supplyFraction(escape);
    expect(share).toBeCloseToRelative(1e26 / (1e13 * 4 * Math.PI * 3.6e6 ** 2), 1e-13);
  });

  it("is 1 for the Earth's hydrogen: 3 kg/s against 2.5e13 × 14.1 ppm of H atoms", () => {
    // 1.79e27 s⁻¹ is 3 kg/s; the constant is that of Hunten (1973), from memory.
    const surface = { diffusionLimit: 2.5e17 * 14.1e-6, exobaseRadius: 6.371e6 };
    const { share } = supplyFraction({ ...surface, log10Rate: Math.log10(1.79e27) });
    expect(share).toAgreeWith({
      what: "share of the diffusion limit, 2.5e13 × 14.1 ppm, in the Earth's 3 kg/s of H",
      unit: "1",
      published: 1,
      within: { relative: 0.1 },
      source: "CatlingZahnle2009",
      mark: "from memory",
    });
  });

  it("vanishes with the rate, told by its logarithm", () => {
    const none = supplyFraction({ ...escape, log10Rate: -700 });
    expect(none.share).toBeNull();
    expect(none.log10Share).toBeCloseTo(-700 - 13 - Math.log10(4 * Math.PI * 3.6e6 ** 2), 10);
  });

  it("goes with the rate and against the limit", () => {
    const factor = fc.double({ min: 0.01, max: 100, noNaN: true });
    fc.assert(
      fc.property(factor, (f) => {
        const { share } = supplyFraction({
          ...escape,
          log10Rate: 26 + Math.log10(f),
          diffusionLimit: 1e13 * f * f,
        });
        return Math.abs(((share ?? NaN) * f) / (supplyFraction(escape).share ?? NaN) - 1) < 1e-12;
      }),
      { seed },
    );
  });

  it.each([{ log10Rate: NaN }, { diffusionLimit: 0 }, { diffusionLimit: -1 }, { exobaseRadius: 0 }])(
    "refuses %o",
    (wrong) => {
      expect(() => supplyFraction({ ...escape, ...wrong })).toThrow(PhysicsDomainError);
    },
  );
});
