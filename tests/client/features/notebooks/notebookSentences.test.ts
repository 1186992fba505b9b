import { describe, expect, it } from "vitest";
import {
  binLine,
  bodyName,
  peopleLine,
  standingLine,
  stateOf,
} from "../../../../src/features/notebooks/notebookSentences";

const person = (name: string) => ({ id: name, name });
const summary = (faults: number, cautions: number) => ({
  summary: { engine: "1.0.0", headline: [], faults, cautions, remarks: 3, bodies: [], strip: null },
});

describe("people", () => {
  it.each([
    [[], "Tamsin Orevale"],
    [["Wiremu Castellane"], "Tamsin Orevale, with Wiremu Castellane"],
    [
      ["Wiremu Castellane", "Ishani Brandvold"],
      "Tamsin Orevale, with Wiremu Castellane and Ishani Brandvold",
    ],
    [["A", "B", "C"], "Tamsin Orevale, with A, B and C"],
  ])("with %j reads %s", (coAuthors, line) => {
    expect(peopleLine({ owner: person("Tamsin Orevale"), coAuthors: coAuthors.map(person) })).toBe(line);
  });
});

describe("the state of a notebook", () => {
  it("waits until the server has computed it", () => {
    expect(stateOf({ summary: null })).toEqual({ state: "waits", words: "not computed yet" });
  });
  it.each([
    [1, 2, "fault", "one fault, two cautions"],
    [2, 0, "fault", "two faults"],
    [0, 1, "caution", "one caution"],
    [0, 0, "holds", "no cautions"],
  ])("with %s faults and %s cautions is a %s: %s", (faults, cautions, state, words) => {
    expect(stateOf(summary(faults, cautions))).toEqual({ state, words });
  });
});

describe("the standing", () => {
  const group = { id: "g", name: "Carrow Aeronomy", code: "CAR" };
  it.each([
    [{ lastVersion: null, role: "owner" as const, group: null }, "draft"],
    [{ lastVersion: 7, role: "owner" as const, group }, "version 7 kept; in CAR"],
    [{ lastVersion: null, role: "co-author" as const, group }, "draft; in CAR; you are co-author"],
  ])("of %j", (notebook, line) => {
    expect(standingLine(notebook)).toBe(line);
  });
});

it("heads a body's name with a capital and without its underlines", () => {
  expect(bodyName("ilmara")).toBe("Ilmara");
  expect(bodyName("small_moon")).toBe("Small moon");
});

it("says until when something in the bin can be put back", () => {
  expect(binLine("2026-03-03T10:00:00Z", new Date("2026-03-05T10:00:00Z"))).toBe(
    "deleted 3 March, kept until 2 April",
  );
});
