import { describe, expect, it } from "vitest";
import { gasStyles } from "../../../../src/lib/gasStyle";
import { plainText } from "../../../../src/lib/richText";
import { sweepLabel, sweepPanels, sweepPlot } from "../../../../src/ui/plots/sweepPlot";
import { readSweep, type SweepResult } from "../../../../src/ui/plots/sweepResult";
import { sweepRoom } from "../../../../src/ui/plots/sweepRoom";
import { answerOf, gasSweep, inks } from "./sweepResults";

interface Line {
  mode: string;
  x: number[];
  y: (number | null)[];
  yaxis: string;
  line: { color: string; dash: string };
}

function drawn(sweep: SweepResult, width = 736, names = 130) {
  const panels = sweepPanels(sweep);
  const styles = gasStyles(["H", "H2"]);
  const { data, layout } = sweepPlot({
    sweep,
    styles,
    room: sweepRoom(width, panels.length, names),
    inks,
    zoom: null,
  });
  return {
    panels,
    lines: data as unknown as Line[],
    layout,
    texts: layout.annotations!.map(({ text }) => text!),
  };
}

const gases = readSweep(gasSweep, "SI")!;

describe("the figure of a sweep of one quantity", () => {
  it("puts results of one quantity into one panel, on decades where they span them", () => {
    const { panels, lines, layout } = drawn(gases);
    expect(panels.map(({ title }) => plainText(title))).toEqual(["exobase altitude, km", "rate, s⁻¹"]);
    expect(lines.map(({ yaxis }) => yaxis)).toEqual(["y", "y2", "y2"]);
    expect(lines[0]!.y).toEqual([200, 250, null]);
    expect(lines[1]!.y).toEqual([25, 26, null]);
    expect(lines[2]!.y).toEqual([22, 24, null]);
    const domains = [layout.yaxis!.domain!, layout.yaxis2!.domain!];
    expect(domains[0]![0]).toBeGreaterThan(domains[1]![1]!);
  });

  it("draws gases in their colour and dash, with their names beside them", () => {
    const { lines, texts } = drawn(gases);
    expect(lines.map(({ line }) => line.color)).toEqual([inks.ink, inks.H, inks.H2]);
    expect(lines[1]!.line.dash).toBe("1.2px,3.2px");
    expect(texts.some((text) => text.includes(">H<"))).toBe(true);
    expect(texts).toContain("exobase altitude");
  });

  it("marks the value as written and one sigma of it", () => {
    const { layout, texts } = drawn(gases);
    expect(texts).toContain("250\u00a0K, as written");
    expect(layout.shapes).toMatchObject([
      { type: "rect", x0: 220, x1: 280, opacity: 0.06 },
      { type: "line", x0: 250, x1: 250 },
    ]);
  });

  it("has neither where the value as written lies beyond the sweep, or is not uncertain", () => {
    const beyond = readSweep(answerOf("sweep", "vary = x from 5 to 8 in 3 steps\nwatch = both"), "SI")!;
    expect(drawn(beyond).layout.shapes).toEqual([]);
    const certain = readSweep(
      answerOf("sweep", "vary = one from 5 to 8 in 3 steps\nwatch = two", "one = 6\ntwo = 2 * one"),
      "SI",
    )!;
    expect(drawn(certain).layout.shapes).toMatchObject([{ type: "line", x0: 6 }]);
  });

  it("draws a point between two without an answer as a point", () => {
    const rows = gasSweep.tables.rows!.map((row, index) =>
      index === 1 ? row : { ...row, "leak.H2.rate": null },
    );
    const lone = readSweep({ ...gasSweep, tables: { ...gasSweep.tables, rows } }, "SI")!;
    expect(drawn(lone).lines.filter(({ mode }) => mode === "markers")).toMatchObject([{ x: [300], y: [24] }]);
  });

  it("names a curve at its right end, whichever way the quantity was varied", () => {
    const falling = readSweep(answerOf("sweep", "vary = x from 8 to 2 in 3 steps\nwatch = both"), "SI")!;
    const { layout } = drawn(falling);
    expect(layout.xaxis!.range).toEqual([2, 8]);
    expect(layout.annotations![0]).toMatchObject({ x: 8, y: 10 });
  });

  it("keeps names that end at one height apart", () => {
    const text = "vary = x from 1 to 2 in 1 steps\nwatch = given.x, given.x";
    const sweep = readSweep(
      answerOf("sweep", text.replace(/given\./g, "").replace("x, x", "x, both")),
      "SI",
    )!;
    const same = { ...sweep.watched[0]!, name: "a.H.rate", gas: "H" };
    const { layout } = drawn({ ...sweep, watched: [same, { ...same, name: "a.H2.rate", gas: "H2" }] });
    const [one, other] = layout.annotations!.map(({ y }) => Number(y));
    const [low, high] = layout.yaxis!.range as [number, number];
    expect((Math.abs(one! - other!) / (high - low)) * 300).toBeGreaterThan(15);
  });

  it("sets a name that is too long for a narrow page word under word", () => {
    expect(drawn(gases, 354).texts).toContain("exobase<br>altitude");
  });

  it("says what it shows", () => {
    expect(sweepLabel(gases)).toBe(
      "Sweep warmer: exobase altitude, rate of H, rate of H2 over T from 200\u00a0K to 400\u00a0K",
    );
  });
});

describe("reading a sweep", () => {
  it("reads nothing from one that has not been computed", () => {
    expect(readSweep({ ...gasSweep, tables: {} }, "SI")).toBeNull();
  });

  it("takes a choice in place of a number as no answer", () => {
    const rows = gasSweep.tables.rows!.map((row) => ({ ...row, "leak.H.rate": "jeans" }));
    const sweep = readSweep({ ...gasSweep, tables: { ...gasSweep.tables, rows } }, "SI")!;
    expect(sweep.watched[1]!.values).toEqual([null, null, null]);
    expect(() => drawn(sweep)).not.toThrow();
  });

  it("reads both axes of a map that was stopped in its second row", () => {
    const whole = answerOf(
      "sweep",
      "vary = x from 1 to 3 in 2 steps\nagainst = r from 1 to 4 in 3 steps\nwatch = both",
    );
    const rows = whole.tables.rows!.slice(0, 5);
    const { axes } = readSweep({ ...whole, tables: { ...whole.tables, rows } }, "SI")!;
    expect(axes.map(({ values }) => values)).toEqual([
      [1, 2, 3],
      [1, 2],
    ]);
  });
});
