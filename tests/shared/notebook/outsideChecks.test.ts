/** Numbers from outside, reached as a user reaches them: by what is written in a notebook. */
import { readFileSync } from "node:fs";
import path from "node:path";
import { describe, expect, it } from "vitest";
import { evaluateNotebook } from "../../../shared/notebook/evaluateNotebook";
import { readNotebookFile } from "../../../shared/notebook/notebookFile";
import type { ResultRow } from "../../../shared/notebook/result";
import jeansCases from "../../fixtures/jeansCases.json";
import standard from "../../fixtures/standardAtmosphere1976.json";
import "../../toBeCloseToRelative";
import { numberIn, resultOf } from "./evaluateCells";
import { notebookWithExobaseAt, type radiiKm } from "./notebookWithExobaseAt";

function documentOf(name: string) {
  const file = path.join(import.meta.dirname, "../../fixtures/notebooks", name);
  let count = 0;
  const reading = readNotebookFile(readFileSync(file, "utf8"), () => String((count += 1)));
  if (!reading.ok) throw new Error(reading.notes.map(({ message }) => message).join("\n"));
  return reading.document;
}

describe("the U.S. Standard Atmosphere 1976 through a notebook, from its row at 150 km", () => {
  const { evaluation } = evaluateNotebook(documentOf("standard-atmosphere.md"));
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
    expect(levelAt(altitudeKm)[`${gas}.number_density`]).toBeCloseToRelative(n, 2e-3);
  });

  it.each(rows)("has the temperature at $altitudeKm km within 0.01 K", ({ altitudeKm, temperature }) => {
    expect(Math.abs((levelAt(altitudeKm).temperature as number) - temperature)).toBeLessThan(0.01);
  });

  it.each(rows.filter(({ gravity }) => gravity !== null))(
    "has gravity at $altitudeKm km within 1e-4",
    ({ altitudeKm, gravity }) => {
      expect(levelAt(altitudeKm).gravity).toBeCloseToRelative(gravity as number, 1e-4);
    },
  );

  // Above 300 km the printed scale height feels the hydrogen, which this column does without.
  it.each(
    rows.filter(
      ({ pressureScaleHeightKm, altitudeKm }) => pressureScaleHeightKm !== null && altitudeKm <= 300,
    ),
  )("has the scale height at $altitudeKm km within 5e-4", ({ altitudeKm, pressureScaleHeightKm }) => {
    expect(levelAt(altitudeKm).scale_height).toBeCloseToRelative(pressureScaleHeightKm! * 1000, 5e-4);
  });
});

describe("the exobase of the U.S. Standard Atmosphere 1976 through a notebook", () => {
  /** With d = 3.65 Å, and so much hydrogen at 150 km; the file has none. */
  const withHydrogen = (atBase: number, criterion: string) => {
    const document = documentOf("standard-atmosphere.md");
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
    expect(Math.abs(numberIn(result, "exobase.altitude") / 1e3 - altitudeKm)).toBeLessThan(0.5);
  });
});

describe("escape parameters and effusion velocities of Earth and Mars through a notebook", () => {
  const cases = jeansCases.rows.filter(({ body }) => body === "Earth" || body === "Mars");

  it.each(cases)("agree for $gas of $body at $temperature K, $radiusKm km", (row) => {
    const body = row.body as keyof typeof radiiKm;
    const result = resultOf(...notebookWithExobaseAt({ ...row, body }));
    expect(numberIn(result, "exobase.radius")).toBeCloseToRelative(row.radiusKm * 1e3, 1e-7);
    expect(numberIn(result, "exobase.escape_speed")).toBeCloseToRelative(row.escapeSpeed, 1e-4);
    expect(numberIn(result, `${row.gas}.escape_parameter`)).toBeCloseToRelative(row.escapeParameter, 1e-4);
    expect(numberIn(result, `${row.gas}.thermal_speed`)).toBeCloseToRelative(row.thermalSpeed, 1e-4);
    expect(numberIn(result, `${row.gas}.effusion_velocity`)).toBeCloseToRelative(row.effusionVelocity, 1e-4);
  });

  // Anderson and Hord (1971): 350 K, 3e4 cm⁻³ at 250 km, 1.8e8 cm⁻² s⁻¹; the published number from memory.
  it("give the Martian flux of 1969 within 5 %", () => {
    const place = { body: "Mars", radiusKm: 3639.5, temperature: 350, hydrogenAtExobase: 3e10 } as const;
    const result = resultOf(...notebookWithExobaseAt(place));
    expect(numberIn(result, "H.number_density")).toBeCloseToRelative(3e10, 1e-4);
    expect(numberIn(result, "H.jeans_flux")).toBeCloseToRelative(1.8e12, 0.05);
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
    expect(flux(170, 1.8e12)).toBeCloseToRelative(flux(350, 3e10), 0.04);
  });
});
