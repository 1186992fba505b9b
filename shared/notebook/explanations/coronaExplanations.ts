import { entry, result, row, type ExplanationRecord } from "./record";

const radius = result("r_\\mathrm{c}", "radius of the exobase", "exobase.radius", "escape");
const lambda = result(
  "\\lambda_\\mathrm{c}",
  "escape parameter at the exobase",
  "GAS.escape_parameter",
  "escape",
);
const exobaseDensity = result("n_\\mathrm{c}", "number density at the exobase", "exobase.number_density");
const here = row("r", "distance from the centre", "radius");
const satellites = entry("s", "share of the satellite orbits that is filled", "satellites");

const partitions = {
  sources: ["Chamberlain1963", "ChamberlainHunten1987"],
  validity:
    "a Maxwellian gas that leaves one exobase, the same all around, and then neither collides nor feels the star's light or tide.",
  notes: ["corona_step", "corona_beyond_hill_radius"],
} as const;
const density = { ...partitions, physics: "corona/coronaDensity.ts#coronaDensity" } as const;
const part = { ...partitions, physics: "corona/partitionFunctions.ts#partitionFunctions" } as const;
const along = {
  ...partitions,
  sources: ["Chamberlain1963", "TakahasiMori1974"],
  conventions: ["satellites", "criterion", "coupling"],
} as const;

const definitions =
  "\\lambda = \\lambda_\\mathrm{c} \\frac{r_\\mathrm{c}}{r}, \\quad \\psi = \\frac{\\lambda^2}{\\lambda + \\lambda_\\mathrm{c}}, \\quad q = \\frac{\\sqrt{\\lambda_\\mathrm{c}^2 - \\lambda^2}}{\\lambda_\\mathrm{c}}";

/** Results of a corona cell, and the columns of its table `levels`. */
export const coronaExplanations: readonly ExplanationRecord[] = [
  {
    id: "corona_exobase_number_density",
    name: "exobase.number_density",
    words: "Number density of GAS at the exobase",
    symbol: "n_\\mathrm{c}",
    formula: "n_\\mathrm{c} = X(z_\\mathrm{c})\\, n",
    with: [
      result("n", "number density of the whole gas there", "exobase.number_density", "escape"),
      entry("X", "gases at the base", "gases", "column"),
    ],
    physics: "column/columnLevel.ts#fillLevel",
    conventions: ["criterion", "coupling", "eddyMixing"],
    sources: ["ChapmanCowling1970"],
    validity: "the column just below the exobase; the corona begins a step lower.",
    notes: ["corona_step"],
  },
  {
    id: "corona_radius",
    name: "levels.radius",
    words: "Distance from the centre: radius of the body and altitude",
    symbol: "r",
    formula: null,
    with: [result("R", "radius of the body", "radius", "body"), row("z", "altitude", "altitude")],
    physics: null,
    conventions: [],
    sources: [],
    validity: null,
  },
  {
    id: "corona_altitude",
    name: "levels.altitude",
    words: "Altitude of the level",
    symbol: "z",
    formula: null,
    with: [entry("z", "levels asked for", "levels")],
    physics: null,
    conventions: [],
    sources: [],
    validity: null,
  },
  {
    ...density,
    id: "corona_number_density",
    name: "levels.number_density",
    words: "Number density of GAS in the corona",
    symbol: "n",
    formula:
      "n = n_\\mathrm{c}\\, e^{-(\\lambda_\\mathrm{c} - \\lambda)} \\left(\\zeta_\\mathrm{bal} + s\\, \\zeta_\\mathrm{sat} + \\zeta_\\mathrm{esc}\\right), \\qquad \\lambda = \\lambda_\\mathrm{c} \\frac{r_\\mathrm{c}}{r}",
    with: [exobaseDensity, lambda, radius, here, satellites],
    conventions: ["satellites", "criterion", "coupling"],
  },
  {
    ...part,
    id: "corona_ballistic",
    name: "levels.ballistic",
    words: "Number density of GAS on ballistic orbits",
    symbol: "n_\\mathrm{bal}",
    formula: `n_\\mathrm{bal} = n_\\mathrm{c}\\, e^{-(\\lambda_\\mathrm{c} - \\lambda)} \\left[P(\\lambda) - q\\, e^{-\\psi} P(\\lambda - \\psi)\\right], \\qquad ${definitions}`,
    with: [exobaseDensity, lambda, radius, here],
    conventions: ["gammaShare", "criterion", "coupling"],
  },
  {
    ...part,
    id: "corona_satellite",
    name: "levels.satellite",
    words: "Number density of GAS on satellite orbits",
    symbol: "n_\\mathrm{sat}",
    formula: `n_\\mathrm{sat} = n_\\mathrm{c}\\, e^{-(\\lambda_\\mathrm{c} - \\lambda)}\\, s\\, q\\, e^{-\\psi} P(\\lambda - \\psi), \\qquad ${definitions}`,
    with: [exobaseDensity, lambda, radius, here, satellites],
    conventions: ["satellites", "gammaShare", "criterion", "coupling"],
  },
  {
    ...part,
    id: "corona_escaping",
    name: "levels.escaping",
    words: "Number density of GAS on its way out",
    symbol: "n_\\mathrm{esc}",
    formula: `n_\\mathrm{esc} = n_\\mathrm{c}\\, e^{-(\\lambda_\\mathrm{c} - \\lambda)}\\, \\tfrac12 \\left[Q(\\lambda) - q\\, e^{-\\psi} Q(\\lambda - \\psi)\\right], \\qquad ${definitions}`,
    with: [exobaseDensity, lambda, radius, here],
    conventions: ["gammaShare", "criterion", "coupling"],
  },
  {
    ...along,
    id: "corona_limb_column",
    name: "levels.limb_column",
    words: "Column of GAS along the limb",
    symbol: "N",
    formula: "N = 2 \\int_0^\\infty n\\, dx, \\qquad r'^2 = r^2 + x^2",
    with: [
      row("n", "number density at the tangent point", "number_density"),
      here,
      exobaseDensity,
      satellites,
    ],
    physics: "corona/coronaColumn.ts#limbColumn",
  },
  {
    ...along,
    id: "corona_overhead_column",
    name: "levels.overhead_column",
    words: "Column of GAS overhead",
    symbol: "N",
    formula: "N = \\int_r^\\infty n\\, dr",
    with: [row("n", "number density here", "number_density"), here, exobaseDensity, satellites],
    physics: "corona/coronaColumn.ts#overheadColumn",
  },
];
