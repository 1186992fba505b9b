import { describe, expect, it } from "vitest";
import { parseEntries } from "../../../../shared/notebook/language/parseEntries";
import { describe as shown, faultsOf } from "./evaluated";

const notesOf = (text: string) =>
  parseEntries(text).notes.map((note) => ({ line: note.line, ...shown(note, text) }));

describe("entries", () => {
  const text = [
    "# a quiet Sun",
    "T_quiet     = 240 ± 30 K   # occultation, spring",
    "temperature = bates(base = 140 K, # at 80 km",
    "  exosphere = T_quiet,",
    "  shape = 0.03 /km) # fitted",
    "",
    "gases = CO2: rest, N2: 2.7 %,",
    "  H2: 15 ppm",
    "eddy=1e6 cm^2/s",
  ].join("\n");
  const { entries, notes } = parseEntries(text);

  it("finds keys, lines and remarks, over several lines while a bracket is open or a comma ends the line", () => {
    expect(notes).toEqual([]);
    expect(entries.map(({ key, line, endLine, remark }) => [key, line, endLine, remark])).toEqual([
      ["T_quiet", 2, 2, "occultation, spring"],
      ["temperature", 3, 5, "at 80 km fitted"],
      ["gases", 7, 8, null],
      ["eddy", 9, 9, null],
    ]);
  });

  it("gives ranges in the cell's text", () => {
    const slices = entries.map(({ keyRange, valueRange, range }) =>
      [keyRange, valueRange, range].map(({ from, to }) => text.slice(from, to)),
    );
    expect(slices[0]).toEqual(["T_quiet", "240 ± 30 K", "T_quiet     = 240 ± 30 K"]);
    expect(slices[2][1]).toBe("CO2: rest, N2: 2.7 %,\n  H2: 15 ppm");
    expect(slices[3]).toEqual(["eddy", "1e6 cm^2/s", "eddy=1e6 cm^2/s"]);
  });

  it("makes subscript digits of a formula plain digits", () => {
    const [{ node }] = parseEntries("gases = CO₂: rest, H₂O: 1 %").entries;
    expect(
      node.type === "list" && node.items.map(({ label }) => label?.type === "name" && label.path),
    ).toEqual(["CO2", "H2O"]);
  });

  it("ends an entry with an open bracket where the next one begins", () => {
    const open = "a = (1 + 2\nb = 3\nc = bates(base = 1 K,\n  exosphere = 2 K\nd = 4";
    expect(notesOf(open)).toEqual([
      expect.objectContaining({ line: 1, code: "bracket", at: "(" }),
      expect.objectContaining({ line: 3, code: "bracket", at: "(" }),
    ]);
    expect(parseEntries(open).entries.map(({ key }) => key)).toEqual(["a", "b", "c", "d"]);
  });

  it("ends a list with a comma too many where the next entry begins", () => {
    const text = "gases = CO2: rest,\neddy = 1 m^2/s";
    expect(notesOf(text)).toEqual([
      {
        line: 1,
        code: "trailing_comma",
        at: ",",
        message: "Nothing follows the comma.",
        remedied: "gases = CO2: rest\neddy = 1 m^2/s",
      },
    ]);
  });

  it("keeps the first of a key that stands twice, and says where that is", () => {
    const text = "a = 1\nb = 2\na = 3";
    expect(parseEntries(text).entries.map(({ key }) => key)).toEqual(["a", "b"]);
    expect(notesOf(text)).toEqual([
      expect.objectContaining({
        line: 3,
        code: "duplicate_key",
        at: "a",
        message: "*a* stands twice; line 1 already gives it. Keep one.",
      }),
    ]);
  });

  it("lets no slip in one entry touch another", () => {
    const text = "a = 1\nb = 3 ) ^^ [\nc = 2\nnonsense here\nd = between 1 and\ne = 5";
    const { entries, notes } = parseEntries(text);
    expect(entries.filter(({ node }) => node.type !== "broken").map(({ key }) => key)).toEqual([
      "a",
      "c",
      "e",
    ]);
    expect(notes.map(({ line }) => line)).toEqual([2, 4, 5]);
  });

  it.each([
    ["foo bar", "no_entry", "foo bar", null],
    ["T quiet = 1 K", "bad_key", "T quiet", "T_quiet = 1 K"],
    ["T-quiet = 1 K", "bad_key", "T-quiet", "T_quiet = 1 K"],
    ["T₀ = 1 K", "bad_key", "T₀", "T0 = 1 K"],
    ["2x = 1", "bad_key", "2x", null],
    ["α = 1", "bad_key", "α", null],
    ["= 3", "bad_key", "=", null],
    ["x =", "no_value", "x", null],
    ["x = # only a remark", "no_value", "x", null],
  ])("%s: %s at %s", (text, code, at, remedied) => {
    expect(notesOf(text)).toEqual([expect.objectContaining({ code, at, remedied })]);
  });
});

