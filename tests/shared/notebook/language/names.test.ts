import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { nearestName } from "../../../../shared/notebook/language/nearestName";
import { nameFault, reservedWord } from "../../../../shared/notebook/language/reservedWord";

const keys = ["body", "base", "number_density", "pressure", "gases", "temperature", "eddy", "top", "levels"];

describe("the nearest name", () => {
  it.each([
    ["level", "levels"],
    ["temprature", "temperature"],
    ["Temperature", "temperature"],
    ["presure", "pressure"],
    ["temp", "temperature"],
    ["boyd", "body"],
    ["edy", "eddy"],
  ])("to %s is %s", (name, nearest) => {
    expect(nearestName(name, keys)).toBe(nearest);
  });

  it.each(["wavelength", "xyz", "", "q", "x".repeat(5000)])("to %s is none", (name) => {
    expect(nearestName(name, keys)).toBeUndefined();
  });

  it("is a candidate, or none, for any word", () => {
    fc.assert(
      fc.property(fc.string({ maxLength: 30 }), (name) => {
        const nearest = nearestName(name, keys);
        expect(nearest === undefined || keys.includes(nearest)).toBe(true);
      }),
      { seed: 1 },
    );
  });
});

describe("reserved words", () => {
  it.each([
    ["K", "a unit"],
    ["min", "a unit"],
    ["earth_mass", "a unit"],
    ["sqrt", "a function"],
    ["k_B", "a constant"],
    ["rest", "a word of the language"],
    ["between", "a word of the language"],
    ["T", null],
    ["T_quiet", null],
    ["flux", null],
  ])("%s is %s", (word, what) => {
    expect(reservedWord(word)).toBe(what);
  });

  it.each([
    ["T_quiet", null],
    ["", "A name is missing."],
    ["_x", "A name begins with a letter from a to z."],
    ["2x", "A name begins with a letter from a to z."],
    ["a-b", "A name consists of letters from a to z, digits and *_*; nothing else."],
    ["aα", "A name consists of letters from a to z, digits and *_*; nothing else."],
    ["a.b", "A name consists of letters from a to z, digits and *_*; nothing else."],
    ["x".repeat(65), "A name has 64 characters at most."],
    ["K", "*K* is a unit, so it can't be a name."],
  ])("%s as a name: %s", (name, message) => {
    expect(nameFault(name)).toBe(message);
  });
});
