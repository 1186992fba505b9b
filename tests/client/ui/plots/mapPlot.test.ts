import { describe, expect, it } from "vitest";
import { contourLabels } from "../../../../src/ui/plots/contourLabels";
import { contourLines } from "../../../../src/ui/plots/contourLines";
import { bandAt, levelsOf, mapBands, paletteStep } from "../../../../src/ui/plots/mapBands";
import { emptyMeshes, filledGrid, mapGrid } from "../../../../src/ui/plots/mapGrid";
import { contourWords, mapLabel, mapPlot, mapScale } from "../../../../src/ui/plots/mapPlot";
import { mapRoom } from "../../../../src/ui/plots/mapRoom";
import { stretches } from "../../../../src/ui/plots/MissingPoints";
import { readSweep, type SweepResult } from "../../../../src/ui/plots/sweepResult";
import { answerOf, inks } from "./sweepResults";

const sweepOf = (text: string, given?: string): SweepResult =>
  readSweep(answerOf("sweep", text, given), "SI")!;

const plane = sweepOf("vary = x from 1 to 5 in 4 steps\nagainst = r from 1 to 4 in 3 steps\nwatch = both");
const decades = sweepOf(
  "vary = x from 1 to 2 in 4 steps\nagainst = r from 1 to 2 in 4 steps\nwatch = tenfold",
);
const holed = sweepOf("vary = x from -2 to 2 in 4 steps\nagainst = r from 1 to 2 in 2 steps\nwatch = root");

interface Trace {
  type: string;
  x: (number | null)[];
  y: (number | null)[];
  contours?: { start: number; end: number; size: number; coloring: string };
  line?: { width: number };
  fill?: string;
  marker?: { symbol?: string; color: string | string[] };
}

function drawn(sweep: SweepResult, index = 0, width = 736) {
  const { data, layout } = mapPlot({
    sweep,
    shown: sweep.watched[index]!,
    room: mapRoom(width),
    inks,
    zoom: null,
  });
  return { traces: data as unknown as Trace[], layout };
}

describe("the bands of a map", () => {
  it("are a quarter of a decade wide, and wider where ten do not reach", () => {
    expect(mapBands(24.1, 26.4, true)).toMatchObject({ step: 0.25 });
    expect(levelsOf(mapBands(24.1, 25.1, true))).toEqual([24.25, 24.5, 24.75, 25]);
    expect(mapBands(20.1, 26.4, true).step).toBe(1);
  });

  it("are round steps on an even scale, ten at most, and hold both ends", () => {
    for (const [low, high] of [
      [3, 7],
      [-1, 1],
      [199, 1204],
      [0.013, 0.0131],
    ] as const) {
      const { edges, step } = mapBands(low, high, false);
      expect(edges.length - 1).toBeLessThanOrEqual(10);
      expect(edges.length - 1).toBeGreaterThanOrEqual(4);
      expect(edges[0]).toBeLessThanOrEqual(low + 1e-9);
      expect(edges.at(-1)).toBeGreaterThanOrEqual(high - 1e-9);
      expect(["1", "2", "5"]).toContain((step / 10 ** Math.floor(Math.log10(step) + 1e-9)).toFixed(0));
    }
  });

  it("use the whole of the palette, and find the band of a place", () => {
    const bands = mapBands(0, 4, false);
    const last = bands.edges.length - 2;
    expect([paletteStep(0, bands), paletteStep(last, bands)]).toEqual([0, 9]);
    expect([bandAt(0, bands), bandAt(3.99, bands), bandAt(99, bands)]).toEqual([0, last, last]);
  });

  it("are one where all is the same", () => {
    expect(levelsOf(mapBands(7, 7, false))).toEqual([]);
  });
});

describe("the grid of a map", () => {
  it("has the first quantity across and the second up, both ascending", () => {
    const turned = sweepOf(
      "vary = x from 5 to 1 in 4 steps\nagainst = r from 4 to 1 in 3 steps\nwatch = both",
    );
    const { x, y, z } = mapGrid(turned.axes, turned.watched[0]!.values, mapScale(turned.watched[0]!));
    expect([x, y]).toEqual([
      [1, 2, 3, 4, 5],
      [1, 2, 3, 4],
    ]);
    z.forEach((line, row) =>
      line.forEach((place, column) => expect(place).toBeCloseTo(x[column]! + y[row]!, 12)),
    );
  });

  it("finds meshes that lack a corner, and fills what is missing only for what is hidden", () => {
    const grid = mapGrid(holed.axes, holed.watched[0]!.values, mapScale(holed.watched[0]!));
    // √x exists from x = 0 on: of four columns of meshes, the first two lack corners.
    expect(
      emptyMeshes(grid)
        .map(({ column, row }) => `${column} ${row}`)
        .sort(),
    ).toEqual(["0 0", "0 1", "1 0", "1 1"]);
    const filled = filledGrid(grid);
    expect(filled.flat().every(Number.isFinite)).toBe(true);
    expect(filled[0]!.slice(2)).toEqual(grid.z[0]!.slice(2));
  });
});

