import { boltzmann, escapeRegimeBounds, largestDrift, looselyBound } from "../../physics";
import { constant, entry, optional, particleMass, result, type ExplanationRecord } from "./record";

const k = constant("k", boltzmann);
const gm = result("GM", "gravitational parameter", "gm", "body");
const radius = result("r_\\mathrm{c}", "radius of the exobase", "exobase.radius");
const temperature = result("T", "temperature of the exobase", "exobase.temperature");
const lambda = result("\\lambda", "escape parameter", "GAS.escape_parameter");
const gravity = result("g", "gravity there", "exobase.gravity");

const exobase = {
  conventions: ["criterion", "coupling"],
  validity: "one sharp exobase, the same all around, between a gas that collides and one that does not.",
  notes: ["exobase_near_hill_radius"],
} as const;

const level = {
  ...exobase,
  physics: "column/columnLevel.ts#fillLevel",
  sources: ["ChamberlainHunten1987"],
} as const;

const jeans = {
  sources: ["Jeans1925", "ChamberlainHunten1987"],
  validity: `gases near rest: λ of the mean mass ${escapeRegimeBounds.jeans} or more, down to ${escapeRegimeBounds.jeans_estimate} as an estimate, down to ${escapeRegimeBounds.transition} in order of magnitude; λ of the gas itself above ${looselyBound}, its drift below ${largestDrift} of its thermal speed.`,
  notes: ["jeans_estimate", "escape_transition", "escape_wind", "jeans_correction_range", "fast_drift"],
} as const;

const diffusion = {
  sources: ["Hunten1973", "Blanc1908"],
  conventions: ["limitLevel", "eddyMixing"],
  validity:
    "a light trace gas that diffuses up through the rest, in a column that does not change with time.",
  notes: ["above_diffusion_limit", "supply_limited", "estimated_collisions", "limits_at_base"],
} as const;

