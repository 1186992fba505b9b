import { describe, expect, it } from "vitest";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";
import { evaluateCells, numberIn, resultOf, type WrittenCell } from "../evaluateCells";

const entries = "mass = 0.41 earth_mass\nradius = 4943 km";
const star = "star_distance = 0.05 au\nstar_mass = 1 solar_mass";
const body = (text = "", name = "b"): WrittenCell => ["body", name, `${entries}\n${text}`];

describe("the tidal factor", () => {
  // Erkaev et al. (2007): K(ξ) = 1 − 3/(2ξ) + 1/(2ξ³).
  it.each([
    [2, 0.3125],
    [4, 0.6328125],
  ])("is at ξ = %d %d", (ratio, expected) => {
    const near = body(`${star}\nxuv_radius = far.hill_radius / ${ratio}`);
    expect(numberIn(resultOf(body(star, "far"), near), "tidal_factor")).toAgreeWith({
      what: `tidal factor at ξ = ${ratio}`,
      unit: "1",
      published: expected,
      within: { relative: 1e-12 },
      source: "Erkaev2007",
      mark: "computed independently",
    });
  });

  it("does not exist where the body overflows its Hill sphere", () => {
    const result = resultOf(
      body(star, "far"),
      body(`${star}\nxuv_radius = 2 * far.hill_radius\nxuv_flux = 1 W/m^2\nheating_efficiency = 10 %`),
    );
    expect(result.values).not.toHaveProperty("tidal_factor");
    expect(result.notes.map(({ code }) => code)).toContain("inside_hill_radius");
  });

  it("acts with the body's own radius by default", () => {
    const cell = (text: string) => evaluateCells([body(text)])[0];
    const texts = (text: string) => cell(text).defaults.map((one) => one.text);
    expect(texts(star)).toEqual(["xuv_radius = radius"]);
    expect(texts("xuv_flux = 1 W/m^2\nheating_efficiency = 10 %")).toEqual(["xuv_radius = radius"]);
    expect(texts("xuv_flux = 1 W/m^2")).toEqual([]);
  });
});

describe("rotation", () => {
  const column =
    "body = b\nbase = 100 km\npressure = 0.1 Pa\ngases = N2: rest, H: 2 ppm\ntemperature = 700 K\nlevels = 100 km, 300 km";
  const cells = (text: string): WrittenCell[] => [body(text), ["column", "air", column]];
  const gravityAt = (text: string, row: number) =>
    resultOf(...cells(text)).tables.levels[row].gravity as number;

  it.each([
    ["rotation_period = 9 h\nlatitude = 0 deg", 9, 1],
    ["rotation_period = 9 h\nlatitude = 60 deg", 9, 0.25],
    ["rotation_period = -9 h\nlatitude = -60 deg", 9, 0.25],
    ["rotation_period = 9 h\nlatitude = 90 deg", 9, 0],
  ])("with %j takes r ω² cos²φ off gravity in the column", (text, hours, cosineSquared) => {
    [100e3, 300e3].forEach((altitude, row) => {
      const omega = (2 * Math.PI) / (hours * 3600);
      const term = (4943e3 + altitude) * omega ** 2 * cosineSquared;
      expect(gravityAt("", row) - gravityAt(text, row)).toBeCloseTo(term, 12);
    });
  });

  it("leaves escape parameter and escape speed without it, at the same radius", () => {
    const result = resultOf(...cells("rotation_period = 9 h\nlatitude = 0 deg"), [
      "escape",
      "e",
      "column = air",
    ]);
    const gm = numberIn(resultOf(body()), "gm");
    const [radius, temperature] = ["radius", "temperature"].map((name) =>
      numberIn(result, `exobase.${name}`),
    );
    expect(numberIn(result, "exobase.escape_speed")).toBeCloseToRelative(Math.sqrt((2 * gm) / radius), 1e-12);
    const lambda = (gm * 1.00782503223 * 1.66053906892e-27) / (1.380649e-23 * temperature * radius);
    expect(numberIn(result, "H.escape_parameter")).toBeCloseToRelative(lambda, 1e-12);
  });

  it("acts only where both entries stand", () => {
    expect(gravityAt("rotation_period = 9 h", 0)).toBe(gravityAt("", 0));
    expect(resultOf(body("latitude = 20 deg")).notes.map(({ code }) => code)).toEqual([
      "latitude_without_rotation",
    ]);
  });
});
