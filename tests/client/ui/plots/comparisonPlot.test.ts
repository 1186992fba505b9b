import { expect, it } from "vitest";
import { comparisonPlot, commonStrip } from "../../../../src/ui/plots/comparisonPlot";
import { figureRoom } from "../../../../src/ui/plots/figureRoom";
import { gasStyles } from "../../../../src/lib/gasStyle";
import type { Strip } from "../../../../shared/notebook/summary";

const altitude = Array.from({ length: 40 }, (_, i) => 80e3 + i * 10e3);

function column(gases: string[], exobase: number | null, factor: number) {
  const strip: Strip = {
    column: "dayside",
    base: 80e3,
    top: 470e3,
    exobase,
    lower: null,
    upper: null,
    gases,
    homopauses: [],
    altitude,
    temperature: altitude.map(() => 300),
    log10NumberDensity: altitude.map(() => 15),
    log10Knudsen: altitude.map(() => -3),
    moleFractions: gases.map(() => altitude.map(() => 1 / gases.length)),
  };
  const profiles = {
    altitude,
    temperature: altitude.map(() => 300 * factor),
    knudsen: altitude.map((z) => 10 ** ((z - 250e3) / 80e3)),
    ...Object.fromEntries(
      gases.map((gas) => [`${gas}.number_density`, altitude.map((z) => factor * 1e18 * Math.exp(-z / 40e3))]),
    ),
  };
  return { profiles, strip };
}

const older = column(["CO2", "O"], 200e3, 1);
const newer = column(["CO2", "H"], 240e3, 2);
const gases = ["CO2", "H", "O"];
const plot = comparisonPlot({
  older,
  newer,
  unitSystem: "SI",
  styles: gasStyles(gases),
  room: figureRoom(736, 470, "two panels"),
  inks: {
    ...Object.fromEntries(gases.map((gas) => [gas, "#123456"])),
    ink: "#000",
    ink2: "#111",
    dusk: "#00f",
  },
  zoom: null,
});

it("draws the older thin, the newer bold, and tints between them where both have the gas", () => {
  const lines = plot.data.filter((trace) => "mode" in trace && trace.mode === "lines" && "name" in trace) as {
    name: string;
    line: { width: number };
  }[];
  expect(lines.map(({ name, line }) => [name, line.width])).toEqual([
    ["CO2", 0.9],
    ["O", 0.9],
    ["CO2", 2.2],
    ["H", 2.2],
  ]);
  expect(plot.data.filter((trace) => "fill" in trace && trace.fill === "toself")).toHaveLength(1);
});

it("marks the exobase of either, the older dashed", () => {
  const marks = plot.layout.shapes!.map(({ y0, line }) => [y0, line!.dash]);
  expect(marks).toContainEqual([200, "dash"]);
  expect(marks).toContainEqual([240, "solid"]);
});

it("reaches over both columns and names the gases of either", () => {
  expect(commonStrip({ ...older.strip, top: 600e3 }, newer.strip)).toMatchObject({
    top: 600e3,
    gases: ["CO2", "H", "O"],
  });
});