/** Values of an escape cell at its exobase as a whole. */
const exobaseExplanations: readonly ExplanationRecord[] = [
  {
    ...exobase,
    id: "exobase_altitude",
    name: "exobase.altitude",
    words: "Altitude of the exobase",
    symbol: "z_\\mathrm{c}",
    formula:
      "\\frac{l}{H} = 1 \\ \\text{at}\\ z_\\mathrm{c}, \\qquad l = \\frac{1}{\\sqrt 2 \\sum_j n_j \\sigma_j}, \\qquad H = \\frac{kT}{\\bar m g}",
    forms: {
      entry: "criterion",
      formulas: {
        gas: "\\frac{l_i}{H_i} = 1 \\ \\text{at}\\ z_\\mathrm{c}, \\qquad H_i = \\frac{kT}{m_i g}, \\qquad \\frac{1}{l_i} = \\sum_j n_j \\pi d_{ij}^2 \\sqrt{1 + \\frac{m_i}{m_j}}",
        simple:
          "\\frac{1}{H \\sum_j n_j \\sigma_j} = 1 \\ \\text{at}\\ z_\\mathrm{c}, \\qquad H = \\frac{kT}{\\bar m g}",
        unit_depth: "\\int_{z_\\mathrm{c}}^{\\infty} \\sum_j n_j \\sigma_j \\, dz = 1",
      },
    },
    with: [
      result("l", "mean free path there", "exobase.mean_free_path"),
      result("H", "scale height there", "exobase.scale_height"),
    ],
    physics: "exobase/exobaseNumber.ts#exobaseNumber",
    conventions: ["criterion", "coupling", "crossSections"],
    sources: ["Chamberlain1963", "ChapmanCowling1970"],
  },
  {
    ...level,
    id: "exobase_radius",
    name: "exobase.radius",
    words: "Radius of the exobase",
    symbol: "r_\\mathrm{c}",
    formula: "r_\\mathrm{c} = R + z_\\mathrm{c}",
    with: [
      result("R", "radius of the body", "radius", "body"),
      result("z_\\mathrm{c}", "altitude of the exobase", "exobase.altitude"),
    ],
  },
  {
    ...level,
    id: "exobase_temperature",
    name: "exobase.temperature",
    words: "Temperature of the exobase",
    symbol: "T",
    formula: "T = T(z_\\mathrm{c})",
    with: [
      result("z_\\mathrm{c}", "altitude of the exobase", "exobase.altitude"),
      entry("T(z)", "temperature as written", "temperature", "column"),
    ],
    sources: ["Bates1959", "FritschCarlson1980"],
  },
  {
    ...level,
    id: "exobase_number_density",
    name: "exobase.number_density",
    words: "Number density at the exobase",
    symbol: "n",
    formula: "n = \\frac{p(z_\\mathrm{c})}{kT}",
    with: [
      result("z_\\mathrm{c}", "altitude of the exobase", "exobase.altitude"),
      temperature,
      result("n_0", "number density at the base", "base.number_density", "column"),
      k,
    ],
    conventions: ["criterion", "coupling", "eddyMixing"],
  },
  {
    ...level,
    id: "exobase_gravity",
    name: "exobase.gravity",
    words: "Gravity at the exobase",
    symbol: "g",
    formula: "g = \\frac{GM}{r_\\mathrm{c}^2}",
    with: [gm, radius],
    conventions: ["criterion", "centrifugal"],
  },
  {
    ...level,
    id: "exobase_scale_height",
    name: "exobase.scale_height",
    words: "Scale height of the whole gas at the exobase",
    symbol: "H",
    formula: "H = \\frac{kT}{\\bar m g}",
    with: [temperature, gravity, k],
    conventions: ["criterion", "coupling", "centrifugal"],
  },
  {
    ...level,
    id: "exobase_mean_free_path",
    name: "exobase.mean_free_path",
    words: "Mean free path of the whole gas at the exobase",
    symbol: "l",
    formula: "l = \\frac{1}{\\sqrt 2\\, \\sum_j n_j \\sigma_j}, \\qquad \\sigma_j = \\pi d_j^2",
    with: [result("n = \\textstyle\\sum n_j", "number density there", "exobase.number_density")],
    conventions: ["criterion", "crossSections"],
    sources: ["ChapmanCowling1970"],
  },
  {
    ...exobase,
    id: "exobase_lower",
    name: "exobase.lower",
    words: "Lower end of the band round the exobase",
    symbol: "z_{0.1}",
    formula: "\\mathrm{Kn}(z_{0.1}) = \\frac{l}{H} = 0.1",
    with: [result("z_\\mathrm{c}", "altitude of the exobase", "exobase.altitude")],
    physics: "exobase/findExobase.ts#findExobaseBand",
    conventions: ["bandIsBulk", "coupling"],
    sources: ["Chamberlain1963"],
    validity: "showing how wide the step from colliding to free flight is; it is no uncertainty.",
  },
  {
    ...exobase,
    id: "exobase_upper",
    name: "exobase.upper",
    words: "Upper end of the band round the exobase",
    symbol: "z_{10}",
    formula: "\\mathrm{Kn}(z_{10}) = \\frac{l}{H} = 10",
    with: [result("z_\\mathrm{c}", "altitude of the exobase", "exobase.altitude")],
    physics: "exobase/findExobase.ts#findExobaseBand",
    conventions: ["bandIsBulk", "coupling"],
    sources: ["Chamberlain1963"],
    validity: "showing how wide the step from colliding to free flight is; it is no uncertainty.",
  },
  {
    id: "exobase_escape_speed",
    name: "exobase.escape_speed",
    words: "Escape speed at the exobase",
    symbol: "v_\\mathrm{esc}",
    formula: "v_\\mathrm{esc} = \\sqrt{\\frac{2GM}{r_\\mathrm{c}}}",
    with: [gm, radius],
    physics: "body/escapeSpeed.ts#escapeSpeed",
    conventions: ["criterion", "withoutRotation"],
    sources: ["ChamberlainHunten1987"],
    validity: "a body alone: the star's tide is left out.",
  },
  {
    id: "bulk_escape_parameter",
    name: "bulk_escape_parameter",
    words: "Escape parameter of the mean mass",
    symbol: "\\bar\\lambda",
    formula: "\\bar\\lambda = \\frac{GM \\bar m}{kT r_\\mathrm{c}}",
    with: [gm, temperature, radius, k],
    physics: "escape/escapeParameter.ts#escapeParameter",
    conventions: ["criterion", "coupling"],
    sources: ["ChamberlainHunten1987"],
    validity: "telling the regime: one gas, or a well coupled mixture.",
    notes: ["jeans_estimate", "escape_transition", "escape_wind"],
  },
  {
    id: "escape_regime",
    name: "regime",
    words: "Regime of escape",
    symbol: "\\bar\\lambda",
    formula: `\\bar\\lambda \\ge ${escapeRegimeBounds.jeans}:\\ \\text{Jeans} \\qquad \\ge ${escapeRegimeBounds.jeans_estimate}:\\ \\text{estimate} \\qquad \\ge ${escapeRegimeBounds.transition}:\\ \\text{transition} \\qquad < ${escapeRegimeBounds.transition}:\\ \\text{wind}`,
    with: [optional(result("\\bar\\lambda", "escape parameter of the mean mass", "bulk_escape_parameter"))],
    physics: "escape/escapeRegime.ts#escapeRegime",
    conventions: ["criterion"],
    sources: ["Volkov2011", "Parker1958", "Opik1963"],
    validity: "heat put in well below the exobase, and one gas or a well coupled mixture.",
    notes: ["jeans_estimate", "escape_transition", "escape_wind"],
  },
];

