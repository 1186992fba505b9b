import { PhysicsDomainError } from "../errors";
import { requirePositive } from "../guards";
import type { RecombiningIon } from "../handbook/recombination";
import { exponential, logarithm } from "../numerics/elementary";
import { freeEndedCubic } from "../numerics/freeEndedCubic";
import { gaussLegendre } from "../numerics/gaussLegendre";
import { cubicValue } from "../numerics/monotoneCubic";
import type { PhysicsNote } from "../types";
import { escapingFragments, type FragmentYield } from "./escapingFragments";
import { recombinationCoefficient } from "./recombinationCoefficient";

/** Sampled profiles, each on radii of its own [m], ascending. */
export interface Ionosphere {
  ions: { radii: ArrayLike<number>; numberDensities: ArrayLike<number> };
  electrons: {
    radii: ArrayLike<number>;
    numberDensities: ArrayLike<number>;
    temperatures: ArrayLike<number>;
    /** Radii of the temperatures where they are sampled elsewhere than the densities; constant beyond their ends. */
    temperatureRadii?: ArrayLike<number>;
  };
}

export interface RecombinationEscape extends FragmentYield {
  /** ∫ α n_e n_i dr above the exobase, m⁻² s⁻¹. */
  columnRate: number;
  /** Fragments that leave, s⁻¹, in all and by formula; null where a branching is not known. */
  rate: number | null;
  rates: Record<string, number> | null;
  /** Where the integral begins and ends, m. */
  from: number;
  to: number;
  notes: PhysicsNote[];
}

/** Between two sampled radii the integral is taken in so many pieces. */
const pieces = 4;

/**
 * Rate at which recombination of an ion above the exobase sends off fast fragments, half of them upward.
 *
 *   F = 4πr_c² ½ ∫_{r_c}^{top} α(T_e) n_e n_i dr × Σ branching × (fragments above the escape energy)
 *
 * Densities are interpolated by a monotone cubic in their logarithm, temperatures by one as they are; the top is where
 * the first of the density profiles ends.
 *
 * @param source.ion                      see `recombiningIons`
 * @param source.gravitationalParameter   GM   [m³ s⁻²]  above zero
 * @param source.exobaseRadius            r_c  [m]       above zero
 * @param source.ionosphere               n_i, n_e [m⁻³] above zero, T_e [K] above zero, each on ascending radii [m] that
 *                                        reach beyond r_c
 * @param source.branchings               see `escapingFragments`
 * @returns  channels and fragments; the column rate; F [s⁻¹]; a caution where profiles begin above r_c
 *
 * @assumes as `escapingFragments`; nothing is stopped above the exobase, nothing from below it comes through, and the
 *          profiles hold all around the body
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [FoxHac1997]; each ion's own, in `recombiningIons`
 * @explained recombination_escape_rate
 */
export function recombinationEscape({
  ion,
  gravitationalParameter,
  exobaseRadius,
  ionosphere,
  branchings,
}: {
  ion: RecombiningIon;
  gravitationalParameter: number;
  exobaseRadius: number;
  ionosphere: Ionosphere;
  branchings?: readonly number[];
}): RecombinationEscape {
  const fragments = escapingFragments({ ion, gravitationalParameter, exobaseRadius, branchings });
  const { ions, electrons } = ionosphere;
  const ionCurve = logCurve("ion density", ions.radii, ions.numberDensities);
  const electronCurve = logCurve("electron density", electrons.radii, electrons.numberDensities);
  for (let i = 0; i < electrons.temperatures.length; i += 1) {
    requirePositive("electron temperature", electrons.temperatures[i]);
  }
  const temperatureRadii = electrons.temperatureRadii ?? electrons.radii;
  const temperatureCurve = freeEndedCubic(temperatureRadii, electrons.temperatures);

  const lowest = Math.max(ions.radii[0], electrons.radii[0]);
  const from = Math.max(exobaseRadius, lowest);
  const to = Math.min(ions.radii[ions.radii.length - 1], electrons.radii[electrons.radii.length - 1]);
  if (!(to > from))
    throw new PhysicsDomainError("top of the ion and electron profiles", to, `above ${from} m`);
  const integrand = (radius: number): number => {
    const logPairs = cubicValue(ionCurve, radius) + cubicValue(electronCurve, radius);
    return recombinationCoefficient(ion, cubicValue(temperatureCurve, radius)) * exponential(logPairs);
  };
  const knots = knotsBetween(from, to, [ions.radii, electrons.radii, temperatureRadii]);
  let columnRate = 0;
  for (let i = 1; i < knots.length; i += 1) {
    const width = (knots[i] - knots[i - 1]) / pieces;
    for (let k = 0; k < pieces; k += 1) {
      const start = knots[i - 1] + k * width;
      columnRate += gaussLegendre(integrand, start, start + width);
    }
  }
  const upward = 2 * Math.PI * exobaseRadius * exobaseRadius * columnRate;
  const { perRecombination, total } = fragments;
  return {
    ...fragments,
    columnRate,
    rate: total === null ? null : upward * total,
    rates: perRecombination && scaled(perRecombination, upward),
    from,
    to,
    notes: notesOf(ion, from - exobaseRadius, total === null),
  };
}

function logCurve(quantity: string, radii: ArrayLike<number>, densities: ArrayLike<number>) {
  const logs = Float64Array.from(densities, (density) => {
    requirePositive(quantity, density);
    return logarithm(density);
  });
  return freeEndedCubic(radii, logs);
}

/** The ends and every sampled radius between them, ascending. */
function knotsBetween(from: number, to: number, samples: readonly ArrayLike<number>[]): number[] {
  const inner = samples
    .flatMap((radii) => Array.from(radii))
    .filter((radius) => radius > from && radius < to);
  return [...new Set([from, ...inner, to])].sort((a, b) => a - b);
}

function scaled(perRecombination: Record<string, number>, factor: number): Record<string, number> {
  return Object.fromEntries(
    Object.entries(perRecombination).map(([formula, share]) => [formula, share * factor]),
  );
}

function notesOf(ion: RecombiningIon, missing: number, isUnknown: boolean): PhysicsNote[] {
  const notes: PhysicsNote[] = [];
  if (missing > 0) {
    const message = `The ion and electron profiles begin ${(missing / 1000).toFixed(1)} km above the exobase; what recombines below is left out. Let them begin at the exobase.`;
    notes.push({ level: "caution", code: "profile_begins_above_exobase", message });
  }
  if (isUnknown) {
    const message = `The handbook has no branching for the channels of ${ion.formula}, so there is no rate of escape, only the energies. Give the branching of each channel to have one.`;
    notes.push({ level: "caution", code: "branching_unknown", message });
  }
  return notes;
}
