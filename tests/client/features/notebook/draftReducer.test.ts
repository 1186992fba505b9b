import { describe, expect, it } from "vitest";
import type { DocumentEdit } from "../../../../shared/notebook/editDocument";
import {
  beginDraft,
  draftReducer,
  isUnsaved,
  openMerge,
  type Draft,
  type DraftAction,
} from "../../../../src/features/notebook/draft/draftReducer";
import { aCell, aNotebook, aServerDraft, withTexts, wiremu } from "./aNotebook";

const after = (...actions: DraftAction[]): Draft => actions.reduce(draftReducer, beginDraft(aServerDraft()));
const edit = (change: DocumentEdit): DraftAction => ({ type: "edit", edit: change });
const ids = (draft: Draft) => draft.document.cells.map(({ id }) => id);
const write = (id: string, text: string) => edit({ type: "changeText", id, text });
const theirs = (texts: Record<string, string>, revision = 8): DraftAction => ({
  type: "arrived",
  theirs: aServerDraft({ revision, document: withTexts(aNotebook(), texts), savedBy: wiremu }),
});

describe("draftReducer", () => {
  it("is unsaved after an edit and saved when the server has taken that text", () => {
    const written = after(write("text", "New."));
    expect(isUnsaved(written)).toBe(true);
    const saved = draftReducer(written, {
      type: "saved",
      document: written.document,
      revision: 8,
      savedAt: "2031-04-02T10:43:00.000Z",
      savedBy: wiremu,
    });
    expect(isUnsaved(saved)).toBe(false);
    expect(saved.agreed.revision).toBe(8);
  });

  it("undoes and redoes an insertion, a removal and a move", () => {
    const steps: DocumentEdit[] = [
      { type: "insertCell", index: 1, cell: aCell({ id: "new" }) },
      { type: "removeCell", id: "body" },
      { type: "moveCell", id: "air", index: 0 },
    ];
    const done = after(...steps.map(edit));
    expect(ids(done)).toEqual(["air", "text", "new"]);
    const undone = [1, 2, 3].reduce((draft) => draftReducer(draft, { type: "undo" }), done);
    expect(undone.document).toEqual(aNotebook());
    const redone = [1, 2, 3].reduce((draft) => draftReducer(draft, { type: "redo" }), undone);
    expect(redone.document).toEqual(done.document);
  });

  it("puts a removed cell back with the text it had", () => {
    const draft = after(write("body", "mass = 1 earth_mass"), edit({ type: "removeCell", id: "body" }), {
      type: "undo",
    });
    expect(draft.document.cells[1]).toMatchObject({ id: "body", text: "mass = 1 earth_mass" });
  });

  it("leaves writing to the editor's own undo", () => {
    const draft = after(write("text", "New."), { type: "undo" });
    expect(draft.document.cells[0]!.text).toBe("New.");
  });

  it("forgets a step that speaks of a cell someone else has removed", () => {
    const moved = after(edit({ type: "moveCell", id: "air", index: 0 }));
    const without = aNotebook({ cells: moved.document.cells.filter(({ id }) => id !== "air") });
    const saved = draftReducer(moved, {
      type: "saved",
      document: moved.document,
      revision: 8,
      savedAt: "2031-04-02T10:43:00.000Z",
      savedBy: wiremu,
    });
    const met = draftReducer(saved, {
      type: "arrived",
      theirs: aServerDraft({ revision: 9, document: without }),
    });
    const undone = draftReducer(met, { type: "undo" });
    expect(ids(undone)).toEqual(["text", "body"]);
    expect(undone.done).toEqual([]);
  });

  it("takes over what someone else saved where nothing was written here", () => {
    const draft = after(theirs({ text: "Theirs." }));
    expect(draft.document.cells[0]!.text).toBe("Theirs.");
    expect(isUnsaved(draft)).toBe(false);
    expect(draft.joined).toMatchObject({ by: "Wiremu Castellane", changes: [{ cellId: "text" }] });
  });

  it("joins changes to different cells and stays unsaved on their revision", () => {
    const draft = after(write("text", "Mine."), theirs({ body: "mass = 1 earth_mass" }));
    expect(draft.document.cells.map(({ text }) => text).slice(0, 2)).toEqual([
      "Mine.",
      "mass = 1 earth_mass",
    ]);
    expect(draft.agreed.revision).toBe(8);
    expect(isUnsaved(draft)).toBe(true);
    expect(openMerge(draft)).toBeNull();
  });

  it("keeps both states of one text until one is chosen", () => {
    const conflicted = after(write("text", "Mine."), theirs({ text: "Theirs." }));
    expect(conflicted.document.cells[0]!.text).toBe("Mine.");
    expect(openMerge(conflicted)?.conflicts).toHaveLength(1);
    expect(conflicted.agreed.revision).toBe(7);
    const chosen = draftReducer(conflicted, { type: "choose", conflictId: "text/:text", side: "theirs" });
    expect(openMerge(chosen)?.document.cells[0]!.text).toBe("Theirs.");
    const settled = draftReducer(chosen, { type: "settle" });
    expect(settled.document.cells[0]!.text).toBe("Theirs.");
    expect(settled.agreed.revision).toBe(8);
    expect(settled.theirs).toBeNull();
  });

  it("chooses everything of one side at once", () => {
    const conflicted = after(
      write("text", "Mine."),
      write("body", "mass = 1 earth_mass\nradius = 1 km"),
      theirs({ text: "Theirs.", body: "mass = 2 earth_mass\nradius = 2 km" }),
    );
    const settled = draftReducer(draftReducer(conflicted, { type: "chooseAll", side: "theirs" }), {
      type: "settle",
    });
    expect(settled.document.cells.map(({ text }) => text).slice(0, 2)).toEqual([
      "Theirs.",
      "mass = 2 earth_mass\nradius = 2 km",
    ]);
  });

  it("keeps a choice when they save once more, and drops it when its question is gone", () => {
    const chosen = draftReducer(after(write("text", "Mine."), theirs({ text: "Theirs." })), {
      type: "choose",
      conflictId: "text/:text",
      side: "theirs",
    });
    const again = draftReducer(chosen, theirs({ text: "Theirs, again." }, 9));
    expect(openMerge(again)?.document.cells[0]!.text).toBe("Theirs, again.");
    const agreeing = draftReducer(again, theirs({ text: "Mine." }, 10));
    expect(agreeing.theirs).toBeNull();
    expect(agreeing.choices).toEqual({});
  });

  it("ignores a state that is not newer than the one it knows", () => {
    const draft = after(write("text", "Mine."));
    expect(draftReducer(draft, theirs({ text: "Old." }, 7))).toBe(draft);
  });

  it("takes up text kept in the browser that was written on the present revision", () => {
    const kept = withTexts(aNotebook(), { text: "Kept." });
    const draft = after({ type: "resume", base: aNotebook(), document: kept });
    expect(draft.document.cells[0]!.text).toBe("Kept.");
    expect(isUnsaved(draft)).toBe(true);
    expect(draft.agreed.revision).toBe(7);
  });

  it("brings kept text together with what was saved since", () => {
    const before = withTexts(aNotebook(), { body: "radius = 4943 km" });
    const kept = withTexts(before, { text: "Kept." });
    const draft = after({ type: "resume", base: before, document: kept });
    expect(draft.document.cells[0]!.text).toBe("Kept.");
    expect(draft.document.cells[1]!.text).toBe("mass = 0.41 earth_mass\nradius = 4943 km");
  });
});
