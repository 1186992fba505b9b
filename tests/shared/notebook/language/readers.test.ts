import { describe, expect, it } from "vitest";
import { readChoice } from "../../../../shared/notebook/language/readChoice";
import { readCollision } from "../../../../shared/notebook/language/readCollision";
import { readEddy } from "../../../../shared/notebook/language/readEddy";
import { readGasFactors } from "../../../../shared/notebook/language/readGasFactors";
import { readGasList } from "../../../../shared/notebook/language/readGasList";
import { readGasNames } from "../../../../shared/notebook/language/readGasName";
import { readHandbook } from "../../../../shared/notebook/language/readHandbook";
import type { Reading } from "../../../../shared/notebook/language/reading";
import { readLevels } from "../../../../shared/notebook/language/readLevels";
import { readQuantity, type ExpectedQuantity } from "../../../../shared/notebook/language/readQuantity";
import { readReference } from "../../../../shared/notebook/language/readReference";
import { readTemperature } from "../../../../shared/notebook/language/readTemperature";
import type { ValueNode } from "../../../../shared/notebook/language/syntax";
import { describe as shown, nodeOf, scopeOf } from "./evaluated";

const gases = ["H", "H2", "He", "N", "N2", "O", "CO2", "Ar"];
const scope = scopeOf({ T_quiet: { value: 240, dimension: [0, 0, 0, 1, 0, 0] } });

type Read<Value> = (node: ValueNode) => Reading<Value>;

function valueOf<Value>(written: string, read: Read<Value>): Value {
  const reading = read(nodeOf(written).node);
  if (!reading.ok) throw new Error(`"${written}": ${reading.notes.map(({ message }) => message).join(" ")}`);
  return reading.value;
}

/** [at, message] of each fault. */
function faults<Value>(written: string, read: Read<Value>): [string, string][] {
  const { node, text } = nodeOf(written);
  const reading = read(node);
  expect(reading.ok).toBe(false);
  return reading.notes.map((note) => [shown(note, text).at, note.message]);
}

const plain = (text: string): string => text.replace(/\u202f/g, " ");

describe("a quantity", () => {
  it.each<[string, ExpectedQuantity, string, string]>([
    ["80 km", { kind: "temperature" }, "80 km", "A temperature in K is needed here; this is a length."],
    ["240", { kind: "temperature" }, "240", "A temperature in K is needed here; this has no unit."],
    ["240 K", { kind: "number" }, "240 K", "A number without unit is needed here; this is a temperature."],
    ["3 km^2 K", { kind: "length" }, "3 km^2 K", "A length in km is needed here; this is in m^2 K."],
    [
      "-5 km",
      { kind: "length", name: "the radius", above: 0 },
      "-5 km",
      "The radius must be above zero; this is −5 km.",
    ],
    ["0 K", { kind: "temperature", above: 0 }, "0 K", "A temperature must be above 0 K here; this is 0 K."],
    [
      "120 %",
      { kind: "number", name: "the efficiency", atMost: 1 },
      "120 %",
      "The efficiency must be 1 or less; this is 1.2.",
    ],
    [
      "-1",
      { kind: "number", name: "the share", atLeast: 0 },
      "-1",
      "The share must be zero or more; this is −1.",
    ],
    [
      "90 deg",
      { kind: "angle", name: "the latitude", below: 1 },
      "90 deg",
      "The latitude must be below 1; this is 1.571.",
    ],
  ])("%s: %s", (written, expected, at, message) => {
    expect(
      faults(written, (node) => readQuantity(node, expected, scope)).map(([where, what]) => [
        where,
        plain(what),
      ]),
    ).toEqual([[at, message]]);
  });

  it("is read with its value in SI, and a missing K is offered", () => {
    expect(valueOf("80 km", (node) => readQuantity(node, { kind: "length" }, scope)).value).toBe(80_000);
    const { node, text } = nodeOf("240");
    const reading = readQuantity(node, { kind: "temperature" }, scope);
    expect(shown(reading.notes[0], text).remedied).toBe("x = 240 K");
  });
});

