import { describe, expect, it } from "vitest";

import { elementaryCharge } from "../../../../shared/physics/constants/codata2022";
import { findGas } from "../../../../shared/physics/handbook/handbookGases";
import { findRecombiningIon, recombiningIons } from "../../../../shared/physics/handbook/recombination";
import { references } from "../../../../shared/physics/references";
import "../../../toBeCloseToRelative";

describe("recombiningIons", () => {
  it("are those of upper atmospheres of N2, O2 and CO2", () => {
    expect(recombiningIons.map(({ formula }) => formula)).toEqual(["O2+", "CO+", "N2+", "NO+", "CO2+"]);
  });

  it.each([
    // eV that the fragments share. O2+: Fox and Hać (1997), secondary. CO+: Rosén et al. (1998), from memory save the
    // first. N2+: Peterson et al. (1998), 2.25 from memory. NO+: from memory. CO2+: Rosati et al. (2003), secondary.
    ["O2+", [6.99, 5.02, 3.06, 0.84]],
    ["CO+", [2.9, 1.64, 0.94]],
    ["N2+", [5.82, 3.44, 2.25, 1.04]],
    ["NO+", [2.75, 0.38]],
    ["CO2+", [8.31, 2.3, 1.26, 0.49]],
  ])("give the channels of %s their energies", (formula, energiesEv) => {
    const channels = findRecombiningIon(formula)!.channels;
    expect(channels).toHaveLength(energiesEv.length);
    channels.forEach(({ energy }, i) => {
      expect(energy / elementaryCharge.value).toBeCloseToRelative(energiesEv[i], 1e-14);
    });
  });

  it("put the channels of O2+ apart by what the excited atoms keep", () => {
    // O(¹D) lies 1.97 eV and O(¹S) 4.19 eV above O(³P): energy levels of the atom, from memory.
    const [ground, one, two, high] = findRecombiningIon("O2+")!.channels.map(
      ({ energy }) => energy / elementaryCharge.value,
    );
    expect(ground - one).toBeCloseTo(1.97, 1);
    expect(one - two).toBeCloseTo(1.97, 1);
    expect(ground - high).toBeCloseTo(1.97 + 4.19, 1);
  });

  it("put the channels of N2+ apart by 2.38 and 3.58 eV, and of NO+ by 2.38 eV", () => {
    // N(²D) and N(²P) above N(⁴S): energy levels of the atom, from memory.
    const n2 = findRecombiningIon("N2+")!.channels.map(({ energy }) => energy / elementaryCharge.value);
    expect(n2[0] - n2[1]).toBeCloseTo(2.38, 1);
    expect(n2[0] - n2[2]).toBeCloseTo(3.58, 1);
    expect(n2[0] - n2[3]).toBeCloseTo(2 * 2.38, 1);
    const no = findRecombiningIon("NO+")!.channels.map(({ energy }) => energy / elementaryCharge.value);
    expect(no[0] - no[1]).toBeCloseTo(2.38, 1);
  });

  it("share every recombination out", () => {
    for (const { formula, channels, otherBranchings } of recombiningIons) {
      if (formula === "CO2+") {
        expect(channels.every(({ branching }) => branching === null)).toBe(true);
        continue;
      }
      const sets = [
        channels.map(({ branching }) => branching ?? NaN),
        ...otherBranchings.map((o) => o.branchings),
      ];
      for (const set of sets) {
        expect(set).toHaveLength(channels.length);
        expect(set.reduce((sum, share) => sum + share, 0)).toBeCloseToRelative(1, 1e-12);
      }
    }
  });

  it("give O2+ a mean energy of 4.64 eV by Kella's branchings and 4.90 eV by Petrignani's", () => {
    // Computed independently.
    const { channels, otherBranchings } = findRecombiningIon("O2+")!;
    const mean = (shares: readonly (number | null)[]) =>
      channels.reduce(
        (sum, { energy }, i) => sum + (energy / elementaryCharge.value) * (shares[i] ?? NaN),
        0,
      );
    expect(mean(channels.map(({ branching }) => branching))).toBeCloseToRelative(4.637, 2e-3);
    expect(mean(otherBranchings[0].branchings)).toBeCloseToRelative(4.9, 2e-3);
  });

  it("keep every atom of the ion in the products, and know each of them", () => {
    const atomsOf = (formula: string) =>
      [...formula.matchAll(/([A-Z][a-z]?)(\d*)/g)].flatMap(([, atom, n]) =>
        Array<string>(Number(n || 1)).fill(atom),
      );
    for (const { formula, channels } of recombiningIons) {
      for (const { products } of channels) {
        expect(products.flatMap(atomsOf).sort(), formula).toEqual(atomsOf(formula).sort());
        for (const product of products) expect(findGas(product), product).toBeDefined();
      }
    }
  });

  it("say where each number comes from", () => {
    for (const { rate, channels, otherBranchings } of recombiningIons) {
      const provenances = [
        rate.provenance,
        ...channels.flatMap(({ provenance }) => [provenance.energy, provenance.branching]),
        ...otherBranchings.map(({ provenance }) => provenance),
      ];
      for (const provenance of provenances) {
        if (provenance) expect(references).toHaveProperty([provenance.source]);
      }
    }
  });

  it("answer undefined for what they do not hold", () => {
    expect(findRecombiningIon("O2")).toBeUndefined();
    expect(findRecombiningIon("constructor")).toBeUndefined();
  });
});
