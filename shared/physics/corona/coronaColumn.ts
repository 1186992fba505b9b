import { requireFinite } from "../guards";
import { exponential, logarithm } from "../numerics/elementary";
import { integrateFromZero, integrateHalfLine } from "../numerics/doubleExponential";
import { magnitude } from "../numerics/magnitude";
import { type Corona, logRelativeDensities, logSum } from "./coronaDensity";

/** A column below 1e-300 m⁻² is null; its logarithm carries it. */
export interface CoronaColumn {
  column: number | null;
  log10Column: number;
}

/**
 * Column of a corona along a straight line of sight, from end to end.
 *
 *   N = 2 ∫₀^∞ n dx,   r² = b² + x²;  satellites, whose density falls off as r^{−3/2} only, up to r = reach
 *
 * @param corona         see `coronaDensity`
 * @param tangentRadius  b  [m]    r_c or more; where the line comes nearest to the centre
 * @returns              N  [m⁻²]  with its decimal logarithm; within 1e-10 relative
 *
 * @assumes as `partitionFunctions`
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [Chamberlain1963]; [TakahasiMori1974] for the integral
 * @explained corona_limb_column
 */
export function limbColumn(corona: Corona, tangentRadius: number): CoronaColumn {
  const square = tangentRadius * tangentRadius;
  const radiusAt = (x: number) => Math.sqrt(square + x * x);
  const end = Math.sqrt(Math.max(0, (corona.reach - tangentRadius) * (corona.reach + tangentRadius)));
  return integrateAlong(corona, tangentRadius, radiusAt, end, Math.LN2, limbScale);
}

/**
 * Column of a corona straight overhead.
 *
 *   N = ∫_r^∞ n dr;  satellites up to the reach
 *
 * @param corona  see `coronaDensity`
 * @param radius  r  [m]    r_c or more
 * @returns       N  [m⁻²]  with its decimal logarithm; within 1e-10 relative
 *
 * @assumes as `partitionFunctions`
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [Chamberlain1963]; [TakahasiMori1974] for the integral
 * @explained corona_overhead_column
 */
export function overheadColumn(corona: Corona, radius: number): CoronaColumn {
  const end = Math.max(0, corona.reach - radius);
  return integrateAlong(corona, radius, (x) => radius + x, end, 0, overheadScale);
}

/** A few widths of n along the line: of a bell of width b√(2/λ), and of a fall over r/λ. */
const limbScale = (radius: number, lambda: number): number => 3 * radius * Math.sqrt(2 / (2 + lambda));
const overheadScale = (radius: number, lambda: number): number => (3 * radius) / (1 + lambda);

/** ∫ n dx along a line from its lowest place, times e^logFactor; densities relative to those there, which are largest. */
function integrateAlong(
  corona: Corona,
  lowest: number,
  radiusAt: (x: number) => number,
  satelliteEnd: number,
  logFactor: number,
  scaleOf: (radius: number, lambda: number) => number,
): CoronaColumn {
  requireFinite("logarithm of the number density at the exobase", corona.logExobaseNumberDensity);
  const { escapeParameter, ballistic, escaping } = logRelativeDensities(corona, lowest);
  const logLowest = logSum(ballistic, escaping);
  const free = integrateHalfLine(
    (x) => {
      const there = logRelativeDensities(corona, radiusAt(x));
      return exponential(there.ballistic - logLowest) + exponential(there.escaping - logLowest);
    },
    scaleOf(lowest, escapeParameter),
  );
  let log = logLowest + logarithm(free);
  if (corona.satelliteFraction > 0 && satelliteEnd > 0) {
    const bound = integrateFromZero(
      (x) => exponential(logRelativeDensities(corona, radiusAt(x)).satellite - logLowest),
      satelliteEnd,
    );
    log = logSum(log, logLowest + logarithm(bound));
  }
  const logColumn = corona.logExobaseNumberDensity + log + logFactor;
  return { column: magnitude(logColumn), log10Column: logColumn / Math.LN10 };
}
