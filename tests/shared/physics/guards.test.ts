import { describe, expect, it } from "vitest";

import { PhysicsDomainError } from "../../../shared/physics/errors";
import {
  requireAscending,
  requireFinite,
  requireFraction,
  requireNonNegative,
  requirePositive,
} from "../../../shared/physics/guards";

describe("guards", () => {
  it.each([
    [requireFinite, [-1e300, 0, 5], [NaN, Infinity, -Infinity]],
    [requirePositive, [5e-324, 1, 1e308], [0, -0, -1, NaN, Infinity]],
    [requireNonNegative, [0, 1], [-5e-324, NaN, Infinity]],
    [requireFraction, [0, 0.5, 1], [-1e-9, 1.0000001, NaN]],
  ])("$name lets through what it should and nothing else", (guard, accepted, refused) => {
    for (const value of accepted) expect(() => guard("number", value)).not.toThrow();
    for (const value of refused) expect(() => guard("number", value)).toThrow(PhysicsDomainError);
  });

  it("requireAscending names the value that does not rise", () => {
    expect(() => requireAscending("altitude", [1, 2, 5])).not.toThrow();
    expect(() => requireAscending("altitude", [1, 5, 5])).toThrow(
      /altitude is 5; it must be above the one before it, 5/,
    );
  });

  it("say what is wrong, its value and what to do", () => {
    try {
      requirePositive("temperature", -3);
      expect.unreachable();
    } catch (error) {
      expect(error).toBeInstanceOf(PhysicsDomainError);
      expect(error).toMatchObject({
        name: "PhysicsDomainError",
        quantity: "temperature",
        value: -3,
        requirement: "finite and above zero",
        message: "The temperature is -3; it must be finite and above zero.",
      });
    }
  });
});
