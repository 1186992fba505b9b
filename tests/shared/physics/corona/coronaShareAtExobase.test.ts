import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { coronaShareAtExobase } from "../../../../shared/physics/corona/coronaShareAtExobase";
import { PhysicsDomainError } from "../../../../shared/physics/errors";
import published from "../../../fixtures/chamberlainZeta.json";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";
import { maxwellianByOrbit } from "./maxwellianByOrbit";

const seed = 20261201;

describe("coronaShareAtExobase", () => {
  it.each(published.rows.filter(({ radiusRatio }) => radiusRatio === 1))(
    "of λ_c = $exobaseEscapeParameter is the table's",
    (row) => {
      const share = coronaShareAtExobase(row.exobaseEscapeParameter);
      expect(share).toAgreeWith({
        what: "share ½(1 + P) of the column's density at the exobase",
        unit: "1",
        published: row.densityRatio,
        within: { relative: 1e-12 },
        source: "SeparateProgram",
        mark: "computed independently",
      });
    },
  );

  it("is what orbits that rise from the exobase make up there", () => {
    const { ballistic, escaping } = maxwellianByOrbit(2.2, 1);
    expect(coronaShareAtExobase(2.2)).toBeCloseToRelative(ballistic + escaping, 1e-6);
  });

  it("is half where nothing is bound and all where everything is", () => {
    expect(coronaShareAtExobase(1e-12)).toBeCloseToRelative(0.5, 1e-15);
    expect(coronaShareAtExobase(60)).toBe(1);
  });

  it("grows with the escape parameter", () => {
    const lambda = fc.double({ min: 1e-3, max: 30, noNaN: true });
    fc.assert(
      fc.property(lambda, (x) => coronaShareAtExobase(x * 1.01) > coronaShareAtExobase(x)),
      { seed },
    );
  });

  it.each([0, -1, NaN, Infinity])("refuses %s", (wrong) => {
    expect(() => coronaShareAtExobase(wrong)).toThrow(PhysicsDomainError);
  });
});
