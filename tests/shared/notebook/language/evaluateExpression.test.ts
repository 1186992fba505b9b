import { describe, expect, it } from "vitest";
import { parseEntries } from "../../../../shared/notebook/language/parseEntries";
import { evaluateExpression } from "../../../../shared/notebook/language/evaluateExpression";
import type { Uncertainty } from "../../../../shared/notebook/language/quantity";
import "../../../toBeCloseToRelative";
import { faultsOf, quantityOf, scopeOf } from "./evaluated";

const kelvin = [0, 0, 0, 1, 0, 0] as const;
const scope = scopeOf({
  T_quiet: { value: 240, dimension: kelvin },
  "leak.exobase.altitude": { value: 239_200, dimension: [1, 0, 0, 0, 0, 0] },
  "leak.N.jeans_flux": { value: 3, dimension: [-2, 0, -1, 0, 0, 0] },
  "leak.regime": "jeans",
  "leak.CO2.jeans_flux": {
    unavailable: "*leak.CO2.jeans_flux* is below 1e-300; write leak.CO2.log10_jeans_flux.",
  },
});

describe("arithmetic", () => {
  it.each([
    ["1 + 2 * 3", 7],
    ["(1 + 2) * 3", 9],
    ["2 - 3 - 4", -5],
    ["12 / 2 / 3", 2],
    ["2 × 3 · 4", 24],
    ["-2^2", -4],
    ["2^3^2", 512],
    ["2^-1", 0.5],
    ["10^19", 1e19],
    ["10^-7", 1e-7],
    ["2 * -3", -6],
    ["+5", 5],
    ["2³", 8],
    ["2⁻¹", 0.5],
    ["1.5e3", 1500],
    ["1.5×10^3", 1500],
    ["1.5 × 10^-3", 0.0015],
    ["1.5×10⁻³", 0.0015],
    ["1\u202f000\u202f000", 1e6],
    ["1\u2009000.5", 1000.5],
    ["12\u00a0000", 12_000],
    ["\u22122.5", -2.5],
    ["1e\u22123", 0.001],
    [".5", 0.5],
    ["5.", 5],
    ["0", 0],
    ["0e5", 0],
    ["sqrt(16)", 4],
    ["abs(-3)", 3],
    ["min(3, 1, 2)", 1],
    ["max(3, 1, 2)", 3],
    ["exp(0)", 1],
    ["ln(1)", 0],
    ["log10(1000)", 3],
    ["pi", Math.PI],
    ["2 * pi", 2 * Math.PI],
    ["1 - 1", 0],
  ])("%s is %d", (written, value) => {
    expect(quantityOf(written)).toEqual({ value, dimension: [0, 0, 0, 0, 0, 0] });
  });

  it("carries dimensions through sums, products, powers and roots", () => {
    expect(quantityOf("sqrt(2 * 9.81 m/s^2 * 80 km)").dimension).toEqual([1, 0, -1, 0, 0, 0]);
    expect(quantityOf("(2 km)^2")).toEqual({ value: 4e6, dimension: [2, 0, 0, 0, 0, 0] });
    expect(quantityOf("k_B * T_quiet / (28 u * 9 m/s^2)", scope).dimension).toEqual([1, 0, 0, 0, 0, 0]);
    expect(quantityOf("N_A * 28 u").dimension).toEqual([0, 1, 0, 0, -1, 0]);
    expect(quantityOf("min(1 km, 500 m)")).toEqual({ value: 500, dimension: [1, 0, 0, 0, 0, 0] });
    expect(quantityOf("(80 + 5) km").value).toBe(85_000);
    expect(quantityOf("(8 m^3)^(1/3)").dimension).toEqual([1, 0, 0, 0, 0, 0]);
  });

  it("uses names of the cells above, dotted ones too, and no unit hides a gas in them", () => {
    expect(quantityOf("2 * T_quiet", scope)).toEqual({ value: 480, dimension: kelvin });
    expect(quantityOf("leak.exobase.altitude + 1 km", scope).value).toBe(240_200);
    expect(quantityOf("leak.N.jeans_flux", scope).value).toBe(3);
  });

  it("agrees with the published scale height of a simple case", () => {
    // H = kT/(mg) by hand with CODATA 2022: 1.380649e-23 × 240 / (28 × 1.66053906892e-27 × 9)
    const expected = (1.380649e-23 * 240) / (28 * 1.66053906892e-27 * 9);
    expect(quantityOf("k_B * T_quiet / (28 u * 9 m/s^2)", scope).value).toBeCloseToRelative(expected, 1e-15);
  });
});

