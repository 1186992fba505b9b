import { describe, expect, it } from "vitest";

import { advance, beginMarch, heightOfMarch } from "../../../../shared/physics/column/columnMarch";
import { stateWithin } from "../../../../shared/physics/column/columnPath";
import { columnProblem, heightOf } from "../../../../shared/physics/column/columnProblem";
import type { ColumnInput } from "../../../../shared/physics/types";
import "../../../toBeCloseToRelative";
import { altitudesBetween, baseScaleHeight, sampleColumn } from "./sampleColumns";

interface Leg {
  from: number;
  to: number;
  state: Float64Array;
  fluxes?: Float64Array | null;
  tolerance?: number;
}

/** Marches from one height to another; gives the march and the state it ended in. */
function marchAlong(input: ColumnInput, { from, to, state, fluxes = null, tolerance = 1e-11 }: Leg) {
  const problem = columnProblem(input);
  const direction = to > from ? 1 : -1;
  const march = beginMarch({ problem, fluxes, height: from, state, direction, tolerance });
  while (direction * (to - heightOfMarch(march)) > 0) advance(march, to);
  const { steps, states } = march.path;
  const size = problem.masses.length;
  return { march, end: states.slice(steps * size, (steps + 1) * size) };
}

const altitudes = Float64Array.of(90e3, 125e3, 150e3, 210e3);
const kinked = {
  "a ceiling of K": sampleColumn(),
  "points of T": sampleColumn({
    temperature: { kind: "points", altitudes, temperatures: Float64Array.of(130, 160, 150, 230) },
  }),
  "points of T and K at the same and at other altitudes": sampleColumn({
    temperature: { kind: "points", altitudes, temperatures: Float64Array.of(130, 160, 150, 230) },
    eddy: {
      kind: "points",
      altitudes: Float64Array.of(125e3, 140e3, 150e3),
      coefficients: Float64Array.of(300, 2000, 500),
    },
  }),
  "a K that falls from its ceiling": sampleColumn({
    eddy: { kind: "power", base: 1e6, exponent: -0.7, ceiling: 3e4 },
  }),
};

describe("a march", () => {
  it.each(Object.entries(kinked))(
    "that turns round comes back to where it set out, across %s",
    (_, input) => {
      const { baseLogPressures: base } = columnProblem(input);
      const to = heightOf(230e3, input.radius, input.radius + input.baseAltitude);
      const up = marchAlong(input, { from: 0, to, state: base });
      const down = marchAlong(input, { from: to, to: 0, state: up.end });
      down.end.forEach((value, i) => expect(Math.abs(value - base[i])).toBeLessThan(1e-7));
      expect(down.march.law).toMatchObject({ isCapped: up.march.path.laws[0].isCapped });
    },
  );

  it.each(Object.entries(kinked))("lands on every kink, with %s", (_, input) => {
    const problem = columnProblem(input);
    const to = heightOf(230e3, input.radius, problem.baseRadius);
    const { march } = marchAlong(input, { from: 0, to, state: problem.baseLogPressures });
    const landed = [...march.path.positions.slice(0, march.path.steps + 1)];
    for (const along of [problem.temperature, problem.eddy]) {
      if (along.kind !== "points") continue;
      const ahead = [...along.heights].filter((height) => height > 0 && height < to);
      expect(ahead.length).toBeGreaterThan(1);
      for (const height of ahead) expect(landed).toContain(height);
    }
    if (problem.eddy.kind === "power") {
      expect(new Set(march.path.laws.map((law) => law.isCapped)).size).toBe(2);
    }
  });

  it.each(Object.entries(kinked))(
    "can be read between its steps as exactly as at their ends, with %s",
    (_, input) => {
      const problem = columnProblem(input);
      const to = heightOf(230e3, input.radius, problem.baseRadius);
      const whole = marchAlong(input, { from: 0, to, state: problem.baseLogPressures });
      const read = new Float64Array(problem.masses.length);
      for (const altitude of altitudesBetween(101e3, 229e3, 25)) {
        const height = heightOf(altitude, input.radius, problem.baseRadius);
        const { path } = whole.march;
        const step = [...path.positions.slice(0, path.steps)].findLastIndex((position) => position <= height);
        stateWithin(path, step, height, read);
        const { end } = marchAlong(input, { from: 0, to: height, state: problem.baseLogPressures });
        end.forEach((value, i) => expect(Math.abs(read[i] - value)).toBeLessThan(2e-9));
      }
    },
  );

  it("takes no step in which a gas that counts changes its share by more than e³", () => {
    const input = sampleColumn({ eddy: { kind: "none" }, fractions: { CO2: 1, H2: 1e-7 } });
    const problem = columnProblem(input);
    const { march } = marchAlong(input, {
      from: 0,
      to: 600e3,
      state: problem.baseLogPressures,
      tolerance: 1e-4,
    });
    const { steps, states } = march.path;
    const logShare = (node: number) => {
      const [heavy, light] = [states[2 * node], states[2 * node + 1]];
      return light - Math.log(Math.exp(heavy) + Math.exp(light));
    };
    for (let step = 0; step < steps; step += 1) {
      expect(logShare(step + 1) - logShare(step)).toBeLessThan(3.2);
    }
  });
});

