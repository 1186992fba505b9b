import { describe, expect, it } from "vitest";
import { evaluateNotebook } from "../../../../shared/notebook/evaluateNotebook";
import { notebookOf, resultOf, type WrittenCell } from "../evaluateCells";
import { answerInParts, completed, completedLast, given, numberOf, planet, rowsOf } from "./taskNotebooks";
import "../../../toBeCloseToRelative";

const sweep = (text: string): WrittenCell => ["sweep", "across", text];
const watch = "watch = leak.H2.rate, leak.exobase.altitude";

describe("a sweep", () => {
  it("has one point more than steps, with both ends as written", () => {
    const { tables } = completedLast(given, [
      "sweep",
      "across",
      "vary = T_quiet from 180 K to 350 K in 40 steps\nwatch = T_quiet",
    ]);
    expect(tables.rows).toHaveLength(41);
    expect(tables.rows[0]).toEqual({ T_quiet: 180 });
    expect(tables.rows[40]).toEqual({ T_quiet: 350 });
    expect(numberOf(tables.rows[20], "T_quiet")).toBe(265);
  });

  it("answers at each point what the notebook answers with that number written", () => {
    const rows = rowsOf(
      completedLast(...planet, sweep(`vary = T_quiet from 180 K to 350 K in 2 steps\n${watch}`)),
      "rows",
    );
    for (const row of rows) {
      const text = given[2].replace("240 ± 30 K", `${numberOf(row, "T_quiet")} K`);
      const written = resultOf(["values", "given", text], ...planet.slice(1));
      expect(row["leak.H2.rate"]).toBe(written.values["H2.rate"].value);
      expect(row["leak.exobase.altitude"]).toBe(written.values["exobase.altitude"].value);
    }
  });

  it("takes logarithmic steps to whole decades", () => {
    const { tables } = completedLast(
      given,
      sweep("vary = K_base from 1e5 to 1e8 cm^2/s in 3 steps, logarithmic\nwatch = K_base"),
    );
    expect(tables.rows.map((row) => row.K_base)).toEqual([10, 100, 1000, 10_000]);
  });

  it("varies two quantities, the first fastest, and says what they are", () => {
    const { tables, values } = completedLast(
      ...planet,
      sweep(
        `vary = T_quiet from 200 K to 300 K in 1 steps\nagainst = K_base from 1e5 cm^2/s to 1e7 cm^2/s in 2 steps, logarithmic\n${watch}`,
      ),
    );
    expect(values).toEqual({});
    expect(tables.rows.map((row) => [row.T_quiet, row.K_base])).toEqual([
      [200, 10],
      [300, 10],
      [200, 100],
      [300, 100],
      [200, 1000],
      [300, 1000],
    ]);
    expect(Object.keys(tables.rows[0])).toEqual([
      "T_quiet",
      "K_base",
      "leak.H2.rate",
      "leak.exobase.altitude",
    ]);
    expect(tables.quantities).toMatchObject([
      { name: "T_quiet", part: "varied", unit: "K", written: 240, from: 200, to: 300, steps: 1 },
      { name: "K_base", unit: "m^2 s^-1", written: 100, spacing: "logarithmic" },
      { name: "leak.H2.rate", part: "watched", unit: "s^-1" },
      { name: "leak.exobase.altitude", unit: "m" },
    ]);
  });

  it.each([
    ["12 ± 3", 9, 15],
    ["12 within factor 2", 6, 24],
    // The standard deviation of an even range is its width over √12.
    ["between 6 and 18", 12 - 12 / Math.sqrt(12), 12 + 12 / Math.sqrt(12)],
  ])("says one standard deviation of what is varied where it is uncertain: %s", (written, lower, upper) => {
    const cells: WrittenCell[] = [
      ["values", "given", `x = ${written}\ny = 2 * x`],
      sweep("vary = x from 1 to 4 in 3 steps\nwatch = y"),
    ];
    const [varied, watched] = rowsOf(completed(cells)[1], "quantities");
    expect(numberOf(varied, "sigma_lower")).toBeCloseToRelative(lower, 1e-12);
    expect(numberOf(varied, "sigma_upper")).toBeCloseToRelative(upper, 1e-12);
    expect(watched).not.toHaveProperty("sigma_lower");
  });

  it("says none of what is certain", () => {
    const cells: WrittenCell[] = [
      ["values", "given", "x = 3\ny = 2 * x"],
      sweep("vary = x from 1 to 4 in 3 steps\nwatch = y"),
    ];
    expect(rowsOf(completed(cells)[1], "quantities")[0]).not.toHaveProperty("sigma_lower");
  });

  it("carries what is varied through entries that rest on it", () => {
    const cells: WrittenCell[] = [
      ["values", "given", "x = 1 km\ny = x^2\nz = y + 3 km^2"],
      sweep("vary = y from 1 km^2 to 4 km^2 in 3 steps\nwatch = z, x"),
    ];
    expect(completed(cells)[1].tables.rows).toEqual([
      { y: 1e6, z: 4e6, x: 1000 },
      { y: 2e6, z: 5e6, x: 1000 },
      { y: 3e6, z: 6e6, x: 1000 },
      { y: 4e6, z: 7e6, x: 1000 },
    ]);
  });

  it("names the reason at a point without an answer, and its share", () => {
    const { tables, notes, status } = completedLast(
      ["values", "given", "x = 4 km\ny = sqrt(x)"],
      sweep("vary = x from -1 km to 2 km in 3 steps\nwatch = y"),
    );
    expect(tables.rows.map(({ reason }) => reason)).toEqual(["domain", null, null, null]);
    expect(tables.rows[0].y).toBeNull();
    expect(tables.outcomes).toMatchObject([
      { level: "fault", cell: "given", code: "domain", count: 1, share: 0.25 },
    ]);
    expect(status).toBe("caution");
    expect(notes[0].message).toContain("1 of 4 points (25 %) have no answer");
  });

  it("gives the same bits however it is shared out", () => {
    const cells = [...planet, sweep(`vary = T_quiet from 180 K to 350 K in 9 steps\n${watch}`)];
    expect(answerInParts(cells, [1, 4, 9, 10])).toEqual(answerInParts(cells, [10]));
  });

  it("answers the points before the first gap where it was stopped, and says so", () => {
    const cells = [...planet, sweep(`vary = T_quiet from 180 K to 350 K in 9 steps\n${watch}`)];
    const partial = answerInParts(cells, [2, 5]);
    expect(partial).toMatchObject({ done: 5, points: 10 });
    expect(partial.tables.rows).toEqual(answerInParts(cells, [10]).tables.rows.slice(0, 5));
    expect(partial.notes[0]).toMatchObject({ level: "caution", code: "partial" });
    expect(partial.notes[0].message).toContain("first 5 of 10 points");
  });

  it("says that it is still to be computed, and lists its task", () => {
    const cells = [...planet, sweep(`vary = T_quiet from 180 K to 350 K in 9 steps\n${watch}`)];
    const { evaluation, tasks } = evaluateNotebook(notebookOf(cells));
    expect(tasks).toMatchObject([{ cellId: "4", kind: "sweep", name: "across", points: 10 }]);
    expect(evaluation.cells[4].result).toMatchObject({
      values: {},
      tables: {},
      notes: [{ code: "to_be_computed" }],
    });
  });
});

