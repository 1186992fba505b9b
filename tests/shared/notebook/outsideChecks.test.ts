/** Numbers from outside, reached as a user reaches them: by what is written in a notebook. */
import { describe, expect, it } from "vitest";
import { evaluateNotebook } from "../../../shared/notebook/evaluateNotebook";
import type { ResultRow } from "../../../shared/notebook/result";
import jeansCases from "../../fixtures/jeansCases.json";
import standard from "../../fixtures/standardAtmosphere1976.json";
import "../../toAgreeWith";
import "../../toBeCloseToRelative";
import { numberIn, resultOf } from "./evaluateCells";
import { fixtureNotebook } from "./fixtureNotebook";
import { notebookWithExobaseAt, type radiiKm } from "./notebookWithExobaseAt";

describe("the U.S. Standard Atmosphere 1976 through a notebook, from its row at 150 km", () => {
  const { evaluation } = evaluateNotebook(fixtureNotebook("standard-atmosphere.md"));
  const cells = evaluation.cells.map(({ result }) => result);
  const column = cells.find(({ kind }) => kind === "column")!;
  const levelAt = (altitudeKm: number): ResultRow => {
    const row = column.tables.levels.find(({ altitude }) => altitude === altitudeKm * 1000);
    if (!row) throw new Error(`No level at ${altitudeKm} km`);
    return row;
  };
  const rows = standard.rows.filter(({ altitudeKm }) => altitudeKm >= 150);
  const gases = ["N2", "O", "O2", "Ar", "He"] as const;

  // 0.2 %: printed rounding, and thermal diffusion shared within the mixture.
  it.each(
    rows.flatMap(({ altitudeKm, numberDensity }) =>
      gases.map((gas) => ({ altitudeKm, gas, n: numberDensity[gas] })),
    ),
  )("has $gas at $altitudeKm km within 0.2 %", ({ altitudeKm, gas, n }) => {
    if (n === null) return;
    expect(levelAt(altitudeKm)[`${gas}.number_density`]).toAgreeWith({
      what: `number density of ${gas} in the 1976 standard, 150 to 1000 km`,
      unit: "m⁻³",
      published: n,
      within: { relative: 2e-3 },
      source: "Minzner1976",
      mark: "published",
    });
  });

  it.each(rows)("has the temperature at $altitudeKm km within 0.01 K", ({ altitudeKm, temperature }) => {
    expect(levelAt(altitudeKm).temperature).toAgreeWith({
      what: "temperature of the 1976 standard, 150 to 1000 km",
      unit: "K",
      published: temperature,
      within: { absolute: 0.01 },
      source: "Minzner1976",
      mark: "published",
    });
  });

  it.each(rows.filter(({ gravity }) => gravity !== null))(
    "has gravity at $altitudeKm km within 1e-4",
    ({ altitudeKm, gravity }) => {
      expect(levelAt(altitudeKm).gravity).toAgreeWith({
        what: "gravity of the 1976 standard, 150 to 1000 km",
        unit: "m s⁻²",
        published: gravity!,
        within: { relative: 1e-4 },
        source: "Minzner1976",
        mark: "published",
      });
    },
  );

  // Above 300 km the printed scale height feels the hydrogen, which this column does without.
  it.each(
    rows.filter(
      ({ pressureScaleHeightKm, altitudeKm }) => pressureScaleHeightKm !== null && altitudeKm <= 300,
    ),
  )("has the scale height at $altitudeKm km within 5e-4", ({ altitudeKm, pressureScaleHeightKm }) => {
    expect(levelAt(altitudeKm).scale_height).toAgreeWith({
      what: "pressure scale height of the 1976 standard, 150 to 300 km",
      unit: "m",
      published: pressureScaleHeightKm! * 1000,
      within: { relative: 5e-4 },
      source: "Minzner1976",
      mark: "published",
    });
  });
});