describe("uncertain quantities", () => {
  it.each<[string, number, Uncertainty]>([
    ["240 ± 30 K", 240, { form: "normal", mean: 240, deviation: 30 }],
    ["240 +- 30 K", 240, { form: "normal", mean: 240, deviation: 30 }],
    ["240 +/- 30 K", 240, { form: "normal", mean: 240, deviation: 30 }],
    ["240 K ± 30 K", 240, { form: "normal", mean: 240, deviation: 30 }],
    ["240 K ± 10 %", 240, { form: "normal", mean: 240, deviation: 24 }],
    ["T_quiet ± 10 %", 240, { form: "normal", mean: 240, deviation: 24 }],
    ["-240 ± 30 K", -240, { form: "normal", mean: -240, deviation: 30 }],
    ["between 180 and 350 K", 265, { form: "uniform", lower: 180, upper: 350 }],
    ["between 180 K and 350 K", 265, { form: "uniform", lower: 180, upper: 350 }],
    ["between 0.5 and 1.3 %", 0.009, { form: "uniform", lower: 0.005, upper: 0.013 }],
    ["15 ± 5 %", 0.15, { form: "normal", mean: 0.15, deviation: 0.05 }],
    ["15 % ± 5 %", 0.15, { form: "normal", mean: 0.15, deviation: 0.05 }],
    ["2.5e5 /cm^3 within factor 2", 2.5e11, { form: "log_normal", median: 2.5e11, factor: 2 }],
    ["100 + 140 ± 30 K", 240, { form: "normal", mean: 240, deviation: 30 }],
  ])("%s acts by its centre, %d", (written, centre, uncertainty) => {
    const quantity = quantityOf(written, scope);
    expect(quantity.value).toBe(centre);
    expect(quantity.uncertainty).toEqual(uncertainty);
  });

  it("keeps no uncertainty of what is computed from one", () => {
    expect(quantityOf("2 * (240 ± 30 K)")).toEqual({ value: 480, dimension: kelvin });
  });

  it("asks the scope for one draw for each uncertain part, by its place in the cell", () => {
    const text =
      "T = 240 ± 30 K\nprofile = bates(base = 140 ± 5 K, exosphere = 240 K)\ngases = H: 1 ppm within factor 2, CO2: rest\nsum = (1 ± 2) + (3 ± 4)";
    const paths: string[] = [];
    const drawing = { ...scopeOf(), draw: (path: string) => (paths.push(path), 7) };
    const { entries } = parseEntries(text);
    const first = evaluateExpression(entries[0].node, drawing);
    expect(first.ok && first.quantity.value).toBe(7);
    for (const { node } of entries) {
      if (node.type !== "call" && node.type !== "list") continue;
      for (const { value } of node.items) evaluateExpression(value, drawing);
    }
    const sum = evaluateExpression(entries[3].node, drawing);
    expect(sum.ok && sum.quantity.value).toBe(14);
    expect(paths).toEqual(["T", "profile.base", "gases.H", "sum", "sum[2]"]);
  });
});