describe("a choice", () => {
  const read: Read<string> = (node) => readChoice(node, ["bulk", "gas", "simple", "unit_depth"], "criterion");

  it("is one of the words, or the nearest is named", () => {
    expect(valueOf("bulk", read)).toBe("bulk");
    expect(faults("bulkk", read)).toEqual([["bulkk", "No criterion *bulkk*. The nearest is *bulk*."]]);
    expect(faults("mean", read)).toEqual([
      ["mean", "No criterion *mean*. The criterion is bulk, gas, simple or unit_depth."],
    ]);
    expect(faults("3 km", read)).toEqual([["3 km", "The criterion is bulk, gas, simple or unit_depth."]]);
  });
});

describe("a reference to a cell", () => {
  const read: Read<string> = (node) =>
    readReference(node, {
      what: "a body",
      names: ["ilmara", "oda"],
      others: [{ name: "given", what: "a values cell" }],
    });

  it("is the name of a cell of the kind above", () => {
    expect(valueOf("ilmara", read)).toBe("ilmara");
    expect(faults("ilmra", read)).toEqual([
      ["ilmra", "No body above is called *ilmra*. The nearest is *ilmara*."],
    ]);
    expect(faults("given", read)).toEqual([
      ["given", "*given* is a values cell; the name of a body is needed here."],
    ]);
    expect(faults("zzz", read)).toEqual([["zzz", "No body above is called *zzz*."]]);
    expect(faults("3 km", read)).toEqual([["3 km", "The name of a body is needed here."]]);
    expect(faults("ilmara", (node) => readReference(node, { what: "an escape cell", names: [] }))).toEqual([
      ["ilmara", "No escape cell stands above. Add an escape cell before this cell."],
    ]);
  });
});

describe("the handbook", () => {
  const read: Read<string> = (node) => readHandbook(node, ["Venus", "Mars"]);

  it("is asked for a body by name", () => {
    expect(valueOf("handbook(Mars)", read)).toBe("Mars");
    expect(faults("handbook(Mras)", read)).toEqual([
      ["Mras", "The handbook has no *Mras*. The nearest is *Mars*."],
    ]);
    expect(faults("handbook(Oberon)", read)).toEqual([
      ["Oberon", "The handbook has no *Oberon*. It has Venus and Mars."],
    ]);
    expect(faults("Mars", read)).toEqual([["Mars", "A body of the handbook is written handbook(Venus)."]]);
    expect(faults("handbook()", read)).toEqual([
      ["handbook()", "A body of the handbook is written handbook(Venus)."],
    ]);
    expect(faults("handbook(Mars, Venus)", read)).toEqual([
      ["Venus", "The handbook gives one body at a time."],
    ]);
  });
});

