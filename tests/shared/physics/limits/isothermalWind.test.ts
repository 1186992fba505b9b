import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { boltzmann } from "../../../../shared/physics/constants/codata2022";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { isothermalWind } from "../../../../shared/physics/limits/isothermalWind";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";

const seed = 20261201;

/** A wind whose base has the given λ; speed of sound 1000 m/s, 1e-9 kg/m³ at 5e6 m. */
function base(lambda: number) {
  const particleMass = 1.7e-27;
  return {
    gravitationalParameter: lambda * 1e6 * 5e6,
    radius: 5e6,
    temperature: (particleMass * 1e6) / boltzmann.value,
    particleMass,
    massDensity: 1e-9,
  };
}

describe("isothermalWind", () => {
  it.each([
    // Mach numbers at the base, by root finding.
    [2.5, 0.7779169534493435],
    [3, 0.6016509199581841],
    [4, 0.34895160756385973],
    [5, 0.19225402566823555],
    [7, 0.0501258838349124],
    [10, 0.005086775035705231],
    [15, 7.711644883840855e-5],
    [20, 9.237449661974603e-7],
    [30, 9.436040231353984e-11],
  ])("of λ = %s starts at Mach %s", (lambda, mach) => {
    // λ itself is rounded, and moves ln u by 2 − λ/2 times as much… within 1e-13.
    expect(isothermalWind(base(lambda)).machNumber).toAgreeWith({
      what: "Mach number at the base of the isothermal wind, λ from 2.5 to 30",
      unit: "1",
      published: mach,
      within: { relative: 1e-12 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("satisfies the equation of motion in steps from the sonic point down", () => {
    // (u − a²/u) du/dr = 2a²/r − GM/r²; Runge–Kutta from just inside the sonic point, where du/dr = a/r_s.
    const lambda = 6;
    const { gravitationalParameter: gm } = base(lambda);
    const a2 = 1e6;
    const sonic = gm / (2 * a2);
    const slope = (r: number, u: number) => ((2 * a2) / r - gm / r ** 2) / (u - a2 / u);
    const parts = 40000;
    let r = sonic * (1 - 1e-5);
    let u = 1000 * (1 - 1e-5);
    const h = (5e6 - r) / parts;
    for (let i = 0; i < parts; i += 1) {
      const k1 = slope(r, u);
      const k2 = slope(r + h / 2, u + (h / 2) * k1);
      const k3 = slope(r + h / 2, u + (h / 2) * k2);
      const k4 = slope(r + h, u + h * k3);
      u += (h / 6) * (k1 + 2 * k2 + 2 * k3 + k4);
      r += h;
    }
    const wind = isothermalWind(base(lambda));
    expect((wind.machNumber ?? NaN) * wind.soundSpeed).toBeCloseToRelative(u, 1e-6);
    expect(wind.sonicRadius).toBeCloseToRelative(sonic, 1e-12);
    expect(wind.massRate).toBeCloseToRelative(4 * Math.PI * 2.5e13 * 1e-9 * u, 1e-6);
  });

  it("of a corona of 1e6 K around the Sun passes the speed of sound at 5.8 solar radii", () => {
    // Parker (1958): r_s = GM/2a² with a² = kT/m, m half the mass of H.
    const sun = { gravitationalParameter: 1.3271244e20, radius: 6.957e8, massDensity: 1e-13 };
    const wind = isothermalWind({ ...sun, temperature: 1e6, particleMass: 0.5 * 1.6735e-27 });
    expect(wind.sonicRadius / 6.957e8).toAgreeWith({
      what: "sonic point of a corona of 1e6 K around the Sun",
      unit: "solar radii",
      published: 5.78,
      within: { relative: 0.01 },
      source: "Parker1958",
      mark: "from memory",
    });
  });

  it("starts at the speed of sound where the base is the sonic point", () => {
    expect(isothermalWind(base(2)).machNumber).toBeCloseTo(1, 7);
    // Next to it, u/a = 1 − (λ − 2)/2 and on.
    expect(isothermalWind(base(2 + 1e-6)).machNumber).toBeCloseToRelative(1 - 5e-7, 1e-9);
    expect(isothermalWind(base(2 - 1e-6)).machNumber).toBeCloseToRelative(1 + 5e-7, 1e-9);
  });

  it("of a tightly bound gas is e^{3/2} (λ/2)² e^{−λ} of the speed of sound, told by its logarithm", () => {
    const wind = isothermalWind(base(900));
    expect(wind.machNumber).toBeNull();
    expect(wind.massRate).toBeNull();
    const log10Mach = (1.5 + 2 * Math.log(450) - 900) / Math.LN10;
    expect(wind.log10MachNumber).toBeCloseTo(log10Mach, 9);
    expect(wind.log10MassRate).toBeCloseTo(log10Mach + Math.log10(4 * Math.PI * 2.5e13 * 1e-9 * 1e3), 9);
  });

  it("solves u² − ln u² = 4 ln(r/r_s) + 4 r_s/r − 3 and slows as λ grows", () => {
    const lambda = fc.double({ min: 1e-3, max: 500, noNaN: true });
    fc.assert(
      fc.property(lambda, (l) => {
        const { log10MachNumber } = isothermalWind(base(l));
        const w = 2 * log10MachNumber * Math.LN10;
        const right = -4 * Math.log(l / 2) + 2 * l - 3;
        const next = isothermalWind(base(l * 1.01)).log10MachNumber;
        return Math.abs(Math.exp(w) - w - right) < 1e-12 * (10 + Math.abs(right)) && next < log10MachNumber;
      }),
      { seed },
    );
  });

  it("says so where it starts faster than sound", () => {
    expect(isothermalWind(base(2.1)).notes).toEqual([]);
    const { machNumber, notes } = isothermalWind(base(1.2));
    expect(machNumber).toBeGreaterThan(1);
    expect(notes[0]).toMatchObject({ level: "caution", code: "wind_starts_supersonic" });
    expect(notes[0].message).toContain("1.20");
  });

  it.each([
    { gravitationalParameter: 0 },
    { radius: -1 },
    { temperature: NaN },
    { particleMass: 0 },
    { massDensity: 0 },
    { massDensity: Infinity },
  ])("refuses %o", (wrong) => {
    expect(() => isothermalWind({ ...base(5), ...wrong })).toThrow(PhysicsDomainError);
  });
});
