import { describe, expect, it } from "vitest";
import { editDocument } from "../../../../shared/notebook/editDocument";
import { renamingEdit } from "../../../../src/features/notebook/cells/renamingEdit";
import { aCell, aNotebook } from "./aNotebook";

const document = aNotebook({
  headline: ["dayside.exobase", "leak.H.rate"],
  cells: [
    aCell({ id: "air", kind: "column", name: "dayside", text: "base = 80 km # dayside of 2029" }),
    aCell({ id: "values", kind: "values", name: "given", text: "z = dayside.base + 2 km\nq = daysides" }),
    aCell({ id: "leak", kind: "escape", name: "leak", text: "column = dayside" }),
    aCell({ id: "text", kind: "prose", name: "", text: "The dayside is warm." }),
  ],
});

function renamed(id: string, name: string) {
  const { edit, mentions } = renamingEdit(document, id, name);
  return { mentions, ...editDocument(document, edit) };
}

describe("renamingEdit", () => {
  it("changes the name wherever entries and headline mention it, and nothing that only looks like it", () => {
    const { document: after, mentions } = renamed("air", "nightside");
    expect(mentions).toBe(2);
    expect(after.cells.map(({ text }) => text)).toEqual([
      "base = 80 km # dayside of 2029",
      "z = nightside.base + 2 km\nq = daysides",
      "column = nightside",
      "The dayside is warm.",
    ]);
    expect(after.headline).toEqual(["nightside.exobase", "leak.H.rate"]);
  });

  it("is undone in one step", () => {
    const { document: after, inverse } = renamed("air", "nightside");
    expect(editDocument(after, inverse).document).toEqual(document);
  });

  it("changes the name alone where two cells bear it", () => {
    const twice = {
      ...document,
      cells: [...document.cells, aCell({ id: "again", kind: "column", name: "dayside" })],
    };
    const { edit } = renamingEdit(twice, "again", "nightside");
    expect(edit).toEqual({ type: "renameCell", id: "again", name: "nightside" });
  });
});
