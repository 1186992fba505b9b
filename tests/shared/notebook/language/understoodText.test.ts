import { describe, expect, it } from "vitest";
import { dimensionless, quantityKinds } from "../../../../shared/notebook/language/dimensions";
import {
  formatPlainNumber,
  formatQuantity,
  siUnitText,
} from "../../../../shared/notebook/language/formatQuantity";
import { evaluateExpression } from "../../../../shared/notebook/language/evaluateExpression";
import { understoodText } from "../../../../shared/notebook/language/understoodText";
import { nodeOf, scopeOf } from "./evaluated";

const scope = scopeOf({ T_quiet: { value: 240, dimension: [0, 0, 0, 1, 0, 0] } });

function understood(written: string, unitSystem: "SI" | "cgs"): string | null {
  const { node } = nodeOf(written);
  const evaluated = evaluateExpression(node, scope);
  if (!evaluated.ok) throw new Error(evaluated.notes[0]?.message);
  // Ordinary spaces, so that the cases below can be read.
  return understoodText(node, evaluated.quantity, { unitSystem })?.replace(/\u202f/g, " ") ?? null;
}

describe("the value as understood", () => {
  it.each<[string, string | null, string | null]>([
    ["240 K", null, null],
    ["240 ± 30 K", null, null],
    ["0.5", null, null],
    ["2.7 %", null, null],
    ["45 deg", null, null],
    ["80 km", null, null],
    ["0.42 Pa", null, "4.2 µbar"],
    ["0.41 earth_mass", "2.449×10²⁴ kg", "2.449×10²⁷ g"],
    ["0.775 earth_radius", "4 943 km", "4 943 km"],
    ["0.83 au", "1.242×10¹¹ m", "1.242×10¹³ cm"],
    ["3.7 mbar", "370 Pa", "3 700 µbar"],
    ["1e6 cm^2/s", "100 m² s⁻¹", null],
    ["2.5e5 /cm^3", "2.5×10¹¹ m⁻³", null],
    ["0.022 /km", null, null],
    ["9.2 h", null, null],
    ["88775 s", "1.027 day", "1.027 day"],
    ["-5 km", null, null],
    ["2 * T_quiet", "480 K", "480 K"],
    ["T_quiet", "240 K", "240 K"],
    ["T_quiet - 250 K", "−10 K", "−10 K"],
    ["240 K ± 10 %", "216 to 264 K", "216 to 264 K"],
    ["0.41 ± 0.02 earth_mass", "2.33×10²⁴ to 2.57×10²⁴ kg", "2.33×10²⁷ to 2.57×10²⁷ g"],
    ["between 520 and 640 K", "acts as 580 K", "acts as 580 K"],
    ["between 0.5 and 1.3 %", "acts as 0.9 %", "acts as 0.9 %"],
    ["6.1e-3 W/m^2 within factor 1.5", "4.1 to 9.2 mW m⁻²", "4.1 to 9.2 erg cm⁻² s⁻¹"],
    ["1e6 cm^2/s within factor 2", "50 to 200 m² s⁻¹", "500 000 to 2×10⁶ cm² s⁻¹"],
    ["1.2 ppm within factor 1.4", "0.86 to 1.68 ppm", "0.86 to 1.68 ppm"],
    ["30 nT * 2", "60 nT", "60 nT"],
    ["3 m * 4 s", "12 m s", "1 200 cm s"],
  ])("%s: %s in SI, %s in cgs", (written, inSi, inCgs) => {
    expect(understood(written, "SI")).toBe(inSi);
    expect(understood(written, "cgs")).toBe(inCgs);
  });
});

describe("formatting", () => {
  it.each([
    [0, "0"],
    [1, "1"],
    [-5, "−5"],
    [1234.5, "1\u202f235"],
    [999_999, "1×10⁶"],
    [123_456, "123\u202f456"],
    [1e6, "1×10⁶"],
    [2.4485888e24, "2.449×10²⁴"],
    [0.001, "0.001"],
    [0.00099999, "0.001"],
    [0.0009, "9×10⁻⁴"],
    [-1.5e-9, "−1.5×10⁻⁹"],
    [0.1 + 0.2, "0.3"],
    [100, "100"],
  ])("%d is shown as %s", (value, text) => {
    expect(formatPlainNumber(value)).toBe(text);
  });

  it("names SI units as results carry them", () => {
    expect(siUnitText(quantityKinds.particleFlux.dimension)).toBe("m^-2 s^-1");
    expect(siUnitText(quantityKinds.pressure.dimension)).toBe("Pa");
    expect(siUnitText(quantityKinds.energyFlux.dimension)).toBe("W m^-2");
    expect(siUnitText(quantityKinds.gravitationalParameter.dimension)).toBe("m^3 s^-2");
    expect(siUnitText(dimensionless)).toBe("1");
  });

  it("shows a mass density in g cm⁻³ under cgs", () => {
    expect(formatQuantity(4840, quantityKinds.massDensity.dimension, { unitSystem: "cgs" })).toBe(
      "4.84\u202fg\u202fcm⁻³",
    );
  });
});