describe("faults of an expression", () => {
  it.each([
    [
      "1 K + 2 km",
      "dimension",
      "2 km",
      "Only like can be added to like: this is a length, what stands before it a temperature.",
    ],
    [
      "exp(3 K)",
      "dimension",
      "3 K",
      "*exp* takes a number without unit; this is a temperature. Divide by a unit first.",
    ],
    ["2^(3 km)", "dimension", "3 km", "An exponent is a number without unit; this is a length."],
    [
      "max(1 K, 1 km)",
      "dimension",
      "1 km",
      "*max* compares like with like: this is a length, the first a temperature.",
    ],
    ["1 / 0", "division_by_zero", "0", "This is zero, and nothing can be divided by zero."],
    ["0^-1", "division_by_zero", "0^-1", "Zero has no negative power."],
    ["(-2)^0.5", "domain", "(-2)^0.5", "A negative number has only whole powers."],
    ["sqrt(-1)", "domain", "-1", "A negative number has no square root."],
    ["ln(0)", "domain", "0", "Only a number above zero has a logarithm."],
    ["10^10^10", "out_of_range", "10^10^10", "The number is beyond 1e300."],
    ["1e301", "out_of_range", "1e301", "The number is beyond 1e300."],
    ["1e-301", "out_of_range", "1e-301", "The number is below 1e-300, but not zero."],
    ["1e-200 * 1e-200", "out_of_range", "1e-200 * 1e-200", "The number is below 1e-300, but not zero."],
    ["1e99999999999999999999", "out_of_range", "1e99999999999999999999", "The number is beyond 1e300."],
    ["exp(1000)", "out_of_range", "exp(1000)", "The number is beyond 1e300."],
    ["1e300 km", "out_of_range", "1e300 km", "The number is beyond 1e300."],
    ["5 mbarr", "unknown_unit", "mbarr", "No unit *mbarr*. The nearest is *mbar*."],
    ["5 sec", "unknown_unit", "sec", "*sec* is not a unit here. It is written *s* here."],
    ["5 foo", "unknown_unit", "foo", "No unit *foo*."],
    ["T_quit * 2", "unknown_name", "T_quit", "Nothing above is called *T_quit*. The nearest is *T_quiet*."],
    ["zzz * 2", "unknown_name", "zzz", "Nothing above is called *zzz*."],
    ["km * 2", "unknown_name", "km", "*km* is a unit (kilometre); a number must stand before it."],
    ["sqrt * 2", "unknown_name", "sqrt", "*sqrt* is a function; write what it acts on in brackets."],
    ["sqr(4)", "unknown_function", "sqr", "No function *sqr*. The nearest is *sqrt*."],
    ["sqrt(4, 5)", "arguments", "5", "*sqrt* takes one value; this is a second."],
    ["sqrt()", "arguments", "sqrt()", "*sqrt* needs a value in its brackets."],
    ["2 T_quiet", "side_by_side", "T_quiet", "A multiplication sign is missing before the name *T_quiet*."],
    ["leak.regime", "not_a_quantity", "leak.regime", "*leak.regime* is no quantity, but *jeans*."],
    [
      "leak.CO2.jeans_flux",
      "unavailable",
      "leak.CO2.jeans_flux",
      "*leak.CO2.jeans_flux* is below 1e-300; write leak.CO2.log10_jeans_flux.",
    ],
    ["constructor", "unknown_name", "constructor", "Nothing above is called *constructor*."],
    ["__proto__ + 1", "unknown_name", "__proto__", "Nothing above is called *__proto__*."],
    ["1 km, 2 km", "not_a_quantity", "1 km, 2 km", "One quantity is needed here; this is a list."],
    ["240 K ± 30", "dimension", "30", "The unit stands at the end, for both: 240 ± 30 K."],
    [
      "240 K ± 3 km",
      "dimension",
      "3 km",
      "Both parts of an uncertain value must be alike: this is a length, the first a temperature.",
    ],
    ["240 ± -3 K", "uncertainty", "-3 K", "What follows ± is a deviation; it can't be below zero."],
    [
      "between 350 and 180 K",
      "uncertainty",
      "between 350 and 180 K",
      "The lower end of the range comes first; these two stand the wrong way round.",
    ],
    ["2 K within factor 1", "uncertainty", "1", "The factor must be above 1; this is 1."],
    [
      "2 K within factor 2 K",
      "dimension",
      "2 K",
      "The factor is a number without unit; this is a temperature.",
    ],
    ["-2 K within factor 2", "uncertainty", "-2 K", "Only a quantity above zero can lie within a factor."],
    ["1 km^25", "unit_exponent", "km^25", "The exponent of a unit may be 24 at most."],
  ])("%s: %s at %s", (written, code, at, message) => {
    expect(faultsOf(written, scope)).toEqual([expect.objectContaining({ code, at, message })]);
  });

  it.each([
    ["20 °C", "x = 293.15 K"],
    ["-20 °C", "x = 253.15 K"],
    ["20.125 degC", "x = 293.275 K"],
    ["5 mbarr", "x = 5 mbar"],
    ["5 AU", "x = 5 au"],
    ["T_quit * 2", "x = T_quiet * 2"],
    ["2 T_quiet", "x = 2 * T_quiet"],
    ["sqr(4)", "x = sqrt(4)"],
  ])("%s is put right as %s", (written, remedied) => {
    expect(faultsOf(written, scope).map((fault) => fault.remedied)).toEqual([remedied]);
  });

  it("says nothing more about what could not be read", () => {
    const [entry] = parseEntries("x = 3 +").entries;
    expect(evaluateExpression(entry.node, scope)).toEqual({ ok: false, notes: [] });
  });
});
