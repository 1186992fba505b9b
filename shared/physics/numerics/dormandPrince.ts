import * as t from "./dormandPrinceTableau";

/**
 * One step of the explicit Runge–Kutta pair of Dormand and Prince of order 8(5,3), with dense output of
 * order 7. The stages live in this module, so one step is in work at a time: load `start` and `k1`, take the
 * step, read `end`; whoever wants to interpolate later keeps what `keepStages` gives.
 *
 * @source [HairerNorsettWanner1993], section II.10
 */

/** The largest number of equations. */
export const maximumDimension = 64;

/** Writes dy/dx at (position, state) to `slope`. */
export type Slope = (position: number, state: Float64Array, slope: Float64Array) => void;

const array = () => new Float64Array(maximumDimension);

/** State and slope at the beginning of the step, set by the caller. */
export const start = array();
export const k1 = array();
/** State at the end of the step, and the slope there, once `finishStep` was called. */
export const end = array();
export const k13 = array();

const trial = array();
const k2 = array();
const k3 = array();
const k4 = array();
const k5 = array();
const k6 = array();
const k7 = array();
const k8 = array();
const k9 = array();
const k10 = array();
const k11 = array();
const k12 = array();
const k14 = array();
const k15 = array();
const k16 = array();

/** Slopes kept of a step: at its start, of stages 6 to 12, at its end. */
export const keptStages = 9;
/** Rows of the coefficients of the dense output. */
export const denseRows = 7;

/**
 * Takes a step from `start`, with the slope there in `k1`, to `end`: eleven calls of `slope`.
 *
 * @returns  the estimated error, as root mean square over the equations; NaN where a stage left the domain
 */
export function takeStep(slope: Slope, dimension: number, position: number, step: number): number {
  for (let i = 0; i < dimension; i += 1) {
    trial[i] = start[i] + step * (t.a2_1 * k1[i]);
  }
  slope(position + t.c2 * step, trial, k2);
  for (let i = 0; i < dimension; i += 1) {
    trial[i] = start[i] + step * (t.a3_1 * k1[i] + t.a3_2 * k2[i]);
  }
  slope(position + t.c3 * step, trial, k3);
  for (let i = 0; i < dimension; i += 1) {
    trial[i] = start[i] + step * (t.a4_1 * k1[i] + t.a4_3 * k3[i]);
  }
  slope(position + t.c4 * step, trial, k4);
  for (let i = 0; i < dimension; i += 1) {
    trial[i] = start[i] + step * (t.a5_1 * k1[i] + t.a5_3 * k3[i] + t.a5_4 * k4[i]);
  }
  slope(position + t.c5 * step, trial, k5);
  for (let i = 0; i < dimension; i += 1) {
    trial[i] = start[i] + step * (t.a6_1 * k1[i] + t.a6_4 * k4[i] + t.a6_5 * k5[i]);
  }
  slope(position + t.c6 * step, trial, k6);
  for (let i = 0; i < dimension; i += 1) {
    trial[i] = start[i] + step * (t.a7_1 * k1[i] + t.a7_4 * k4[i] + t.a7_5 * k5[i] + t.a7_6 * k6[i]);
  }
  slope(position + t.c7 * step, trial, k7);
  for (let i = 0; i < dimension; i += 1) {
    trial[i] =
      start[i] + step * (t.a8_1 * k1[i] + t.a8_4 * k4[i] + t.a8_5 * k5[i] + t.a8_6 * k6[i] + t.a8_7 * k7[i]);
  }
  slope(position + t.c8 * step, trial, k8);
  for (let i = 0; i < dimension; i += 1) {
    trial[i] =
      start[i] +
      step *
        (t.a9_1 * k1[i] + t.a9_4 * k4[i] + t.a9_5 * k5[i] + t.a9_6 * k6[i] + t.a9_7 * k7[i] + t.a9_8 * k8[i]);
  }
  slope(position + t.c9 * step, trial, k9);
  for (let i = 0; i < dimension; i += 1) {
    trial[i] =
      start[i] +
      step *
        (t.a10_1 * k1[i] +
          t.a10_4 * k4[i] +
          t.a10_5 * k5[i] +
          t.a10_6 * k6[i] +
          t.a10_7 * k7[i] +
          t.a10_8 * k8[i] +
          t.a10_9 * k9[i]);
  }
  slope(position + t.c10 * step, trial, k10);
  for (let i = 0; i < dimension; i += 1) {
    trial[i] =
      start[i] +
      step *
        (t.a11_1 * k1[i] +
          t.a11_4 * k4[i] +
          t.a11_5 * k5[i] +
          t.a11_6 * k6[i] +
          t.a11_7 * k7[i] +
          t.a11_8 * k8[i] +
          t.a11_9 * k9[i] +
          t.a11_10 * k10[i]);
  }
  slope(position + t.c11 * step, trial, k11);
  for (let i = 0; i < dimension; i += 1) {
    trial[i] =
      start[i] +
      step *
        (t.a12_1 * k1[i] +
          t.a12_4 * k4[i] +
          t.a12_5 * k5[i] +
          t.a12_6 * k6[i] +
          t.a12_7 * k7[i] +
          t.a12_8 * k8[i] +
          t.a12_9 * k9[i] +
          t.a12_10 * k10[i] +
          t.a12_11 * k11[i]);
  }
  slope(position + t.c12 * step, trial, k12);

  let fifth = 0;
  let third = 0;
  for (let i = 0; i < dimension; i += 1) {
    end[i] =
      start[i] +
      step *
        (t.b1 * k1[i] +
          t.b6 * k6[i] +
          t.b7 * k7[i] +
          t.b8 * k8[i] +
          t.b9 * k9[i] +
          t.b10 * k10[i] +
          t.b11 * k11[i] +
          t.b12 * k12[i]);
    const fromFifth =
      t.fifth1 * k1[i] +
      t.fifth6 * k6[i] +
      t.fifth7 * k7[i] +
      t.fifth8 * k8[i] +
      t.fifth9 * k9[i] +
      t.fifth10 * k10[i] +
      t.fifth11 * k11[i] +
      t.fifth12 * k12[i];
    const fromThird =
      t.third1 * k1[i] +
      t.third6 * k6[i] +
      t.third7 * k7[i] +
      t.third8 * k8[i] +
      t.third9 * k9[i] +
      t.third10 * k10[i] +
      t.third11 * k11[i] +
      t.third12 * k12[i];
    fifth += fromFifth * fromFifth;
    third += fromThird * fromThird;
  }
  if (fifth === 0 && third === 0) return 0;
  return (Math.abs(step) * fifth) / Math.sqrt((fifth + 0.01 * third) * dimension);
}

