import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { contentText } from "../../../shared/notebook/contentText";
import { cellKinds, type NotebookDocument } from "../../../shared/notebook/document";
import { editDocument, type DocumentEdit } from "../../../shared/notebook/editDocument";

const document: NotebookDocument = {
  format: 1,
  title: "Ilmara",
  unitSystem: "SI",
  headline: [],
  authors: ["Jorun Aldaker"],
  cells: ["a", "b", "c", "d"].map((id) => ({ id, kind: "values", name: `v_${id}`, text: `x_${id} = 1 m` })),
};

const place = fc.integer({ min: 0, max: 3 });
const id = fc.constantFrom("a", "b", "c", "d");
const simple: fc.Arbitrary<DocumentEdit> = fc.oneof(
  fc.record({
    type: fc.constant("insertCell" as const),
    index: fc.integer({ min: 0, max: 4 }),
    cell: fc.record({
      id: fc.constant("new"),
      kind: fc.constantFrom(...cellKinds),
      name: fc.string(),
      text: fc.string(),
    }),
  }),
  fc.record({ type: fc.constant("removeCell" as const), id }),
  fc.record({ type: fc.constant("moveCell" as const), id, index: place }),
  fc.record({ type: fc.constant("changeText" as const), id, text: fc.string() }),
  fc.record({ type: fc.constant("renameCell" as const), id, name: fc.string() }),
  fc.record({ type: fc.constant("changeTitle" as const), title: fc.string() }),
  fc.record({
    type: fc.constant("changeUnitSystem" as const),
    unitSystem: fc.constantFrom("SI" as const, "cgs" as const),
  }),
  fc.record({
    type: fc.constant("changeHeadline" as const),
    headline: fc.array(fc.string(), { maxLength: 3 }),
  }),
  fc.record({
    type: fc.constant("changeAuthors" as const),
    authors: fc.array(fc.string(), { maxLength: 3 }),
  }),
);

describe("an edit of a document", () => {
  it("is undone by its inverse, and done again by the inverse of that", () => {
    fc.assert(
      fc.property(simple, (edit) => {
        const done = editDocument(document, edit);
        const undone = editDocument(done.document, done.inverse);
        expect(undone.document).toEqual(document);
        expect(editDocument(undone.document, undone.inverse).document).toEqual(done.document);
      }),
      { seed: 7 },
    );
  });

  it("composes with others, and the whole is undone at once", () => {
    const edits: DocumentEdit[] = [
      { type: "moveCell", id: "a", index: 3 },
      { type: "removeCell", id: "b" },
      { type: "insertCell", index: 0, cell: { id: "b", kind: "prose", name: "", text: "again" } },
      { type: "changeText", id: "b", text: "and again" },
    ];
    const done = editDocument(document, { type: "several", edits });
    expect(done.document.cells.map((cell) => cell.id)).toEqual(["b", "c", "d", "a"]);
    expect(editDocument(done.document, done.inverse).document).toEqual(document);
  });

  it("leaves untouched cells the same objects and the old document as it was", () => {
    const before = structuredClone(document);
    const { document: after } = editDocument(document, { type: "changeText", id: "b", text: "" });
    expect(after.cells[0]).toBe(document.cells[0]);
    expect(after.cells[1]).not.toBe(document.cells[1]);
    expect(document).toEqual(before);
  });

  it.each<[string, DocumentEdit]>([
    ["a cell that is not there", { type: "removeCell", id: "z" }],
    ["a place outside", { type: "moveCell", id: "a", index: 4 }],
    ["an id twice", { type: "insertCell", index: 0, cell: { id: "a", kind: "prose", name: "", text: "" } }],
  ])("refuses %s", (_, edit) => {
    expect(() => editDocument(document, edit)).toThrow(RangeError);
  });
});

describe("the text behind a content hash", () => {
  it("covers title, cells and engine, and nothing that changes no number", () => {
    const text = contentText(document, "1.0.0");
    expect(contentText({ ...document, unitSystem: "cgs", authors: [], headline: ["a.b"] }, "1.0.0")).toBe(
      text,
    );
    expect(
      contentText(
        { ...document, cells: document.cells.map((cell) => ({ ...cell, id: `${cell.id}2` })) },
        "1.0.0",
      ),
    ).toBe(text);
    expect(contentText({ ...document, title: "Nirel" }, "1.0.0")).not.toBe(text);
    expect(contentText(document, "1.0.1")).not.toBe(text);
    expect(
      contentText(editDocument(document, { type: "moveCell", id: "a", index: 1 }).document, "1.0.0"),
    ).not.toBe(text);
  });
});
