import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { boltzmann } from "../../../../shared/physics/constants/codata2022";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { thermalSpeed } from "../../../../shared/physics/escape/thermalSpeed";
import "../../../toAgreeWith";
import { jeansCases } from "./jeansCases";

const seed = 20261201;
const nitrogen = { temperature: 300, particleMass: 4.6517e-26 };

describe("thermalSpeed", () => {
  it.each(jeansCases)("of $label is that of the independent program", (row) => {
    expect(thermalSpeed(row)).toAgreeWith({
      what: "thermal speeds of gases at five planets",
      unit: "m s⁻¹",
      published: row.thermalSpeed,
      within: { relative: 1e-12 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("of N2 at 300 K is 422 m/s", () => {
    expect(thermalSpeed(nitrogen)).toAgreeWith({
      what: "thermal speed of N2 at 300 K",
      unit: "m s⁻¹",
      published: 422,
      within: { relative: 1e-3 },
      source: "Textbook",
      mark: "from memory",
    });
  });

  it("is where a Maxwellian has its maximum", () => {
    const maxwellian = (v: number) =>
      v * v * Math.exp((-nitrogen.particleMass * v * v) / (2 * boltzmann.value * nitrogen.temperature));
    const peak = thermalSpeed(nitrogen);
    expect(maxwellian(peak)).toBeGreaterThan(maxwellian(peak * 1.0001));
    expect(maxwellian(peak)).toBeGreaterThan(maxwellian(peak * 0.9999));
  });

  it("vanishes in the cold", () => {
    expect(thermalSpeed({ ...nitrogen, temperature: 1e-12 })).toBeLessThan(1e-4);
  });

  it("rises with the root of temperature over mass", () => {
    const factor = fc.double({ min: 1e-3, max: 1e3, noNaN: true });
    fc.assert(
      fc.property(factor, (f) => {
        const hotter = thermalSpeed({ ...nitrogen, temperature: 300 * f * f });
        const lighter = thermalSpeed({ ...nitrogen, particleMass: nitrogen.particleMass / (f * f) });
        const expected = thermalSpeed(nitrogen) * f;
        return Math.abs(hotter / expected - 1) < 1e-15 && Math.abs(lighter / expected - 1) < 1e-15;
      }),
      { seed },
    );
  });

  it.each([0, -1, NaN, Infinity])("refuses %s", (wrong) => {
    expect(() => thermalSpeed({ ...nitrogen, temperature: wrong })).toThrow(PhysicsDomainError);
    expect(() => thermalSpeed({ ...nitrogen, particleMass: wrong })).toThrow(PhysicsDomainError);
  });
});
