import { electronMass, elementaryCharge } from "../../physics";
import { constant, entry, result, row, type ExplanationRecord } from "./record";

const radius = result("r_\\mathrm{c}", "radius of the exobase", "exobase.radius", "escape");
const gm = result("GM", "gravitational parameter", "gm", "body");
const speed = entry("v", "speed of the wind", "flow_speed");
const field = entry("B", "magnetic field", "magnetic_field");
const ion = entry("m", "ion, lighter than its gas by an electron", "ion");

const pickup = {
  conventions: ["singlyCharged"],
  sources: ["CatlingKasting2017"],
  validity:
    "an ion that is born at rest, with flow and field at right angles and the same all along its path.",
} as const;

const recombination = {
  conventions: ["channelsOfHandbook", "criterion", "coupling"],
  sources: ["FoxHac1997"],
  validity: "fragments that do not collide above the exobase, half of them upward; an order of magnitude.",
  notes: ["branching_unknown", "constant_to_top", "temperature_extrapolated"],
} as const;

/** Results of a nonthermal cell, and the columns of its table `channels`. */
export const nonthermalExplanations: readonly ExplanationRecord[] = [
  {
    ...recombination,
    id: "recombination_escape_rate",
    name: "ION.escape_rate",
    words: "Fragments that leave after recombination of ION",
    symbol: "F",
    formula:
      "F = 4\\pi r_\\mathrm{c}^2 \\cdot \\tfrac12 \\int_{r_\\mathrm{c}}^{\\mathrm{top}} \\alpha(T_\\mathrm{e})\\, n_\\mathrm{e} n_\\mathrm{i}\\, dr \\ \\sum_k f_k N_k",
    with: [
      radius,
      entry("n_\\mathrm{i}", "ion density", "ion_density"),
      entry("n_\\mathrm{e}", "electron density", "electron_density"),
      entry("T_\\mathrm{e}", "electron temperature", "electron_temperature"),
    ],
    physics: "nonthermal/recombinationEscape.ts#recombinationEscape",
  },
  {
    ...recombination,
    id: "channel_energy",
    name: "channels.energy",
    words: "Energy that the channel sets free",
    symbol: "E",
    formula: "E_1 = E\\, \\frac{m_2}{m_1 + m_2}",
    with: [entry("E", "channels of the ion", "ion")],
    physics: "nonthermal/fragmentEnergy.ts#fragmentEnergy",
    validity: "an ion and an electron at rest: heat is small beside the energy of the channel.",
  },
  {
    ...recombination,
    id: "channel_branching",
    name: "channels.branching",
    words: "Share of the recombinations that go by the channel",
    symbol: "f_k",
    formula: null,
    with: [entry("f_k", "channels of the ion", "ion")],
    physics: null,
    validity: "ions in the vibrational state of the measurement.",
  },
  {
    ...recombination,
    id: "channel_escapes",
    name: "channels.escapes",
    words: "Fragments of the channel that can leave",
    symbol: "N_k",
    formula: "E_1 = E\\, \\frac{m_2}{m_1 + m_2} > \\frac{GM m_1}{r_\\mathrm{c}}",
    with: [row("E", "energy of the channel", "energy"), gm, radius],
    physics: "nonthermal/escapingFragments.ts#escapingFragments",
    notes: ["escape_energy"],
  },
  {
    ...pickup,
    id: "pickup_gyroradius",
    name: "ION.gyroradius",
    words: "Gyroradius of ION in the wind",
    symbol: "r_\\mathrm{g}",
    formula: "r_\\mathrm{g} = \\frac{m v}{q B}",
    with: [ion, constant("m_\\mathrm{e}", electronMass), speed, field, constant("q", elementaryCharge)],
    physics: "nonthermal/pickupGyroradius.ts#pickupGyroradius",
  },
  {
    ...pickup,
    id: "pickup_energy",
    name: "ION.pickup_energy",
    words: "Largest energy of ION picked up by the wind",
    symbol: "E",
    formula: "E = 2 m v^2",
    with: [ion, constant("m_\\mathrm{e}", electronMass), speed],
    physics: "nonthermal/pickupEnergy.ts#pickupEnergy",
  },
];
