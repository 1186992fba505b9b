import { expect, it } from "vitest";
import { notebookDocumentSchema } from "../../../../shared/notebook/document";
import { evaluateNotebook } from "../../../../shared/notebook/evaluateNotebook";
import { outlineDocument } from "../../../../src/features/notebooks/outlineDocument";

let count = 0;
const outline = outlineDocument("A first look", () => `cell-${count++}`);

it("is a sound document, every cell with an id of its own", () => {
  expect(notebookDocumentSchema.parse(outline)).toEqual(outline);
  expect(new Set(outline.cells.map(({ id }) => id)).size).toBe(outline.cells.length);
});

it("answers at once, without a fault or a caution, with an exobase above its base", () => {
  const { evaluation } = evaluateNotebook(outline);
  const notes = evaluation.cells.flatMap(({ result }) =>
    result.notes.filter(({ level }) => level !== "remark"),
  );
  expect(notes).toEqual([]);
  const leak = evaluation.cells.find(({ result }) => result.name === "leak")?.result;
  expect(Number(leak?.values["exobase.altitude"]?.value)).toBeGreaterThan(80e3);
});
