import { describe, expect, it } from "vitest";
import { completed, completionAt } from "../../../../../src/features/notebook/comments/mentionCompletion";
import { tamsin, wiremu } from "./aThread";

const offered = (text: string, caret = text.length): string[] | null =>
  completionAt(text, caret, [tamsin, wiremu])?.people.map(({ name }) => name) ?? null;

describe("the completion of names", () => {
  it("offers those whose name, or a part of it, begins like what follows the @", () => {
    expect(offered("Ask @")).toEqual([tamsin.name, wiremu.name]);
    expect(offered("Ask @ta")).toEqual([tamsin.name]);
    expect(offered("Ask (@CAST")).toEqual([wiremu.name]);
    expect(offered("Ask @Tamsin O")).toEqual([tamsin.name]);
  });

  it("offers nothing in an address, on another line, for a stranger, or for a name already there", () => {
    expect(offered("t@")).toBeNull();
    expect(offered("@ta\nand")).toBeNull();
    expect(offered("@Jorun")).toBeNull();
    expect(offered("@Tamsin Orevale")).toBeNull();
    expect(offered("no one")).toBeNull();
  });

  it("puts the name in the place of what was written, and the caret after it", () => {
    const text = "Ask @ta, please";
    const found = completionAt(text, 7, [tamsin, wiremu])!;
    expect(completed(text, found, tamsin)).toEqual({ text: "Ask @Tamsin Orevale, please", caret: 19 });
    const end = completionAt("@w", 2, [wiremu])!;
    expect(completed("@w", end, wiremu)).toEqual({ text: "@Wiremu Castellane ", caret: 19 });
  });
});
