import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { coronaShareAtExobase } from "../../../../shared/physics/corona/coronaShareAtExobase";
import { partitionFunctions } from "../../../../shared/physics/corona/partitionFunctions";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { incompleteGamma, scaledUpperGamma } from "../../../../shared/physics/numerics/incompleteGamma";
import exact from "../../../fixtures/coronaPartition.json";
import published from "../../../fixtures/chamberlainZeta.json";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";
import { maxwellianByOrbit } from "./maxwellianByOrbit";

const seed = 20261201;
const kinds = ["ballistic", "satellite", "escaping"] as const;

const at = (exobaseEscapeParameter: number, radiusRatio: number) =>
  partitionFunctions({ exobaseEscapeParameter, exobaseRadius: 3.6e6, radius: 3.6e6 * radiusRatio });

const lambdaC = fc.double({ min: 0.01, max: 2000, noNaN: true });
const ratio = fc.oneof(
  fc.double({ min: 1, max: 3, noNaN: true }),
  fc.double({ min: 0, max: 8, noNaN: true }).map((x) => 10 ** x),
  fc.double({ min: -9, max: 0, noNaN: true }).map((x) => 1 + 10 ** x),
);

describe("partitionFunctions", () => {
  it.each(published.rows)("are the table's at λ_c = $exobaseEscapeParameter, r/r_c = $radiusRatio", (row) => {
    const shares = at(row.exobaseEscapeParameter, row.radiusRatio);
    for (const kind of kinds) {
      // The table holds differences from 1 in double precision: below, its last digits are rounding.
      expect(shares[kind]).toAgreeWith({
        what: `${kind} partition function of Chamberlain (1963), by quadrature over velocities`,
        unit: "1",
        published: row[kind],
        within: { relative: 1e-6, absolute: 2.3e-16 },
        source: "SeparateProgram",
        mark: "computed independently",
      });
    }
    const density = Math.exp(shares.logBallisticDensity) + Math.exp(shares.logEscapingDensity);
    expect(density).toAgreeWith({
      what: "density over that of the exobase, without satellites",
      unit: "1",
      published: row.densityRatio,
      within: { relative: 1e-6 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it("of λ_c = 7 at twice the exobase's radius are 0.711789, 0.216314 and 0.00926413", () => {
    // Checked there by direct quadrature over velocities; see the fixture.
    const { ballistic, satellite, escaping } = at(7, 2);
    expect(ballistic).toAgreeWith({
      what: "ballistic partition function, λ_c = 7, r = 2 r_c",
      unit: "1",
      published: 0.711789,
      within: { relative: 1e-6 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
    expect(satellite).toAgreeWith({
      what: "satellite partition function, λ_c = 7, r = 2 r_c",
      unit: "1",
      published: 0.216314,
      within: { relative: 2e-6 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
    expect(escaping).toAgreeWith({
      what: "escaping partition function, λ_c = 7, r = 2 r_c",
      unit: "1",
      published: 0.00926413,
      within: { relative: 1e-6 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  it.each(exact.rows)("hold their digits at λ_c = $exobaseEscapeParameter, r = $radius r_c", (row) => {
    const shares = partitionFunctions({ ...row, exobaseRadius: 1 });
    expect(shares.ballistic).toAgreeWith({
      what: "ballistic partition function to its digits",
      unit: "1",
      published: row.ballistic,
      within: { relative: 1e-13 },
      source: "MPMath",
      mark: "computed independently",
    });
    if (row.satellite > 1e-300)
      expect(shares.satellite).toAgreeWith({
        what: "satellite partition function to its digits",
        unit: "1",
        published: row.satellite,
        within: { relative: 2e-13 },
        source: "MPMath",
        mark: "computed independently",
      });
    if (row.escaping > 1e-300)
      expect(shares.escaping).toAgreeWith({
        what: "escaping partition function to its digits",
        unit: "1",
        published: row.escaping,
        within: { relative: 1e-13 },
        source: "MPMath",
        mark: "computed independently",
      });
    // A logarithm of 2000 is good to 2e-13 in itself.
    const allowance = 1e-13 + 4e-16 * row.exobaseEscapeParameter;
    expect(shares.logBallisticDensity).toAgreeWith({
      what: "logarithm of the ballistic density",
      unit: "1",
      published: row.logBallistic,
      within: { absolute: allowance },
      source: "MPMath",
      mark: "computed independently",
    });
    expect(shares.logEscapingDensity).toAgreeWith({
      what: "logarithm of the escaping density",
      unit: "1",
      published: row.logEscaping,
      within: { absolute: allowance },
      source: "MPMath",
      mark: "computed independently",
    });
    if (row.logSatellite !== null) {
      expect(shares.logSatelliteDensity).toAgreeWith({
        what: "logarithm of the satellite density",
        unit: "1",
        published: row.logSatellite,
        within: { absolute: allowance },
        source: "MPMath",
        mark: "computed independently",
      });
    }
  });

  it.each([
    [0.3, 1.4],
    [2.5, 1],
    [2.5, 1.02],
    [2.5, 3],
    [7, 1.3],
    [7, 9],
    [25, 1.1],
    [25, 40],
  ])("are the Maxwellian's integral over the orbits, λ_c = %s, r/r_c = %s", (lambda, radiusRatio) => {
    const shares = at(lambda, radiusRatio);
    const orbits = maxwellianByOrbit(lambda, radiusRatio);
    for (const kind of kinds) {
      if (radiusRatio > 1 || kind !== "satellite") {
        expect(shares[kind], kind).toBeCloseToRelative(orbits[kind], 1e-6);
      }
    }
  });

  it("leave no satellites at the exobase, and half of the fast ones", () => {
    for (const lambda of [0.01, 1, 6.9, 80]) {
      const { ballistic, satellite, escaping } = at(lambda, 1);
      expect(satellite).toBe(0);
      expect(ballistic).toBeCloseToRelative(incompleteGamma(lambda), 1e-14);
      expect(escaping).toBeCloseToRelative(0.5 * Math.exp(-lambda) * scaledUpperGamma(lambda), 1e-10);
      expect(ballistic + escaping).toBeCloseToRelative(coronaShareAtExobase(lambda), 1e-14);
    }
  });

  it("tend far out to a fan of escaping particles alone: density as r⁻²", () => {
    const far = at(5, 1e7);
    expect(far.escaping / far.ballistic).toBeGreaterThan(100);
    const doubled = at(5, 2e7);
    expect(far.logEscapingDensity - doubled.logEscapingDensity).toBeCloseTo(Math.log(4), 3);
  });

  it("share the bound ones out: ballistic + satellite = P(3/2, λ)", () => {
    fc.assert(
      fc.property(lambdaC, ratio, (lambda, radiusRatio) => {
        const { ballistic, satellite, escapeParameter } = at(lambda, radiusRatio);
        return Math.abs((ballistic + satellite) / incompleteGamma(escapeParameter) - 1) < 1e-10;
      }),
      { seed, numRuns: 300 },
    );
  });

  it("are above zero and never more than there is", () => {
    fc.assert(
      fc.property(lambdaC, ratio, (lambda, radiusRatio) => {
        const shares = at(lambda, radiusRatio);
        const sum = shares.ballistic + shares.satellite + 2 * shares.escaping;
        return kinds.every((kind) => shares[kind] >= 0) && shares.ballistic > 0 && sum <= 1 + 1e-13;
      }),
      { seed, numRuns: 300 },
    );
  });

  it("give a density of ballistic and escaping particles that falls with height", () => {
    fc.assert(
      fc.property(lambdaC, ratio, (lambda, radiusRatio) => {
        const [low, high] = [at(lambda, radiusRatio), at(lambda, radiusRatio * 1.01)];
        return (
          high.logBallisticDensity < low.logBallisticDensity &&
          high.logEscapingDensity < low.logEscapingDensity
        );
      }),
      { seed, numRuns: 300 },
    );
  });

  it.each([
    { exobaseEscapeParameter: 0 },
    { exobaseEscapeParameter: -1 },
    { exobaseEscapeParameter: NaN },
    { exobaseRadius: 0 },
    { exobaseRadius: Infinity },
    { radius: 3.599e6 },
    { radius: NaN },
    { radius: Infinity },
  ])("refuse %o", (wrong) => {
    const place = { exobaseEscapeParameter: 7, exobaseRadius: 3.6e6, radius: 4e6, ...wrong };
    expect(() => partitionFunctions(place)).toThrow(PhysicsDomainError);
  });
});