describe("faults of syntax, on their characters", () => {
  it.each([
    ["3 +", "unfinished", "+", "A number or a name must follow *+*."],
    ["(3 +)", "unfinished", ")", "A number or a name must stand between *+* and the bracket."],
    ["3 = 4", "unexpected", "=", "A second *=* stands in one entry. Each entry has a line of its own."],
    ["[3, 4]", "unexpected", "[", "Lists take no square brackets; write the items with commas between."],
    [
      "3 km 4",
      "side_by_side",
      "4",
      "Nothing joins *km* and *4*. A sign such as × or / is missing, or a comma between items.",
    ],
    [
      "3 4",
      "side_by_side",
      "4",
      "Two numbers stand side by side, 3 and 4. A sign or a comma is missing; thousands may be parted by a thin space.",
    ],
    [
      "12 000 km",
      "side_by_side",
      "000",
      "Two numbers stand side by side, 12 and 000. A sign or a comma is missing; thousands may be parted by a thin space.",
    ],
    [", 3", "unexpected", ",", "Nothing stands before this comma."],
    ["* 3", "unexpected", "*", "A number or a name must stand before *."],
    ["/cm^3", "unexpected", "/", "A number or a name must stand before */*."],
    ["3 within 4", "unexpected", "4", "*within* is followed by *factor*: 2.5e5 /cm^3 within factor 2."],
    ["between 3", "unfinished", "3", "The upper end is missing: between 180 and 350 K."],
    [
      "bates(base = 3 K exosphere = 4 K)",
      "missing_comma",
      "exosphere",
      "A comma is missing before *exosphere*.",
    ],
    [
      "3; 4",
      "unexpected",
      ";",
      "A semicolon means nothing here. Items are parted by commas, entries by lines.",
    ],
    ["(3", "bracket", "(", "This bracket is not closed. Write *)* where it ends."],
    ["3)", "bracket", ")", "This bracket closes nothing."],
    ["2 x 10^5", "times_sign", "x", "The letter x does not multiply. Write ×."],
    [
      "1.2.3",
      "side_by_side",
      ".3",
      "A number has one decimal point; thousands may be parted by a thin space.",
    ],
    ["3 < 4", "unexpected", "<", "Comparisons mean nothing here. A range is written between 180 and 350 K."],
    ["3 ?", "unexpected", "?", "*?* means nothing here."],
    ['"abc"', "string", '"abc"', "There are no strings here; write names plainly."],
    ["10**3", "double_star", "**", "A power is written with *^*."],
    [
      "2,7 %",
      "decimal_comma",
      "2,7",
      "The decimal sign is the point. Write 2.7; in a list, put a space after the comma.",
    ],
    [
      "1,000",
      "decimal_comma",
      "1,000",
      "The decimal sign is the point, and thousands are not parted by commas. Write 1.000 or 1000.",
    ],
    [
      "1,000,000 m",
      "decimal_comma",
      "1,000,000",
      "Thousands are not parted by commas. Write 1000000; in a list, put a space after each comma.",
    ],
    ["1,2,3", "decimal_comma", "1,2,3", "In a list, put a space after each comma."],
    [
      "1\u202f00",
      "digits_grouped",
      "1\u202f00",
      "Digits are grouped in threes, as in 1\u202f000\u202f000; these are not.",
    ],
  ])("%s: %s at %s", (written, code, at, message) => {
    expect(faultsOf(written)).toEqual([expect.objectContaining({ code, at, message })]);
  });

  it.each([
    ["2,7 %", "x = 2.7 %"],
    ["1,000,000 m", "x = 1000000 m"],
    ["1,000 m", null],
    ["12 000 km", "x = 12000 km"],
    ["bates(base = 3 K exosphere = 4 K)", "x = bates(base = 3 K, exosphere = 4 K)"],
    ["10**3", "x = 10^3"],
    ["2 x 10^5", "x = 2 × 10^5"],
    ['"abc"', "x = abc"],
    ["2 sqrt(3)", "x = 2 * sqrt(3)"],
    ["3)", "x = 3"],
  ])("%s is put right as %s", (written, remedied) => {
    expect(faultsOf(written).map((fault) => fault.remedied)).toEqual([remedied]);
  });
});

