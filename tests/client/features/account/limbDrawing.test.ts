import { readFileSync } from "node:fs";
import path from "node:path";
import { expect, it } from "vitest";
import { readNotebookFile } from "../../../../shared/notebook/notebookFile";
import { evaluateNotebook } from "../../../../shared/notebook/evaluateNotebook";
import { exobase, limbDots, limbOf, pointAt } from "../../../../src/features/account/limbDrawing";
import { sky, skyTop } from "../../../../src/features/account/limbSky";

const limb = limbOf(980, 900);
const lettering = [{ left: 44, top: 52, right: 492, bottom: 236 }];

it("puts the exobase where the demonstration's notebook finds it", () => {
  const file = readFileSync(
    path.resolve(import.meta.dirname, "../../../../server/demo/notebooks/ilmara-dayside.md"),
    "utf8",
  );
  let next = 0;
  const reading = readNotebookFile(file, () => `cell-${next++}`);
  if (!reading.ok) throw new Error("The demonstration's notebook could not be read.");
  const { evaluation } = evaluateNotebook(reading.document);
  const altitude = evaluation.cells.find(({ result }) => result.name === "leak")?.result.values[
    "exobase.altitude"
  ]?.value;
  // The art prints whole kilometres.
  expect(Math.round(Number(altitude) / 1000)).toBe(exobase);
});

it("keeps every dot clear of the lettering", () => {
  const dots = limbDots(limb, lettering);
  expect(dots.length).toBeGreaterThan(400);
  const [box] = lettering;
  expect(
    dots.filter(({ x, y }) => x > box!.left && x < box!.right && y > box!.top && y < box!.bottom),
  ).toEqual([]);
});

it("draws the same dots each time", () => {
  expect(limbDots(limb, lettering)).toEqual(limbDots(limb, lettering));
});

it("thins the dots out above the exobase, and has none where the gas is a fluid", () => {
  const dots = limbDots(limb, []);
  const altitudes = dots.map(
    ({ x, y }) => (Math.hypot(x - limb.centreX, y - limb.centreY) - limb.radius) / limb.scale,
  );
  const between = (from: number, to: number) => altitudes.filter((z) => z >= from && z < to).length;
  expect(between(exobase, exobase + 60)).toBeGreaterThan(between(exobase + 120, exobase + 180));
  expect(between(0, 150)).toBe(0);
});

it("draws altitudes to scale along the normal", () => {
  const ground = pointAt(limb, 0.1, 0);
  const high = pointAt(limb, 0.1, 200);
  expect(Math.hypot(high.x - ground.x, high.y - ground.y)).toBeCloseTo(200 * limb.scale, 6);
});

it("has a sky from the ground to its top in both lights, brightest by night at the green line", () => {
  for (const stops of [sky.dusk, sky.night]) {
    expect(stops[0]?.altitude).toBe(0);
    expect(stops.at(-1)?.altitude).toBeCloseTo(skyTop, 6);
    expect(stops.every(({ colour }) => /^#[0-9a-f]{6}$/.test(colour))).toBe(true);
  }
  const green = (colour: string) => parseInt(colour.slice(3, 5), 16);
  const brightest = sky.night.reduce((best, stop) => (green(stop.colour) > green(best.colour) ? stop : best));
  expect(brightest.altitude).toBeGreaterThan(85);
  expect(brightest.altitude).toBeLessThan(100);
});
