import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { limbColumn, overheadColumn } from "../../../../shared/physics/corona/coronaColumn";
import { type Corona, coronaDensity } from "../../../../shared/physics/corona/coronaDensity";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import exact from "../../../fixtures/coronaPartition.json";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";

const seed = 20261201;
const corona: Corona = {
  exobaseRadius: 1,
  exobaseEscapeParameter: 7,
  logExobaseNumberDensity: 0,
  satelliteFraction: 0,
  reach: 10,
};

/** ∫ n(s) ds from 0 to an end far out, s = s₁ (e^u − 1), by the midpoint rule. */
function columnBySteps(densityAt: (s: number) => number, scale: number, end: number): number {
  const parts = 6000;
  const last = Math.log(1 + end / scale);
  let sum = 0;
  for (let i = 0; i < parts; i += 1) {
    const u = (last * (i + 0.5)) / parts;
    sum += densityAt(scale * (Math.exp(u) - 1)) * scale * Math.exp(u) * (last / parts);
  }
  return sum;
}

const density = (of: Corona, radius: number): number => coronaDensity(of, radius).numberDensity ?? 0;

describe.each([
  {
    name: "limbColumn",
    told: "column along the limb",
    column: limbColumn,
    log: "logLimb",
    logSatellites: "logLimbSatellites",
  } as const,
  {
    name: "overheadColumn",
    told: "column overhead",
    column: overheadColumn,
    log: "logOverhead",
    logSatellites: "logOverheadSatellites",
  } as const,
])("$name", ({ name, told, column, log, logSatellites }) => {
  it.each(exact.columns)("at λ_c = $exobaseEscapeParameter, r = $radius r_c is mpmath's", (row) => {
    const free = column({ ...corona, ...row }, row.radius);
    expect(free.log10Column * Math.LN10).toAgreeWith({
      what: `logarithm of the ${told}, ballistic and escaping`,
      unit: "1",
      published: row[log],
      within: { absolute: 1e-10 },
      source: "MPMath",
      mark: "computed independently",
    });
    const full = column({ ...corona, ...row, satelliteFraction: 1 }, row.radius);
    const all = row[log] + Math.log1p(Math.exp(row[logSatellites] - row[log]));
    expect(full.log10Column * Math.LN10).toAgreeWith({
      what: `logarithm of the ${told}, with satellites`,
      unit: "1",
      published: all,
      within: { absolute: 1e-10 },
      source: "MPMath",
      mark: "computed independently",
    });
  });

  it("adds up the density along the line", () => {
    const half = { ...corona, satelliteFraction: 0.4 };
    const [factor, radiusAt] =
      name === "limbColumn" ? [2, (s: number) => Math.sqrt(1.44 + s * s)] : [1, (s: number) => 1.2 + s];
    const within = name === "limbColumn" ? Math.sqrt(100 - 1.44) : 8.8;
    const free = columnBySteps((s) => density(corona, radiusAt(s)), 0.3, 1e6);
    const satellites = columnBySteps((s) => coronaDensity(half, radiusAt(s)).satellite ?? 0, 0.3, within);
    expect(column(half, 1.2).column).toBeCloseToRelative(factor * (free + satellites), 3e-6);
  });

  it("is in proportion to the density and the size", () => {
    const lambda = fc.double({ min: 0.05, max: 100, noNaN: true });
    const place = fc.double({ min: 1, max: 8, noNaN: true });
    fc.assert(
      fc.property(lambda, place, (exobaseEscapeParameter, radius) => {
        const small = { ...corona, exobaseEscapeParameter, satelliteFraction: 0.5 };
        const large = { ...small, exobaseRadius: 4e6, reach: 4e7, logExobaseNumberDensity: Math.log(3e9) };
        const expected = column(small, radius).log10Column + Math.log10(4e6 * 3e9);
        return Math.abs(column(large, radius * 4e6).log10Column - expected) < 1e-11;
      }),
      { seed, numRuns: 40 },
    );
  });

  it("falls with the distance from the centre", () => {
    const lambda = fc.double({ min: 0.05, max: 200, noNaN: true });
    const place = fc.double({ min: 1, max: 30, noNaN: true });
    fc.assert(
      fc.property(lambda, place, (exobaseEscapeParameter, radius) => {
        const of = { ...corona, exobaseEscapeParameter };
        return column(of, radius * 1.02).log10Column < column(of, radius).log10Column;
      }),
      { seed, numRuns: 40 },
    );
  });

  it("takes no satellites from beyond the reach, and joins there without a step", () => {
    const full = { ...corona, satelliteFraction: 1 };
    expect(column(full, 11)).toEqual(column(corona, 11));
    const inside = column(full, 10 - 1e-9).log10Column;
    expect(Math.abs(inside - column(corona, 10).log10Column)).toBeLessThan(1e-3);
    const [near, far] = [column({ ...full, reach: 20 }, 2), column({ ...full, reach: 40 }, 2)];
    expect(far.log10Column).toBeGreaterThan(near.log10Column);
  });

  it("holds in logarithms what no number holds", () => {
    const deep = column({ ...corona, exobaseEscapeParameter: 1500 }, 2);
    expect(deep.column).toBeNull();
    expect(deep.log10Column).toBeLessThan(-320);
  });

  it.each([0.99, NaN, Infinity, -1])("refuses to pass the centre at %s exobase radii", (radius) => {
    expect(() => column(corona, radius)).toThrow(PhysicsDomainError);
  });

  it("refuses a density that is no number", () => {
    expect(() => column({ ...corona, logExobaseNumberDensity: NaN }, 2)).toThrow(PhysicsDomainError);
    expect(() => column({ ...corona, satelliteFraction: 2 }, 2)).toThrow(PhysicsDomainError);
  });
});

describe("limb and overhead columns of a thin, tightly bound corona", () => {
  it("are n√(2πrH) and nH", () => {
    // A barometric fall over H = r/λ, much thinner than the body is wide; next order in 1/λ.
    const tight = { ...corona, exobaseEscapeParameter: 3000 };
    expect(limbColumn(tight, 1).column).toBeCloseToRelative(Math.sqrt((2 * Math.PI) / 3000), 1e-3);
    expect(overheadColumn(tight, 1).column).toBeCloseToRelative(1 / 3000, 1e-3);
  });
});