describe("unusual characters", () => {
  it("passes over a byte-order mark, tabs and carriage returns, and says so once", () => {
    const text = "\ufeffa\t= 1\r\nb = 2\r\n\tc = (1 +\r\n2)\r";
    const { entries, notes } = parseEntries(text);
    expect(entries.map(({ key, node }) => [key, node.type])).toEqual([
      ["a", "number"],
      ["b", "number"],
      ["c", "sum"],
    ]);
    expect(notes.map(({ code, level }) => [code, level])).toEqual([
      ["byte_order_mark", "remark"],
      ["tab", "remark"],
      ["carriage_return", "remark"],
    ]);
    expect(text.slice(entries[0].keyRange.from, entries[0].keyRange.to)).toBe("a");
  });

  it.each([
    ["a right-to-left override", "\u202e", /turns the direction of the text \(U\+202E\)/],
    ["an isolate", "\u2066", /turns the direction/],
    ["a zero-width space", "\u200b", /does not show \(U\+200B\)/],
    ["a null", "\u0000", /does not show \(U\+0000\)/],
    ["a soft hyphen", "\u00ad", /does not show/],
    ["a byte-order mark inside", "\ufeff", /does not show/],
  ])("refuses an entry with %s, and offers to remove it", (_, character, message) => {
    const text = `a = 1${character}2\nb = 3`;
    const { entries } = parseEntries(text);
    expect(entries.map(({ node }) => node.type)).toEqual(["broken", "number"]);
    expect(notesOf(text)).toEqual([
      expect.objectContaining({
        line: 1,
        code: "hidden_character",
        at: character,
        message: expect.stringMatching(message),
        remedied: "a = 12\nb = 3",
      }),
    ]);
  });

  it("only warns where the character stands in a remark", () => {
    const { entries, notes } = parseEntries("a = 1 # from \u202eelsewhere\n# \u200b\n");
    expect(entries[0].node.type).toBe("number");
    expect(notes.map(({ level, code, line }) => [level, code, line])).toEqual([
      ["caution", "hidden_character", 1],
      ["caution", "hidden_character", 2],
    ]);
  });

  it("takes no-break and thin spaces for spaces", () => {
    const { entries, notes } = parseEntries("a\u00a0=\u2009240\u202fK");
    expect(notes).toEqual([]);
    expect(entries[0].node.type).toBe("measured");
  });
});

describe("limits", () => {
  it("refuses an entry of more than 10,000 characters", () => {
    const fits = `a = ${"1 + ".repeat(2498)}1234`;
    expect(fits.length).toBe(10_000);
    expect(parseEntries(fits).notes).toEqual([]);
    expect(notesOf(`${fits}5`)).toEqual([expect.objectContaining({ code: "too_long", at: "a" })]);
  });

  it.each([
    ["brackets", (depth: number) => `${"(".repeat(depth)}1${")".repeat(depth)}`],
    ["calls", (depth: number) => `${"abs(".repeat(depth)}1${")".repeat(depth)}`],
    ["powers", (depth: number) => `${"1^".repeat(depth)}1`],
    ["signs", (depth: number) => `${"-".repeat(depth)}1`],
    ["sums in brackets", (depth: number) => `${"(1 + ".repeat(depth)}1${")".repeat(depth)}`],
  ])("takes 64 levels of %s and refuses 65", (_, nested) => {
    expect(faultsOf(nested(64))).toEqual([]);
    expect(faultsOf(nested(65)).map(({ code }) => code)).toEqual(["too_deep"]);
  });

  it("survives nesting as deep as an entry can hold", () => {
    for (const text of [
      "(".repeat(9000),
      "-".repeat(9000),
      "2^".repeat(4500),
      "abs(".repeat(2000),
      "/(m".repeat(3000),
    ])
      expect(faultsOf(`1${text}`).length).toBeGreaterThan(0);
  });

  it.each([
    ["quantities", (line: number) => `q_${line} = 2.5e5 /cm^3 within factor 2 # source ${line}`, 10_000],
    ["slips", (line: number) => `q_${line} = 3 ^^ ? 4 km 5 ++ * /`, 10_000],
    ["open brackets", (line: number) => `q_${line} = (,`, 1],
    ["commas", (line: number) => `q_${line} = 1,`, 10_000],
  ])(
    "reads 10,000 lines of %s in time that grows with their number",
    { timeout: 60_000 },
    (_, lineOf, expected) => {
      const read = (lines: number) => {
        const cell = Array.from({ length: lines }, (_unused, line) => lineOf(line)).join("\n");
        const started = process.cpuUsage();
        const { entries } = parseEntries(cell);
        return { entries, time: process.cpuUsage(started).user / 1000 };
      };
      const few = Math.max(2, Math.min(read(1000).time, read(1000).time));
      const many = read(10_000);
      expect(many.entries).toHaveLength(expected);
      // Ten times the lines take about ten times as long; a quadratic pass would take a hundred times.
      expect(many.time).toBeLessThan(50 * few);
    },
  );
});
