import { PhysicsDomainError } from "../errors";
import { requireFraction } from "../guards";
import { findGas } from "../handbook/handbookGases";
import type { RecombiningIon } from "../handbook/recombination";
import { escapeEnergy } from "./escapeEnergy";
import { fragmentEnergy } from "./fragmentEnergy";

export interface Fragment {
  formula: string;
  state: string;
  /** J */
  energy: number;
  /** Energy to leave from the exobase, J. */
  escapeEnergy: number;
  escapes: boolean;
}

export interface ChannelAnswer {
  fragments: readonly [Fragment, Fragment];
  /** What the two share, J. */
  energy: number;
  branching: number | null;
  /** Fragments of the two that can leave: 0, 1 or 2. */
  escaping: number;
}

export interface FragmentYield {
  channels: ChannelAnswer[];
  /** Fragments that can leave, per recombination, by formula and in all; null where a branching is not known. */
  perRecombination: Record<string, number> | null;
  total: number | null;
}

/**
 * Fragments of a recombination that are fast enough to leave from the exobase.
 *
 *   E₁ = E m₂/(m₁ + m₂) > G M m₁/r_c;   per recombination Σ branching × (fragments above the escape energy)
 *
 * @param place.ion                     see `recombiningIons`
 * @param place.gravitationalParameter  GM   [m³ s⁻²]  above zero
 * @param place.exobaseRadius           r_c  [m]       above zero
 * @param place.branchings              [1]  one for each channel, 0 to 1, adding up to no more than 1; where left
 *                                      out, those of the handbook
 * @returns  each channel with its fragments; how many leave per recombination
 *
 * @assumes ions in their lowest vibrational state and nearly at rest; a fragment that is fast enough does leave, once
 *          it flies up
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [FoxHac1997]; each channel's own, in `recombiningIons`
 * @explained channel_escapes
 */
export function escapingFragments({
  ion,
  gravitationalParameter,
  exobaseRadius,
  branchings,
}: {
  ion: RecombiningIon;
  gravitationalParameter: number;
  exobaseRadius: number;
  branchings?: readonly number[];
}): FragmentYield {
  if (branchings) requireBranchings(ion, branchings);
  const channels = ion.channels.map((channel, index): ChannelAnswer => {
    const [first, second] = channel.products.map((formula) => ({ formula, mass: massOf(formula) }));
    const fragment = (own: typeof first, other: typeof first, state: string): Fragment => {
      const energy = fragmentEnergy({ energy: channel.energy, mass: own.mass, otherMass: other.mass });
      const needed = escapeEnergy({ gravitationalParameter, radius: exobaseRadius, particleMass: own.mass });
      return { formula: own.formula, state, energy, escapeEnergy: needed, escapes: energy > needed };
    };
    const fragments = [
      fragment(first, second, channel.states[0]),
      fragment(second, first, channel.states[1]),
    ] as const;
    return {
      fragments,
      energy: channel.energy,
      branching: branchings ? branchings[index] : channel.branching,
      escaping: fragments.filter(({ escapes }) => escapes).length,
    };
  });
  return { channels, ...yieldOf(channels) };
}

function yieldOf(channels: readonly ChannelAnswer[]): Pick<FragmentYield, "perRecombination" | "total"> {
  const perRecombination: Record<string, number> = {};
  let total = 0;
  for (const { fragments, branching } of channels) {
    if (branching === null) return { perRecombination: null, total: null };
    for (const { formula, escapes } of fragments) {
      perRecombination[formula] = (perRecombination[formula] ?? 0) + (escapes ? branching : 0);
      total += escapes ? branching : 0;
    }
  }
  return { perRecombination, total };
}

function requireBranchings(ion: RecombiningIon, branchings: readonly number[]): void {
  const needed = ion.channels.length;
  if (branchings.length !== needed) {
    throw new PhysicsDomainError(
      "number of branchings",
      branchings.length,
      `that of the channels, ${needed}`,
    );
  }
  for (const branching of branchings) requireFraction("branching of a channel", branching);
  const sum = branchings.reduce((all, branching) => all + branching, 0);
  if (sum > 1 + 1e-9) throw new PhysicsDomainError("sum of the branchings", sum, "no more than 1");
}

function massOf(formula: string): number {
  const gas = findGas(formula);
  if (!gas) throw new PhysicsDomainError(`mass of ${formula}`, NaN, "in the handbook");
  return gas.mass;
}