describe("a list of gases", () => {
  const read = (node: ValueNode) => readGasList(node, gases, scope);

  it("takes fractions with a rest, in the order written", () => {
    const list = valueOf("CO2: rest, N2: 2.7 %, Ar: 1.9 %, O: 0.5 %, H2: 15 ppm", read);
    expect(list.gases.map(({ formula }) => formula)).toEqual(["CO2", "N2", "Ar", "O", "H2"]);
    expect(list.gases[0].moleFraction).toBeCloseTo(0.948985, 12);
    expect(list.gases.slice(1).map(({ moleFraction }) => moleFraction)).toEqual([0.027, 0.019, 0.005, 15e-6]);
    expect([list.numberDensity, list.rest]).toEqual([null, "CO2"]);
  });

  it("takes fractions that add up, one gas alone, and an uncertain fraction by its centre", () => {
    expect(valueOf("N2: 95 %, O: 5 %", read).gases.map(({ moleFraction }) => moleFraction)).toEqual([
      0.95, 0.05,
    ]);
    expect(valueOf("H: rest", read).gases[0].moleFraction).toBe(1);
    expect(valueOf("CO2: rest, N: between 0.5 and 1.3 %", read).gases[1].moleFraction).toBe(0.009);
  });

  it("takes number densities for all", () => {
    const list = valueOf("N2: 3e14 /cm^3, O: 1e20 /m^3", read);
    expect(list.numberDensity).toBe(4e20);
    expect(list.gases.map(({ moleFraction }) => moleFraction)).toEqual([0.75, 0.25]);
  });

  it.each<[string, [string, string][]]>([
    [
      "CO2: 95 %, N2: 2 %",
      [
        [
          "CO2: 95 %, N2: 2 %",
          "The fractions add up to 97 % only. Write *rest* for the gas that makes up what is missing.",
        ],
      ],
    ],
    ["CO2: 95 %, N2: 7 %", [["CO2: 95 %, N2: 7 %", "The fractions add up to 102 %, above 100 %."]]],
    [
      "CO2: rest, N2: 100 %",
      [["CO2: rest, N2: 100 %", "The other gases already make up 100 %; nothing is left for *CO2*."]],
    ],
    ["CO2: rest, N2: rest", [["N2: rest", "Only one gas can make up the rest; *CO2* does already."]]],
    ["CO2: rest, N2: 1 %, N2: 2 %", [["N2: 2 %", "*N2* stands twice. Keep one."]]],
    ["CO2: rest, N2: -1 %", [["-1 %", "The fraction of N2 must be above zero."]]],
    ["CO2: rest, N2: 0", [["0", "The fraction of N2 must be above zero. Leave the gas out instead."]]],
    ["CO2: rest, N2: 27", [["27", "A fraction is 1 at most; this is 27, or 2 700 %."]]],
    [
      "CO2: 1e14 /cm^3, N2: 1 %",
      [
        [
          "N2: 1 %",
          "Give fractions or number densities, the same way for all gases; *rest* goes with fractions.",
        ],
      ],
    ],
    [
      "CO2: 1e14 /cm^3, N2: rest",
      [
        [
          "N2: rest",
          "Give fractions or number densities, the same way for all gases; *rest* goes with fractions.",
        ],
      ],
    ],
    [
      "CO2: rest, N2: 3 K",
      [
        [
          "3 K",
          "A fraction in % or ppm, or a number density in /cm^3, is needed here; this is a temperature.",
        ],
      ],
    ],
    ["co2: rest", [["co2", "No gas *co2*. The nearest is *CO2*."]]],
    [
      "Xyz: rest",
      [["Xyz", "No gas *Xyz* in the handbook. A gas cell of that name above would bring it in."]],
    ],
    ["CO2", [["CO2", "A gas, a colon and its fraction are needed: CO2: rest."]]],
    ["CO2: rest, N2", [["N2", "A gas, a colon and its value are needed: CO2: rest, N2: 2.7 %."]]],
    ["3: rest", [["3", "The formula of a gas is needed here, such as CO2."]]],
    [
      "co2: rest, N2: 3 K",
      [
        ["co2", "No gas *co2*. The nearest is *CO2*."],
        [
          "3 K",
          "A fraction in % or ppm, or a number density in /cm^3, is needed here; this is a temperature.",
        ],
      ],
    ],
  ])("%s is refused", (written, expected) => {
    expect(faults(written, read).map(([at, message]) => [at, plain(message)])).toEqual(expected);
  });

  it("names gases without amounts, and factors for gases", () => {
    expect(valueOf("H, H2", (node) => readGasNames(node, gases)).map(({ formula }) => formula)).toEqual([
      "H",
      "H2",
    ]);
    expect(valueOf("N", (node) => readGasNames(node, gases)).map(({ formula }) => formula)).toEqual(["N"]);
    expect(faults("H, H", (node) => readGasNames(node, gases))).toEqual([
      ["H", "*H* stands twice. Keep one."],
    ]);
    expect(faults("H: 1, H2", (node) => readGasNames(node, gases))).toEqual([
      ["H: 1", "Only formulas stand here, with commas between: H, H2."],
    ]);
    const factors = valueOf("H: 1.5 ± 0.2, H2: 1.2", (node) => readGasFactors(node, gases, scope));
    expect(factors.map(({ formula, value }) => [formula, value.value])).toEqual([
      ["H", 1.5],
      ["H2", 1.2],
    ]);
    expect(faults("H: 0", (node) => readGasFactors(node, gases, scope))).toEqual([
      ["0", "The factor of H must be above zero; this is zero."],
    ]);
  });
});