const gasExplanations: readonly ExplanationRecord[] = [
  {
    ...level,
    id: "gas_number_density",
    name: "GAS.number_density",
    words: "Number density of GAS at the exobase",
    symbol: "n_\\mathrm{c}",
    formula: "n_\\mathrm{c} = X(z_\\mathrm{c})\\, n",
    with: [
      result("n", "number density of the whole gas", "exobase.number_density"),
      entry("X", "gases at the base", "gases", "column"),
    ],
    conventions: ["criterion", "coupling", "eddyMixing"],
    notes: ["estimated_collisions"],
  },
  {
    id: "escape_parameter",
    name: "GAS.escape_parameter",
    words: "Escape parameter of GAS",
    symbol: "\\lambda",
    formula: "\\lambda = \\frac{GMm}{kT r_\\mathrm{c}}",
    with: [gm, particleMass, temperature, radius, k],
    physics: "escape/escapeParameter.ts#escapeParameter",
    conventions: ["criterion", "coupling"],
    sources: ["ChamberlainHunten1987"],
    validity: "any gas; where λ is small the gas is loosely bound.",
    notes: ["jeans_correction_range"],
  },
  {
    id: "thermal_speed",
    name: "GAS.thermal_speed",
    words: "Most probable thermal speed of GAS",
    symbol: "v_\\mathrm{p}",
    formula: "v_\\mathrm{p} = \\sqrt{\\frac{2kT}{m}}",
    with: [temperature, particleMass, k],
    physics: "escape/thermalSpeed.ts#thermalSpeed",
    conventions: ["criterion"],
    sources: ["ChamberlainHunten1987"],
    validity: "a Maxwellian gas.",
  },
  {
    ...jeans,
    id: "effusion_velocity",
    name: "GAS.effusion_velocity",
    words: "Effusion velocity of GAS",
    symbol: "w",
    formula: "w = \\frac{v_\\mathrm{p}}{2\\sqrt\\pi}\\,(1 + \\lambda)\\, e^{-\\lambda}",
    with: [result("v_\\mathrm{p}", "thermal speed", "GAS.thermal_speed"), lambda],
    physics: "escape/effusionVelocity.ts#effusionVelocity",
    conventions: ["criterion", "coupling"],
  },
  {
    ...jeans,
    id: "jeans_flux",
    name: "GAS.jeans_flux",
    words: "Jeans flux of GAS",
    symbol: "\\Phi",
    formula:
      "\\Phi = n_\\mathrm{c} w = \\frac{n_\\mathrm{c} v_\\mathrm{p}}{2\\sqrt\\pi}\\,(1 + \\lambda)\\, e^{-\\lambda}",
    with: [
      result("n_\\mathrm{c}", "number density at the exobase", "GAS.number_density"),
      result("v_\\mathrm{p}", "thermal speed", "GAS.thermal_speed"),
      lambda,
    ],
    physics: "escape/jeansFlux.ts#jeansFlux",
    conventions: ["criterion", "coupling"],
  },
  {
    ...jeans,
    id: "escape_rate",
    name: "GAS.rate",
    words: "Rate at which GAS leaves",
    symbol: "F",
    formula: "F = 4\\pi r_\\mathrm{c}^2\\, c\\, \\Phi",
    with: [
      radius,
      result("\\Phi", "Jeans flux", "GAS.jeans_flux"),
      optional(entry("c", "factors on the Jeans rate", "correction")),
    ],
    physics: "escape/thermalEscape.ts#thermalEscape",
    conventions: ["criterion", "coupling", "correction"],
    notes: [...jeans.notes, "supply_limited", "above_diffusion_limit"],
  },
  {
    ...jeans,
    id: "mass_rate",
    name: "GAS.mass_rate",
    words: "Mass rate of GAS",
    symbol: "\\dot M",
    formula: "\\dot M = m F",
    with: [particleMass, result("F", "rate", "GAS.rate")],
    physics: "escape/thermalEscape.ts#thermalEscape",
    conventions: ["criterion", "coupling", "correction"],
  },
  {
    ...diffusion,
    id: "diffusion_limit",
    name: "GAS.diffusion_limit",
    words: "Flux of GAS that diffusion can supply",
    symbol: "\\Phi_\\mathrm{lim}",
    formula:
      "\\Phi_\\mathrm{lim} = n D X \\left[\\frac{(m_\\mathrm{a} - m)\\, g}{kT} - \\frac{\\alpha}{T} \\frac{dT}{dz}\\right] \\left(\\frac{r_\\mathrm{h}}{r_\\mathrm{c}}\\right)^{2}",
    with: [
      particleMass,
      radius,
      optional(result("z_\\mathrm{h}", "homopause", "GAS.homopause.altitude", "column")),
      entry("X", "gases at the base", "gases", "column"),
      k,
    ],
    physics: "limits/diffusionLimit.ts#diffusionLimit",
  },
  {
    ...diffusion,
    id: "supply_fraction",
    name: "GAS.supply_fraction",
    words: "Rate of GAS over what diffusion can supply",
    symbol: "F / F_\\mathrm{lim}",
    formula:
      "\\frac{F}{F_\\mathrm{lim}}, \\qquad F_\\mathrm{lim} = 4\\pi r_\\mathrm{c}^2\\, \\Phi_\\mathrm{lim}",
    with: [
      result("F", "rate", "GAS.rate"),
      result("\\Phi_\\mathrm{lim}", "diffusion limit", "GAS.diffusion_limit"),
      radius,
    ],
    physics: "limits/supplyFraction.ts#supplyFraction",
    conventions: ["limitLevel", "coupling", "correction"],
  },
  {
    id: "depletion_time",
    name: "GAS.depletion_time",
    words: "Time in which GAS would leave the column",
    symbol: "t",
    formula: "t = \\frac{N}{F}, \\qquad N = 4\\pi \\int_{z_0}^{z_\\mathrm{c}} n_i r^2\\, dz",
    with: [
      result("F", "rate", "GAS.rate"),
      result("z_0", "base of the column", "base.altitude", "column"),
      result("z_\\mathrm{c}", "altitude of the exobase", "exobase.altitude"),
    ],
    physics: "limits/depletionTime.ts#depletionTime",
    conventions: ["inventory", "coupling", "correction"],
    sources: ["Hunten1973"],
    validity: "a rate that stays as it is, and nothing that is supplied from below the base.",
  },
];

