import { describe, expect, it } from "vitest";
import type { ColumnCorona } from "../../../../src/lib/columnCorona";
import { gasStyles } from "../../../../src/lib/gasStyle";
import { figureText } from "../../../../src/lib/richText";
import { densityCurves } from "../../../../src/ui/plots/columnCurves";
import { crossingPlot } from "../../../../src/ui/plots/crossingPlot";
import { densityPlot } from "../../../../src/ui/plots/densityPlot";
import { figureRoom } from "../../../../src/ui/plots/figureRoom";
import { ilmara, sampleColumn } from "../../fixtures/sampleColumn";

const { strip, profiles } = sampleColumn(ilmara);
const styles = gasStyles(strip.gases);
const inks = {
  ink: "#000",
  ink2: "#222",
  ink3: "#444",
  paper: "#fff",
  dusk: "#00f",
  ...Object.fromEntries(strip.gases.map((gas) => [gas, "#123"])),
};

/** A corona of H that begins at a fifth of the column's density and steps down by half, made by hand. */
const halo: ColumnCorona = {
  gas: "H",
  cell: "halo",
  share: 0.5,
  densityBelow: 2e11,
  altitude: [strip.exobase!, 300e3, 1000e3],
  numberDensity: [1e11, 9e10, 2e10],
};

function drawn(width: number, hidden: string[] = [], of = strip, coronae: ColumnCorona[] = []) {
  return densityPlot({
    profiles,
    strip: of,
    unitSystem: "SI",
    curves: densityCurves(profiles, of, "SI", coronae),
    styles,
    room: figureRoom(width, 600, "two panels"),
    inks,
    hidden: new Set(hidden),
    zoom: null,
  });
}

describe("the density figure", () => {
  it("draws each gas below and above the exobase, thinner above, and the temperature beside", () => {
    const { data, named, unnamed } = drawn(736);
    expect(data).toHaveLength(2 * strip.gases.length + 1);
    const co2 = data.filter(({ name }) => name === "CO2") as { line: { width: number; dash: string } }[];
    expect(co2[1]!.line.width).toBeCloseTo(0.72 * co2[0]!.line.width, 9);
    expect((data.find(({ name }) => name === "H") as (typeof co2)[0]).line.dash).toBe("1.2px,3.2px");
    expect([...named, ...unnamed].sort()).toEqual([...strip.gases].sort());
    expect(unnamed).toEqual([]);
  });

  it("gives up the temperature where it is narrow", () => {
    const { data, layout } = drawn(354);
    expect(data.some(({ name }) => name === "temperature")).toBe(false);
    expect(layout.xaxis2).toBeUndefined();
    expect(layout.width).toBe(354);
  });

  it("names gases first among its lettering, so that a pressed name is known by its place", () => {
    const { layout, named } = drawn(736);
    named.forEach((gas, i) => {
      expect(layout.annotations![i]!.text).toContain(`>${figureText(styles.get(gas)!.name)}<`);
    });
    expect(layout.annotations!.slice(named.length).map(({ text }) => text)).toContainEqual(
      expect.stringContaining("exobase"),
    );
  });

  it("hides a curve and dims its name", () => {
    const { data, layout, named } = drawn(736, ["O"]);
    expect(data.filter(({ name }) => name === "O").every(({ visible }) => visible === false)).toBe(true);
    expect(layout.annotations![named.indexOf("O")]!.opacity).toBe(0.4);
  });

  it("draws no exobase where there is none", () => {
    const { layout } = drawn(736, [], { ...strip, exobase: null, lower: null, upper: null });
    expect(layout.annotations!.some(({ text }) => text?.includes("exobase"))).toBe(false);
  });

  it("draws the band with few shapes, since each costs time at every keystroke", () => {
    expect(drawn(736).layout.shapes!.length).toBeLessThan(30);
  });
});

describe("a gas with a corona in the density figure", () => {
  type Line = { name: string; x: number[]; y: number[]; opacity: number; line: { dash: string } };
  const linesOf = (gas: string, coronae: ColumnCorona[]) =>
    (drawn(736, [], strip, coronae).data as Line[]).filter(({ name }) => name === gas);
  const km = strip.exobase! / 1000;

  it("goes on dashed above the exobase, by the corona's densities, up to the end of the figure", () => {
    const [, above] = linesOf("H", [halo]);
    expect(above!.line.dash).toBe("6px,4.5px");
    expect(above!.opacity).toBe(0.86);
    expect([above!.x[0], above!.y[0]]).toEqual([1e11, km]);
    expect([above!.x[1], above!.y[1]]).toEqual([9e10, 300]);
    expect(above!.y.at(-1)).toBe(strip.top / 1000);
    expect(above!.x.at(-1)).toBeLessThan(9e10);
    expect(above!.x.at(-1)).toBeGreaterThan(2e10);
  });

  it("leaves all others hydrostatic", () => {
    expect(linesOf("O", [halo])).toEqual(linesOf("O", []));
  });

  it("has its step drawn to scale between two short bars", () => {
    const bars = (hidden: string[]) =>
      drawn(736, hidden, strip, [halo]).layout.shapes!.filter(
        ({ yanchor, ysizemode }) => ysizemode === "pixel" && yanchor === km,
      );
    expect(bars([]).map(({ x0, x1, y1 }) => [x0, x1, y1])).toEqual([
      [2e11, 2e11, -4.5],
      [2e11, 1e11, 0],
      [1e11, 1e11, 4.5],
    ]);
    expect(bars(["H"])).toEqual([]);
  });
});

describe("the crossing figure", () => {
  it("has both lengths and a ring where they meet, at the exobase", () => {
    const { data } = crossingPlot({
      profiles,
      strip,
      room: figureRoom(736, 600, "one panel"),
      inks,
      zoom: null,
    });
    expect(data.map(({ name }) => name)).toEqual(["mean free path", "scale height", undefined]);
    const ring = data[2] as { x: number[]; y: number[] };
    const path = data[0] as { x: number[]; y: number[] };
    expect(ring.y).toEqual([strip.exobase! / 1000]);
    const row = path.y.findIndex((km) => km >= ring.y[0]!);
    expect(ring.x[0]! / path.x[row]!).toBeGreaterThan(0.5);
    expect(ring.x[0]! / path.x[row]!).toBeLessThan(2);
  });
});
