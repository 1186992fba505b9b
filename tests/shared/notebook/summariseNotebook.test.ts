import { describe, expect, it } from "vitest";
import { completeNotebook } from "../../../shared/notebook/completeNotebook";
import { engineVersion } from "../../../shared/notebook/engine";
import { evaluateNotebook } from "../../../shared/notebook/evaluateNotebook";
import { summariseNotebook } from "../../../shared/notebook/summariseNotebook";
import { notebookSummarySchema } from "../../../shared/notebook/summary";
import { notebookOf, numberIn, type WrittenCell } from "./evaluateCells";

const cells: WrittenCell[] = [
  ["body", "ilmara", "mass = 0.41 earth_mass\nradius = 4943 km"],
  ["values", "given", "T_top = 428 K"],
  [
    "column",
    "dayside",
    "body = ilmara\nbase = 80 km\npressure = 0.42 Pa\ngases = CO2: rest, O: 0.9 %, H: 1.2 ppm\ntemperature = bates(base = 165 K, exosphere = T_top, shape = 0.022 /km)",
  ],
  ["escape", "leak", "column = dayside\ncoupling = open"],
];

function summarise(written: WrittenCell[], headline: string[] = []) {
  const document = notebookOf(written, { headline });
  const { evaluation } = evaluateNotebook(document);
  const summary = summariseNotebook(document, evaluation);
  expect(notebookSummarySchema.parse(JSON.parse(JSON.stringify(summary)))).toEqual(summary);
  return { summary, evaluation };
}

const plain = (text: string) => text.replace(/[\u2009\u202f]/g, " ");

describe("the headline", () => {
  it("is by default the exobase, the gas that leaves fastest, and its escape parameter", () => {
    const { summary, evaluation } = summarise(cells);
    const leak = evaluation.cells[3].result;
    const [exobase, rate, parameter] = summary.headline;
    expect(exobase).toMatchObject({
      name: "leak.exobase.altitude",
      label: "Exobase",
      value: numberIn(leak, "exobase.altitude"),
      log10: null,
      unit: "m",
      gas: null,
    });
    expect(plain(exobase.note)).toMatch(/^bulk, l = H; Kn 0.1 at \d+ km$/);
    expect(rate).toMatchObject({
      name: "leak.H.rate",
      label: "Atomic hydrogen leaves",
      unit: "s^-1",
      gas: "H",
    });
    expect(rate.log10).toBe(numberIn(leak, "H.log10_rate"));
    expect(parameter).toMatchObject({
      name: "leak.H.escape_parameter",
      label: "Escape parameter of H",
      unit: "1",
    });
    expect(parameter.note).toMatch(/^regime jeans, bulk λ \d+/);
  });

  it("gives both ends of the band where there are two", () => {
    const heavy = cells.map(([kind, name, text]): WrittenCell => [
      kind,
      name,
      text.replace(", H: 1.2 ppm", ""),
    ]);
    expect(plain(summarise(heavy).summary.headline[0].note)).toMatch(
      /^bulk, l = H; Kn 0.1–10 at \d+–\d+ km$/,
    );
  });

  it("is what the notebook names, in its order, also what is not there", () => {
    const { summary } = summarise(cells, ["ilmara.surface_gravity", "T_top", "leak.H.speed"]);
    expect(summary.headline.map(({ name, label, value }) => [name, label, value])).toEqual([
      ["ilmara.surface_gravity", "Surface gravity", expect.closeTo(6.69, 2)],
      ["T_top", "T top", 428],
      ["leak.H.speed", "leak.H.speed", "no such result"],
    ]);
  });

  it("says where there is no exobase, and whether a wind blows instead", () => {
    const hot = cells.map(([kind, name, text]): WrittenCell => [
      kind,
      name,
      text.replace("428 K", "40000 K"),
    ]);
    expect(summarise(hot).summary.headline).toEqual([
      {
        name: "leak.exobase.altitude",
        label: "Exobase",
        value: "none: a wind instead",
        log10: null,
        unit: "m",
        gas: null,
        note: "bulk, l = H",
      },
    ]);
    const low = cells.map(([kind, name, text]): WrittenCell => [
      kind,
      name,
      kind === "column" ? `${text}\ntop = 120 km` : text,
    ]);
    expect(summarise(low).summary.headline.map(({ value }) => value)).toEqual(["none"]);
  });

  it("names the criterion and the coupling that a number rests on", () => {
    const [body, values, column] = cells;
    const noteOf = (text: string, name: string) =>
      plain(summarise([body, values, column, ["escape", "leak", text]], [name]).summary.headline[0].note);
    const exobase = "leak.exobase.altitude";
    expect(noteOf("column = dayside\ncriterion = unit_depth", exobase)).toMatch(/^unit depth; Kn 0.1/);
    expect(noteOf("column = dayside\ncriterion = gas\ngas = O", exobase)).toMatch(/^l = H of O; Kn 0.1/);
    expect(noteOf("column = dayside", "leak.H.rate")).toBe("Jeans, coupled column");
    expect(noteOf("column = dayside\ncoupling = open", "leak.H.rate")).toBe("Jeans, open column");
    expect(noteOf("column = dayside", "leak.wind_mass_rate")).toBe("isothermal wind");
  });

  it("carries the spread of what a spread watches", () => {
    const document = notebookOf(
      [
        ["values", "given", "x = 240 ± 30 K"],
        ["spread", "sure", "watch = x\nsamples = 1024"],
      ],
      { headline: ["x"] },
    );
    const [item] = summariseNotebook(document, completeNotebook(document)).headline;
    expect(notebookSummarySchema.shape.headline.parse([item])).toEqual([item]);
    // Of a normal distribution the middle 68.27 % lie within one sigma.
    expect(item.spread).toEqual({
      lower: expect.closeTo(210, 0),
      upper: expect.closeTo(270, 0),
      cell: "sure",
    });
    expect(summarise(cells).summary.headline[0]).not.toHaveProperty("spread");
  });

  it("is empty without an escape cell", () => {
    expect(summarise(cells.slice(0, 3)).summary.headline).toEqual([]);
  });
});

describe("the summary", () => {
  it("counts notes by level and names the bodies", () => {
    const { summary } = summarise([...cells, ["values", "more", "x = 1 kg + 1 m"]]);
    expect(summary).toMatchObject({ faults: 1, bodies: ["ilmara"], engine: engineVersion });
    expect(summary.cautions + summary.remarks).toBeGreaterThan(0);
  });

  it("carries the strip of the first column, with the exobase that its escape cell finds", () => {
    const { summary, evaluation } = summarise(cells);
    expect(summary.strip?.column).toBe("dayside");
    const escape = evaluation.cells.find(({ result }) => result.kind === "escape")!;
    expect(summary.strip?.exobase).toBe(escape.result.values["exobase.altitude"]!.value);
    expect(summarise(cells.slice(0, 2)).summary.strip).toBeNull();
  });
});
