import { describe, expect, it } from "vitest";
import {
  explain,
  type Explanation,
  type ResultPlace,
} from "../../../../shared/notebook/explanations/explain";
import { evaluateNotebook } from "../../../../shared/notebook/evaluateNotebook";
import { notebookOf, type WrittenCell } from "../evaluateCells";
import { coldAndCoupled, completed, everyKind } from "./everyKind";

const all = completed(everyKind);
const cold = completed(coldAndCoupled);

function explained(
  { cells, evaluations }: typeof all,
  cell: string,
  name: string,
  row?: ResultPlace["row"],
): Explanation {
  const explanation = explain(cells, evaluations, { cell, name, row });
  if (!explanation) throw new Error(`${cell}.${name} is not explained`);
  return explanation;
}

const now = (written: readonly WrittenCell[], place: ResultPlace) => {
  const document = notebookOf(written);
  return explain(document.cells, evaluateNotebook(document).evaluation.cells, place);
};

const inputNamed = ({ inputs }: Explanation, words: string) => inputs.find((input) => input.words === words);
const originsOf = ({ origins }: Explanation) => origins.map(({ name }) => name);

describe("what a number is", () => {
  it("gives the value with all its digits, its logarithm and its spread, as the results have them", () => {
    const leak = all.evaluations.find(({ result }) => result.name === "leak")!.result.values;
    const rate = explained(all, "leak", "H.rate");
    expect(rate.name).toBe("leak.H.rate");
    expect(rate.words).toBe("Rate at which H leaves");
    expect(rate.value).toBe(leak["H.rate"].value);
    expect(rate.log10).toBe(leak["H.log10_rate"].value);
    expect(rate.spread).toMatchObject({ cell: "sure", lower: leak["H.rate"].spread!.lower });
    expect(rate.formula).toContain("4\\pi");
  });

  it("shows what went into it as it acted", () => {
    const lambda = explained(all, "leak", "H.escape_parameter");
    const leak = all.evaluations.find(({ result }) => result.name === "leak")!.result.values;
    expect(inputNamed(lambda, "temperature of the exobase")?.value).toBe(leak["exobase.temperature"].value);
    // GMm/(kTr) of the inputs it shows must be the number that they explain.
    const number = (words: string) => inputNamed(lambda, words)!.value!;
    const byHand =
      (number("gravitational parameter") * number("mass of one particle")) /
      (number("Boltzmann constant") * number("temperature of the exobase") * number("radius of the exobase"));
    expect(byHand / (lambda.value as number)).toBeCloseTo(1, 12);
  });

  it("follows names to the entry that states them, with its remark", () => {
    const temperature = explained(all, "leak", "exobase.temperature");
    expect(temperature.origins).toContainEqual({
      cellId: "0",
      name: "given.T_quiet",
      text: "420 ± 45 K",
      remark: "two occultations",
    });
    expect(explained(all, "ilmara", "hill_radius").origins).toContainEqual({
      cellId: "1",
      name: "ilmara.mass",
      text: "0.41 earth_mass",
      remark: "orbit of its moonlet",
    });
  });

  it("says which numbers are those of the handbook, and whose they are there", () => {
    const { origins } = explained(cold, "like_mars", "surface_gravity");
    const handbook = origins.filter(({ cellId }) => cellId === null);
    expect(handbook).toHaveLength(1);
    expect(handbook[0]).toMatchObject({ name: "handbook, Mars" });
    expect(handbook[0].text).toMatch(/NASA|Jet Propulsion|Archinal|NaifGM/);
    expect(originsOf(explained(all, "leak", "H.thermal_speed"))).toContain("handbook, H");
  });

  it("takes the mass of a gas cell before that of the handbook", () => {
    const speed = explained(all, "leak", "O.thermal_speed");
    expect(inputNamed(speed, "mass of one particle")?.text).toBe("15.999 u");
    expect(originsOf(speed)).toContain("O.mass");
    expect(originsOf(speed)).not.toContain("handbook, O");
  });

  it("shows what acts by default, and says that it does", () => {
    const lost = explained(all, "lost", "particles");
    expect(inputNamed(lost, "how fast the XUV light falls")?.text).toBe("1.23");
    expect(lost.origins.find(({ name }) => name === "lost.xuv_exponent")?.remark).toBe("by default");
    expect(
      inputNamed(
        explained(cold, "held", "energy_limited_mass_rate"),
        "radius where the radiation is absorbed",
      )?.value,
    ).toBe(3_389_500);
  });

  it("changes its formula and its words with the convention that is written", () => {
    const bulk = explained(all, "leak", "exobase.altitude");
    const ofGas = explained(cold, "held", "exobase.altitude");
    expect(ofGas.formula).not.toBe(bulk.formula);
    expect(ofGas.restsOn.join(" ")).toMatch(/of CO2 is the scale height of that gas \(\*criterion = gas\*\)/);
    expect(ofGas.restsOn.join(" ")).toMatch(/together with what escapes.*coupled\*, by default/);
    expect(bulk.restsOn.join(" ")).toMatch(/without a flux.*\*coupling = open\*\)/);
    expect(explained(all, "lost", "particles").formula).not.toBe(
      explained(all, "by_table", "particles").formula,
    );
  });

  it("keeps a number beyond sight by its logarithm", () => {
    const flux = explained(cold, "held", "CO2.jeans_flux");
    expect(flux.value).toBeNull();
    expect(flux.log10).toBeLessThan(-300);
    expect(explained(cold, "held", "CO2.log10_rate").words).toBe(
      "Decimal logarithm: rate at which CO2 leaves",
    );
  });

  it("explains a number of a table by its own row", () => {
    const at = (value: number) => explained(all, "dayside", "levels.knudsen", { column: "altitude", value });
    expect(at(240_000).name).toBeNull();
    for (const level of [at(80_000), at(240_000)]) {
      const [path, height] = ["mean free path", "scale height"].map(
        (words) => inputNamed(level, words)!.value!,
      );
      expect((path / height / (level.value as number)).toFixed(12)).toBe("1.000000000000");
    }
  });

  it("brings the notes that say whether it holds here, of its own gas only", () => {
    const messages = (gas: string) =>
      explained(all, "leak", `${gas}.supply_fraction`).notes.map(({ message }) => message);
    expect(messages("H").join(" ")).toMatch(/^H leaves at/);
    expect(messages("H2").join(" ")).not.toMatch(/^H leaves at/);
  });

  it("sets out the entry of a values cell with the values of its names", () => {
    const warm = explained(all, "given", "warm");
    expect(warm).toMatchObject({ value: 840, name: "warm", formula: null });
    expect(warm.inputs).toMatchObject([{ words: "T_quiet", value: 420, unit: "K" }]);
    expect(warm.origins[0]).toMatchObject({ name: "given.warm", text: "2 * T_quiet" });
  });

  it("is nothing where the notebook has no such number", () => {
    const body: WrittenCell = ["body", "ilmara", "mass = 0.41 earth_mass\nradius = 4943 km"];
    expect(now([body], { cell: "ilmara", name: "surface_gravity" })).not.toBeNull();
    expect(now([body], { cell: "ilmara", name: "hill_radius" })).toBeNull();
    expect(now([body], { cell: "gone", name: "surface_gravity" })).toBeNull();
    expect(
      explain(all.cells, all.evaluations, {
        cell: "dayside",
        name: "levels.knudsen",
        row: { column: "altitude", value: 1 },
      }),
    ).toBeNull();
  });
});