describe("contours", () => {
  const grid = mapGrid(plane.axes, plane.watched[0]!.values, mapScale(plane.watched[0]!));

  it("of a plane are one straight line, from edge to edge", () => {
    const [line, ...others] = contourLines(grid, 5.5);
    expect(others).toEqual([]);
    for (const [x, y] of line!) expect(x + y).toBeCloseTo(5.5, 12);
    const ends = [line![0]!, line!.at(-1)!].map(([x]) => x).sort();
    expect(ends[0]).toBeCloseTo(1.5, 12);
    expect(ends[1]).toBeCloseTo(4.5, 12);
  });

  it("round a hill close", () => {
    const hill = {
      x: [0, 1, 2],
      y: [0, 1, 2],
      z: [
        [0, 0, 0],
        [0, 1, 0],
        [0, 0, 0],
      ],
      index: [],
    };
    const [ring] = contourLines(hill, 0.5);
    expect(ring).toHaveLength(5);
    expect(ring![0]).toEqual(ring!.at(-1));
  });

  it("keep out of meshes that lack a corner", () => {
    const z = grid.z.map((line) => [...line]);
    z[1]![1] = null;
    for (const line of contourLines({ ...grid, z }, 4.5))
      for (const [x, y] of line) expect(x <= 1 || x >= 3 || y >= 3 || y <= 1).toBe(true);
  });

  it("carry labels along them that meet neither each other nor what is kept clear", () => {
    const straight = (y: number) =>
      [
        [0, y],
        [400, y],
      ] as [number, number][];
    const contours = [100, 104].map((y) => ({ level: y, lines: [straight(y)], labelWidth: 40 }));
    const labels = contourLabels(contours, { width: 400, height: 300 }, [[200, 100]]);
    expect(labels.map(({ level, angle }) => [level, Math.abs(angle)])).toEqual([
      [100, 0],
      [104, 0],
    ]);
    expect(Math.abs(labels[0]!.x - 200)).toBeGreaterThan(20);
    expect(Math.abs(labels[0]!.x - labels[1]!.x)).toBeGreaterThan(40);
  });

  it("read upright, and go without a label where there is no room", () => {
    const falling: [number, number][] = [
      [300, 20],
      [100, 220],
    ];
    const [label] = contourLabels(
      [{ level: 1, lines: [falling], labelWidth: 40 }],
      { width: 400, height: 300 },
      [],
    );
    expect(label!.angle).toBeCloseTo(-45, 6);
    expect(
      contourLabels(
        [
          {
            level: 1,
            lines: [
              [
                [0, 0],
                [30, 0],
              ],
            ],
            labelWidth: 40,
          },
        ],
        { width: 400, height: 300 },
        [],
      ),
    ).toEqual([]);
  });
});

describe("the map", () => {
  it("draws bands, a line a level, whole decades heavier", () => {
    const { traces } = drawn(decades);
    const [bands, ...lines] = traces.filter(({ type }) => type === "contour");
    // x + r runs from 2 to 4.
    expect(bands!.contours).toMatchObject({ start: 2.25, end: 3.75, size: 0.25, coloring: "fill" });
    expect(lines.map(({ contours, line }) => [contours!.start, line!.width])).toEqual(
      [2.25, 2.5, 2.75, 3, 3.25, 3.5, 3.75].map((level) => [level, level === 3 ? 1.3 : 0.7]),
    );
    expect(contourWords(decades.watched[0]!, decades)).toBe(
      "Lines every quarter of a decade, whole decades heavier",
    );
  });

  it("has a cross where the notebook stands, and none where that is beyond", () => {
    const crossOf = (sweep: SweepResult) =>
      drawn(sweep).traces.find(({ marker }) => marker?.symbol === "cross-thin");
    expect(crossOf(plane)).toMatchObject({ x: [4], y: [2] });
    expect(crossOf(holed)).toBeUndefined();
  });

  it("hatches meshes without an answer, and nothing where all is answered", () => {
    const hatched = drawn(holed).traces.filter(({ fill }) => fill === "toself");
    expect(hatched).toHaveLength(2);
    expect(Math.max(...hatched[0]!.x.filter((place) => place !== null))).toBe(0);
    expect(drawn(plane).traces.some(({ fill }) => fill === "toself")).toBe(false);
  });

  it("has a colour bar of its bands, and keeps within a narrow page", () => {
    const { traces, layout } = drawn(plane, 0, 354);
    const bar = traces.find(({ type }) => type === "bar")!;
    const colours = bar.marker!.color as string[];
    expect([colours[0], colours.at(-1)]).toEqual([inks.map0, inks.map9]);
    expect(layout.width).toBe(354);
  });

  it("is drawn where all is the same, and where nothing is answered", () => {
    const same = sweepOf("vary = x from 1 to 5 in 2 steps\nagainst = r from 1 to 4 in 2 steps\nwatch = e");
    expect(() => drawn(same)).not.toThrow();
    expect(contourWords(same.watched[0]!, same)).toBe("It is the same all over the map");
    const none = { ...holed.watched[0]!, values: holed.watched[0]!.values.map(() => null) };
    expect(() => drawn({ ...holed, watched: [none] })).not.toThrow();
    expect(mapLabel(holed, none)).toContain("no point has an answer");
  });
});

describe("the reasons of a sweep", () => {
  it("are told by stretches, row by row", () => {
    expect(stretches(holed, "domain")).toEqual(["r 1: x −2 to −1", "r 1.5: x −2 to −1", "r 2: x −2 to −1"]);
  });
});
