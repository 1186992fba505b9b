import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { type Corona, coronaDensity } from "../../../../shared/physics/corona/coronaDensity";
import { coronaShareAtExobase } from "../../../../shared/physics/corona/coronaShareAtExobase";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import published from "../../../fixtures/chamberlainZeta.json";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";
import { maxwellianByOrbit } from "./maxwellianByOrbit";

const seed = 20261201;
const corona: Corona = {
  exobaseRadius: 3.6e6,
  exobaseEscapeParameter: 5,
  logExobaseNumberDensity: Math.log(2e11),
  satelliteFraction: 0,
  reach: 3.6e7,
};

describe("coronaDensity", () => {
  it.each(published.rows)("at λ_c = $exobaseEscapeParameter, r/r_c = $radiusRatio is the table's", (row) => {
    const { numberDensity } = coronaDensity({ ...corona, ...row }, 3.6e6 * row.radiusRatio);
    expect(numberDensity).toAgreeWith({
      what: "density of a corona of 2e11 m⁻³ at its exobase",
      unit: "m⁻³",
      published: 2e11 * row.densityRatio,
      within: { relative: 1e-6 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("is the sum over orbits of what rises from the exobase", () => {
    const { ballistic, satellite, escaping } = maxwellianByOrbit(5, 2);
    const barometric = 2e11 * Math.exp(-2.5);
    const half = coronaDensity({ ...corona, satelliteFraction: 0.5 }, 7.2e6);
    expect(half.numberDensity).toBeCloseToRelative(
      barometric * (ballistic + 0.5 * satellite + escaping),
      1e-6,
    );
    expect(half.satellite).toBeCloseToRelative(barometric * 0.5 * satellite, 1e-6);
    expect(half.ballistic).toBeCloseToRelative(barometric * ballistic, 1e-6);
    expect(half.escaping).toBeCloseToRelative(barometric * escaping, 1e-6);
  });

  it("steps down at the exobase by what would come from above", () => {
    const { numberDensity } = coronaDensity(corona, 3.6e6);
    expect(numberDensity).toBeCloseToRelative(2e11 * coronaShareAtExobase(5), 1e-13);
  });

  it("with all satellites is nearly barometric where nearly all is bound", () => {
    const { numberDensity } = coronaDensity(
      { ...corona, exobaseEscapeParameter: 40, satelliteFraction: 1 },
      3.6e6 * 1.25,
    );
    expect(numberDensity).toBeCloseToRelative(2e11 * Math.exp(-8), 1e-9);
  });

  it("holds in logarithms what no number holds", () => {
    const deep = coronaDensity({ ...corona, exobaseEscapeParameter: 2000 }, 7.2e6);
    expect(deep.numberDensity).toBeNull();
    expect(deep.escaping).toBeNull();
    // Half of the depth, 1000 kT, and next to nothing more.
    expect(deep.log10NumberDensity).toBeCloseTo(Math.log10(2e11) - 1000 / Math.LN10, 10);
    expect(deep.log10Escaping).toBeLessThan(deep.log10NumberDensity - 400);
  });

  it("says that there are no satellites: at the exobase, beyond the reach, with none filled", () => {
    const full = { ...corona, satelliteFraction: 1 };
    for (const none of [coronaDensity(full, 3.6e6), coronaDensity(full, 3.7e7), coronaDensity(corona, 5e6)]) {
      expect(none).toMatchObject({ satellite: 0, log10Satellite: null });
    }
    expect(coronaDensity(full, 3.6e7).satellite).toBeGreaterThan(0);
  });

  it("is in proportion to the density at the exobase, and its parts add up", () => {
    const radius = fc.double({ min: 3.6e6, max: 1e9, noNaN: true });
    const fraction = fc.double({ min: 0, max: 1, noNaN: true });
    fc.assert(
      fc.property(radius, fraction, (r, satelliteFraction) => {
        const one = coronaDensity({ ...corona, satelliteFraction }, r);
        const logDouble = corona.logExobaseNumberDensity + Math.LN2;
        const two = coronaDensity({ ...corona, satelliteFraction, logExobaseNumberDensity: logDouble }, r);
        const sum = (one.ballistic ?? 0) + (one.satellite ?? 0) + (one.escaping ?? 0);
        return (
          Math.abs((two.numberDensity ?? 0) / (one.numberDensity ?? 0) - 2) < 1e-13 &&
          Math.abs(sum / (one.numberDensity ?? 0) - 1) < 1e-13 &&
          Math.abs(10 ** one.log10NumberDensity / (one.numberDensity ?? 0) - 1) < 1e-12
        );
      }),
      { seed },
    );
  });

  it.each([
    { satelliteFraction: -0.1 },
    { satelliteFraction: 1.1 },
    { satelliteFraction: NaN },
    { reach: NaN },
    { reach: Infinity },
    { logExobaseNumberDensity: -Infinity },
    { exobaseEscapeParameter: 0 },
  ])("refuses %o", (wrong) => {
    expect(() => coronaDensity({ ...corona, ...wrong }, 5e6)).toThrow(PhysicsDomainError);
  });

  it("refuses a place under the exobase", () => {
    expect(() => coronaDensity(corona, 3.5e6)).toThrow(/exobase/);
  });
});