/**
 * A trace with an upward flux through an isothermal background: n = n_h (1 − Φ₀ I), n_h the profile without
 * flux, I = ∫ dh/[(D + K) n_h]; in h, where Φ₀ is constant. Without K, D n_h = b Xᵢ₀ e^{(1/H − 1/Hᵢ)h}.
 */
describe("a flux", () => {
  const temperature = { kind: "constant", temperature: 200 } as const;
  const setting = (eddy: ColumnInput["eddy"]) => {
    const input = sampleColumn({ fractions: { N2: 1, H: 1e-13 }, temperature, eddy, spread: 0 });
    const problem = columnProblem(input);
    const [heavy, light] = input.gases.map((gas) => baseScaleHeight(input, gas.mass, 200));
    const { coefficient } = input.collisionParameters[0][1];
    const b = coefficient * Math.sqrt(200);
    return { input, problem, rate: 1 / heavy - 1 / light, b, heavy };
  };
  const fluxOf = (value: number) => Float64Array.of(0, value);

  it.each([0.3, 0.9, 0.999, -2])(
    "that takes %d of what can diffuse leaves what the closed form says",
    (share) => {
      const { input, problem, rate, b } = setting({ kind: "none" });
      const limit = b * input.gases[1].moleFraction * rate; // 1/I at infinity
      const to = 150e3;
      const { end } = marchAlong(input, {
        from: 0,
        to,
        state: problem.baseLogPressures,
        fluxes: fluxOf(share * limit),
      });
      const free = marchAlong(input, { from: 0, to, state: problem.baseLogPressures }).end;
      const expected = Math.log(1 - share * (1 - Math.exp(-rate * to)));
      expect(end[1] - free[1]).toBeCloseTo(expected, 7);
      expect(end[0] - free[0]).toBeCloseTo(0, 10);
    },
  );

  it("is held back by mixing below the homopause as the integral of 1/(D + K) says", () => {
    const coefficient = 300;
    const { input, problem, b, heavy } = setting({ kind: "constant", coefficient });
    const to = 150e3;
    const free = (h: number) => marchAlong(input, { from: 0, to: h, state: problem.baseLogPressures }).end;
    const density = (logPressure: number) => Math.exp(logPressure) / (1.380649e-23 * 200);
    const conductance = (h: number) => {
      const diffusion = (b / input.baseNumberDensity) * Math.exp(h / heavy);
      return (diffusion + coefficient) * density(free(h)[1]);
    };
    // Simpson's rule.
    const parts = 200;
    let integral = 0;
    for (let k = 0; k <= parts; k += 1) {
      const weight = k === 0 || k === parts ? 1 : k % 2 === 1 ? 4 : 2;
      const h = Math.max((k * to) / parts, 1e-3);
      integral += (weight * to) / (3 * parts) / conductance(h);
    }
    const flux = 0.7 / integral;
    const { end } = marchAlong(input, { from: 0, to, state: problem.baseLogPressures, fluxes: fluxOf(flux) });
    expect(end[1] - free(to)[1]).toBeCloseTo(Math.log(0.3), 4);
  });

  it("is found again from above: downward from the depleted state comes back to the base", () => {
    const { input, problem, rate, b } = setting({ kind: "constant", coefficient: 100 });
    const fluxes = fluxOf(0.5 * b * input.gases[1].moleFraction * rate);
    const up = marchAlong(input, { from: 0, to: 100e3, state: problem.baseLogPressures, fluxes });
    const down = marchAlong(input, { from: 100e3, to: 0, state: up.end, fluxes });
    down.end.forEach((value, i) => expect(value).toBeCloseTo(problem.baseLogPressures[i], 7));
  });

  it("of one gas drags the others with it, in proportion", () => {
    const input = sampleColumn({
      fractions: { N2: 0.5, CO2: 0.3, H2: 0.2 },
      eddy: { kind: "none" },
      temperature,
    });
    const problem = columnProblem(input);
    const drag = (value: number) => {
      const fluxes = Float64Array.of(0, 0, value);
      const leg = { from: 0, to: 5e3, state: problem.baseLogPressures };
      const [with_, without] = [marchAlong(input, { ...leg, fluxes }).end, marchAlong(input, leg).end];
      return [...with_].map((pressure, i) => pressure - without[i]);
    };
    const [one, two] = [drag(1e14), drag(2e14)];
    expect(one[0]).toBeGreaterThan(0);
    expect(one[1]).toBeGreaterThan(0);
    expect(one[2]).toBeLessThan(0);
    one.forEach((value, i) => expect(two[i]).toBeCloseToRelative(2 * value, 1e-2));
  });
});

describe("a march that cannot go on", () => {
  it("says so instead of shortening its steps for ever", () => {
    const problem = columnProblem(sampleColumn());
    const masses = problem.masses.map(() => NaN);
    const state = problem.baseLogPressures;
    const march = beginMarch({
      problem: { ...problem, masses },
      ...{ fluxes: null, height: 0, state, direction: 1, tolerance: 1e-10 },
    });
    expect(() => advance(march, 1e5)).toThrow(/passable in steps that a number can tell apart/);
  });
});