describe("the exobase of the U.S. Standard Atmosphere 1976 through a notebook", () => {
  /** With d = 3.65 Å, and so much hydrogen at 150 km; the file has none. */
  const withHydrogen = (atBase: number, criterion: string) => {
    const document = fixtureNotebook("standard-atmosphere.md");
    const cells = document.cells.map((cell) => {
      const text = cell.text.replace("He: 2.106e13 /m^3", `He: 2.106e13 /m^3, H: ${atBase} /m^3`);
      if (cell.kind === "gas") return { ...cell, text: `${text}\ncross_section = pi * (3.65 angstrom)^2` };
      return { ...cell, text: cell.kind === "escape" ? `${text}\ncriterion = ${criterion}` : text };
    });
    const { evaluation } = evaluateNotebook({ ...document, cells });
    return evaluation.cells.map(({ result }) => result);
  };
  // The standard's own hydrogen flows; here it stands, and is made to meet the standard's 500 km row.
  const wanted = standard.rows.find(({ altitudeKm }) => altitudeKm === 500)!.numberDensity.H!;
  const tried = withHydrogen(1e11, "bulk").find(({ kind }) => kind === "column")!;
  const got = tried.tables.levels.find(({ altitude }) => altitude === 500e3)!["H.number_density"] as number;

  // Recomputed from the standard's column with the pressure scale height.
  it.each([
    ["bulk", 491.2],
    ["simple", 465.5],
  ])("lies by the criterion %s at %d km within 0.5 km", (criterion, altitudeKm) => {
    const result = withHydrogen((1e11 * wanted) / got, criterion).at(-1)!;
    expect(numberIn(result, "exobase.altitude") / 1e3).toAgreeWith({
      what: `exobase of the 1976 standard by the criterion ${criterion}, d = 3.65 Å`,
      unit: "km",
      published: altitudeKm,
      within: { absolute: 0.5 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });
});

describe("escape parameters and effusion velocities of Earth and Mars through a notebook", () => {
  const cases = jeansCases.rows.filter(({ body }) => body === "Earth" || body === "Mars");

  it.each(cases)("agree for $gas of $body at $temperature K, $radiusKm km", (row) => {
    const body = row.body as keyof typeof radiiKm;
    const result = resultOf(...notebookWithExobaseAt({ ...row, body }));
    expect(numberIn(result, "exobase.radius")).toBeCloseToRelative(row.radiusKm * 1e3, 1e-7);
    expect(numberIn(result, "exobase.escape_speed")).toAgreeWith({
      what: "escape speed at exobases of the Earth and Mars",
      unit: "m s⁻¹",
      published: row.escapeSpeed,
      within: { relative: 1e-4 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
    expect(numberIn(result, `${row.gas}.escape_parameter`)).toAgreeWith({
      what: "escape parameters of gases at the Earth and Mars",
      unit: "1",
      published: row.escapeParameter,
      within: { relative: 1e-4 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
    expect(numberIn(result, `${row.gas}.thermal_speed`)).toAgreeWith({
      what: "thermal speeds of gases at the Earth and Mars",
      unit: "m s⁻¹",
      published: row.thermalSpeed,
      within: { relative: 1e-4 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
    expect(numberIn(result, `${row.gas}.effusion_velocity`)).toAgreeWith({
      what: "effusion velocities of gases at the Earth and Mars",
      unit: "m s⁻¹",
      published: row.effusionVelocity,
      within: { relative: 1e-4 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
  });

  // Anderson and Hord (1971): 350 K, 3e4 cm⁻³ at 250 km, 1.8e8 cm⁻² s⁻¹.
  it("give the Martian flux of 1969 within 5 %", () => {
    const place = { body: "Mars", radiusKm: 3639.5, temperature: 350, hydrogenAtExobase: 3e10 } as const;
    const result = resultOf(...notebookWithExobaseAt(place));
    expect(numberIn(result, "H.number_density")).toBeCloseToRelative(3e10, 1e-4);
    expect(numberIn(result, "H.jeans_flux")).toAgreeWith({
      what: "Jeans flux of H from Mars in 1969: 350 K, 3e4 cm⁻³ at 250 km",
      unit: "m⁻² s⁻¹",
      published: 1.8e12,
      within: { relative: 0.05 },
      source: "AndersonHord1971",
      mark: "from memory",
    });
  });

  // Levine et al. (1978): 170 K and 1.8e6 cm⁻³ give the same flux.
  it("give the same flux for a cool and rich Mars within 4 %", () => {
    const flux = (temperature: number, hydrogenAtExobase: number) =>
      numberIn(
        resultOf(
          ...notebookWithExobaseAt({ body: "Mars", radiusKm: 3639.5, temperature, hydrogenAtExobase }),
        ),
        "H.jeans_flux",
      );
    expect(flux(170, 1.8e12) / flux(350, 3e10)).toAgreeWith({
      what: "Jeans flux of H from Mars at 170 K, 1.8e6 cm⁻³ over that of 1969",
      unit: "1",
      published: 1,
      within: { relative: 0.04 },
      source: "Levine1978",
      mark: "published",
    });
  });
});
