import { describe, expect, it } from "vitest";
import { mentionedIn, splitMentions } from "../../../shared/schemas/mentions";

const people = [
  { id: "1", name: "Tamsin Orevale" },
  { id: "2", name: "Tamsin" },
  { id: "3", name: "Iné (Brandvold)" },
];
const mentioned = (text: string): string[] => mentionedIn(text, people).map(({ id }) => id);

describe("mentions", () => {
  it("are @ and the name in full, in any case; the longer of two names counts", () => {
    expect(mentioned("Ask @Tamsin Orevale.")).toEqual(["1"]);
    expect(mentioned("Ask @tamsin orevale, please")).toEqual(["1"]);
    expect(mentioned("Ask @Tamsin, Orevale knows")).toEqual(["2"]);
    expect(mentioned("@Iné (Brandvold): see above")).toEqual(["3"]);
    expect(mentioned("@Tamsin and (@Tamsin Orevale)")).toEqual(["1", "2"]);
  });

  it("are not within a word, an address or a longer name", () => {
    for (const text of ["t@Tamsin", "@Tamsina", "@@Tamsin", "Tamsin Orevale", "@ Tamsin", ""]) {
      expect(mentioned(text), text).toEqual([]);
    }
  });

  it("of two people with one name mean both", () => {
    const twins = [
      { id: "1", name: "Oda Lin" },
      { id: "2", name: "Oda Lin" },
    ];
    expect(mentionedIn("@Oda Lin", twins)).toHaveLength(2);
  });

  it("cut a text without losing a character", () => {
    const text = "a @Tamsin, b@Tamsin @TAMSIN OREVALE\nc";
    const pieces = splitMentions(text, ["Tamsin", "Tamsin Orevale"]);
    expect(pieces.map((piece) => piece.text).join("")).toBe(text);
    expect(pieces.flatMap(({ name }) => name ?? [])).toEqual(["Tamsin", "Tamsin Orevale"]);
  });
});
