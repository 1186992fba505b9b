import {
  crossSectionFromDiameter,
  diameterFromCrossSection,
  findGas,
  type CollisionParameter,
  type HandbookGas,
} from "../../physics";
import type { GasModel } from "./models";
import { sayWhichCentresAct, type OpenCell } from "./openCell";
import { knownGases, readEntry, readQuantityEntry } from "./readEntries";
import { inWords } from "../language/notes";
import { readCollision } from "../language/readCollision";
import type { CellAnswer } from "./cellAnswer";

/** Element symbols with counts: "CO2", "C2H6". */
const formulaPattern = /^(?:[A-Z][a-z]?[0-9]*)+$/;

export function evaluateGas(cell: OpenCell): CellAnswer {
  const formula = cell.name;
  const isNamed = checkFormula(cell);
  const handbook = findGas(formula);
  if (isNamed && !handbook) requireOwnData(cell);

  const mass = readQuantityEntry(cell, "mass");
  const crossSection = readQuantityEntry(cell, "cross_section");
  const thermalDiffusion = readQuantityEntry(cell, "thermal_diffusion");
  const collisions = readCollisions(cell);
  sayWhichCentresAct(cell);
  if (!isNamed) return {};

  const model: GasModel = {
    kind: "gas",
    formula,
    mass: mass ?? null,
    collisionDiameter: crossSection === undefined ? null : diameterFromCrossSection(crossSection),
    thermalDiffusionFactor: thermalDiffusion ?? null,
    collisions,
  };
  sayWhatHandbookGives(cell, handbook);
  return { model, gases: [formula] };
}

function sayWhatHandbookGives(cell: OpenCell, handbook: HandbookGas | undefined): void {
  const inHandbook = (key: string, text: string) => {
    if (!cell.entry(key)) cell.actByDefault(key, { text: `${key} = ${text}`, note: "handbook" });
  };
  if (!handbook) {
    if (!cell.entry("thermal_diffusion"))
      cell.actByDefault("thermal_diffusion", { text: "thermal_diffusion = 0" });
    return;
  }
  const crossSection = crossSectionFromDiameter(handbook.collisionDiameter) * 1e4;
  inHandbook("mass", `${handbook.molarMassU} u`);
  inHandbook("cross_section", `${crossSection.toExponential(3)} cm^2`);
  inHandbook("thermal_diffusion", String(handbook.thermalDiffusionFactor));
}

function checkFormula(cell: OpenCell): boolean {
  if (!formulaPattern.test(cell.name)) {
    const named = cell.name === "" ? "has no name" : `can't be called *${cell.name}*`;
    cell.say("fault", "bad_name", `A gas cell is named by its formula, such as CO2; this one ${named}.`);
    return false;
  }
  const earlier = cell.surroundings.definedAbove(cell.name);
  if (earlier === null) return true;
  cell.say(
    "fault",
    "name_twice",
    `*${cell.name}* is already the name of ${earlier} above; keep one of the two.`,
  );
  return false;
}

function requireOwnData(cell: OpenCell): void {
  const missing = ["mass", "cross_section"].filter((key) => !cell.entry(key)).map((key) => `*${key}*`);
  if (missing.length === 0) return;
  const message = `The handbook does not know *${cell.name}*, so ${inWords(missing, "and")} must be given.`;
  cell.say("fault", "missing_key", message);
}

function readCollisions(cell: OpenCell): Record<string, CollisionParameter> {
  const pairs = readEntry(cell, "collision", (node) =>
    readCollision(node, knownGases(cell), cell.surroundings),
  );
  const collisions: Record<string, CollisionParameter> = {};
  for (const { formula, value, range } of pairs ?? []) {
    if (formula === cell.name) {
      cell.say("fault", "collision_with_itself", "A collision parameter is of two different gases.", range);
      continue;
    }
    collisions[formula] = { ...value, source: "given", isEstimate: false };
  }
  return collisions;
}
