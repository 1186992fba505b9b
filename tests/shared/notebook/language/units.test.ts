import { describe, expect, it } from "vitest";
import { findUnit, isReservedUnit, unitsForCompletion } from "../../../../shared/notebook/language/units";
import "../../../toAgreeWith";
import { quantityOf } from "./evaluated";

const siBrochure = "BIPM, The International System of Units, 9th edition (2019, updated 2022)";
const codata = "CODATA recommended values of the fundamental constants: 2022";
const iauB2 = "IAU 2012 resolution B2";
const iauB3 = "IAU 2015 resolution B3";

/** [written, SI value, source]: each to the last bit. Dimensions in m, kg, s, K, mol, A. */
const exact: [string, number, string][] = [
  ["1 m", 1, siBrochure],
  ["1 cm", 0.01, siBrochure],
  ["1 mm", 0.001, siBrochure],
  ["1 um", 1e-6, siBrochure],
  ["1 µm", 1e-6, siBrochure],
  ["1 nm", 1e-9, siBrochure],
  ["1 km", 1000, siBrochure],
  ["1 Gm", 1e9, siBrochure],
  ["1 angstrom", 1e-10, siBrochure],
  ["1 g", 1e-3, siBrochure],
  ["1 kg", 1, siBrochure],
  ["1 min", 60, siBrochure],
  ["1 h", 3600, siBrochure],
  ["1 day", 86_400, siBrochure],
  ["1 Pa", 1, siBrochure],
  ["1 hPa", 100, siBrochure],
  ["1 bar", 1e5, siBrochure],
  ["1 mbar", 100, siBrochure],
  ["1 ubar", 0.1, siBrochure],
  ["1 µbar", 0.1, siBrochure],
  ["1 erg", 1e-7, "SI Brochure, 8th edition (2006), table 9"],
  ["1 eV", 1.602176634e-19, siBrochure],
  ["1 keV", 1.602176634e-16, siBrochure],
  ["1 nT", 1e-9, siBrochure],
  ["1 %", 0.01, siBrochure],
  ["1 ppm", 1e-6, siBrochure],
  ["1 Hz", 1, siBrochure],
  ["1 mW", 1e-3, siBrochure],
  ["1 u", 1.66053906892e-27, codata],
  ["1 au", 149_597_870_700, iauB2],
  ["1 yr", 365.25 * 86_400, "IAU style manual (1989), Julian year"],
  ["1 Myr", 365.25 * 86_400 * 1e6, "IAU style manual (1989)"],
  ["1 Gyr", 365.25 * 86_400 * 1e9, "IAU style manual (1989)"],
  ["1 earth_radius", 6.3781e6, iauB3],
  ["1 jupiter_radius", 7.1492e7, iauB3],
  ["1 solar_radius", 6.957e8, iauB3],
];

