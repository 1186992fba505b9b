import { boltzmann } from "../../../../shared/physics/constants/codata2022";
import { temperatureAt } from "../../../../shared/physics/temperature/temperatureAt";
import type { ColumnInput } from "../../../../shared/physics/types";

/**
 * A second, slow route to the column, that shares nothing with the first but the equations: in altitude z and
 * ln n, with the Stefan–Maxwell system of all gases solved whole by elimination, and classical Runge–Kutta
 * steps of one length.
 */
export function slowColumn(input: ColumnInput, top: number, steps: number): number[] {
  const step = (top - input.baseAltitude) / steps;
  let y = input.gases.map((gas) => Math.log(input.baseNumberDensity * gas.moleFraction));
  for (let k = 0; k < steps; k += 1) {
    const z = input.baseAltitude + k * step;
    const k1 = gradient(input, z, y);
    const k2 = gradient(input, z + step / 2, moved(y, k1, step / 2));
    const k3 = gradient(input, z + step / 2, moved(y, k2, step / 2));
    const k4 = gradient(input, z + step, moved(y, k3, step));
    y = y.map((value, i) => value + (step / 6) * (k1[i] + 2 * k2[i] + 2 * k3[i] + k4[i]));
  }
  return y;
}

const moved = (y: number[], slope: number[], step: number) => y.map((value, i) => value + step * slope[i]);

/** d ln nᵢ/dz, where each gas flows up at a global rate Fᵢ, s⁻¹, if rates are given. */
export function gradient(
  input: ColumnInput,
  z: number,
  y: number[],
  rates: readonly number[] = [],
): number[] {
  const flux = (i: number) => (rates[i] ?? 0) / (4 * Math.PI * (input.radius + z) ** 2);
  const n = y.map(Math.exp);
  const total = n.reduce((a, b) => a + b, 0);
  const x = n.map((value) => value / total);
  const temperature = temperatureAt(input.temperature, z, input.radius);
  const lapse =
    (temperatureAt(input.temperature, z + 0.5, input.radius) -
      temperatureAt(input.temperature, z - 0.5, input.radius)) /
    temperature;
  const gravity = input.gravitationalParameter / (input.radius + z) ** 2;
  const { gases } = input;
  const meanMass = gases.reduce((sum, gas, i) => sum + x[i] * gas.mass, 0);
  const meanFactor = gases.reduce((sum, gas, i) => sum + x[i] * gas.thermalDiffusionFactor, 0);
  const eddy = eddyCoefficient(input, z, total);
  const b = (i: number, j: number) => {
    const { coefficient, exponent } = input.collisionParameters[i][j];
    return coefficient * temperature ** exponent;
  };
  // dXᵢ/dz − Σⱼ (Xᵢ Kn dXⱼ/dz − Xⱼ Kn dXᵢ/dz)/bᵢⱼ = right-hand side
  const rows = gases.map((gas, i) => {
    const row = gases.map((_, j) => (i === j ? 1 : (-x[i] * eddy * total) / b(i, j)));
    gases.forEach((_, j) => {
      if (j !== i) row[i] += (x[j] * eddy * total) / b(i, j);
    });
    const weight = ((gas.mass - meanMass) * gravity) / (boltzmann.value * temperature);
    let drag = 0;
    gases.forEach((_, j) => {
      if (j !== i) drag += (x[i] * flux(j) - x[j] * flux(i)) / b(i, j);
    });
    row.push(-x[i] * weight - x[i] * (gas.thermalDiffusionFactor - meanFactor) * lapse + drag);
    return row;
  });
  const dx = eliminate(rows);
  const dLogTotal = (-meanMass * gravity) / (boltzmann.value * temperature) - lapse;
  return dx.map((value, i) => value / x[i] + dLogTotal);
}

function eddyCoefficient({ eddy, baseNumberDensity }: ColumnInput, z: number, n: number): number {
  switch (eddy.kind) {
    case "none":
      return 0;
    case "constant":
      return eddy.coefficient;
    case "power":
      return Math.min(eddy.base * (baseNumberDensity / n) ** eddy.exponent, eddy.ceiling ?? Infinity);
    case "points":
      throw new Error(`The slow column has no points of K (at ${z} m).`);
  }
}

/** Solves rows of [matrix | right-hand side] by elimination with row pivoting. */
function eliminate(rows: number[][]): number[] {
  const n = rows.length;
  for (let j = 0; j < n; j += 1) {
    let best = j;
    for (let i = j + 1; i < n; i += 1) if (Math.abs(rows[i][j]) > Math.abs(rows[best][j])) best = i;
    [rows[j], rows[best]] = [rows[best], rows[j]];
    for (let i = j + 1; i < n; i += 1) {
      const factor = rows[i][j] / rows[j][j];
      for (let k = j; k <= n; k += 1) rows[i][k] -= factor * rows[j][k];
    }
  }
  const solution = new Array<number>(n).fill(0);
  for (let i = n - 1; i >= 0; i -= 1) {
    let sum = rows[i][n];
    for (let k = i + 1; k < n; k += 1) sum -= rows[i][k] * solution[k];
    solution[i] = sum / rows[i][i];
  }
  return solution;
}
