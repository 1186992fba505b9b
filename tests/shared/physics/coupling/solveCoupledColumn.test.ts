import { describe, expect, it } from "vitest";

import { solveColumn } from "../../../../shared/physics/column/solveColumn";
import { solveCoupledColumn } from "../../../../shared/physics/coupling/solveCoupledColumn";
import type { CoupledInput, ExobaseCriterion } from "../../../../shared/physics/types";
import "../../../toBeCloseToRelative";
import { randomColumn } from "../column/randomColumn";
import { collisionParametersOf } from "../column/sampleColumns";
import { numbersOf, sampleCoupled, solved, warm } from "./coupledSamples";

const criteria: ExobaseCriterion[] = [
  { kind: "bulk" },
  { kind: "simple" },
  { kind: "gas", formula: "O" },
  { kind: "gas", formula: "H" },
  { kind: "unit_depth" },
];

describe("solveCoupledColumn on random planets", { timeout: 120_000 }, () => {
  const randomInput = (seed: number): CoupledInput => {
    const column = randomColumn(seed);
    const { formula } = column.gases[seed % column.gases.length];
    const criterion = seed % 4 === 0 ? criteria[1 + ((seed / 4) % 4)] : criteria[0];
    return {
      ...column,
      criterion: criterion.kind === "gas" ? { kind: "gas", formula } : criterion,
      corrections: seed % 3 === 0 ? { [formula]: 0.7 } : {},
    };
  };
  const seeds = Array.from({ length: 300 }, (_, k) => 40_000 + k);

  it("answers with finite numbers and Kn = 1, or says why there is no exobase, every time", () => {
    const reasons = new Map<string, number>();
    for (const seed of seeds) {
      const input = randomInput(seed);
      const outcome = solveCoupledColumn(input);
      const reason = outcome.converged ? "converged" : outcome.reason;
      reasons.set(reason, (reasons.get(reason) ?? 0) + 1);
      if (!outcome.converged) {
        expect(outcome.message, `seed ${seed}`).toMatch(/^[A-Z].*\.$/s);
        expect(outcome.largestKnudsen, `seed ${seed}`).toBeGreaterThan(0);
        continue;
      }
      const odd = numbersOf(outcome).find((value) => !Number.isFinite(value));
      expect(odd, `seed ${seed}`).toBeUndefined();
      if (input.criterion.kind === "bulk") {
        expect(outcome.exobase.level.knudsen, `seed ${seed}`).toBeCloseToRelative(1, 1e-11);
      }
      const base = outcome.column.levelAt(input.baseAltitude);
      input.gases.forEach(({ moleFraction }, i) =>
        expect(base.moleFractions[i], `seed ${seed}`).toBeCloseToRelative(moleFraction, 1e-7),
      );
    }
    expect(reasons.get("converged")).toBeGreaterThan(100);
    expect([...reasons.keys()]).toEqual(expect.arrayContaining(["base_unbound", "runaway"]));
    expect(reasons.get("not_converged") ?? 0).toBeLessThan(3);
  });

  it("does not depend on its steps: at half the tolerance no rate moves by 4e-7 in log₁₀, no number by 1e-6", () => {
    for (const seed of seeds.slice(0, 100)) {
      const input = randomInput(seed);
      const [one, two] = [solveCoupledColumn(input), solveCoupledColumn(input, 5e-11)];
      expect(two.converged, `seed ${seed}`).toBe(one.converged);
      if (!one.converged || !two.converged) continue;
      one.gases.forEach(({ logRate }, i) => {
        const change = Math.abs(logRate - two.gases[i].logRate) / Math.LN10;
        expect(change, `seed ${seed}, rate ${i}`).toBeLessThan(4e-7);
      });
      const expected = numbersOf(two);
      numbersOf(one).forEach((value, k) => {
        // A density that is itself next to nothing (below 1e-100) may move by more.
        if (Math.abs(value) > 1e-100)
          expect(value, `seed ${seed}, number ${k}`).toBeCloseToRelative(expected[k], 1e-6);
      });
    }
  });
});

