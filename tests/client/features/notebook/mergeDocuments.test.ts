import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { NotebookDocument } from "../../../../shared/notebook/document";
import { isSameDocument, mergeDocuments } from "../../../../src/features/notebook/draft/mergeDocuments";
import { aCell, aNotebook, withTexts } from "./aNotebook";

const base = aNotebook();
const textOf = (document: NotebookDocument, id: string) =>
  document.cells.find((cell) => cell.id === id)?.text;

describe("mergeDocuments", () => {
  it("takes what only one side changed, cell by cell", () => {
    const mine = withTexts(base, { text: "Ilmara is small." });
    const theirs = withTexts(base, { body: "mass = 0.4 earth_mass\nradius = 4943 km" });
    const merge = mergeDocuments({ base, mine, theirs });
    expect(merge.conflicts).toEqual([]);
    expect(textOf(merge.document, "text")).toBe("Ilmara is small.");
    expect(textOf(merge.document, "body")).toBe("mass = 0.4 earth_mass\nradius = 4943 km");
    expect(merge.settled).toEqual([
      { cellId: "text", label: "cell", side: "mine" },
      { cellId: "body", label: "cell", side: "theirs" },
    ]);
  });

  it("joins two changes to one cell where they touch different entries", () => {
    const mine = withTexts(base, { body: "mass = 0.41 earth_mass\nradius = 5000 km" });
    const theirs = withTexts(base, { body: "mass = 0.4 earth_mass # by transit timing\nradius = 4943 km" });
    const merge = mergeDocuments({ base, mine, theirs });
    expect(merge.conflicts).toEqual([]);
    expect(textOf(merge.document, "body")).toBe(
      "mass = 0.4 earth_mass # by transit timing\nradius = 5000 km",
    );
  });

  it("asks where both changed one entry, and stands as mine until told", () => {
    const mine = withTexts(base, { body: "mass = 0.41 earth_mass\nradius = 5000 km" });
    const theirs = withTexts(base, { body: "mass = 0.41 earth_mass\nradius = 4900 km" });
    const merge = mergeDocuments({ base, mine, theirs });
    expect(merge.conflicts).toEqual([
      {
        id: "body/radius",
        cellId: "body",
        label: "radius",
        base: "radius = 4943 km",
        mine: "radius = 5000 km",
        theirs: "radius = 4900 km",
      },
    ]);
    expect(textOf(merge.document, "body")).toContain("5000 km");
    const chosen = mergeDocuments({ base, mine, theirs }, { "body/radius": "theirs" });
    expect(textOf(chosen.document, "body")).toBe("mass = 0.41 earth_mass\nradius = 4900 km");
  });

  it("asks whether an entry stays that one side took away and the other changed", () => {
    const mine = withTexts(base, { body: "mass = 0.41 earth_mass" });
    const theirs = withTexts(base, { body: "mass = 0.41 earth_mass\nradius = 4900 km" });
    const { conflicts, document } = mergeDocuments({ base, mine, theirs });
    expect(conflicts).toMatchObject([{ label: "radius", mine: null, theirs: "radius = 4900 km" }]);
    expect(textOf(document, "body")).toBe("mass = 0.41 earth_mass");
  });

  it("keeps a removed cell in question when the other side went on writing it", () => {
    const mine = { ...base, cells: base.cells.filter(({ id }) => id !== "air") };
    const theirs = withTexts(base, { air: "body = ilmara" });
    const { conflicts } = mergeDocuments({ base, mine, theirs });
    expect(conflicts).toMatchObject([{ id: "air/air", cellId: "air", mine: null }]);
    const chosen = mergeDocuments({ base, mine, theirs }, { "air/air": "theirs" });
    expect(chosen.document.cells.map(({ id }) => id)).toEqual(["text", "body", "air"]);
  });

  it("keeps both sides' new cells beside the cells they were put after", () => {
    const here = aCell({ id: "here", name: "here" });
    const there = aCell({ id: "there", name: "there" });
    const mine = { ...base, cells: base.cells.toSpliced(1, 0, here) };
    const theirs = { ...base, cells: [...base.cells, there] };
    const { document, conflicts } = mergeDocuments({ base, mine, theirs });
    expect(conflicts).toEqual([]);
    expect(document.cells.map(({ id }) => id)).toEqual(["text", "here", "body", "air", "there"]);
  });

  it("keeps a move of one side together with an insertion of the other", () => {
    const [text, body, air] = base.cells;
    const mine = { ...base, cells: [air!, text!, body!] };
    const theirs = { ...base, cells: [text!, aCell({ id: "there" }), body!, air!] };
    const { document } = mergeDocuments({ base, mine, theirs });
    expect(document.cells.map(({ id }) => id)).toEqual(["air", "text", "there", "body"]);
  });

  it("asks about the title when both changed it", () => {
    const { conflicts } = mergeDocuments({
      base,
      mine: { ...base, title: "Mine" },
      theirs: { ...base, title: "Theirs" },
    });
    expect(conflicts).toMatchObject([{ id: "/:title", label: "title", mine: "Mine", theirs: "Theirs" }]);
  });

  it("asks about prose as a whole", () => {
    const mine = withTexts(base, { text: "Mine." });
    const theirs = withTexts(base, { text: "Theirs." });
    expect(mergeDocuments({ base, mine, theirs }).conflicts).toMatchObject([
      { id: "text/:text", label: "text" },
    ]);
  });

  const line = fc.constantFrom("a = 1", "a = 2", "b = 3 K", "b = 4 K", "c = 5", "# a remark", "", "d");
  const text = fc.array(line, { maxLength: 6 }).map((lines) => lines.join("\n"));
  const cells = fc.uniqueArray(
    fc.record({
      id: fc.constantFrom("one", "two", "three", "four"),
      kind: fc.constant("values" as const),
      name: fc.constantFrom("x", "y"),
      text,
    }),
    { selector: (cell) => cell.id, maxLength: 4 },
  );
  const document = cells.map((list) => aNotebook({ cells: list }));

  it("gives the other side where one side changed nothing", () => {
    fc.assert(
      fc.property(document, document, (one, other) => {
        const { document: merged, conflicts } = mergeDocuments({ base: one, mine: one, theirs: other });
        expect(conflicts).toEqual([]);
        expect(isSameDocument(merged, other)).toBe(true);
      }),
    );
  });

  it("asks nothing where both sides made the same change", () => {
    fc.assert(
      fc.property(document, document, (one, other) => {
        const merge = mergeDocuments({ base: one, mine: other, theirs: other });
        expect(merge.conflicts).toEqual([]);
        expect(isSameDocument(merge.document, other)).toBe(true);
      }),
    );
  });

  it("never loses a cell that one side added", () => {
    fc.assert(
      fc.property(document, document, document, (before, mine, theirs) => {
        const merged = mergeDocuments({ base: before, mine, theirs }).document;
        const known = new Set(before.cells.map(({ id }) => id));
        const added = [...mine.cells, ...theirs.cells].filter(({ id }) => !known.has(id));
        for (const { id } of added) expect(merged.cells.some((cell) => cell.id === id)).toBe(true);
      }),
    );
  });
});
