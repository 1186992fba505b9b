/** Rows of the handbook as cells, written as one would by hand, each number with its source as a remark. */
import {
  astronomicalUnit,
  gravitationalConstant,
  handbookGases,
  nominalSolarGravitationalParameter,
  type HandbookBody,
  type HandbookGas,
  type PhysicalConstant,
  type Provenance,
} from "../physics";
import type { Cell } from "./document";
import { shortCitation } from "./evaluation/shortCitation";
import { collisionPairs, type CollisionPair } from "./handbookPairs";
import { unitFactors } from "./unitFactors";

/** A cell without the id that it gets where it is put. */
export type HandbookCell = Pick<Cell, "kind" | "name" | "text">;

interface WrittenEntry {
  key: string;
  value: string;
  remark?: string;
}

/** `like = handbook(Mars)`: the numbers stay those of the handbook. */
export function referringBodyCell({ name }: HandbookBody): HandbookCell {
  return { kind: "body", name: name.toLowerCase(), text: `like = handbook(${name})` };
}

/** The same body with every number written out, to be changed one by one. */
export function writtenBodyCell(body: HandbookBody): HandbookCell {
  const { sources } = body;
  const solarMass = nominalSolarGravitationalParameter.value / gravitationalConstant.value;
  const entry = (
    key: string,
    value: number | undefined,
    unit: string,
    source?: Provenance,
  ): WrittenEntry[] =>
    value === undefined ? [] : [{ key, value: `${plainNumber(value)} ${unit}`, remark: remarkOf(source) }];
  const over = (value: number | undefined, unit: number) => (value === undefined ? undefined : value / unit);
  return {
    kind: "body",
    name: body.name.toLowerCase(),
    text: written([
      ...entry("gm", body.gravitationalParameter, "m^3/s^2", sources.gravitationalParameter),
      ...entry("radius", over(body.radius, 1000), "km", sources.radius),
      ...entry("rotation_period", over(body.rotationPeriod, 3600), "h", sources.rotationPeriod),
      ...entry("star_distance", over(body.starDistance, astronomicalUnit.value), "au", sources.starDistance),
      ...entry("star_mass", over(body.starMass, solarMass), "solar_mass", sources.starMass),
    ]),
  };
}

/** A gas with all that the handbook has of it, measured pairs included. */
export function gasCell(gas: HandbookGas): HandbookCell {
  const { sources } = gas;
  const diameter = plainNumber(gas.collisionDiameter * 1e10);
  const pairs = collisionPairs(handbookGases).filter(
    ({ gases, acting }) => gases.includes(gas.formula) && !acting.isEstimate,
  );
  const collisions = pairs.map(
    ({ gases: [first, second], acting }) =>
      `${first === gas.formula ? second : first}: ${binary(acting.coefficient, acting.exponent)}`,
  );
  const collision: WrittenEntry[] =
    pairs.length === 0
      ? []
      : [
          {
            key: "collision",
            value: collisions.join(",\n"),
            remark: [...new Set(pairs.map(({ acting }) => shortCitation(acting.source)))].join("; "),
          },
        ];
  return {
    kind: "gas",
    name: gas.formula,
    text: written([
      {
        key: "mass",
        value: `${plainNumber(gas.molarMassU)} u`,
        remark: [...new Set(sources.mass.map(remarkOf))].join("; "),
      },
      {
        key: "cross_section",
        value: `pi*(${diameter} angstrom)^2`,
        remark: remarkOf(sources.collisionDiameter),
      },
      {
        key: "thermal_diffusion",
        value: plainNumber(gas.thermalDiffusionFactor),
        remark: remarkOf(sources.thermalDiffusionFactor),
      },
      ...collision,
    ]),
  };
}

/** One collision parameter: it may stand in a cell of either gas. */
export function pairCells({ gases, acting }: CollisionPair): HandbookCell[] {
  const source = acting.isEstimate ? "estimated from the masses, " : "";
  return [gases, [gases[1], gases[0]] as const].map(([named, other]) => ({
    kind: "gas",
    name: named,
    text: written([
      {
        key: "collision",
        value: `${other}: ${binary(acting.coefficient, acting.exponent)}`,
        remark: `${source}${shortCitation(acting.source)}`,
      },
    ]),
  }));
}

/** A constant under its own name, with its uncertainty where it is not exact. */
export function constantCell({ name, value, unit, uncertainty, source }: PhysicalConstant): HandbookCell {
  const spread = uncertainty === 0 ? "" : ` ± ${plainNumber(uncertainty)}`;
  return {
    kind: "values",
    name: "constants",
    text: written([
      {
        key: name.replace(/ /g, "_"),
        value: `${plainNumber(value)}${spread}${writtenUnit(unit)}`,
        remark: shortCitation(source),
      },
    ]),
  };
}

/** " m^3/(kg s^2)" for m³ kg⁻¹ s⁻². */
function writtenUnit(unit: string): string {
  const factors = unitFactors(unit).flatMap((factor) =>
    // The coulomb is no unit of the cells.
    factor.symbol === "C" ? ["A", "s"].map((symbol) => ({ ...factor, symbol })) : [factor],
  );
  const words = (chosen: typeof factors) =>
    chosen.map(({ symbol, exponent }) => {
      const size = Math.abs(exponent);
      return size === 1 ? symbol : `${symbol}^${size}`;
    });
  const over = words(factors.filter(({ exponent }) => exponent > 0)).join(" ");
  const under = words(factors.filter(({ exponent }) => exponent < 0));
  const divisor = under.length > 1 ? `/(${under.join(" ")})` : under.map((word) => `/${word}`).join("");
  return ` ${over}${divisor}`;
}

const binary = (coefficient: number, exponent: number): string =>
  `binary(A = ${plainNumber(coefficient)} /(m s), s = ${exponent})`;

/** The fewest digits that give back the number, but for what a change of unit left in the last two of them. */
function plainNumber(value: number): string {
  const rounded = Number(value.toPrecision(15));
  const size = Math.abs(rounded);
  const isPlain = rounded === 0 || (size >= 1e-3 && size < 1e6);
  return isPlain ? String(rounded) : rounded.toExponential().replace("e+", "e");
}

function remarkOf(provenance: Provenance | undefined): string {
  if (!provenance) return "";
  const { source, mark, note } = provenance;
  const isOwnWord = mark === "from memory" || mark === "by analogy";
  return [shortCitation(source), ...(note ? [note] : []), ...(isOwnWord ? [mark] : [])].join(", ");
}

/** Entries with their signs of equality and their remarks in line. */
function written(entries: readonly WrittenEntry[]): string {
  const keyWidth = Math.max(...entries.map(({ key }) => key.length));
  const lines = entries.map(({ key, value, remark }) => {
    const indent = `\n${" ".repeat(keyWidth + 3)}`;
    return { text: `${key.padEnd(keyWidth)} = ${value.replace(/\n/g, indent)}`, remark };
  });
  const short = lines.filter(({ text }) => !text.includes("\n"));
  const width = Math.max(0, ...short.map(({ text }) => text.length));
  return lines.map(({ text, remark }) => (remark ? `${text.padEnd(width)}  # ${remark}` : text)).join("\n");
}
