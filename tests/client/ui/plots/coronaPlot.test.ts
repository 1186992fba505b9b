import { describe, expect, it } from "vitest";
import { orbitCurves, sightCurves } from "../../../../src/ui/plots/coronaCurves";
import { coronaPlot } from "../../../../src/ui/plots/coronaPlot";
import { coronaRoom } from "../../../../src/ui/plots/coronaRoom";

/** Five levels made by hand: densities fall by ten from one to the next. */
const profiles = {
  altitude: [200e3, 400e3, 1000e3, 3000e3, 9000e3],
  number_density: [1e12, 1e11, 1e10, 1e9, 1e8],
  ballistic: [9e11, 9e10, 9e9, 9e8, 9e7],
  satellite: [0, 1e9, 5e8, 2e8, 1e7],
  escaping: [1e8, 9e7, 8e7, 7e7, 6e7],
};
const sights = [
  { altitude: 200e3, limb_column: 1e18, overhead_column: 1e17 },
  { altitude: 1000e3, limb_column: 1e16, overhead_column: 1e15 },
  { altitude: 9000e3, limb_column: 1e14, overhead_column: null },
];
const inks = { ink: "#000", ink2: "#222", ink3: "#444", paper: "#fff", dusk: "#00f", gas: "#a0f" };

const plotAt = (width: number) =>
  coronaPlot({
    orbits: orbitCurves(profiles, 1),
    sights: sightCurves(profiles, sights, 1),
    density: { factor: 1, unit: "m^-3" },
    column: { factor: 1, unit: "m^-2" },
    exobase: 200e3,
    step: { from: 2e12, to: 1e12 },
    room: coronaRoom(width),
    inks,
    zoom: null,
  });

describe("curves of a corona", () => {
  it("has a curve a kind of orbit, only where something flies on it", () => {
    const [all, , satellite] = orbitCurves(profiles, 1e-6);
    expect(all!.x[0]).toBeCloseTo(1e6, 6);
    expect(satellite!.words).toBe("satellite");
    expect(satellite!.y[0]).toBe(400);
    const empty = { ...profiles, satellite: profiles.satellite.map(() => 0) };
    expect(orbitCurves(empty, 1).map(({ words }) => words)).toEqual(["all orbits", "ballistic", "escaping"]);
  });

  it("carries a column on between the levels it is known at, straight where its logarithm is", () => {
    const [limb, overhead] = sightCurves(profiles, sights, 1);
    expect(limb!.x.map((x) => Math.log10(x))).toEqual(
      [18, 17, 16, 15, 14].map((log) => expect.closeTo(log, 9) as number),
    );
    expect(overhead!.y).toEqual([200, 400, 1000]);
  });

  it("draws no column where the levels do not fit those of the corona", () => {
    expect(sightCurves(profiles, sights.concat(sights.slice(2)), 1)).toEqual([]);
  });
});

describe("the corona figure", () => {
  it("has densities and columns on the same altitudes, in decades", () => {
    const { data, layout } = plotAt(736);
    expect(data.map(({ name }) => name)).toEqual([
      ...["all orbits", "ballistic", "satellite", "escaping"],
      ...["along the limb", "overhead"],
    ]);
    expect(layout.yaxis!.type).toBe("log");
    expect(layout.yaxis2!.matches).toBe("y");
    expect(layout.xaxis2!.domain![0]).toBeGreaterThan(layout.xaxis!.domain![1]!);
  });

  it("puts its panels one above the other where it is narrow", () => {
    const { layout } = plotAt(354);
    expect(layout.xaxis!.domain).toEqual(layout.xaxis2!.domain);
    expect(layout.yaxis!.domain![0]).toBeGreaterThan(layout.yaxis2!.domain![1]!);
    expect(layout.width).toBe(354);
  });

  it("draws the step at the exobase to scale", () => {
    const bars = plotAt(736).layout.shapes!.filter(({ ysizemode }) => ysizemode === "pixel");
    expect(bars.map(({ x0, yanchor }) => [x0, yanchor])).toEqual([
      [2e12, 200],
      [1e12, 200],
    ]);
  });
});