const limitExplanations: readonly ExplanationRecord[] = [
  {
    id: "crossover_mass",
    name: "crossover_mass",
    words: "Crossover mass",
    symbol: "m_\\mathrm{c}",
    formula:
      "m_\\mathrm{c} = m_1 + \\frac{kT\\, \\Phi_1}{b\\, g X_1}, \\qquad \\Phi_1 = \\frac{F_1}{4\\pi r^2}",
    with: [entry("X_1", "gases at the base", "gases", "column"), k],
    physics: "limits/crossoverMass.ts#crossoverMass",
    conventions: ["crossoverGases", "coupling", "correction"],
    sources: ["HuntenPepinWalker1987"],
    validity:
      "a light gas that flows up through heavier ones; those heavier than the crossover mass stay behind.",
  },
  {
    id: "energy_limited_mass_rate",
    name: "energy_limited_mass_rate",
    words: "Energy-limited mass rate",
    symbol: "\\dot M",
    formula: "\\dot M = \\frac{\\varepsilon\\, \\pi R_\\mathrm{XUV}^2 R\\, F_\\mathrm{XUV}}{GM\\, K}",
    with: [
      entry("\\varepsilon", "heating efficiency", "heating_efficiency", "body"),
      entry("R_\\mathrm{XUV}", "radius where the radiation is absorbed", "xuv_radius", "body"),
      result("R", "radius", "radius", "body"),
      result("F_\\mathrm{XUV}", "XUV flux", "xuv_flux", "body"),
      gm,
      optional(result("K", "tidal factor", "tidal_factor", "body")),
    ],
    physics: "limits/energyLimitedMassRate.ts#energyLimitedMassRate",
    conventions: ["withoutTide"],
    sources: ["Watson1981", "Erkaev2007"],
    validity:
      "an upper bound: all of the heat lifts gas, as far as the efficiency says, and none is conducted down.",
  },
  {
    id: "wind_mass_rate",
    name: "wind_mass_rate",
    words: "Mass rate of an isothermal wind from the base",
    symbol: "\\dot M",
    formula:
      "\\dot M = 4\\pi r_0^2 \\rho_0 u, \\qquad \\frac{u^2}{a^2} - \\ln\\frac{u^2}{a^2} = 4 \\ln\\frac{r_0}{r_\\mathrm{s}} + \\frac{4 r_\\mathrm{s}}{r_0} - 3, \\qquad a = \\sqrt{\\frac{kT}{\\bar m}}, \\quad r_\\mathrm{s} = \\frac{GM}{2a^2}",
    with: [
      gm,
      result("z_0", "base of the column", "base.altitude", "column"),
      result("n_0", "number density there", "base.number_density", "column"),
      optional(temperature),
      k,
    ],
    physics: "limits/isothermalWind.ts#isothermalWind",
    conventions: ["windTemperature"],
    sources: ["Parker1958", "Cranmer2004"],
    validity: "λ of the mean mass of 2 or more at the base; below, the wind starts faster than sound.",
    notes: ["wind_starts_supersonic", "no_wind"],
  },
];

/** Values of an escape cell. */
export const escapeExplanations: readonly ExplanationRecord[] = [
  ...exobaseExplanations,
  ...gasExplanations,
  ...limitExplanations,
];
