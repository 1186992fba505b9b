import jeansCases from "../../fixtures/jeansCases.json";
import type { WrittenCell } from "./evaluateCells";

/** Constants of the program that computed the cases. */
export const { boltzmann, atomicMass, massesU, gravitationalParametersKm3S2 } = jeansCases.inputs;

/** Radii that the altitudes of the cases count from, km. */
export const radiiKm = { Earth: 6371.0084, Mars: 3389.5 } as const;

/**
 * A notebook whose exobase lies where a case wants it: isothermal CO2 (d = 3.763 Å, stated) with traces, without
 * mixing. Then n = n_b exp(Λ_b − Λ), Λ = GMm/kTr, and l = H gives n = mg/(√2 σ kT) at the exobase.
 */
export function notebookWithExobaseAt(place: {
  body: keyof typeof radiiKm;
  radiusKm: number;
  temperature: number;
  hydrogenAtExobase?: number;
}): WrittenCell[] {
  const { body, radiusKm, temperature } = place;
  const gm = gravitationalParametersKm3S2[body] * 1e9;
  const kT = boltzmann * temperature;
  const base = radiusKm * 1e3 - 60e3;
  const rise = (massU: number) => ((gm * massU * atomicMass) / kT) * (1 / base - 1 / (radiusKm * 1e3));
  const crossSection = Math.PI * 3.763e-10 ** 2;
  const mass = massesU.CO2 * atomicMass;
  const atExobase = (mass * gm) / (radiusKm * 1e3) ** 2 / (Math.SQRT2 * crossSection * kT);
  const co2 = atExobase * Math.exp(rise(massesU.CO2));
  const trace = (formula: keyof typeof massesU) =>
    formula === "H" && place.hydrogenAtExobase
      ? place.hydrogenAtExobase * Math.exp(rise(massesU.H))
      : atExobase * 1e-9 * Math.exp(rise(massesU[formula]));
  const traces = (["H", "D", "He", "O", "H2", "HD"] as const).map((gas) => `${gas}: ${trace(gas)} /m^3`);
  const masses = Object.entries(massesU).map(([formula, massU]): WrittenCell => [
    "gas",
    formula,
    `mass = ${massU} u\nthermal_diffusion = 0${formula === "CO2" ? `\ncross_section = ${crossSection} m^2` : ""}`,
  ]);
  return [
    ["body", "planet", `gm = ${gm} m^3/s^2\nradius = ${radiiKm[body]} km`],
    ...masses,
    [
      "column",
      "air",
      `body = planet\nbase = ${base / 1e3 - radiiKm[body]} km\ngases = CO2: ${co2} /m^3, ${traces.join(", ")}\ntemperature = ${temperature} K`,
    ],
    ["escape", "leak", "column = air\ncoupling = open"],
  ];
}
