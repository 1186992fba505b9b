import { describe, expect, it } from "vitest";
import type { TableColumn } from "../../../../src/features/handbook/handbookTable";
import { scaled, shownValue, systemScale } from "../../../../src/features/handbook/shownNumber";
import { plainText } from "../../../../src/lib/richText";

const column: TableColumn = { key: "x", head: ["x"], unit: "", digits: 15 };
const shown = (value: number, more: object = {}, system: "SI" | "cgs" = "SI") =>
  plainText(shownValue({ value, ...more }, column, system)).replace(/[\u202f\u00a0]/g, " ");

describe("units of the handbook", () => {
  it.each([
    // Powers of ten between SI and cgs-Gaussian units: SI Brochure, 9th edition (2019), table 8 and section 4.
    ["m^3 s^-2", 6, "cm^3 s^-2"],
    ["m^-1 s^-1", -2, "cm^-1 s^-1"],
    ["m^3 kg^-1 s^-2", 3, "cm^3 g^-1 s^-2"],
    ["J K^-1", 7, "erg K^-1"],
    ["W m^-2", 3, "erg s^-1 cm^-2"],
    ["C", 0, "C"],
  ])("take %s to cgs", (unit, shift, cgs) => {
    expect(systemScale(unit, "cgs")).toEqual({ shift, unit: cgs });
    expect(systemScale(unit, "SI")).toEqual({ shift: 0, unit });
  });

  it("change no digit on the way", () => {
    expect(scaled(1.380649e-23, systemScale("J K^-1", "cgs"))).toBe(1.380649e-16);
  });
});

describe("numbers of the handbook", () => {
  it("carry their uncertainty in the last two digits, as CODATA prints them", () => {
    // CODATA 2022: G = 6.674 30(15)e-11, m_u = 1.660 539 068 92(52)e-27, m_e = 9.109 383 7139(28)e-31.
    expect(shown(6.6743e-11, { uncertainty: 0.00015e-11 })).toBe("6.67430(15) × 10⁻¹¹");
    expect(shown(1.66053906892e-27, { uncertainty: 0.00000000052e-27 })).toContain("1.66053906892(52)");
    expect(shown(9.1093837139e-31, { uncertainty: 0.0000000028e-31 })).toContain("9.1093837139(28)");
  });

  it("are told in the unit of their row, in either system", () => {
    expect(shown(6.6743e-11, { uncertainty: 0.00015e-11, unit: "m^3 kg^-1 s^-2" }, "cgs")).toBe(
      "6.67430(15) × 10⁻⁸ cm³ g⁻¹ s⁻²",
    );
  });

  it("stand in threes, with a true minus", () => {
    expect(shown(1.00782503)).toBe("1.007 825 03");
    expect(shown(-0.7183333)).toBe("−0.718 333 3");
    expect(shown(384_400)).toBe("384 400");
    expect(shown(0)).toBe("0");
  });
});
