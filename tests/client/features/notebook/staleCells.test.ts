import { describe, expect, it } from "vitest";
import type { CellEvaluation } from "../../../../shared/notebook/result";
import { staleCells } from "../../../../src/features/notebook/evaluation/staleCells";
import { aCell, aNotebook, withTexts } from "./aNotebook";

const document = aNotebook({
  cells: [
    aCell({ id: "values", kind: "values", name: "given", text: "T = 300 K" }),
    aCell({ id: "body", kind: "body", name: "ilmara", text: "radius = 4943 km" }),
    aCell({ id: "air", kind: "column", name: "dayside", text: "body = ilmara" }),
    aCell({ id: "leak", kind: "escape", name: "leak", text: "column = dayside" }),
    aCell({ id: "other", kind: "body", name: "oda", text: "radius = 900 km" }),
  ],
});

function anAnswer(id: string, uses: string[], values: string[] = []): CellEvaluation {
  const cell = document.cells.find((candidate) => candidate.id === id)!;
  return {
    id,
    result: {
      kind: cell.kind,
      name: cell.name,
      status: "fine",
      values: Object.fromEntries(values.map((name) => [name, { value: 1, unit: "1" }])),
      tables: {},
      notes: [],
    },
    understood: [],
    defaults: [],
    uses,
    gases: [],
  };
}

const answers = new Map(
  [
    anAnswer("values", [], ["T"]),
    anAnswer("body", []),
    anAnswer("air", ["ilmara", "T"]),
    anAnswer("leak", ["dayside"]),
    anAnswer("other", []),
  ].map((answer) => [answer.id, answer]),
);

const stale = (written: typeof document) => [...staleCells(written, document, answers)];

describe("staleCells", () => {
  it("finds none where the text is the one that was computed", () => {
    expect(stale(document)).toEqual([]);
  });

  it("finds the cell that was written and all that rest on it, near and far", () => {
    expect(stale(withTexts(document, { body: "radius = 5000 km" }))).toEqual(["body", "air", "leak"]);
  });

  it("follows the names of values", () => {
    expect(stale(withTexts(document, { values: "T = 310 K" }))).toEqual(["values", "air", "leak"]);
  });

  it("leaves alone what nothing rests on", () => {
    expect(stale(withTexts(document, { other: "radius = 800 km" }))).toEqual(["other"]);
  });

  it("doubts all that stands below a cell that came or went", () => {
    expect(stale({ ...document, cells: document.cells.toSpliced(2, 1) })).toEqual(["leak", "other"]);
  });

  it("doubts everything before the first answer", () => {
    expect([...staleCells(document, null, new Map())]).toHaveLength(5);
  });
});