describe("a temperature profile", () => {
  const read = (node: ValueNode) => readTemperature(node, scope);

  it("is a quantity, bates or points", () => {
    expect(valueOf("T_quiet", read)).toEqual({ kind: "constant", temperature: 240 });
    expect(valueOf("bates(base = 140 K, exosphere = T_quiet, shape = 0.03 /km)", read)).toEqual({
      kind: "bates",
      base: 140,
      exosphere: 240,
      shape: 3e-5,
      referenceAltitude: null,
    });
    expect(
      valueOf("bates(base = 140 K, exosphere = 9 K, shape = 0.03 /km, at = 120 km)", read),
    ).toMatchObject({
      referenceAltitude: 120_000,
    });
    expect(valueOf("points(80 km: 140 K, 120 km: 165 ± 5 K)", read)).toEqual({
      kind: "points",
      altitudes: Float64Array.of(80_000, 120_000),
      temperatures: Float64Array.of(140, 165),
    });
  });

  it.each<[string, [string, string][]]>([
    ["80 km", [["80 km", "A temperature in K is needed here; this is a length."]]],
    ["-3 K", [["-3 K", "The temperature must be above 0 K; this is −3 K."]]],
    ["bats(base = 1 K)", [["bats", "No temperature profile *bats*. The nearest is *bates*."]]],
    [
      "table(a, b)",
      [["table", "No temperature profile *table*. A temperature is a quantity, bates(…) or points(…)."]],
    ],
    [
      "bates(base = 140 K)",
      [
        ["bates", "*bates* needs *exosphere*: exosphere = 240 K."],
        ["bates", "*bates* needs *shape*: shape = 0.03 /km."],
      ],
    ],
    [
      "bates(bse = 140 K, exosphere = 2 K, shape = 1 /km)",
      [["bse", "*bates* has no argument *bse*. The nearest is *base*."]],
    ],
    [
      "bates(base = 1 K, base = 2 K, exosphere = 2 K, shape = 1 /km)",
      [["base", "*base* stands twice in *bates*. Keep one."]],
    ],
    [
      "bates(140 K, exosphere = 2 K, shape = 1 /km)",
      [["140 K", "Each argument of *bates* has its name: base = 140 K."]],
    ],
    [
      "bates(base = 140 km, exosphere = 2 K, shape = 1 K)",
      [
        ["140 km", "A temperature in K is needed here; this is a length."],
        ["1 K", "An inverse length in /km is needed here; this is a temperature."],
      ],
    ],
    [
      "points(80 km: 140 K)",
      [
        [
          "points(80 km: 140 K)",
          "*points* needs two points at least. A point is an altitude and a temperature: 80 km: 140 K.",
        ],
      ],
    ],
    [
      "points(80 km: 140 K, 70 km: 150 K)",
      [["70 km", "Altitudes go upward; this one is below the one before it."]],
    ],
    ["points(80 km: 140 K, 80 km: 150 K)", [["80 km", "This altitude stands twice. Keep one value for it."]]],
    ["points(80 km: 140 K, 90 km)", [["90 km", "A point is an altitude and a temperature: 80 km: 140 K."]]],
    [
      "points(80 km: 140 K, 90 K: 0 K)",
      [
        ["90 K", "A length in km is needed here; this is a temperature."],
        ["0 K", "A temperature must be above 0 K; this is 0 K."],
      ],
    ],
    ["80 km: 140 K", [["80 km: 140 K", "One quantity is needed here; this is a list."]]],
  ])("%s is refused", (written, expected) => {
    expect(faults(written, read).map(([at, message]) => [at, plain(message)])).toEqual(expected);
  });
});

