import { describe, expect, it } from "vitest";
import { answerCaution, answeredCautions, numbersOf } from "../../../shared/notebook/cautionAnswers";
import type { NotebookDocument } from "../../../shared/notebook/document";
import { givenValues } from "../../../shared/notebook/givenValues";
import { readNotebookFile, writeNotebookFile } from "../../../shared/notebook/notebookFile";

const empty: NotebookDocument = { format: 1, title: "N", unitSystem: "SI", headline: [], authors: [], cells: [] };
const caution = (message: string) => ({ level: "caution" as const, code: "held_constant", entry: "eddy", message });
const cellsWith = (message: string) => [{ name: "air", notes: [caution(message)] }];

describe("an answer to a caution", () => {
  const answered = answerCaution(empty, { cell: "air", note: caution("Held above 900 km.") }, "Only 1 % of it.");

  it.each([
    ["Held above 908 km.", false],
    ["Held above 910 km.", true],
    ["Held above 900 km and 2 more.", true],
  ])("at %s has lapsed: %s", (message, hasLapsed) => {
    expect(answeredCautions(answered, cellsWith(message))).toMatchObject([{ hasLapsed, answer: { entry: "eddy" } }]);
  });

  it("is of its own caution alone, and can be taken back", () => {
    expect(answeredCautions(answered, [{ name: "other", notes: [caution("Held above 900 km.")] }])[0]!.answer).toBeNull();
    expect(answerCaution(answered, { cell: "air", note: caution("") }, " ")).toEqual(empty);
  });

  it("travels in the file, commas and all", () => {
    const sentence = "Yes, # really, 50 % \\ of it";
    const document = answerCaution(answered, { cell: "", note: { code: "other", message: "None" } }, sentence);
    const reading = readNotebookFile(writeNotebookFile(document), () => "id");
    expect(reading).toMatchObject({ ok: true, document: { answers: document.answers } });
  });

  it("knows the numbers of its caution, not the digits of names", () => {
    expect(numbersOf("λ of H2 is −7.67 at 1\u202f200 km, 1.5×10^3 or 2e-4; CO2 not.")).toEqual([-7.67, 1200, 1500, 2e-4]);
  });
});

describe("a given value", () => {
  const given = (text: string) =>
    givenValues({ cells: [{ id: "a", kind: "values", name: "v", text }] }).map(({ key, hasSource }) => [key, hasSource]);

  it.each([
    ["a = 240 K # assumed", [["a", true]]],
    ["a = 240 K", [["a", false]]],
    ["a = 240 ± 30 K", [["a", false]]],
    ["a = 0.3", [["a", false]]],
    ["a = 2 * b", []],
    ["a = b + 3 K", [["a", false]]],
    ["a = ref(CAR4.2, b)", []],
    ["a = N2: 2 %, O: b", [["a", false]]],
  ])("%s", (text, expected) => {
    expect(given(text)).toEqual(expected);
  });
});
