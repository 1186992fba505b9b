import { afterEach, describe, expect, it, vi } from "vitest";
import { dropDraft, keepDraft, readKeptDrafts } from "../../../../src/features/notebook/draft/keptDrafts";
import { aNotebook, withTexts } from "./aNotebook";

const draft = (changedAt: number, userId = "tamsin") => ({
  userId,
  revision: 7,
  base: aNotebook(),
  document: withTexts(aNotebook(), { text: `At ${changedAt}.` }),
  changedAt,
});

afterEach(() => {
  localStorage.clear();
  vi.restoreAllMocks();
});

describe("kept drafts", () => {
  it("come back by tab, the oldest first, until they are dropped", () => {
    keepDraft("ilmara", "two", draft(20));
    keepDraft("ilmara", "one", draft(10));
    expect(readKeptDrafts("ilmara", "tamsin").map(({ tabId }) => tabId)).toEqual(["one", "two"]);
    dropDraft("ilmara", "one");
    expect(readKeptDrafts("ilmara", "tamsin")).toEqual([{ tabId: "two", draft: draft(20) }]);
  });

  it("are shown to nobody but their writer, and for no other notebook", () => {
    keepDraft("ilmara", "one", draft(10));
    expect(readKeptDrafts("ilmara", "pello")).toEqual([]);
    expect(readKeptDrafts("nirel", "tamsin")).toEqual([]);
  });

  it("pass over what they can't read", () => {
    localStorage.setItem("tenuity:draft:ilmara:one", "{broken");
    localStorage.setItem("tenuity:draft:ilmara:two", '{"userId":"tamsin"}');
    expect(readKeptDrafts("ilmara", "tamsin")).toEqual([]);
  });

  it("say when the browser has no room", () => {
    vi.spyOn(Storage.prototype, "setItem").mockImplementation(() => {
      throw new DOMException("full", "QuotaExceededError");
    });
    expect(keepDraft("ilmara", "one", draft(10))).toBe(false);
  });
});
