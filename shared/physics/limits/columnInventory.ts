import { PhysicsDomainError } from "../errors";
import { exponential, logarithm } from "../numerics/elementary";
import { addGaussLegendre } from "../numerics/gaussLegendre";
import { magnitude } from "../numerics/magnitude";
import type { Column, ColumnLevel } from "../types";

/** Pieces are so many of the shortest scale height long. */
const pieceLength = 2;
const pieceLimit = 10_000;

export interface Inventory {
  particles: number | null;
  logParticles: number;
}

/**
 * Particles of gases between two altitudes of a column, all around the body.
 *
 *   N = 4π ∫ n r² dz;  by Gauss and Legendre over pieces of two scale heights
 *
 * @param column  solved, with or without flux
 * @param gases   indices in `column.input.gases`; together they are cheaper than one by one
 * @param from    [m]  altitude inside the column
 * @param to      [m]  altitude inside the column, above `from`
 * @returns       of each N [1], null where below 1e-300, and its natural logarithm; within 1e-9 where temperature and
 *                eddy coefficient are smooth, 1e-6 across the kinks of tables
 *
 * @throws  PhysicsDomainError if an input breaks a bound above, or if a gas is not there at all
 * @source  [Hunten1973]
 */
export function columnInventory(
  column: Pick<Column, "levelAt">,
  gases: readonly number[],
  from: number,
  to: number,
): Inventory[] {
  if (!(to > from && to < Infinity)) throw new PhysicsDomainError("upper altitude", to, `above ${from} m`);
  const base = column.levelAt(from);
  const references = gases.map((gas) => logAreaDensity(base, gas));
  if (references.includes(-Infinity)) {
    throw new PhysicsDomainError("number density at the base", 0, "above zero");
  }
  const relativeDensities = (altitude: number, values: Float64Array) => {
    const level = column.levelAt(altitude);
    gases.forEach((gas, i) => {
      values[i] = exponential(logAreaDensity(level, gas) - references[i]);
    });
  };
  const sums = new Float64Array(gases.length);
  let altitude = from;
  for (let piece = 0; altitude < to; piece += 1) {
    if (piece === pieceLimit)
      throw new PhysicsDomainError("upper altitude", to, "within reach of 10,000 pieces");
    const next = Math.min(to, altitude + pieceLength * shortestScale(column.levelAt(altitude), gases));
    addGaussLegendre(relativeDensities, altitude, next, sums);
    altitude = next;
  }
  return references.map((reference, i) => {
    const logParticles = reference + logarithm(4 * Math.PI * sums[i]);
    return { particles: magnitude(logParticles), logParticles };
  });
}

function shortestScale({ scaleHeight, scaleHeights }: ColumnLevel, gases: readonly number[]): number {
  return gases.reduce((shortest, gas) => Math.min(shortest, scaleHeights[gas]), scaleHeight);
}

/** ln(n r²). */
function logAreaDensity(level: ColumnLevel, gas: number): number {
  return level.logNumberDensities[gas] + 2 * logarithm(level.radius);
}
