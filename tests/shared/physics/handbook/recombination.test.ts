import { describe, expect, it } from "vitest";

import { elementaryCharge } from "../../../../shared/physics/constants/codata2022";
import { findGas } from "../../../../shared/physics/handbook/handbookGases";
import { findRecombiningIon, recombiningIons } from "../../../../shared/physics/handbook/recombination";
import { references } from "../../../../shared/physics/references";
import "../../../toAgreeWith";
import "../../../toBeCloseToRelative";

describe("recombiningIons", () => {
  it("are those of upper atmospheres of N2, O2 and CO2", () => {
    expect(recombiningIons.map(({ formula }) => formula)).toEqual(["O2+", "CO+", "N2+", "NO+", "CO2+"]);
  });

  it.each([
    // eV that the fragments share. The first of CO+ was read; 2.25 of N2+ is from memory, and the others read.
    ["O2+", [6.99, 5.02, 3.06, 0.84], "FoxHac1997", "secondary"],
    ["CO+", [2.9, 1.64, 0.94], "Rosen1998", "from memory"],
    ["N2+", [5.82, 3.44, 2.25, 1.04], "Peterson1998", "published"],
    ["NO+", [2.75, 0.38], "VejbyChristensen1998", "from memory"],
    ["CO2+", [8.31, 2.3, 1.26, 0.49], "Rosati2003", "secondary"],
  ] as const)("give the channels of %s their energies", (formula, energiesEv, source, mark) => {
    const channels = findRecombiningIon(formula)!.channels;
    expect(channels).toHaveLength(energiesEv.length);
    channels.forEach(({ energy }, i) => {
      expect(energy / elementaryCharge.value).toAgreeWith({
        what: `energies of the recombination channels of ${formula}`,
        unit: "eV",
        published: energiesEv[i],
        within: { relative: 1e-14 },
        source,
        mark,
      });
    });
  });

  it("put the channels of O2+ apart by what the excited atoms keep", () => {
    // O(¹D) lies 1.97 eV and O(¹S) 4.19 eV above O(³P).
    const [ground, one, two, high] = findRecombiningIon("O2+")!.channels.map(
      ({ energy }) => energy / elementaryCharge.value,
    );
    const levels = {
      unit: "eV",
      within: { absolute: 0.05 },
      source: "EnergyLevels",
      mark: "from memory",
    } as const;
    const what = "steps between the channels of O2+, O(¹D) and O(¹S) over O(³P)";
    expect(ground - one).toAgreeWith({ ...levels, what, published: 1.97 });
    expect(one - two).toAgreeWith({ ...levels, what, published: 1.97 });
    expect(ground - high).toAgreeWith({ ...levels, what, published: 1.97 + 4.19 });
  });

  it("put the channels of N2+ apart by 2.38 and 3.58 eV, and of NO+ by 2.38 eV", () => {
    // N(²D) and N(²P) above N(⁴S).
    const levels = {
      unit: "eV",
      within: { absolute: 0.05 },
      source: "EnergyLevels",
      mark: "from memory",
    } as const;
    const what = "steps between the channels of N2+ and NO+, N(²D) and N(²P) over N(⁴S)";
    const n2 = findRecombiningIon("N2+")!.channels.map(({ energy }) => energy / elementaryCharge.value);
    expect(n2[0] - n2[1]).toAgreeWith({ ...levels, what, published: 2.38 });
    expect(n2[0] - n2[2]).toAgreeWith({ ...levels, what, published: 3.58 });
    expect(n2[0] - n2[3]).toAgreeWith({ ...levels, what, published: 2 * 2.38 });
    const no = findRecombiningIon("NO+")!.channels.map(({ energy }) => energy / elementaryCharge.value);
    expect(no[0] - no[1]).toAgreeWith({ ...levels, what, published: 2.38 });
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
    const { channels, otherBranchings } = findRecombiningIon("O2+")!;
    const mean = (shares: readonly (number | null)[]) =>
      channels.reduce(
        (sum, { energy }, i) => sum + (energy / elementaryCharge.value) * (shares[i] ?? NaN),
        0,
      );
    expect(mean(channels.map(({ branching }) => branching))).toAgreeWith({
      what: "mean energy of O2+ recombination, branchings of Kella et al. (1997)",
      unit: "eV",
      published: 4.637,
      within: { relative: 2e-3 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
    expect(mean(otherBranchings[0].branchings)).toAgreeWith({
      what: "mean energy of O2+ recombination, branchings of Petrignani et al. (2005)",
      unit: "eV",
      published: 4.9,
      within: { relative: 2e-3 },
      source: "SeparateProgram",
      mark: "computed independently",
    });
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