describe("eddy mixing", () => {
  const read = (node: ValueNode) => readEddy(node, scope);

  it("is nothing, a quantity, power or points", () => {
    expect(valueOf("0", read)).toEqual({ kind: "none" });
    expect(valueOf("0 cm^2/s", read)).toEqual({ kind: "none" });
    expect(valueOf("1e6 cm^2/s", read)).toEqual({ kind: "constant", coefficient: 100 });
    expect(valueOf("power(base = 1e6 cm^2/s, exponent = 0.5, ceiling = 1e8 cm^2/s)", read)).toEqual({
      kind: "power",
      base: 100,
      exponent: 0.5,
      ceiling: 10_000,
    });
    expect(valueOf("power(base = 1e6 cm^2/s, exponent = 0.5)", read)).toMatchObject({ ceiling: null });
    expect(valueOf("points(80 km: 1e6 cm^2/s, 90 km: 2e6 cm^2/s)", read)).toMatchObject({
      coefficients: Float64Array.of(100, 200),
    });
  });

  it.each<[string, [string, string][]]>([
    ["5", [["5", "A diffusion coefficient in cm^2/s is needed here; this has no unit."]]],
    ["-5 cm^2/s", [["-5 cm^2/s", "Eddy mixing must be zero or more; this is −5×10⁻⁴ m² s⁻¹."]]],
    [
      "bates(base = 1 K)",
      [
        [
          "bates",
          "No profile of eddy mixing *bates*. Eddy mixing is a diffusion coefficient, power(…) or points(…).",
        ],
      ],
    ],
    [
      "power(base = 1e6 cm^2/s, exponent = 0.5, ceiling = 1e5 cm^2/s)",
      [["1e5 cm^2/s", "The ceiling must be at least the coefficient at the base, 100 m² s⁻¹."]],
    ],
    [
      "points(80 km: 0 cm^2/s, 90 km: 2e6 cm^2/s)",
      [["0 cm^2/s", "A diffusion coefficient must be above zero; this is zero."]],
    ],
  ])("%s is refused", (written, expected) => {
    expect(faults(written, read).map(([at, message]) => [at, plain(message)])).toEqual(expected);
  });
});

describe("levels and collisions", () => {
  it("takes altitudes with a unit each, or one unit at the end for all", () => {
    expect(valueOf("80 km, 120 km", (node) => readLevels(node, scope))).toEqual([80_000, 120_000]);
    expect(valueOf("80, 120, 160 km", (node) => readLevels(node, scope))).toEqual([80_000, 120_000, 160_000]);
    expect(valueOf("80 km", (node) => readLevels(node, scope))).toEqual([80_000]);
    expect(faults("80 km, 3 K", (node) => readLevels(node, scope))).toEqual([
      ["3 K", "A length in km is needed here; this is a temperature."],
    ]);
    expect(faults("80 km: 3 K", (node) => readLevels(node, scope))).toEqual([
      ["80 km: 3 K", "Altitudes stand with commas between: 100 km, 200 km."],
    ]);
    expect(
      faults(Array.from({ length: 1001 }, () => "1 km").join(", "), (node) => readLevels(node, scope)),
    ).toEqual([["1 km", "There may be 1000 altitudes at most."]]);
  });

  it("takes collision parameters of pairs", () => {
    const read = (node: ValueNode) => readCollision(node, gases, scope);
    const [pair] = valueOf("CO2: binary(A = 8.4e17 /(cm s), s = 0.597)", read);
    expect([pair.formula, pair.value]).toEqual(["CO2", { coefficient: 8.4e19, exponent: 0.597 }]);
    expect(faults("CO2: 3", read)).toEqual([
      ["3", "A collision parameter is written binary(A = 8.4e17 /(cm s), s = 0.597)."],
    ]);
    expect(faults("CO2: binary(A = 8.4e17 /cm^3, s = 0.5 K)", read)).toEqual([
      ["8.4e17 /cm^3", "A collision parameter in /(cm s) is needed here; this is a number density."],
      ["0.5 K", "A number without unit is needed here; this is a temperature."],
    ]);
  });
});
