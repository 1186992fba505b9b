/** The gases of a column with everything that the handbook and gas cells know of them. */
import {
  collisionParameter,
  findGas,
  type CollisionParameter,
  type ColumnGas,
  type HandbookGas,
} from "../../physics";
import { inWords } from "../language/notes";
import type { Entry } from "../language/syntax";
import type { TextRange } from "../result";
import type { GasModel } from "./models";
import type { OpenCell } from "./openCell";
import { shortCitation } from "./shortCitation";

/** A gas of the list, with its mole fraction at the base. */
export interface ListedGas {
  formula: string;
  moleFraction: number;
  range: TextRange;
}

/** At or above this mole fraction a gas takes part in what the mixture does as a whole. */
const mainGas = 0.1;

interface KnownGas {
  gas: ColumnGas;
  handbook: HandbookGas | undefined;
  own: GasModel | null;
}

/** Masses and diameters; undefined if the data of a gas are missing, which is said on its name. */
export function describeGases(cell: OpenCell, listed: readonly ListedGas[]): KnownGas[] | undefined {
  const known = listed.map(({ formula, moleFraction, range }): KnownGas | undefined => {
    const handbook = findGas(formula);
    const own = cell.surroundings.gas(formula);
    const mass = own?.mass ?? handbook?.mass;
    const collisionDiameter = own?.collisionDiameter ?? handbook?.collisionDiameter;
    if (mass === undefined || collisionDiameter === undefined) {
      const message = own
        ? `The gas cell *${formula}* must give mass and cross_section, since the handbook does not know this gas.`
        : `The handbook does not know the gas *${formula}*. Write a gas cell *${formula}* above, with mass and cross_section.`;
      cell.say("fault", "unknown_gas", message, range);
      return undefined;
    }
    const thermalDiffusionFactor = own?.thermalDiffusionFactor ?? handbook?.thermalDiffusionFactor ?? 0;
    return { gas: { formula, mass, collisionDiameter, thermalDiffusionFactor, moleFraction }, handbook, own };
  });
  return known.every((gas) => gas !== undefined) ? known : undefined;
}

/** b of every pair: what a gas cell says, else the handbook. */
export function collisionTable(known: readonly KnownGas[]): CollisionParameter[][] {
  return known.map((one) =>
    known.map(
      (other) =>
        one.own?.collisions[other.gas.formula] ??
        other.own?.collisions[one.gas.formula] ??
        collisionParameter(one.gas, other.gas),
    ),
  );
}

/**
 * Says where masses, diameters and collision parameters come from, and which are estimates.
 *
 * @param table null where collision parameters do not act: without mixing and flux each gas stands on its own
 */
export function sayWhereGasesComeFrom(
  cell: OpenCell,
  entry: Entry,
  known: readonly KnownGas[],
  table: readonly (readonly CollisionParameter[])[] | null,
): void {
  for (const { gas, own } of known) if (own) sayWhatGasCellGives(cell, entry, gas.formula, own);

  const sources = new Set<string>();
  const fromHandbook = known.filter(({ handbook, own }) => handbook && !(own?.mass && own.collisionDiameter));
  for (const { handbook } of fromHandbook) {
    for (const { source } of [...handbook!.sources.mass, handbook!.sources.collisionDiameter])
      sources.add(source);
  }
  if (fromHandbook.length > 0) {
    const formulas = inWords(
      fromHandbook.map(({ gas }) => gas.formula),
      "and",
    );
    cell.say(
      "remark",
      "handbook_gases",
      `Masses and collision diameters of ${formulas} are those of the handbook: ${citations(sources)}.`,
      entry,
    );
  }
  if (table) sayWherePairsComeFrom(cell, entry, known, table);
  sayIfThermalDiffusionIsBorrowed(cell, entry, known);
}

function sayWhatGasCellGives(cell: OpenCell, entry: Entry, formula: string, own: GasModel): void {
  const given = [
    own.mass === null ? "" : "mass",
    own.collisionDiameter === null ? "" : "cross section",
    own.thermalDiffusionFactor === null ? "" : "thermal diffusion factor",
    Object.keys(own.collisions).length === 0 ? "" : "collision parameters",
  ].filter((word) => word !== "");
  if (given.length === 0) return;
  cell.say(
    "remark",
    "gas_cell_acts",
    `${formula}: ${inWords(given, "and")} from the gas cell *${formula}*.`,
    entry,
  );
}

function sayWherePairsComeFrom(
  cell: OpenCell,
  entry: Entry,
  known: readonly KnownGas[],
  table: readonly (readonly CollisionParameter[])[],
): void {
  const measured = new Set<string>();
  const estimated: { pair: string; isMain: boolean }[] = [];
  for (let i = 0; i < known.length; i += 1) {
    for (let j = 0; j < i; j += 1) {
      const { source, isEstimate } = table[i][j];
      const [light, heavy] = [known[i].gas, known[j].gas].sort((a, b) => a.moleFraction - b.moleFraction);
      if (isEstimate) {
        estimated.push({
          pair: `${light.formula} in ${heavy.formula}`,
          isMain: heavy.moleFraction >= mainGas,
        });
      } else if (source !== "given") measured.add(source);
    }
  }
  if (measured.size > 0) {
    cell.say(
      "remark",
      "handbook_collisions",
      `Measured collision parameters are those of the handbook: ${citations(measured)}.`,
      entry,
    );
  }
  const say = (level: "caution" | "remark", pairs: string[]) => {
    if (pairs.length === 0) return;
    cell.say(
      level,
      "estimated_collisions",
      `No measured collision parameter for ${inWords(pairs, "and")}; estimated from the masses (Banks and Kockarts 1973). A gas cell with *collision* can give a better one.`,
      entry,
    );
  };
  const pairsWhere = (isMain: boolean) =>
    estimated.filter((pair) => pair.isMain === isMain).map(({ pair }) => pair);
  say("caution", pairsWhere(true));
  say("remark", pairsWhere(false));
}

function sayIfThermalDiffusionIsBorrowed(cell: OpenCell, entry: Entry, known: readonly KnownGas[]): void {
  const [main] = [...known].sort((a, b) => b.gas.moleFraction - a.gas.moleFraction);
  const borrowed = known.filter(
    ({ own, handbook, gas }) =>
      (own?.thermalDiffusionFactor ?? null) === null && handbook && gas.thermalDiffusionFactor !== 0,
  );
  const nitrogen = findGas("N2")!.mass;
  if (borrowed.length === 0 || known.length === 1 || main.gas.mass >= 0.99 * nitrogen) return;
  const formulas = inWords(
    borrowed.map(({ gas }) => gas.formula),
    "and",
  );
  cell.say(
    "remark",
    "thermal_diffusion_borrowed",
    `Thermal diffusion factors of ${formulas} are those of light gases in air (1976 standard); the main gas here, ${main.gas.formula}, is lighter than N2, for which they are not meant.`,
    entry,
  );
}

function citations(keys: Iterable<string>): string {
  return [...keys].map(shortCitation).join("; ");
}
