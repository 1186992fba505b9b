import { describe, expect, it } from "vitest";
import type { CellResult } from "../../../../shared/notebook/result";
import {
  outline,
  roomOfSpread,
  shareMark,
  spreadLabel,
  spreadPlot,
} from "../../../../src/ui/plots/spreadPlot";
import { readSpread, type SpreadResult } from "../../../../src/ui/plots/spreadResult";
import { keyPlaces } from "../../../../src/ui/plots/spreadRoom";
import { answerOf, inks } from "./sweepResults";

const answer = answerOf("spread", "watch = length, both\nsamples = 256");
const spread = readSpread(answer, "SI")!;

interface Trace {
  mode: string;
  x: number[];
  y: number[];
  xaxis: string;
  fill?: string;
  marker?: { symbol: string; color: string };
}

function drawn(of: SpreadResult, width = 736) {
  const room = roomOfSpread(width, of);
  const { data, layout } = spreadPlot({ spread: of, room, inks });
  return { room, layout, traces: data as unknown as Trace[] };
}

const [length] = spread.watched;
const value = (name: keyof NonNullable<typeof length>["quantiles"]) => length!.quantiles[name].value!;

describe("reading a spread", () => {
  it("has its draws, its results in the order watched, and its entries by what they drive", () => {
    expect(spread).toMatchObject({ name: "asked", draws: 256, faultedShare: 0 });
    expect(spread.watched.map(({ name }) => name)).toEqual(["length", "both"]);
    expect(spread.inputs[0]).toBe("x");
    expect(value("lower")).toBeLessThan(value("median"));
    expect(length!.bins.reduce((sum, { count }) => sum + count, 0)).toBe(256);
  });

  it("reads nothing from one that has not been computed", () => {
    expect(readSpread({ ...answer, values: {}, tables: {} }, "SI")).toBeNull();
  });
});

describe("the figure of a spread", () => {
  it("outlines every bin, and the middle 68 % from quantile to quantile", () => {
    const scale = { isLog: false, factor: 1, place: (at: number) => at, valueAt: (at: number) => at };
    const bins = [
      { from: 0, to: 1, count: 2 },
      { from: 1, to: 2, count: 5 },
    ];
    expect(outline({ ...length!, bins }, scale)).toEqual({ x: [0, 0, 1, 1, 2, 2], y: [0, 2, 2, 5, 5, 0] });
    expect(outline({ ...length!, bins }, scale, [0.5, 1.5])).toEqual({
      x: [0.5, 0.5, 1, 1, 1.5, 1.5],
      y: [0, 2, 2, 5, 5, 0],
    });
  });

  it("has under each histogram a thin line for 95 %, a thick one for 68 %, a tick at the median", () => {
    const { layout } = drawn(spread);
    const lines = layout
      .shapes!.filter(({ xref }) => xref === "x")
      .map(({ x0, x1, line }) => [x0, x1, line!.width]);
    const shown = (name: Parameters<typeof value>[0]) => value(name) * length!.scale.factor;
    expect(lines).toContainEqual([shown("q2_5"), shown("q97_5"), 0.9]);
    expect(lines).toContainEqual([shown("lower"), shown("upper"), 3.2]);
    expect(lines).toContainEqual([shown("median"), shown("median"), 1.6]);
  });

  it("marks shares of the first result with a dot, of the second with a ring, of each further one with another shape", () => {
    const { traces } = drawn(spread);
    const marks = traces
      .filter(({ mode }) => mode === "markers")
      .map(({ marker }) => [marker!.symbol, marker!.color]);
    expect(marks).toContainEqual(["circle", inks.ink]);
    expect(marks).toContainEqual(["circle", inks.paper]);
    const all = Array.from({ length: 24 }, (_, index) => JSON.stringify(shareMark(index)));
    expect(new Set(all).size).toBe(24);
  });

  it("puts each share at its place on the axis from 0 to 1, in the row of its entry", () => {
    const { traces } = drawn(spread);
    const first = traces.filter(({ mode }) => mode === "markers")[1]!;
    spread.inputs.forEach((input, row) => {
      expect(first.x[row]).toBe(length!.shares.get(input)!.share);
      expect(first.y[row]).toBe(-row);
    });
  });

  it("puts histograms under each other where it is narrow, and long names over their rows", () => {
    const wide = drawn(spread).room;
    const narrow = drawn(spread, 354).room;
    expect(new Set(wide.histograms.map(({ top }) => top)).size).toBe(1);
    expect(new Set(narrow.histograms.map(({ top }) => top)).size).toBe(2);
    const long = { ...spread, inputs: spread.inputs.map((input) => `dayside.temperature.${input}`) };
    expect(roomOfSpread(354, long).isStacked).toBe(true);
    expect(roomOfSpread(354, long).shares.width).toBeGreaterThan(300);
  });

  it("leaves out the histogram of a result that has none, not its shares", () => {
    const tables: CellResult["tables"] = {
      ...answer.tables,
      histogram: answer.tables.histogram!.filter(({ watched }) => watched !== "both"),
    };
    const part = drawn(readSpread({ ...answer, tables }, "SI")!);
    expect(part.room.histograms).toHaveLength(1);
    expect(part.traces.filter(({ mode }) => mode === "markers")).toHaveLength(4);
  });

  it("breaks its key into lines that fit", () => {
    expect(keyPlaces([60, 60, 60], 220).map(({ line }) => line)).toEqual([0, 0, 1]);
  });

  it("says what it shows", () => {
    expect(spreadLabel(spread)).toBe(
      `Spread asked: histograms of length, both, and the share of their variance that each of ${spread.inputs.join(", ")} explains alone`,
    );
  });
});
