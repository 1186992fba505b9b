import { PhysicsDomainError } from "../errors";
import { exponential, logarithm } from "../numerics/elementary";
import { gaussLegendre } from "../numerics/gaussLegendre";
import { magnitude } from "../numerics/magnitude";
import type { Column, ColumnLevel } from "../types";

/** Pieces are so many of the shorter scale height long. */
const pieceLength = 2;
const pieceLimit = 10_000;

/**
 * Particles of one gas between two altitudes of a column, all around the body.
 *
 *   N = 4π ∫ n r² dz;  by Gauss and Legendre over pieces of two scale heights
 *
 * @param column  solved, with or without flux
 * @param gas     index of the gas in `column.input.gases`
 * @param from    [m]  altitude inside the column
 * @param to      [m]  altitude inside the column, above `from`
 * @returns       N  [1], null where below 1e-300, and its natural logarithm; within 1e-9 where temperature and eddy
 *                coefficient are smooth, 1e-6 across the kinks of tables
 *
 * @throws  PhysicsDomainError if an input breaks a bound above, or if the gas is not there at all
 * @source  [Hunten1973]
 */
export function columnInventory(
  column: Pick<Column, "levelAt">,
  gas: number,
  from: number,
  to: number,
): { particles: number | null; logParticles: number } {
  if (!(to > from && to < Infinity)) throw new PhysicsDomainError("upper altitude", to, `above ${from} m`);
  const reference = logAreaDensity(column.levelAt(from), gas);
  if (reference === -Infinity) throw new PhysicsDomainError("number density at the base", 0, "above zero");
  let sum = 0;
  let altitude = from;
  for (let piece = 0; altitude < to; piece += 1) {
    if (piece === pieceLimit)
      throw new PhysicsDomainError("upper altitude", to, "within reach of 10,000 pieces");
    const level = column.levelAt(altitude);
    const next = Math.min(to, altitude + pieceLength * Math.min(level.scaleHeight, level.scaleHeights[gas]));
    sum += gaussLegendre(
      (z) => exponential(logAreaDensity(column.levelAt(z), gas) - reference),
      altitude,
      next,
    );
    altitude = next;
  }
  const logParticles = reference + logarithm(4 * Math.PI * sum);
  return { particles: magnitude(logParticles), logParticles };
}

/** ln(n r²). */
function logAreaDensity(level: ColumnLevel, gas: number): number {
  return level.logNumberDensities[gas] + 2 * logarithm(level.radius);
}
