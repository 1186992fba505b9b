import { gasCell } from "../../../../shared/notebook/handbookCells";
import {
  atomicMass,
  crossSectionFromDiameter,
  handbookGases,
  type HandbookGas,
} from "../../../../shared/physics";
import { formatGas } from "../../../lib/format";
import type { HandbookSection, Standing, TableColumn, TableRow } from "../handbookTable";

const columns: readonly TableColumn[] = [
  { key: "name", head: ["Name"], unit: "", digits: 1 },
  {
    key: "mass",
    head: ["Mass ", { italic: "m" }],
    unit: "kg",
    scale: { per: atomicMass.value, unit: "u" },
    digits: 9,
  },
  {
    key: "diameter",
    head: ["Diameter ", { italic: "d" }],
    unit: "m",
    scale: { shift: 10, unit: "Å" },
    digits: 6,
    leastDigits: 4,
  },
  {
    key: "cross_section",
    head: ["Cross-section ", { italic: "σ" }, " = π", { italic: "d" }, { sup: "2" }],
    unit: "m^2",
    scale: { SI: { shift: 19, unit: "10^-19 m^2" }, cgs: { shift: 19, unit: "10^-15 cm^2" } },
    digits: 3,
    leastDigits: 3,
  },
  { key: "thermal_diffusion", head: [{ italic: "α" }], unit: "1", digits: 3 },
];

/** By analogy is what no measurement of the gas itself stands behind. */
function standingOf({ sources }: HandbookGas): Standing {
  const borrowed = [
    ...(sources.collisionDiameter.mark === "by analogy" ? ["d"] : []),
    ...(sources.thermalDiffusionFactor.mark === "by analogy" ? ["α"] : []),
  ];
  return borrowed.length === 0
    ? { shape: "filled", word: "published" }
    : { shape: "hollow", word: `${borrowed.join(" and ")} by analogy` };
}

function gasRow(gas: HandbookGas): TableRow {
  const { sources } = gas;
  return {
    key: gas.formula,
    name: gas.formula,
    head: formatGas(gas.formula),
    gas: gas.formula,
    words: gas.name,
    values: {
      name: { value: gas.name },
      mass: { value: gas.mass, sources: sources.mass },
      diameter: { value: gas.collisionDiameter, sources: [sources.collisionDiameter] },
      cross_section: { value: crossSectionFromDiameter(gas.collisionDiameter) },
      thermal_diffusion: { value: gas.thermalDiffusionFactor, sources: [sources.thermalDiffusionFactor] },
    },
    standing: standingOf(gas),
    forms: [{ label: "as a gas cell", choices: [gasCell(gas)] }],
  };
}

export const gasesSection: HandbookSection = {
  id: "gases",
  title: "Gases",
  about: [
    "Mass, collision diameter and thermal diffusion factor, the last meant for a background of N",
    { sub: "2" },
    " or heavier gas. A filled circle is published for the gas itself, a hollow one was put in by analogy with another. A ",
    { code: "gas" },
    " cell overrides what stands here, and the columns below it say so.",
  ],
  tables: [{ id: "gases", caption: "Gases", rowHead: "Gas", columns, rows: handbookGases.map(gasRow) }],
};
