import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { cellSchemas } from "../../../shared/notebook/cellSchemas";
import { cellKinds, notebookDocumentSchema, type NotebookDocument } from "../../../shared/notebook/document";
import { readNotebookFile, writeNotebookFile } from "../../../shared/notebook/notebookFile";

function countedIds(): () => string {
  let count = 0;
  return () => `cell-${(count += 1)}`;
}

function read(text: string) {
  return readNotebookFile(text, countedIds());
}

function documentOf(text: string): NotebookDocument {
  const reading = read(text);
  if (!reading.ok) throw new Error(reading.notes.map(({ message }) => message).join("\n"));
  return reading.document;
}

function notesOf(text: string) {
  return read(text).notes.map(({ level, code, line }) => ({ level, code, line }));
}

const head = "# Ilmara\n\n```notebook\nformat = 1\n```\n";

describe("a notebook file", () => {
  it("holds a cell of every kind, with every entry that it may have", () => {
    const cells = cellKinds.map((kind, place) => ({
      id: `cell-${place + 1}`,
      kind,
      name: kind === "gas" ? "H" : kind,
      text: cellSchemas[kind].entries.map(({ example }) => example).join("\n") || "x = 1",
    }));
    const document = documentOf(`${head}\n`);
    const file = writeNotebookFile({ ...document, cells });
    for (const kind of cellKinds.filter((one) => one !== "prose")) expect(file).toContain(`\`\`\`${kind} `);
    expect(read(file).notes).toEqual([]);
    expect(documentOf(file).cells).toEqual(cells);
  });

  it("holds title, settings, prose and cells as a person would write them", () => {
    const document: NotebookDocument = {
      format: 1,
      title: "Escape of hydrogen from Ilmara’s dayside",
      unitSystem: "cgs",
      headline: ["leak.exobase.altitude", "leak.H.rate"],
      authors: ["Tamsin Orevale", "Wiremu Castellane"],
      cells: [
        { id: "a", kind: "prose", name: "intro", text: "Ilmara is small, warm and *dry*." },
        { id: "b", kind: "body", name: "ilmara", text: "mass   = 0.41 earth_mass\nradius = 4943 km" },
        { id: "c", kind: "values", name: "", text: "" },
      ],
    };
    const file = writeNotebookFile(document);
    expect(file).toBe(
      [
        "# Escape of hydrogen from Ilmara’s dayside",
        "",
        "```notebook",
        "format = 1",
        "unit_system = cgs",
        "headline = leak.exobase.altitude, leak.H.rate",
        "authors = Tamsin Orevale, Wiremu Castellane",
        "```",
        "",
        "<!-- prose intro -->",
        "",
        "Ilmara is small, warm and *dry*.",
        "",
        "```body ilmara",
        "mass   = 0.41 earth_mass",
        "radius = 4943 km",
        "```",
        "",
        "```values",
        "```",
        "",
      ].join("\n"),
    );
    const { cells, ...rest } = documentOf(file);
    expect(rest).toEqual({ ...document, cells: undefined });
    expect(cells.map(({ kind, name, text }) => ({ kind, name, text }))).toEqual(
      document.cells.map(({ kind, name, text }) => ({ kind, name, text })),
    );
  });

  it("gives every document back to the character", { timeout: 60_000 }, () => {
    const piece = fc.constantFrom(
      ..."\n|\n\n| |  |    |\t|```|````|~~~|`|<!-- prose x -->|<!--|-->|<script>|</script>|<div>|<?|- |1. |> |# |===|---|[a]: /b|body x|```body x|```notebook|\\|&amp;|&#35;|*|_|µ|é|𝛼|\u00a0|\u202e|a|x = 1 m|# s".split(
        "|",
      ),
    );
    const messy = fc
      .array(fc.oneof(piece, fc.string({ unit: "grapheme" })), { maxLength: 14 })
      .map((parts) => parts.join(""));
    const text = messy.map((value) => value.replace(/\0|\p{Surrogate}/gu, ""));
    const line = text.map((value) => value.replace(/\p{Cc}/gu, " "));
    const document = fc.record({
      format: fc.constant(1 as const),
      title: line,
      unitSystem: fc.constantFrom("SI" as const, "cgs" as const),
      headline: fc.array(
        line.filter((value) => value !== ""),
        { maxLength: 3 },
      ),
      authors: fc.array(
        line.filter((value) => value !== ""),
        { maxLength: 4 },
      ),
      cells: fc.array(
        fc.record({
          id: fc.uuid(),
          kind: fc.constantFrom(
            "prose" as const,
            "values" as const,
            "body" as const,
            "gas" as const,
            "prose" as const,
          ),
          name: fc.oneof(
            fc.constant("dayside"),
            line.map((value) => [...value].slice(0, 30).join("")),
          ),
          text,
        }),
        { maxLength: 5 },
      ),
    });
    fc.assert(
      fc.property(document, (given) => {
        fc.pre(notebookDocumentSchema.safeParse(given).success);
        const back = documentOf(writeNotebookFile(given));
        const withoutIds = (value: NotebookDocument) => ({
          ...value,
          cells: value.cells.map(({ kind, name, text: cellText }) => ({
            kind,
            name,
            text: cellText.replace(/\r\n?/g, "\n"),
          })),
        });
        expect(withoutIds(back)).toEqual(withoutIds(given));
      }),
      { numRuns: 400, seed: 41 },
    );
  });

  it("keeps prose readable unless Markdown would take it for something else", () => {
    const prose = (text: string) =>
      writeNotebookFile({ ...documentOf(head), cells: [{ id: "a", kind: "prose", name: "p", text }] });
    expect(prose("See\n\n```python\nx\n```")).not.toContain("```prose");
    expect(prose("An <em>inline</em> tag\n\n- list")).not.toContain("```prose");
    expect(prose("```body ilmara\n```")).toContain("````prose p");
    expect(prose("<!-- never closed")).toContain("```prose p");
  });

  it("reads prose that no comment names, and fences that are no cells as prose", () => {
    const { cells } = documentOf(
      `${head}\nHello *there*.\n\n\n\`\`\`python\nx\n\`\`\`\n\n\`\`\`gas CO2\nmass = 44 u\n\`\`\`\n\n\n`,
    );
    expect(cells).toEqual([
      { id: "cell-1", kind: "prose", name: "", text: "Hello *there*.\n\n\n```python\nx\n```" },
      { id: "cell-2", kind: "gas", name: "CO2", text: "mass = 44 u" },
    ]);
  });

  it("leaves fences inside lists and quotations to the prose", () => {
    const { cells } = documentOf(`${head}\n> \`\`\`body a\n> \`\`\`\n\n- one\n\n  \`\`\`body b\n  \`\`\`\n`);
    expect(cells.map(({ kind }) => kind)).toEqual(["prose"]);
  });

  it("says on which line of the file each cell's text begins", () => {
    const reading = read(`${head}\n<!-- prose p -->\n\nHello\n\n\`\`\`body b\nmass = 1 kg\n\`\`\`\n`);
    expect(reading).toMatchObject({ ok: true, textLines: { "cell-1": 9, "cell-2": 12 } });
  });

  it("reads a header over several lines, with remarks and escapes", () => {
    const { authors, headline } = documentOf(
      "# T\n\n```notebook\nformat = 1 # of the file\nauthors = A\\, B,\n  C \\# D, # two\n  E\n\nheadline = a.b\n```\n",
    );
    expect(authors).toEqual(["A, B", "C # D", "E"]);
    expect(headline).toEqual(["a.b"]);
  });

  it.each([
    ["nothing at all", "", "no_title", 1],
    ["prose without a title", "Hello\n", "no_title", 1],
    ["a later title", "\n\nHello\n\n# T\n", "no_title", 3],
    ["a title alone", "# T\n\nHello\n", "no_notebook_block", 3],
    ["another format", "# T\n\n```notebook\nformat = 2\n```\n", "format", 4],
    ["no format", "# T\n\n```notebook\nunit_system = SI\n```\n", "format", 4],
    ["an unknown unit system", "# T\n\n```notebook\nformat = 1\nunit_system = feet\n```\n", "unit_system", 5],
    ["a key twice", "# T\n\n```notebook\nformat = 1\nformat = 1\n```\n", "key_twice", 5],
    ["an unknown key", "# T\n\n```notebook\nformat = 1\ncolour = red\n```\n", "unknown_key", 5],
    ["no entry", "# T\n\n```notebook\nformat = 1\nhello\n```\n", "no_entry", 5],
    ["four headlines", "# T\n\n```notebook\nformat = 1\nheadline = a, b, c, d\n```\n", "headline", 5],
    ["an unclosed cell", `${head}\n\`\`\`body a\nmass = 1 kg\n`, "unclosed_block", 7],
    ["a null character", `${head}\nab\0c\n`, "broken_characters", 7],
    ["half a surrogate pair", `${head}\nab\uD800c\n`, "broken_characters", 7],
    ["absurd nesting", `${head}\n${"> ".repeat(5000)}a\n`, "nested_too_deep", 7],
    ["an absurd name", `${head}\n\`\`\`body ${"a".repeat(70)}\n\`\`\`\n`, "name_too_long", 8],
    ["a program", "\x7fELF\x02\x01\0\0\0", "broken_characters", 1],
  ])("refuses %s and names the line", (_, text, code, line) => {
    const reading = read(text);
    expect(reading.ok).toBe(false);
    expect(reading.notes).toContainEqual(expect.objectContaining({ level: "fault", code, line }));
  });

  it("refuses a file beyond the bounds of a document", { timeout: 60_000 }, () => {
    expect(notesOf(head + "a".repeat(4_200_000))).toEqual([{ level: "fault", code: "too_long", line: 1 }]);
    expect(notesOf(head + "\n```values v\n```\n".repeat(501))).toContainEqual(
      expect.objectContaining({ code: "too_many_cells" }),
    );
  });

  it("puts a byte-order mark and line ends right and says so", () => {
    const text = `\uFEFF${head}\n\`\`\`body b\nmass = 1 kg\nradius = 1 km\n\`\`\`\n`.replaceAll("\n", "\r\n");
    expect(documentOf(text).cells[0]!.text).toBe("mass = 1 kg\nradius = 1 km");
    expect(notesOf(text)).toEqual([
      { level: "remark", code: "byte_order_mark", line: 1 },
      { level: "remark", code: "line_ends", line: 1 },
    ]);
    expect(documentOf(text.replaceAll("\r\n", "\r")).cells).toHaveLength(1);
  });

  it("keeps tabs, control and bidirectional characters and says so", () => {
    const text = `${head}\n\`\`\`body b\nmass\t= 1 kg\nradius = 1\u0007 km # \u202Eabc\n\`\`\`\n`;
    expect(documentOf(text).cells[0]!.text).toBe("mass\t= 1 kg\nradius = 1\u0007 km # \u202Eabc");
    expect(notesOf(text)).toEqual([
      { level: "remark", code: "tabs", line: 8 },
      { level: "caution", code: "bidirectional_characters", line: 9 },
      { level: "caution", code: "control_characters", line: 9 },
    ]);
  });

  it("says when a block is nearly a kind", () => {
    expect(read(`${head}\n\`\`\`colum dayside\n\`\`\`\n`).notes).toEqual([
      expect.objectContaining({
        level: "remark",
        code: "unknown_kind",
        line: 7,
        message: expect.stringContaining("column"),
      }),
    ]);
  });
});
