import { effusionVelocity } from "../../../../shared/physics/escape/effusionVelocity";
import { escapeParameter } from "../../../../shared/physics/escape/escapeParameter";
import { temperatureAt } from "../../../../shared/physics/temperature/temperatureAt";
import type { CoupledInput } from "../../../../shared/physics/types";
import { gradient } from "../column/slowColumn";

/**
 * The coupled column as a boundary-value problem, solved at once by collocation: ln n of every gas at equally
 * spaced nodes from the base to an exobase of unknown altitude, Hermite–Simpson residuals of the fourth order between
 * them, the given densities at the base and Kn = 1 at the top; Newton's method with a Jacobian from differences. It
 * shares only formulas for T and for the Jeans flux with the solver under test.
 */
export function collocate(
  input: CoupledInput,
  firstAltitude: number,
  intervals: number,
  guess: (z: number) => number[],
) {
  const size = input.gases.length;
  const base = input.gases.map((gas) => Math.log(input.baseNumberDensity * gas.moleFraction));
  let altitude = firstAltitude;
  let nodes = Array.from({ length: intervals + 1 }, (_, k) =>
    guess(input.baseAltitude + (k / intervals) * (altitude - input.baseAltitude)),
  );
  for (let turn = 0; turn < 12; turn += 1) {
    const change = newtonChange(input, base, altitude, nodes);
    nodes = nodes.map((y, k) => y.map((value, i) => value + change[k * size + i]));
    altitude += change[change.length - 1] * 1e4;
    if (Math.max(...change.map(Math.abs)) < 1e-9) {
      return { altitude, logRates: ratesAt(input, altitude, nodes[intervals]).map(Math.log), nodes };
    }
  }
  throw new Error("Newton's method did not settle.");
}

/** Global rates of all gases from an exobase with these ln n. */
function ratesAt(input: CoupledInput, altitude: number, y: number[]): number[] {
  const radius = input.radius + altitude;
  const temperature = temperatureAt(input.temperature, altitude, input.radius);
  return input.gases.map(({ formula, mass: particleMass }, i) => {
    const lambda = escapeParameter({
      gravitationalParameter: input.gravitationalParameter,
      radius,
      temperature,
      particleMass,
    });
    const velocity = effusionVelocity({ temperature, particleMass, escapeParameter: lambda });
    return 4 * Math.PI * radius ** 2 * (input.corrections[formula] ?? 1) * velocity * Math.exp(y[i]);
  });
}

/** ln of l/H of the whole gas. */
function logKnudsen(input: CoupledInput, altitude: number, y: number[]): number {
  const n = y.map(Math.exp);
  const total = n.reduce((a, b) => a + b, 0);
  const temperature = temperatureAt(input.temperature, altitude, input.radius);
  const mass = input.gases.reduce((sum, gas, i) => sum + (n[i] / total) * gas.mass, 0);
  const opacity = input.gases.reduce((sum, gas, i) => sum + n[i] * Math.PI * gas.collisionDiameter ** 2, 0);
  const gravity = input.gravitationalParameter / (input.radius + altitude) ** 2;
  return Math.log((mass * gravity) / (1.380649e-23 * temperature * Math.SQRT2 * opacity));
}

/** Residuals of one interval. */
function intervalResidual(
  input: CoupledInput,
  from: number,
  length: number,
  lower: number[],
  upper: number[],
  rates: number[],
): number[] {
  const f0 = gradient(input, from, lower, rates);
  const f1 = gradient(input, from + length, upper, rates);
  const middle = lower.map((value, i) => (value + upper[i]) / 2 + (length / 8) * (f0[i] - f1[i]));
  const fm = gradient(input, from + length / 2, middle, rates);
  return lower.map((value, i) => upper[i] - value - (length / 6) * (f0[i] + 4 * fm[i] + f1[i]));
}

/**
 * Solves the linearised system. Unknowns in the order of the nodes, then altitude in 10 km; the residual of every interval
 * depends on its two nodes and, through the rates, on the last node and the altitude.
 */
function newtonChange(input: CoupledInput, base: number[], altitude: number, nodes: number[][]): number[] {
  const size = base.length;
  const intervals = nodes.length - 1;
  const unknowns = nodes.length * size + 1;
  const rows: Float64Array[] = Array.from({ length: unknowns }, () => new Float64Array(unknowns + 1));
  const top = nodes[intervals];
  const shift = 1e-6;
  const shifted = (y: number[], i: number) => y.map((value, k) => value + (k === i ? shift : 0));

  base.forEach((value, i) => {
    rows[i][i] = 1;
    rows[i][unknowns] = value - nodes[0][i];
  });
  for (let k = 0; k < intervals; k += 1) {
    const residual = (lower: number[], upper: number[], end: number[], z: number) => {
      const length = (z - input.baseAltitude) / intervals;
      return intervalResidual(
        input,
        input.baseAltitude + k * length,
        length,
        lower,
        upper,
        ratesAt(input, z, end),
      );
    };
    const here = residual(nodes[k], nodes[k + 1], top, altitude);
    const first = (k + 1) * size;
    const put = (column: number, changed: number[], by: number) =>
      changed.forEach((value, i) => (rows[first + i][column] += (value - here[i]) / by));
    for (let i = 0; i < size; i += 1) {
      put(k * size + i, residual(shifted(nodes[k], i), nodes[k + 1], top, altitude), shift);
      put((k + 1) * size + i, residual(nodes[k], shifted(nodes[k + 1], i), top, altitude), shift);
      put(intervals * size + i, residual(nodes[k], nodes[k + 1], shifted(top, i), altitude), shift);
    }
    put(unknowns - 1, residual(nodes[k], nodes[k + 1], top, altitude + 1), 1e-4);
    here.forEach((value, i) => (rows[first + i][unknowns] = -value));
  }
  const last = rows[unknowns - 1];
  const knudsen = logKnudsen(input, altitude, top);
  for (let i = 0; i < size; i += 1) {
    last[intervals * size + i] = (logKnudsen(input, altitude, shifted(top, i)) - knudsen) / shift;
  }
  last[unknowns - 1] = (logKnudsen(input, altitude + 1, top) - knudsen) / 1e-4;
  last[unknowns] = -knudsen;
  return eliminate(rows, size);
}

/** Elimination with pivots among the rows of the nearest nodes: the matrix is a band with a border on the right. */
function eliminate(rows: Float64Array[], size: number): number[] {
  const n = rows.length;
  for (let j = 0; j < n; j += 1) {
    const reach = Math.min(n - 1, j + 3 * size);
    let best = j;
    for (let i = j + 1; i < n; i += 1) {
      if (i > reach && i < n - 1) continue;
      if (Math.abs(rows[i][j]) > Math.abs(rows[best][j])) best = i;
    }
    [rows[j], rows[best]] = [rows[best], rows[j]];
    for (let i = j + 1; i < n; i += 1) {
      const factor = rows[i][j] / rows[j][j];
      if (factor === 0) continue;
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
