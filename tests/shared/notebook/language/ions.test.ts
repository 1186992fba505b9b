import { describe, expect, it } from "vitest";
import { evaluateExpression } from "../../../../shared/notebook/language/evaluateExpression";
import { cellParser } from "../../../../shared/notebook/language/parser";
import { readHistory } from "../../../../shared/notebook/language/readHistory";
import { readIon } from "../../../../shared/notebook/language/readIon";
import { readSamples } from "../../../../shared/notebook/language/readSamples";
import { describe as shown, faultsOf, nodeOf, quantityOf, scopeOf } from "./evaluated";

const number = (value: number) => ({ value, dimension: [0, 0, 0, 0, 0, 0] as const });
const scope = scopeOf({
  T: number(3),
  O2: number(5),
  "hot.O2+.escape_rate": number(7),
  "hot.O2": number(11),
});

describe("a plus sign", () => {
  it.each([
    ["O2+", "O2+"],
    ["O₂+", "O2+"],
    ["O₂⁺", "O2+"],
    ["O2+  ", "O2+"],
    ["O2+ # of the ionosphere", "O2+"],
    ["CO2+", "CO2+"],
  ])("is the charge of an ion in %j", (written, path) => {
    expect(nodeOf(written).node).toMatchObject({ type: "name", path });
  });

  it.each([
    ["T+T", 6],
    ["T+ T", 6],
    ["T +T", 6],
    ["(T+T)+T", 9],
    ["T+2", 5],
    ["T+.5", 3.5],
    ["hot.O2+T", 14],
    ["hot.O2+.5", 11.5],
    ["hot.O2+.escape_rate", 7],
    ["hot.O2+.escape_rate+T", 10],
    ["2+hot.O2+.escape_rate*2", 16],
  ])("adds, or stands in a name, in %j", (written, value) => {
    expect(quantityOf(written, scope).value).toBe(value);
  });

  it("stands in lists and calls as well", () => {
    expect(nodeOf("O2+, CO2+").node).toMatchObject({
      type: "list",
      items: [{ value: { path: "O2+" } }, { value: { path: "CO2+" } }],
    });
  });

  it.each([
    ["T +", "unfinished"],
    ["3 K+", "unfinished"],
    ["(T)+", "unfinished"],
  ])("that joins nothing to %j is still told", (written, code) => {
    expect(faultsOf(written, scope).map((fault) => fault.code)).toEqual([code]);
  });

  it("of an ion where a number is wanted is told as an unknown name", () => {
    expect(faultsOf("T+", scope)).toEqual([expect.objectContaining({ code: "unknown_name", at: "T+" })]);
  });

  it("is read by the editor as the evaluation reads it", () => {
    const names: string[] = [];
    const text = "ion = O2+ # remark\nx = T+T\ny = hot.O2+.escape_rate";
    cellParser.parse(text).iterate({
      enter: ({ name, from, to, type }) => {
        expect(type.isError).toBe(false);
        if (name === "Name") names.push(text.slice(from, to));
      },
    });
    expect(names).toEqual(["O2+", "T", "T", "hot.O2+.escape_rate"]);
  });
});

describe("an ion", () => {
  const read = (written: string) => {
    const { node, text } = nodeOf(written);
    const reading = readIon(node, ["O2+", "CO2+", "N2+"]);
    return reading.ok ? reading.value : reading.notes.map((note) => shown(note, text));
  };

  it("is one of those that are known", () => {
    expect(read("O2+")).toBe("O2+");
  });

  it.each([
    ["O2", "O2", "x = O2+"],
    ["C02+", "C02+", "x = CO2+"],
    ["3", "3", null],
    ["Xyz+", "Xyz+", null],
  ])("%j is refused, with a remedy where one is sure", (written, at, remedied) => {
    expect(read(written)).toEqual([expect.objectContaining({ code: "ion", at, remedied })]);
  });
});

describe("samples", () => {
  const expected = { kind: "numberDensity", name: "an ion density", example: "200 km: 8e3 /cm^3" } as const;
  const read = (written: string) => readSamples(nodeOf(written).node, expected, scope);

  it("are one value, or points against altitude", () => {
    expect(read("1e4 /cm^3")).toMatchObject({ ok: true, value: { kind: "constant", value: 1e10 } });
    expect(read("points(200 km: 8e3 /cm^3, 300 km: 1e3 /cm^3)")).toMatchObject({
      ok: true,
      value: { kind: "points", altitudes: Float64Array.of(2e5, 3e5), values: Float64Array.of(8e9, 1e9) },
    });
  });

  it("of another form are told which there are", () => {
    const reading = read("bates(base = 3 K)");
    expect(reading.notes[0].message).toBe(
      "No profile *bates* here. Write one value, or points(200 km: 8e3 /cm^3, …).",
    );
  });
});

describe("a history", () => {
  const read = (written: string) => readHistory(nodeOf(written).node, scope);

  it("has ages, and light in watts or in nothing", () => {
    const ages = Float64Array.of(1e9 * 31557600, 2e9 * 31557600);
    expect(read("points(1 Gyr: 6, 2 Gyr: T)")).toMatchObject({
      ok: true,
      value: { ages, fluxes: Float64Array.of(6, 3) },
    });
    expect(read("points(1 Gyr: 6 mW/m^2, 2 Gyr: 2 erg/(cm^2 s))")).toMatchObject({
      ok: true,
      value: { ages },
    });
  });

  it.each([
    ["points(1 Gyr: 6)", "points"],
    ["points()", "points"],
    ["points(1 Gyr: 6, 1 Gyr: 3)", "points"],
    ["points(0 Gyr: 6, 1 Gyr: 3)", "bound"],
    ["points(1 Gyr: 6 K, 2 Gyr: 3 K)", "dimension"],
    ["6", "profile"],
  ])("%j is refused", (written, code) => {
    const reading = read(written);
    expect(reading.ok).toBe(false);
    expect(reading.notes.map((note) => note.code)).toContain(code);
  });

  it("that could not be read says nothing more", () => {
    expect(evaluateExpression(nodeOf("points(1 Gyr: )").node, scope).ok).toBe(false);
    expect(read("points(1 Gyr: )").notes).toEqual([]);
  });
});