describe("solveCoupledColumn", () => {
  const input = sampleCoupled({ temperature: warm });

  it("is deterministic to the last bit, whatever was solved before", () => {
    const first = solved(input);
    solved(sampleCoupled({ fractions: { H2: 0.9, He: 0.1 }, gravitationalParameter: 2e14 }));
    const second = solved(input);
    expect(numbersOf(second)).toEqual(numbersOf(first));
    expect(second.gases).toEqual(first.gases);
    expect(second.evaluations).toBe(first.evaluations);
  });

  it("does not depend on the order of the gases", () => {
    const turned = { ...input, gases: [...input.gases].reverse() };
    const parameters = input.collisionParameters.map((row) => [...row].reverse()).reverse();
    const [one, two] = [solved(input), solved({ ...turned, collisionParameters: parameters })];
    const expected = [...two.gases].reverse();
    one.gases.forEach(({ logRate }, i) => expect(logRate).toBeCloseTo(expected[i].logRate, 7));
  });

  it("does not tell two halves of a gas from the whole", () => {
    const gases = input.gases.flatMap((gas) =>
      gas.formula === "H2"
        ? [0.3, 0.7].map((part) => ({ ...gas, moleFraction: part * gas.moleFraction }))
        : [gas],
    );
    const parted = { ...input, gases, collisionParameters: collisionParametersOf(gases) };
    const whole = { ...input, collisionParameters: collisionParametersOf(input.gases) };
    const [one, two] = [solved(whole), solved(parted)];
    expect(two.exobase.level.altitude).toBeCloseToRelative(one.exobase.level.altitude, 1e-8);
    const sum = Math.exp(two.gases[6].logRate) + Math.exp(two.gases[7].logRate);
    expect(sum).toBeCloseToRelative(Math.exp(one.gases[6].logRate), 1e-7);
    expect(two.gases[6].supplyShare).toBeCloseToRelative(two.gases[7].supplyShare, 1e-7);
  });

  it("loses more of a gas the more there is of it, less than in proportion", () => {
    const rates = [1e-8, 1e-7, 1e-6, 1e-5].map((H) => {
      const fractions = { CO2: 0.93, N2: 0.07, H };
      return solved(sampleCoupled({ fractions, temperature: warm })).gases[2].logRate;
    });
    for (let k = 1; k < rates.length; k += 1) {
      expect(rates[k] - rates[k - 1]).toBeGreaterThan(0);
      expect(rates[k] - rates[k - 1]).toBeLessThan(Math.log(10) + 1e-6);
    }
  });

  it("never lets more of a trace go than the column without flux has it", () => {
    const cool = sampleCoupled({ fractions: { CO2: 0.93, N2: 0.07, H: 1e-9 } });
    const open = solveColumn(cool).exobase;
    if (!open.found) throw new Error(open.message);
    const { level } = solved(cool).exobase;
    expect(level.logNumberDensities[2]).toBeLessThan(open.level.logNumberDensities[2] - 0.1);
  });

  it("counts its marches and evaluations", () => {
    const { marches, evaluations, column } = solved(input);
    expect(marches).toBeGreaterThan(2);
    expect(marches).toBeLessThan(12);
    expect(column.evaluations).toBe(evaluations);
    expect(solved(input, 1e-6).evaluations).toBeLessThan(evaluations);
  });

  it("keeps its accuracy at a tolerance of 1e-9, as draws use it", () => {
    const [draw, exact] = [solved(input, 1e-9), solved(input, 1e-12)];
    draw.gases.forEach(({ logRate }, i) => expect(logRate).toBeCloseTo(exact.gases[i].logRate, 6));
  });
});

describe("escape from an exobase by another criterion", () => {
  const runs = criteria.map((criterion) => solved(sampleCoupled({ temperature: warm, criterion })));

  it.each(criteria.map((criterion, k) => [Object.values(criterion).join(" "), k] as const))(
    "leaves from where the number of %s is 1, with its band of Kn",
    (_, k) => {
      const { column, exobase } = runs[k];
      const { level } = exobase;
      const { gases } = column.input;
      const total = (each: (i: number) => number) => gases.reduce((sum, _gas, i) => sum + each(i), 0);
      const area = (i: number, j: number) =>
        Math.PI * ((gases[i].collisionDiameter + gases[j].collisionDiameter) / 2) ** 2;
      const criterion = criteria[k];
      if (criterion.kind === "bulk") expect(level.knudsen).toBeCloseToRelative(1, 1e-11);
      if (criterion.kind === "simple") expect(level.knudsen).toBeCloseToRelative(1 / Math.SQRT2, 1e-11);
      if (criterion.kind === "gas") {
        const own = gases.findIndex(({ formula }) => formula === criterion.formula);
        const collisions = total(
          (j) => level.numberDensities[j] * area(own, j) * Math.sqrt(1 + gases[own].mass / gases[j].mass),
        );
        expect(collisions * level.scaleHeights[own]).toBeCloseToRelative(1, 1e-11);
      }
      expect(column.levelAt(exobase.lower ?? NaN).knudsen).toBeCloseToRelative(0.1, 1e-11);
      expect(column.exobaseBy(criterion)).toBe(exobase);
    },
  );

  it("has the other exobases of the same column as well", () => {
    const [bulk] = runs;
    const simple = bulk.column.exobaseBy({ kind: "simple" });
    if (!simple.found) throw new Error(simple.message);
    expect(simple.level.knudsen).toBeCloseToRelative(1 / Math.SQRT2, 1e-11);
    const again = runs[1].column.exobaseBy({ kind: "bulk" });
    if (!again.found) throw new Error(again.message);
    expect(again.level.knudsen).toBeCloseToRelative(1, 1e-11);
    const high = bulk.column.exobaseBy({ kind: "gas", formula: "H" });
    expect(high).toMatchObject({ found: true });
  });

  it("is the same at both ends of a gas alone: its own criterion is that of the bulk", () => {
    const alone = { fractions: { N2: 1 }, temperature: { kind: "constant", temperature: 300 } } as const;
    const [bulk, own] = [criteria[0], { kind: "gas", formula: "N2" } as const].map((criterion) =>
      solved(sampleCoupled({ ...alone, criterion })),
    );
    expect(own.exobase.level.altitude).toBeCloseToRelative(bulk.exobase.level.altitude, 1e-11);
  });

  it("leaves the rate of a gas that is limited by its supply nearly as it is", () => {
    const rates = runs.map(({ gases }) => gases[7].logRate);
    for (const rate of rates) expect(Math.abs(rate - rates[0])).toBeLessThan(0.2);
  });
});
