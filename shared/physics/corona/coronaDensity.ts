import { requireFinite, requireFraction } from "../guards";
import { exponential, logarithm } from "../numerics/elementary";
import { magnitude } from "../numerics/magnitude";
import { partitionFunctions } from "./partitionFunctions";

/** One gas above its exobase. */
export interface Corona {
  exobaseRadius: number;
  exobaseEscapeParameter: number;
  /** ln(n_c/1 m⁻³) of the column at the exobase: the full Maxwellian. */
  logExobaseNumberDensity: number;
  /** Share of the satellite orbits that is filled. */
  satelliteFraction: number;
  /** Beyond this radius no satellite orbit is filled, m. */
  reach: number;
}

/** A density below 1e-300 m⁻³ is null and its logarithm carries it; one of nothing is 0, its logarithm null. */
export interface CoronaDensity {
  escapeParameter: number;
  numberDensity: number | null;
  log10NumberDensity: number;
  ballistic: number | null;
  log10Ballistic: number;
  satellite: number | null;
  log10Satellite: number | null;
  escaping: number | null;
  log10Escaping: number;
}

/**
 * Density of a gas above its exobase, by kind of orbit.
 *
 *   n = n_c e^{−(λ_c − λ)} (ζ_bal + s ζ_sat + ζ_esc),   ζ as in `partitionFunctions`;  s = 0 beyond the reach
 *
 * @param corona.exobaseRadius            r_c     [m]          above zero; from the centre
 * @param corona.exobaseEscapeParameter   λ_c     [1]          above zero
 * @param corona.logExobaseNumberDensity  ln n_c  [n in m⁻³]   finite; of the full Maxwellian, as the column has it
 * @param corona.satelliteFraction        s       [1]          0 to 1
 * @param corona.reach                            [m]          from the centre; at or below r_c there are no satellites
 * @param radius                          r       [m]          r_c or more
 * @returns                               n       [m⁻³]        in all and by kind of orbit, with decimal logarithms
 *
 * @assumes as `partitionFunctions`
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [Chamberlain1963], [ChamberlainHunten1987]
 * @explained corona_number_density
 */
export function coronaDensity(corona: Corona, radius: number): CoronaDensity {
  const { logExobaseNumberDensity } = corona;
  requireFinite("logarithm of the number density at the exobase", logExobaseNumberDensity);
  const { ballistic, satellite, escaping, escapeParameter } = logRelativeDensities(corona, radius);
  const total = logSum(logSum(ballistic, escaping), satellite);
  const hasSatellites = satellite !== -Infinity;
  const log10Of = (relative: number) => (logExobaseNumberDensity + relative) / Math.LN10;
  return {
    escapeParameter,
    numberDensity: magnitude(logExobaseNumberDensity + total),
    log10NumberDensity: log10Of(total),
    ballistic: magnitude(logExobaseNumberDensity + ballistic),
    log10Ballistic: log10Of(ballistic),
    satellite: magnitude(logExobaseNumberDensity + satellite),
    log10Satellite: hasSatellites ? log10Of(satellite) : null,
    escaping: magnitude(logExobaseNumberDensity + escaping),
    log10Escaping: log10Of(escaping),
  };
}

/** λ, and ln(n/n_c) by kind of orbit; −Infinity for satellites where there are none. */
export function logRelativeDensities(
  corona: Corona,
  radius: number,
): { escapeParameter: number; ballistic: number; satellite: number; escaping: number } {
  const { satelliteFraction, reach } = corona;
  requireFraction("share of filled satellite orbits", satelliteFraction);
  requireFinite("reach of satellite orbits", reach);
  const shares = partitionFunctions({ ...corona, radius });
  return {
    escapeParameter: shares.escapeParameter,
    ballistic: shares.logBallisticDensity,
    satellite: radius > reach ? -Infinity : shares.logSatelliteDensity + logarithm(satelliteFraction),
    escaping: shares.logEscapingDensity,
  };
}

/** ln(e^a + e^b); a finite. */
export function logSum(a: number, b: number): number {
  return a > b ? a + logarithm(1 + exponential(b - a)) : b + logarithm(1 + exponential(a - b));
}
