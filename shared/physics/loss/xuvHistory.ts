import { PhysicsDomainError } from "../errors";
import { requireAscending, requireFinite, requireNonNegative, requirePositive } from "../guards";
import { logarithm } from "../numerics/elementary";

/**
 * A star's XUV light against its age.
 *
 * `power`: t^−exponent, constant before the age of saturation (0 where there is none).
 * `table`: a power law from each age to the next, constant beyond the ends; the unit of the light does not matter.
 */
export type XuvHistory =
  | { kind: "power"; exponent: number; saturationAge: number }
  | { kind: "table"; ages: ArrayLike<number>; fluxes: ArrayLike<number> };

/** β of the Sun and its like in 1–1200 Å: [Ribas2005]. */
export const solarXuvExponent = 1.23;

/** A stretch of time in which ln XUV = logFlux − exponent ln(t/from); ages in s. */
export interface XuvPiece {
  from: number;
  to: number;
  logFlux: number;
  exponent: number;
}

/**
 * Pieces of an XUV history, each a power of the age, from age 0 on; the last has no end.
 *
 * @param history  ages [s] above zero and ascending, at least one; fluxes above zero; saturation age zero or more
 * @returns        pieces that join without a gap; ln XUV is 0 at the age of saturation (at 1 s where there is none)
 *
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [Ribas2005]
 */
export function xuvPieces(history: XuvHistory): XuvPiece[] {
  if (history.kind === "power") {
    const { exponent, saturationAge } = history;
    requireFinite("exponent of the XUV history", exponent);
    requireNonNegative("age of saturation", saturationAge);
    if (saturationAge === 0) return [{ from: 0, to: Infinity, logFlux: 0, exponent }];
    const flat = { from: 0, to: saturationAge, logFlux: 0, exponent: 0 };
    return [flat, { from: saturationAge, to: Infinity, logFlux: 0, exponent }];
  }
  return tablePieces(history.ages, history.fluxes);
}

function tablePieces(ages: ArrayLike<number>, fluxes: ArrayLike<number>): XuvPiece[] {
  const count = ages.length;
  if (count < 1) throw new PhysicsDomainError("number of rows of the XUV history", count, "one or more");
  if (fluxes.length !== count) {
    throw new PhysicsDomainError(
      "number of fluxes of the XUV history",
      fluxes.length,
      `that of ages, ${count}`,
    );
  }
  requirePositive("first age of the XUV history", ages[0]);
  requireAscending("age of the XUV history", ages);
  const logs = Array.from(fluxes, (flux) => {
    requirePositive("flux of the XUV history", flux);
    return logarithm(flux);
  });
  const pieces: XuvPiece[] = [{ from: 0, to: ages[0], logFlux: logs[0], exponent: 0 }];
  for (let i = 0; i < count - 1; i += 1) {
    const exponent = -(logs[i + 1] - logs[i]) / logarithm(ages[i + 1] / ages[i]);
    pieces.push({ from: ages[i], to: ages[i + 1], logFlux: logs[i], exponent });
  }
  pieces.push({ from: ages[count - 1], to: Infinity, logFlux: logs[count - 1], exponent: 0 });
  return pieces;
}

/** ln XUV at an age that is zero or more. */
export function logXuvAt(pieces: readonly XuvPiece[], age: number): number {
  return logXuvWithin(pieces.findLast(({ from }) => from < age) ?? pieces[0], age);
}

/** The same where the piece is known. */
export function logXuvWithin({ from, logFlux, exponent }: XuvPiece, age: number): number {
  return exponent === 0 ? logFlux : logFlux - exponent * logarithm(from === 0 ? age : age / from);
}
