import { describe, expect, it } from "vitest";
import {
  displayScale,
  formatCount,
  formatDay,
  formatDuration,
  formatFixed,
  formatGas,
  formatKilometres,
  formatMagnitude,
  formatNumber,
  formatPercent,
  formatPower,
  formatQuantity,
  formatTime,
  formatUnit,
  formatWhen,
  quantityText,
  resultScale,
} from "../../../src/lib/format";
import { figureText, plainText } from "../../../src/lib/richText";

const thin = "\u202f";

describe("formatFixed", () => {
  it("sets thousands apart and a true minus", () => {
    expect(formatFixed(4943)).toBe(`4${thin}943`);
    expect(formatFixed(-1234567.891, 2)).toBe(`−1${thin}234${thin}567.89`);
    expect(formatFixed(999)).toBe("999");
  });
});

describe("formatNumber", () => {
  it.each([
    [239.2, "239"],
    [9.2912, "9.29"],
    [0.0431, "0.0431"],
    [4943.2, `4${thin}943`],
    [0, "0"],
    [-0.5, "−0.500"],
  ])("writes %s out as %s", (value, text) => {
    expect(plainText(formatNumber(value))).toBe(text);
  });

  it("goes to a power of ten from a hundred thousand and below a thousandth", () => {
    expect(plainText(formatNumber(1.84e20))).toBe(`1.84${thin}×${thin}10²⁰`);
    expect(plainText(formatNumber(99_999.4))).toBe(`99${thin}999`);
    expect(plainText(formatNumber(99_999.6))).toBe(`1.00${thin}×${thin}10⁵`);
    expect(plainText(formatNumber(2.5e-6, 2))).toBe(`2.5${thin}×${thin}10⁻⁶`);
  });

  it("rounds the mantissa up into the next decade rather than to 10.0", () => {
    expect(plainText(formatNumber(9.9996e7))).toBe(`1.00${thin}×${thin}10⁸`);
    expect(plainText(formatNumber(9.9996))).toBe("10.0");
  });
});

describe("formatMagnitude", () => {
  it("keeps the size of what is beyond sight as a power", () => {
    expect(plainText(formatMagnitude(1.8e-155, -154.744))).toBe("10^−154.7");
    expect(plainText(formatMagnitude(null, -412.36))).toBe("10^−412.4");
  });
  it("shows a dash where nothing is known", () => {
    expect(plainText(formatMagnitude(null, null))).toBe("–");
  });
});

describe("formatQuantity", () => {
  it.each([
    [4.464e-26, "kg", "26.9 u"],
    [7.45e-19, "J", "4.65 eV"],
    [1.7e-14, "J", "106 keV"],
    [3.2e-8, "Pa", "3.20 × 10⁻⁸ Pa"],
    [3.2e-8, "s^-1", "10^−7.5 s⁻¹"],
  ])("tells %s %s as %s: only what flows off as a bare power", (value, unit, text) => {
    expect(quantityText(formatQuantity({ value, unit }, "SI")).replace(/[\u202f\u00a0]/g, " ")).toBe(text);
  });

  it("shows SI as it is and lengths in km from a kilometre", () => {
    expect(quantityText(formatQuantity({ value: 6.6886, unit: "m s^-2" }, "SI"))).toBe(
      "6.69\u00a0m\u00a0s⁻²",
    );
    expect(quantityText(formatQuantity({ value: 4_943_027, unit: "m" }, "SI"))).toBe(`4${thin}943\u00a0km`);
    expect(quantityText(formatQuantity({ value: 12, unit: "m" }, "SI"))).toBe("12.0\u00a0m");
  });

  it.each([
    [1e12, "m^-3", "1.00 × 10⁶ cm⁻³"],
    [2.94e11, "m^-2 s^-1", "2.94 × 10⁷ cm⁻² s⁻¹"],
    [4840, "kg m^-3", "4.84 g cm⁻³"],
    [0.42, "Pa", "4.20 µbar"],
    [100, "m^2 s^-1", "1.00 × 10⁶ cm² s⁻¹"],
    [0.006, "W m^-2", "6.00 erg cm⁻² s⁻¹"],
    [7936, "m s^-1", "7.94 km s⁻¹"],
  ])("converts %s %s to cgs", (value, unit, text) => {
    expect(quantityText(formatQuantity({ value, unit }, "cgs")).replace(/[\u202f\u00a0]/g, " ")).toBe(text);
  });

  it("moves a logarithm with its unit", () => {
    const flux = { value: null, log10: -310.2, unit: "m^-2 s^-1" };
    expect(quantityText(formatQuantity(flux, "cgs"))).toBe("10^−314.2\u00a0cm⁻²\u00a0s⁻¹");
  });

  it("tells long times in years", () => {
    expect(displayScale("s", "SI", 3.2e9)).toEqual({ factor: 1 / 31_557_600, unit: "yr" });
    expect(displayScale("s", "SI", 12).unit).toBe("s");
  });

  it("keeps altitudes in km in both systems, however low", () => {
    expect(resultScale("leak.exobase.altitude", "m", "cgs", 400).unit).toBe("km");
    expect(resultScale("leak.exobase.mean_free_path", "m", "cgs", 4).unit).toBe("cm");
  });
});

describe("units, gases and other words", () => {
  it("sets exponents and digits of formulas", () => {
    expect(plainText(formatUnit("kg m^-3"))).toBe("kg\u00a0m⁻³");
    expect(formatUnit("1")).toEqual([]);
    expect(formatGas("C2H6")).toEqual(["C", { sub: "2" }, "H", { sub: "6" }]);
    expect(figureText([...formatGas("CO2"), " < ", ...formatPower(3, 0)])).toBe(
      "CO<sub>2</sub> &lt; 10<sup>3</sup>",
    );
  });

  it("tells percentages and altitudes", () => {
    expect(plainText(formatPercent(0.5712))).toBe(`57${thin}%`);
    expect(formatKilometres(1_329_400)).toBe(`1${thin}329`);
    expect(formatKilometres(2_500)).toBe("2.50");
  });

  it.each([
    [0.2, "under a second"],
    [31_557_600 * 615, `615${thin}years`],
    [31_557_600, `1${thin}year`],
    [31_557_600 * 2.34e9, "2.3 billion years"],
    [31_557_600 * 1e60, "10^60.0 years"],
    [7200, `2.0${thin}hours`],
  ])("tells %s s as %s", (seconds, text) => {
    expect(formatDuration(seconds)).toBe(text);
  });

  it("counts in words to twelve", () => {
    expect(formatCount(1, "fault")).toBe("one fault");
    expect(formatCount(12, "remark")).toBe("twelve remarks");
    expect(formatCount(1300, "body", "bodies")).toBe(`1${thin}300 bodies`);
  });

  it("tells days as one speaks of them", () => {
    const now = new Date(2026, 10, 30, 14, 5);
    expect(formatTime(new Date(2026, 10, 30, 9, 3))).toBe("09:03");
    expect(formatWhen(new Date(2026, 10, 30, 9, 3), now)).toBe("today 09:03");
    expect(formatWhen(new Date(2026, 10, 29, 23, 59), now)).toBe("yesterday");
    expect(formatWhen(new Date(2026, 10, 2), now)).toBe("2 November");
    expect(formatDay(new Date(2025, 0, 2), now)).toBe("2 January 2025");
  });
});
