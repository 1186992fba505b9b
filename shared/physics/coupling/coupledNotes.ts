import type { CoupledGas, PhysicsNote } from "../types";

/** Share above which a gas is said to leave as fast as it is supplied. */
export const supplyLimitedShare = 0.9;

/** What the reader of a coupled escape has to know beside its numbers. */
export function coupledNotes(
  gases: readonly CoupledGas[],
  exobaseAltitude: number,
  topAltitude: number,
): PhysicsNote[] {
  const notes = gases
    .filter(({ supplyShare }) => supplyShare > supplyLimitedShare)
    .map(({ formula, supplyShare }) => supplyLimited(formula, supplyShare));
  return exobaseAltitude > topAltitude ? [exobaseAboveTop(exobaseAltitude, topAltitude), ...notes] : notes;
}

function supplyLimited(formula: string, share: number): PhysicsNote {
  return {
    level: "remark",
    code: "supply_limited",
    message:
      `${formula} leaves as fast as it is supplied: its escape keeps ${percent(share)} of what would be at the exobase ` +
      "without it away from there. Its rate is set by diffusion and mixing below, hardly by the Jeans flux.",
  };
}

/** Per cent with as many nines as tell it from all. */
function percent(share: number): string {
  const left = 100 * (1 - share);
  const digits = left >= 1 ? 0 : left >= 0.1 ? 1 : left >= 0.01 ? 2 : 3;
  return left < 0.001 ? "over 99.999 %" : `${(100 - left).toFixed(digits)} %`;
}

function exobaseAboveTop(exobaseAltitude: number, topAltitude: number): PhysicsNote {
  return {
    level: "caution",
    code: "exobase_above_top",
    message:
      `The exobase lies at ${(exobaseAltitude / 1000).toFixed(1)} km, above the top of the column at ` +
      `${(topAltitude / 1000).toFixed(1)} km: levels and figures do not reach it. Raise the top, or leave it out.`,
  };
}
