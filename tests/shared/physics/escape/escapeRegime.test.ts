import fc from "fast-check";
import { describe, expect, it } from "vitest";

import { PhysicsDomainError } from "../../../../shared/physics/errors";
import { escapeRegime, escapeRegimeBounds } from "../../../../shared/physics/escape/escapeRegime";

const seed = 20261201;

describe("escapeRegime", () => {
  it.each([
    // Volkov et al. (2011), abstract: near Jeans above about 6, particle by particle above 3, turning over at 2 to 3.
    [300, "jeans", []],
    [6, "jeans", []],
    [5.999, "jeans_estimate", ["caution jeans_estimate"]],
    [3, "jeans_estimate", ["caution jeans_estimate"]],
    [2.999, "transition", ["caution escape_transition"]],
    [2, "transition", ["caution escape_transition"]],
    [1.999, "wind", ["fault escape_wind"]],
    [0.1, "wind", ["fault escape_wind"]],
  ])("at λ̄ = %s is %s", (lambda, regime, notes) => {
    const answer = escapeRegime(lambda);
    expect(answer.regime).toBe(regime);
    expect(answer.notes.map(({ level, code }) => `${level} ${code}`)).toEqual(notes);
  });

  it("puts the end of the transition where the sonic point of an isothermal wind reaches the exobase", () => {
    // Parker (1958): r_s = GMm/(2kT) = λr/2, so r_s = r at λ = 2.
    expect((escapeRegimeBounds.transition * 1) / 2).toBe(1);
  });

  it("says the number it found and the published enhancement", () => {
    expect(escapeRegime(4.2).notes[0].message).toContain("4.20");
    expect(escapeRegime(4.2).notes[0].message).toContain("1.4 to 1.7 times");
    expect(escapeRegime(2.5).notes[0].message).toContain("order of magnitude");
    expect(escapeRegime(1.2).notes[0].message).toContain("wind rate");
  });

  it("never becomes more tightly bound as λ̄ falls", () => {
    const order = ["wind", "transition", "jeans_estimate", "jeans"];
    const lambda = fc.double({ min: 1e-3, max: 100, noNaN: true });
    fc.assert(
      fc.property(lambda, lambda, (a, b) => {
        const [low, high] = a < b ? [a, b] : [b, a];
        return order.indexOf(escapeRegime(low).regime) <= order.indexOf(escapeRegime(high).regime);
      }),
      { seed },
    );
  });

  it.each([0, -1, NaN, Infinity])("refuses %s", (wrong) => {
    expect(() => escapeRegime(wrong)).toThrow(PhysicsDomainError);
  });
});