describe("a sweep that cannot be computed says why, on the very characters", () => {
  const values: WrittenCell = ["values", "given", "T_quiet = 240 K\nx = 2 km\ny = 3 * x"];
  it.each([
    ["vary = T_quit from 180 K to 350 K in 4 steps", "not_an_entry", "T_quit", /The nearest is \*T_quiet\*/],
    [
      "vary = ilmara.mass from 1 kg to 2 kg in 4 steps",
      "not_an_entry",
      "ilmara.mass",
      /no entry of a values cell/,
    ],
    ["vary = 3 km from 1 km to 2 km in 4 steps", "variation", "3 km", /has a name/],
    [
      "vary = x from 180 K to 2 km in 4 steps",
      "dimension",
      "180 K",
      /\*x\* is a length; this is a temperature/,
    ],
    ["vary = x from 1 km to 2 in 4 steps", "dimension", "2", /a number without unit/],
    ["vary = x from 2 km to 2000 m in 4 steps", "same_ends", "2 km to 2000 m", /Both ends are the same/],
    ["vary = x from 0 km to 2 km in 4 steps, logarithmic", "logarithmic", "0 km", /above zero/],
    ["vary = x from -1 km to 2 km in 4 steps, logarithmic", "logarithmic", "-1 km", /above zero/],
    ["vary = x from 1 km to 2 km in 4 steps, logarithmc", "variation", "logarithmc", /logarithmic/],
    ["vary = x from 1 km to 2 km in 0 steps", "steps", "0", /1 or more/],
    ["vary = x from 1 km to 2 km in 2.5 steps", "steps", "2.5", /whole/],
    ["vary = x from 1 km to 2 km in 3 km steps", "steps", "3 km", /no unit/],
    ["vary = x from 1 km to 2 km in 1e7 steps", "too_many", "1e7", /100.000 points at most/],
    [
      "vary = x from 1 km to 2 km in 4 steps\nagainst = x from 3 km to 4 km in 2 steps",
      "varied_twice",
      "x",
      /already/,
    ],
    [
      "vary = x from 1 km to 2 km in 999 steps\nagainst = T_quiet from 1 K to 2 K in 999 steps",
      "too_many",
      "T_quiet from 1 K to 2 K in 999 steps",
      /100.000 points at most/,
    ],
    ["vary = x", "variation", "x", /Say what is varied/],
    ["vary = x from 1 km to 2 km", "unfinished", "m", /in 40 steps/],
    ["vary = x from 1 km to 2 km in 4 steps logarithmic", "missing_comma", "logarithmic", /comma is missing/],
  ])("%s", (text, code, characters, message) => {
    const { notes, status } = resultOf(values, planet[1], sweep(`${text}\nwatch = y`));
    const note = notes.find((each) => each.code === code);
    expect(note?.message).toMatch(message);
    expect(status).toBe("fault");
    expect(`${text}\nwatch = y`.slice(note!.range!.from, note!.range!.to)).toBe(characters);
  });

  it.each([
    ["watch = z", "unknown_name", /No result above is called \*z\*/],
    ["watch = leak.H2.rat", "unknown_name", /The nearest is \*leak.H2.rate\*/],
    ["watch = leak.regime", "not_a_quantity", /no number/],
    ["watch = leak", "not_a_quantity", /an escape cell; name one of its results/],
    ["watch = later.y", "unavailable", /further down/],
    ["watch = 3 km", "watch", /Names of results/],
    ["watch = T_quiet, T_quiet", "watch", /stands twice/],
    ["", "missing_key", /The entry \*watch\* is missing/],
  ])("%s", (text, code, message) => {
    const cell = sweep(`vary = T_quiet from 180 K to 350 K in 4 steps\n${text}`);
    const notebook = notebookOf([...planet, cell, ["values", "later", "later_y = 1"]]);
    const { evaluation, tasks } = evaluateNotebook(notebook);
    const note = evaluation.cells[4].result.notes.find((each) => each.code === code);
    expect(note?.message).toMatch(message);
    expect(tasks).toEqual([]);
  });

  it("cautions where nothing that is watched rests on what is varied, and answers all the same", () => {
    const result = completedLast(...planet, sweep(`vary = idle from 1 km to 2 km in 2 steps\n${watch}`));
    expect(result.notes).toMatchObject([{ level: "caution", code: "changes_nothing" }]);
    const [first, ...others] = rowsOf(result, "rows").map((row) => row["leak.H2.rate"]);
    expect(others).toEqual([first, first]);
  });

  it("does not watch what rests on another sweep or spread", () => {
    const cells: WrittenCell[] = [
      ["values", "given", "x = 240 ± 30 K"],
      ["spread", "sure", "watch = x\nsamples = 512"],
      ["values", "taken", "taken_x = sure.x.median"],
      sweep("vary = x from 1 K to 2 K in 2 steps\nwatch = taken_x"),
    ];
    const [, sure, taken, across] = completed(cells);
    expect(taken.values.taken_x.value).toBe(sure.values["x.median"].value);
    expect(across.notes[0].message).toContain("rests on *sure*");
    // Before the spread is computed, its results are on their way and not unknown.
    expect(evaluateNotebook(notebookOf(cells)).evaluation.cells[2].result.notes[0].message).toBe(
      "*sure* is still to be computed.",
    );
  });
});