/** Evaluates the slope at the end of an accepted step. */
export function finishStep(slope: Slope, position: number, step: number): void {
  slope(position + step, end, k13);
}

/** Copies the slopes of the finished step that its dense output rests on. */
export function keepStages(dimension: number, target: Float64Array, offset: number): void {
  for (let i = 0; i < dimension; i += 1) {
    target[offset + i] = k1[i];
    target[offset + dimension + i] = k6[i];
    target[offset + 2 * dimension + i] = k7[i];
    target[offset + 3 * dimension + i] = k8[i];
    target[offset + 4 * dimension + i] = k9[i];
    target[offset + 5 * dimension + i] = k10[i];
    target[offset + 6 * dimension + i] = k11[i];
    target[offset + 7 * dimension + i] = k12[i];
    target[offset + 8 * dimension + i] = k13[i];
  }
}

/** Brings back slopes kept before, so that `denseCoefficients` works on that step. */
export function restoreStages(dimension: number, source: Float64Array, offset: number): void {
  for (let i = 0; i < dimension; i += 1) {
    k1[i] = source[offset + i];
    k6[i] = source[offset + dimension + i];
    k7[i] = source[offset + 2 * dimension + i];
    k8[i] = source[offset + 3 * dimension + i];
    k9[i] = source[offset + 4 * dimension + i];
    k10[i] = source[offset + 5 * dimension + i];
    k11[i] = source[offset + 6 * dimension + i];
    k12[i] = source[offset + 7 * dimension + i];
    k13[i] = source[offset + 8 * dimension + i];
  }
}

/**
 * Writes the coefficients of the dense output of the step whose `start`, `end` and stages are at hand:
 * three more calls of `slope`. They take `denseRows` × `dimension` numbers from `place` on.
 */
