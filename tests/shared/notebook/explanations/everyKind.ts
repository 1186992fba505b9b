/** Notebooks that between them hold every result that any kind of cell can give. */
import type { Cell } from "../../../../shared/notebook/document";
import { completeNotebook } from "../../../../shared/notebook/completeNotebook";
import type { CellEvaluation } from "../../../../shared/notebook/result";
import { notebookOf, type WrittenCell } from "../evaluateCells";

const star = "star_distance = 0.83 au\nstar_mass = 0.86 solar_mass";

export const everyKind: readonly WrittenCell[] = [
  [
    "values",
    "given",
    "T_quiet = 420 ± 45 K  # two occultations\nwarm = 2 * T_quiet\nmix = 1e6 cm^2/s\nage = 4.1 Gyr",
  ],
  [
    "body",
    "ilmara",
    `mass = 0.41 earth_mass # orbit of its moonlet\nradius = 4943 km\nxuv_flux = 6.4 mW/m^2\nheating_efficiency = 15 %\n${star}`,
  ],
  ["gas", "O", "mass = 15.999 u"],
  [
    "column",
    "dayside",
    `body = ilmara
base = 80 km
pressure = 0.42 Pa
gases = CO2: rest, N2: 2.7 %, O: 0.8 %, H2: 15 ppm, H: 1.2 ppm
temperature = bates(base = 165 K, exosphere = T_quiet, shape = 0.022 /km)
eddy = mix
top = 2500 km
levels = 80 km, 120 km, 240 km`,
  ],
  ["escape", "leak", "column = dayside\ncriterion = bulk\ncorrection = H: 0.73\ncoupling = open"],
  ["corona", "halo", "escape = leak\ngas = H\nsatellites = 0.1\nlevels = 2000 km, 3000 km"],
  [
    "nonthermal",
    "hot",
    `escape = leak
ion = O2+
ion_density = points(1000 km: 8e3 /cm^3, 1500 km: 900 /cm^3, 2200 km: 60 /cm^3)
electron_density = points(1000 km: 1e4 /cm^3, 1500 km: 1.5e3 /cm^3, 2200 km: 200 /cm^3)
electron_temperature = 1200 K
flow_speed = 400 km/s
magnetic_field = 3 nT`,
  ],
  [
    "loss",
    "lost",
    "body = ilmara\nrate = leak.H.rate\ngas = H\nbegin = 0.1 Gyr\nend = age\nnow = age\nsaturation = 0.3 Gyr",
  ],
  [
    "loss",
    "by_table",
    "body = ilmara\nrate = 1e26 /s\ngas = O\nbegin = 0.1 Gyr\nend = age\nnow = age\nhistory = points(0.1 Gyr: 90, 1 Gyr: 6.2, 4.6 Gyr: 1)",
  ],
  [
    "sweep",
    "warmer",
    "vary = T_quiet from 380 K to 440 K in 2 steps\nagainst = mix from 1e6 cm^2/s to 2e6 cm^2/s in 1 steps\nwatch = leak.H.rate",
  ],
  ["spread", "sure", "watch = leak.H.rate, leak.exobase.altitude\nsamples = 64"],
];

/** A body of the handbook, a coupled column of one temperature, carried by logarithms where escape is beyond sight. */
export const coldAndCoupled: readonly WrittenCell[] = [
  ["body", "like_mars", "like = handbook(Mars)\nxuv_flux = 1 mW/m^2\nheating_efficiency = 0.1"],
  [
    "column",
    "cold",
    "body = like_mars\nbase = 100 km\nnumber_density = 1e12 /cm^3\ngases = CO2: rest, H: 10 ppm\ntemperature = 70 K",
  ],
  ["escape", "held", "column = cold\ncriterion = gas\ngas = CO2"],
];

export function completed(written: readonly WrittenCell[]): { cells: Cell[]; evaluations: CellEvaluation[] } {
  const document = notebookOf(written);
  return { cells: document.cells, evaluations: completeNotebook(document).cells };
}
