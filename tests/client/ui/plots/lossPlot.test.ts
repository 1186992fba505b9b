import { describe, expect, it } from "vitest";
import type { CellResult } from "../../../../shared/notebook/result";
import { ageScale, lossCourse, lossScales } from "../../../../src/ui/plots/lossHistory";
import { lossPlot, lossRoom } from "../../../../src/ui/plots/lossPlot";

const gyr = 1e9 * 31_557_600;
/** Made by hand: eight particles in all, a layer of two metres, half of it gone at 2 Gyr. */
const lost: CellResult = {
  kind: "loss",
  name: "lost",
  status: "fine",
  values: {
    particles: { value: 8, unit: "1" },
    mass: { value: 16, unit: "kg" },
    water_layer: { value: 2, unit: "m" },
  },
  tables: {
    history: [
      { age: 1 * gyr, rate: 1e27, lost: 0 },
      { age: 3 * gyr, rate: 1e27, lost: 8 },
      { age: 5 * gyr, rate: 1e25, lost: 8 },
    ],
  },
  notes: [],
};
const inks = { ink: "#000", ink2: "#222", ink3: "#444", paper: "#fff", dusk: "#00f", gas: "#a0f" };

function plotOf(light: { now: number; saturation: number | null }, result = lost) {
  const course = lossCourse(result, light)!;
  return lossPlot({
    course,
    scales: lossScales(course, "SI"),
    dash: "1.2px,3.2px",
    room: lossRoom(736),
    inks,
    zoom: null,
  });
}
type Line = { mode: string; x: number[]; y: number[]; yaxis: string; line: { dash: string } };
const linesOf = (plot: ReturnType<typeof plotOf>) =>
  (plot.data as unknown as Line[]).filter(({ mode }) => mode === "lines");
const texts = (plot: ReturnType<typeof plotOf>) =>
  plot.layout.annotations!.map(({ text }) => text!.replace(/[\u202f\u00a0]/g, " "));

describe("the course of a loss", () => {
  it("counts a layer of water where the gas stands for some, else mass", () => {
    expect(lossCourse(lost, { now: gyr, saturation: null })).toMatchObject({
      lost: [0, 2, 2],
      measure: { unit: "m" },
      half: 2 * gyr,
    });
    const { particles, mass } = lost.values;
    const dry = lossCourse(
      { ...lost, values: { particles: particles!, mass: mass! } },
      { now: gyr, saturation: null },
    );
    expect(dry).toMatchObject({ lost: [0, 16, 16], measure: { unit: "kg" } });
  });

  it("is none without a history, and has no half where nothing has gone", () => {
    expect(lossCourse({ ...lost, tables: {} }, { now: gyr, saturation: null })).toBeNull();
    const values = { ...lost.values, particles: { value: 0, unit: "1" } };
    expect(lossCourse({ ...lost, values }, { now: gyr, saturation: null })!.half).toBeNull();
  });

  it.each([
    [5 * gyr, "Gyr"],
    [0.02 * gyr, "Myr"],
    [1e-5 * gyr, "yr"],
  ])("tells ages up to %s s in %s", (greatest, unit) => {
    expect(ageScale(greatest).unit).toBe(unit);
  });
});

describe("the loss figure", () => {
  it("has the rate above what has gone, on one axis of ages", () => {
    const { layout } = plotOf({ now: 5 * gyr, saturation: null });
    expect(layout.yaxis!.domain![0]).toBeGreaterThan(layout.yaxis2!.domain![1]!);
    expect(layout.xaxis2).toBeUndefined();
  });

  it("is solid while the light is saturated, from the first age to the last of it", () => {
    const [saturated, after, gone] = linesOf(plotOf({ now: 5 * gyr, saturation: 2 * gyr }));
    expect(saturated!.line.dash).toBe("solid");
    expect(saturated!.x).toEqual([1, expect.closeTo(2, 9)]);
    expect(after!.line.dash).toBe("1.2px,3.2px");
    expect(after!.x[0]).toBeCloseTo(2, 9);
    expect(gone!.yaxis).toBe("y2");
    expect(linesOf(plotOf({ now: 5 * gyr, saturation: null }))).toHaveLength(2);
  });

  it("marks with a ring and words where half has gone", () => {
    const plot = plotOf({ now: 5 * gyr, saturation: 2 * gyr });
    const ring = (plot.data as unknown as Line[]).find(({ mode }) => mode === "markers")!;
    expect([ring.x[0], ring.y[0]]).toEqual([expect.closeTo(2, 9), 1]);
    expect(texts(plot)).toEqual(["light saturated before 2.0 Gyr", "half of it by 2.0 Gyr"]);
  });

  it("marks now where the loss is followed beyond it", () => {
    expect(texts(plotOf({ now: 4 * gyr, saturation: null }))).toContain("now");
    expect(texts(plotOf({ now: 5 * gyr, saturation: null }))).not.toContain("now");
  });
});
