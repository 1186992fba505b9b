import { PhysicsDomainError } from "../errors";
import { requirePositive } from "../guards";
import { exponential, expm1, log1p, logarithm } from "../numerics/elementary";
import { gaussLegendre } from "../numerics/gaussLegendre";
import { incompleteGamma, scaledUpperGamma } from "../numerics/incompleteGamma";
import { scaledErfc } from "../numerics/scaledErfc";

/** Where formulas trade places; none is in doubt there, only slower or short of digits. */
const shortFall = 1;
const lowTurn = 1.5;
const shortSpan = 0.5;

const twoOverRootPi = 2 / Math.sqrt(Math.PI);

export interface CoronaPlace {
  exobaseEscapeParameter: number;
  exobaseRadius: number;
  radius: number;
}

/** Shares of the full Maxwellian by orbit, with what a density needs where they are too small for a number. */
export interface PartitionFunctions {
  escapeParameter: number;
  ballistic: number;
  satellite: number;
  escaping: number;
  /** ln of n/n_c for each kind of orbit: the share with the barometric e^{−(λ_c − λ)}; −Infinity where there are none. */
  logBallisticDensity: number;
  logSatelliteDensity: number;
  logEscapingDensity: number;
}

/**
 * Shares of a Maxwellian's particles above an exobase that are on ballistic, satellite and escaping orbits.
 *
 *   λ = λ_c r_c/r,   ψ = λ²/(λ + λ_c),   q = √(λ_c² − λ²)/λ_c,   P = P(3/2, ·),   Q = 1 − P
 *   ζ_bal = P(λ) − q e^{−ψ} P(λ−ψ)      ζ_sat = q e^{−ψ} P(λ−ψ)      ζ_esc = ½[Q(λ) − q e^{−ψ} Q(λ−ψ)]
 *
 * each rearranged into a sum of terms above zero, so that nothing is lost near the exobase, far out, or at any λ_c.
 *
 * @param place.exobaseEscapeParameter  λ_c  [1]  above zero; `escapeParameter` of the gas there
 * @param place.exobaseRadius           r_c  [m]  above zero; from the centre
 * @param place.radius                  r    [m]  r_c or more
 * @returns  λ and the three ζ [1], 0 where below 5e-324; ln of e^{−(λ_c − λ)} ζ. The density of each kind of orbit is
 *           n_c e^{−(λ_c − λ)} ζ, n_c that of the full Maxwellian at the exobase. Within 4e-11 relative, the worst
 *           a hair above the exobase; else 1e-13
 *
 * @assumes no collisions above the exobase and a full Maxwellian of what rises through it, the same all around;
 *          satellite orbits, which never cross it, filled as if they did
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [Chamberlain1963], [ChamberlainHunten1987]
 * @explained corona_ballistic, corona_satellite, corona_escaping
 */
export function partitionFunctions({
  exobaseEscapeParameter,
  exobaseRadius,
  radius,
}: CoronaPlace): PartitionFunctions {
  requirePositive("escape parameter at the exobase", exobaseEscapeParameter);
  requirePositive("radius of the exobase", exobaseRadius);
  if (!(radius >= exobaseRadius && radius < Infinity)) {
    throw new PhysicsDomainError("radius", radius, `finite and the exobase's ${exobaseRadius} m or more`);
  }
  const y = exobaseRadius / radius;
  const height = (radius - exobaseRadius) / radius; // 1 − y with all its digits
  const lambda = exobaseEscapeParameter * y;
  const turn = lambda / (1 + y); // λ − ψ
  const psi = turn * y;
  const q = Math.sqrt(height * (1 + y));
  const belowTurn = incompleteGamma(turn);

  const shielded = y < 0.5 ? -expm1(-psi + 0.5 * log1p(-y * y)) : 1 - q * exponential(-psi);
  const ballistic = between(turn, lambda, psi) + belowTurn * shielded;
  const satellite = q * exponential(-psi) * belowTurn;
  const escapingWithoutDecay = scaledEscaping(lambda, y, height, q);

  const logBarometric = -exobaseEscapeParameter * height;
  return {
    escapeParameter: lambda,
    ballistic,
    satellite,
    escaping: exponential(-lambda) * escapingWithoutDecay,
    logBallisticDensity: logBarometric + logarithm(ballistic),
    logSatelliteDensity: logBarometric - psi + logarithm(q * belowTurn),
    logEscapingDensity: -exobaseEscapeParameter + logarithm(escapingWithoutDecay),
  };
}

/** P(λ) − P(λ − ψ). */
function between(turn: number, lambda: number, psi: number): number {
  if (psi <= shortFall) {
    return gaussLegendre((s) => twoOverRootPi * Math.sqrt(turn + s) * exponential(-turn - s), 0, psi);
  }
  if (turn < lowTurn) return incompleteGamma(lambda) - incompleteGamma(turn);
  return exponential(-turn) * (scaledUpperGamma(turn) - exponential(-psi) * scaledUpperGamma(lambda));
}

/** e^λ ζ_esc. */
function scaledEscaping(lambda: number, y: number, height: number, q: number): number {
  const root = Math.sqrt(lambda);
  const u = Math.sqrt(height);
  const stretch = Math.sqrt(1 + y);
  const v = 1 / stretch;
  const width = (root * y) / (stretch * (1 + stretch)); // √λ − √(λ−ψ)
  if (width >= shortSpan) {
    const direct = (twoOverRootPi * root * y) / (1 + u) + scaledErfc(root) - q * scaledErfc(root * v);
    return 0.5 * direct;
  }
  const lateral = (twoOverRootPi * root * y * y) / ((1 + y) * (u + v));
  const lower = root * v;
  const span = gaussLegendre((s) => 2 * (lower + s) * scaledErfc(lower + s), 0, width);
  const rest = ((y * y) / (1 + q)) * scaledErfc(lower);
  return 0.5 * (lateral + span + rest);
}