describe("units", () => {
  it.each(exact)("%s is %d in SI, by %s", (written, value) => {
    expect(quantityOf(written).value).toBe(value);
  });

  /** Compounds round once: the value is the double nearest to what is written. */
  it.each([
    ["2.5e5 /cm^3", 2.5e11],
    ["1e15 /cm^3", 1e21],
    ["3 cm^-3", 3e6],
    ["2e6 cm^2/s", 200],
    ["8.4e17 /(cm s)", 8.4e19],
    ["1 erg/(cm^2 s)", 1e-3],
    ["4.64 mW/m^2", 4.64e-3],
    ["1e8 /(cm^2 s)", 1e12],
    ["0.03 /km", 3e-5],
    ["1.2 g/cm^3", 1200],
    ["3.7 mbar", 370],
    ["1e-3 ubar", 1e-4],
    ["2.7 %", 0.027],
    ["15 ppm", 15e-6],
    ["0.1 km", 100],
    ["1.1 um", 1.1e-6],
    ["2.4 h", 8640],
    ["3.65 angstrom", 3.65e-10],
    ["44.0095 u", 7.307949415363474e-26 /* 44.0095 × 1.66053906892e-27 in exact decimals */],
    ["-5 km", -5000],
    ["1 m/s^2", 1],
    ["100 cm/s^2", 1],
  ])("%s is exactly %d", (written, value) => {
    expect(quantityOf(written).value).toBe(value);
  });

  it("gives the nominal GM back as the IAU states it", () => {
    const nominal = {
      unit: "m³ s⁻²",
      within: { relative: 2e-16 },
      source: "IAU2015B3",
      mark: "published",
    } as const;
    expect(quantityOf("G * 1 earth_mass").value).toAgreeWith({
      ...nominal,
      what: "nominal GM of the Earth, as G × earth_mass",
      published: 3.986004e14,
    });
    expect(quantityOf("G * 1 jupiter_mass").value).toAgreeWith({
      ...nominal,
      what: "nominal GM of Jupiter, as G × jupiter_mass",
      published: 1.2668653e17,
    });
    expect(quantityOf("G * 1 solar_mass").value).toAgreeWith({
      ...nominal,
      what: "nominal GM of the Sun, as G × solar_mass",
      published: 1.3271244e20,
    });
  });

  it("takes every SI prefix, and a unit of its own before a prefixed one", () => {
    // SI Brochure, table 7
    const prefixes = {
      Y: 24,
      Z: 21,
      E: 18,
      P: 15,
      T: 12,
      G: 9,
      M: 6,
      k: 3,
      h: 2,
      da: 1,
      d: -1,
      c: -2,
      m: -3,
      u: -6,
      n: -9,
      p: -12,
      f: -15,
      a: -18,
      z: -21,
      y: -24,
    };
    for (const [prefix, power] of Object.entries(prefixes))
      expect(quantityOf(`1 ${prefix}m`).value).toBe(Number(`1e${power}`));
    expect(findUnit("min")?.name).toBe("minute");
    expect(findUnit("Pa")?.name).toBe("pascal");
  });

  it("turns degrees to radians and keeps them a pure number", () => {
    expect(quantityOf("180 deg")).toEqual({ value: Math.PI, dimension: [0, 0, 0, 0, 0, 0] });
  });

  it("reads a space as times and a slash as over what follows it alone", () => {
    expect(quantityOf("1 W/m^2 s")).toEqual({ value: 1, dimension: [0, 1, -2, 0, 0, 0] });
    expect(quantityOf("6 m / 2 s")).toEqual({ value: 3, dimension: [1, 0, -1, 0, 0, 0] });
    expect(quantityOf("240 km / 2 km/s")).toEqual({ value: 120, dimension: [0, 0, 1, 0, 0, 0] });
    expect(quantityOf("1 J/(kg K)")).toEqual({ value: 1, dimension: [2, 0, -2, -1, 0, 0] });
    expect(quantityOf("1 m/(s/(kg/K))").dimension).toEqual([1, 1, -1, -1, 0, 0]);
    expect(quantityOf("1 cm² s⁻¹")).toEqual({ value: 1e-4, dimension: [2, 0, -1, 0, 0, 0] });
    expect(quantityOf("5 /min").value).toBe(5 / 60);
    expect(quantityOf("6 / min(2, 3)").value).toBe(3);
    expect(quantityOf("2 * min(2, 3)").value).toBe(4);
    expect(quantityOf("5 kg*m/s^2")).toEqual({ value: 5, dimension: [1, 1, -2, 0, 0, 0] });
    expect(quantityOf("5 N·m")).toEqual({ value: 5, dimension: [2, 1, -2, 0, 0, 0] });
    expect(quantityOf("2 * K * 3")).toEqual({ value: 6, dimension: [0, 0, 0, 1, 0, 0] });
    expect(quantityOf("1.5 × 10^3 * cm").value).toBe(15);
  });

  it("reserves the words that are units, and leaves T for temperatures", () => {
    for (const word of ["K", "m", "min", "km", "u", "day", "earth_mass", "mbar"])
      expect(isReservedUnit(word)).toBe(true);
    for (const word of ["T", "H", "F", "S", "T_quiet", "x"]) expect(isReservedUnit(word)).toBe(false);
    expect(quantityOf("5 T").value).toBe(5);
  });

  it("offers only units that it can read", () => {
    for (const { unit, dimension } of unitsForCompletion)
      expect(quantityOf(`1 ${unit}`).dimension).toEqual(dimension);
  });
});
