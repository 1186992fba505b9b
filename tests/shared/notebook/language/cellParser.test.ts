import { highlightTree, tagHighlighter, tags } from "@lezer/highlight";
import { describe, expect, it } from "vitest";
import { cellParser } from "../../../../shared/notebook/language/parser";
import { parseEntries } from "../../../../shared/notebook/language/parseEntries";

const cell = [
  "T_quiet     = 240 ± 30 K   # occultation",
  "temperature = bates(base = 140 K, # first",
  "  exosphere = T_quiet,",
  "",
  "  shape = 0.03 /km)",
  "gases = CO2: rest, N2: 2.7 %,",
  "  H2: 15 ppm",
  "eddy = between 1e6 and 2e6 cm^2/s",
].join("\n");

function namesIn(text: string): string[] {
  const names: string[] = [];
  cellParser
    .parse(text)
    .iterate({ enter: (node) => void names.push(node.type.isError ? "error" : node.name) });
  return names;
}

describe("the editor's parser", () => {
  it("finds the same entries as the evaluation does, without an error", () => {
    const keys: string[] = [];
    cellParser.parse(cell).iterate({
      enter: ({ name, from, to }) => {
        if (name === "Key") keys.push(cell.slice(from, to));
      },
    });
    expect(namesIn(cell)).not.toContain("error");
    expect(keys).toEqual(parseEntries(cell).entries.map(({ key }) => key));
  });

  it("ends an entry with an open bracket or a comma too many where the next one begins", () => {
    for (const text of ["a = (1 + 2\nb = 3", "a = CO2: rest,\nb = 3"]) {
      const names = namesIn(text);
      expect(names.filter((name) => name === "Key")).toHaveLength(2);
    }
  });

  it("tells units, names, keys and remarks apart", () => {
    const highlighter = tagHighlighter([
      { tag: tags.unit, class: "unit" },
      { tag: tags.number, class: "number" },
      { tag: tags.definition(tags.propertyName), class: "key" },
      { tag: tags.attributeName, class: "argument" },
      { tag: tags.function(tags.variableName), class: "function" },
      { tag: tags.variableName, class: "name" },
      { tag: tags.keyword, class: "keyword" },
      { tag: tags.lineComment, class: "remark" },
    ]);
    const found: [string, string][] = [];
    const text = "t = bates(base = T_quiet) + between 1 and 2 km # so";
    highlightTree(cellParser.parse(text), highlighter, (from, to, style) =>
      found.push([text.slice(from, to), style]),
    );
    expect(found).toEqual([
      ["t", "key"],
      ["bates", "function"],
      ["base", "argument"],
      ["T_quiet", "name"],
      ["between", "keyword"],
      ["1", "number"],
      ["and", "keyword"],
      ["2", "number"],
      ["km", "unit"],
      ["# so", "remark"],
    ]);
  });
});