export function denseCoefficients(
  slope: Slope,
  dimension: number,
  position: number,
  step: number,
  coefficients: Float64Array,
  place: number,
): void {
  for (let i = 0; i < dimension; i += 1) {
    trial[i] =
      start[i] +
      step *
        (t.a14_1 * k1[i] +
          t.a14_7 * k7[i] +
          t.a14_8 * k8[i] +
          t.a14_9 * k9[i] +
          t.a14_10 * k10[i] +
          t.a14_11 * k11[i] +
          t.a14_12 * k12[i] +
          t.a14_13 * k13[i]);
  }
  slope(position + t.c14 * step, trial, k14);
  for (let i = 0; i < dimension; i += 1) {
    trial[i] =
      start[i] +
      step *
        (t.a15_1 * k1[i] +
          t.a15_6 * k6[i] +
          t.a15_7 * k7[i] +
          t.a15_8 * k8[i] +
          t.a15_11 * k11[i] +
          t.a15_12 * k12[i] +
          t.a15_13 * k13[i] +
          t.a15_14 * k14[i]);
  }
  slope(position + t.c15 * step, trial, k15);
  for (let i = 0; i < dimension; i += 1) {
    trial[i] =
      start[i] +
      step *
        (t.a16_1 * k1[i] +
          t.a16_6 * k6[i] +
          t.a16_7 * k7[i] +
          t.a16_8 * k8[i] +
          t.a16_9 * k9[i] +
          t.a16_13 * k13[i] +
          t.a16_14 * k14[i] +
          t.a16_15 * k15[i]);
  }
  slope(position + t.c16 * step, trial, k16);
  for (let i = 0; i < dimension; i += 1) {
    const rise = end[i] - start[i];
    const first = step * k1[i] - rise;
    coefficients[place + i] = rise;
    coefficients[place + dimension + i] = first;
    coefficients[place + 2 * dimension + i] = rise - step * k13[i] - first;
    coefficients[place + 3 * dimension + i] =
      step *
      (t.d4_1 * k1[i] +
        t.d4_6 * k6[i] +
        t.d4_7 * k7[i] +
        t.d4_8 * k8[i] +
        t.d4_9 * k9[i] +
        t.d4_10 * k10[i] +
        t.d4_11 * k11[i] +
        t.d4_12 * k12[i] +
        t.d4_13 * k13[i] +
        t.d4_14 * k14[i] +
        t.d4_15 * k15[i] +
        t.d4_16 * k16[i]);
    coefficients[place + 4 * dimension + i] =
      step *
      (t.d5_1 * k1[i] +
        t.d5_6 * k6[i] +
        t.d5_7 * k7[i] +
        t.d5_8 * k8[i] +
        t.d5_9 * k9[i] +
        t.d5_10 * k10[i] +
        t.d5_11 * k11[i] +
        t.d5_12 * k12[i] +
        t.d5_13 * k13[i] +
        t.d5_14 * k14[i] +
        t.d5_15 * k15[i] +
        t.d5_16 * k16[i]);
    coefficients[place + 5 * dimension + i] =
      step *
      (t.d6_1 * k1[i] +
        t.d6_6 * k6[i] +
        t.d6_7 * k7[i] +
        t.d6_8 * k8[i] +
        t.d6_9 * k9[i] +
        t.d6_10 * k10[i] +
        t.d6_11 * k11[i] +
        t.d6_12 * k12[i] +
        t.d6_13 * k13[i] +
        t.d6_14 * k14[i] +
        t.d6_15 * k15[i] +
        t.d6_16 * k16[i]);
    coefficients[place + 6 * dimension + i] =
      step *
      (t.d7_1 * k1[i] +
        t.d7_6 * k6[i] +
        t.d7_7 * k7[i] +
        t.d7_8 * k8[i] +
        t.d7_9 * k9[i] +
        t.d7_10 * k10[i] +
        t.d7_11 * k11[i] +
        t.d7_12 * k12[i] +
        t.d7_13 * k13[i] +
        t.d7_14 * k14[i] +
        t.d7_15 * k15[i] +
        t.d7_16 * k16[i]);
  }
}

/** Writes the state at `fraction` (0 … 1) of a step that began with `states[offset …]`. */
export function interpolateStep(
  coefficients: Float64Array,
  place: number,
  dimension: number,
  states: Float64Array,
  offset: number,
  fraction: number,
  out: Float64Array,
): void {
  const left = 1 - fraction;
  for (let i = 0; i < dimension; i += 1) {
    let sum = coefficients[place + 6 * dimension + i] * fraction;
    sum = (sum + coefficients[place + 5 * dimension + i]) * left;
    sum = (sum + coefficients[place + 4 * dimension + i]) * fraction;
    sum = (sum + coefficients[place + 3 * dimension + i]) * left;
    sum = (sum + coefficients[place + 2 * dimension + i]) * fraction;
    sum = (sum + coefficients[place + dimension + i]) * left;
    sum = (sum + coefficients[place + i]) * fraction;
    out[i] = states[offset + i] + sum;
  }
}
