import { julianYear, solarXuvAges, solarXuvExponent, waterDensity } from "../../physics";
import { entry, optional, particleMass, result, row, type ExplanationRecord } from "./record";

const particles = result("N", "particles lost in all", "particles");
const radius = result("R", "radius of the body", "radius", "body");
const rate = entry("F_\\mathrm{now}", "rate now", "rate");
const begin = entry("t_1", "begin", "begin");
const now = entry("t_\\mathrm{now}", "now", "now");
const law = [
  entry("x", "power of the XUV light", "exponent"),
  optional(entry("\\beta", "how fast the XUV light falls", "xuv_exponent")),
  optional(entry("t_\\mathrm{sat}", "age of saturation", "saturation")),
  optional(entry("\\mathrm{XUV}(t)", "history of the XUV light", "history")),
];

const billions = (age: number): string => String(age / (1e9 * julianYear.value));
const loss = {
  sources: ["Ribas2005"],
  conventions: ["xuvLaw"],
  validity: `a rate that follows the XUV light. Its power law, with exponent ${solarXuvExponent}, rests on stars like the Sun from ${billions(solarXuvAges.youngest)} to ${billions(solarXuvAges.oldest)} billion years of age.`,
  notes: ["xuv_extrapolated", "history_extrapolated"],
} as const;
const xuv = "\\mathrm{XUV} \\propto t^{-\\beta}, \\ \\text{constant before}\\ t_\\mathrm{sat}";
const table = "\\mathrm{XUV}(t)\\ \\text{by the history}";

/** Results of a loss cell, and the columns of its table `history`. */
export const lossExplanations: readonly ExplanationRecord[] = [
  {
    ...loss,
    id: "lost_particles",
    name: "particles",
    words: "Particles of GAS lost in all",
    symbol: "N",
    formula: `N = F_\\mathrm{now} \\int_{t_1}^{t_2} \\left(\\frac{\\mathrm{XUV}(t)}{\\mathrm{XUV}(t_\\mathrm{now})}\\right)^{x} dt, \\qquad ${xuv}`,
    forms: {
      entry: "history",
      formulas: {
        points: `N = F_\\mathrm{now} \\int_{t_1}^{t_2} \\left(\\frac{\\mathrm{XUV}(t)}{\\mathrm{XUV}(t_\\mathrm{now})}\\right)^{x} dt, \\qquad ${table}`,
      },
    },
    with: [rate, begin, entry("t_2", "end", "end"), now, ...law],
    physics: "loss/equivalentTime.ts#equivalentTime",
  },
  {
    ...loss,
    id: "lost_mass",
    name: "mass",
    words: "Mass of GAS lost in all",
    symbol: "M",
    formula: "M = N m",
    with: [particles, particleMass],
    physics: "loss/equivalentTime.ts#equivalentTime",
  },
  {
    ...loss,
    id: "water_layer",
    name: "water_layer",
    words: "Layer of water that the loss of GAS stands for",
    symbol: "L",
    formula: `L = \\frac{N w\\, m_{\\mathrm{H_2O}}}{4\\pi R^2 \\rho}, \\qquad \\rho = ${waterDensity}\\ \\mathrm{kg\\,m^{-3}}`,
    with: [particles, radius],
    physics: "loss/waterLayerFromMolecules.ts#waterLayerFromMolecules",
    conventions: ["waterPerParticle", "xuvLaw"],
    sources: ["CatlingKasting2017", "Ribas2005"],
  },
  {
    ...loss,
    id: "lost_surface_pressure",
    name: "surface_pressure",
    words: "Surface pressure that the loss of GAS stands for",
    symbol: "\\Delta p",
    formula: "\\Delta p = \\frac{N m g}{4\\pi R^2}",
    with: [particles, particleMass, result("g", "surface gravity", "surface_gravity", "body"), radius],
    physics: "loss/surfacePressureFromParticles.ts#surfacePressureFromParticles",
    sources: ["CatlingKasting2017", "Ribas2005"],
  },
  {
    id: "history_age",
    name: "history.age",
    words: "Age of the star",
    symbol: "t",
    formula: null,
    with: [begin, entry("t_2", "end", "end")],
    physics: null,
    conventions: [],
    sources: [],
    validity: null,
  },
  {
    ...loss,
    id: "history_rate",
    name: "history.rate",
    words: "Rate of GAS at that age",
    symbol: "F",
    formula: `F(t) = F_\\mathrm{now} \\left(\\frac{\\mathrm{XUV}(t)}{\\mathrm{XUV}(t_\\mathrm{now})}\\right)^{x}, \\qquad ${xuv}`,
    forms: {
      entry: "history",
      formulas: {
        points: `F(t) = F_\\mathrm{now} \\left(\\frac{\\mathrm{XUV}(t)}{\\mathrm{XUV}(t_\\mathrm{now})}\\right)^{x}, \\qquad ${table}`,
      },
    },
    with: [row("t", "age", "age"), rate, now, ...law],
    physics: "loss/relativeXuv.ts#relativeXuv",
  },
  {
    ...loss,
    id: "history_lost",
    name: "history.lost",
    words: "Particles of GAS lost up to that age",
    symbol: "N",
    formula: "N(t) = \\int_{t_1}^{t} F\\, dt",
    with: [row("t", "age", "age"), row("F", "rate at that age", "rate"), begin],
    physics: "loss/lossHistory.ts#lossHistory",
  },
];
