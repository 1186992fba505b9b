import { evaluateNotebook } from "../../../../../shared/notebook/evaluateNotebook";
import type { CellEvaluation } from "../../../../../shared/notebook/result";
import { notebookOf, type WrittenCell } from "../../../../shared/notebook/evaluateCells";

/** A column with all that can rest on it. */
export const haloCells: readonly WrittenCell[] = [
  [
    "body",
    "ilmara",
    "mass = 0.41 earth_mass\nradius = 4943 km\nxuv_flux = 6.4 mW/m^2\nheating_efficiency = 15 %",
  ],
  [
    "column",
    "dayside",
    "body = ilmara\nbase = 80 km\npressure = 0.42 Pa\ngases = CO2: rest, O: 0.9 %, H: 1.2 ppm\ntemperature = bates(base = 165 K, exosphere = 420 K, shape = 0.022 /km)",
  ],
  ["escape", "leak", "column = dayside\ncoupling = open"],
  ["corona", "halo", "escape = leak\ngas = H\nlevels = 5000 km, 9000 km"],
  ["nonthermal", "hot", "escape = leak\nion = O2+\nflow_speed = 400 km/s\nmagnetic_field = 3 nT"],
  [
    "loss",
    "lost",
    "body = ilmara\nrate = leak.H.rate\ngas = H\nbegin = 0.1 Gyr\nend = 5 Gyr\nnow = 4.1 Gyr\nsaturation = 0.3 Gyr",
  ],
];

export function evaluatedHalo(
  cells: readonly WrittenCell[] = haloCells,
): ReadonlyMap<string, CellEvaluation> {
  const { evaluation } = evaluateNotebook(notebookOf(cells));
  return new Map(evaluation.cells.map((cell) => [cell.id, cell]));
}

export const cellNamed = (cells: ReadonlyMap<string, CellEvaluation>, name: string): CellEvaluation =>
  [...cells.values()].find(({ result }) => result.name === name)!;
