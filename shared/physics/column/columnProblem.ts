import { boltzmann } from "../constants/codata2022";
import { requirePositive } from "../guards";
import { cosine, exponential, logarithm } from "../numerics/elementary";
import { monotoneCubic } from "../numerics/monotoneCubic";
import {
  pieceAt,
  pieceSlope,
  pieceValue,
  piecewiseCubic,
  type PiecewiseCubic,
} from "../numerics/piecewiseCubic";
import type { ColumnInput, EddyProfile, TemperatureProfile } from "../types";
import { requireColumnInput } from "./requireColumnInput";

/**
 * A column made ready for the integrator: checked, gases that are absent left out, everything that does not
 * change with altitude worked out, arrays flat.
 *
 * The independent variable is the geopotential height above the base,
 *
 *   h = (z − z₀) r₀/r,   r = r₀²/(r₀ − h),   r₀ = R + z₀,
 *
 * so that g dz = g₀ dh, all spherical factors vanish and infinity is h = r₀.
 *
 * @source [USSA1976] for the geopotential height
 */
export interface ColumnProblem {
  readonly input: ColumnInput;
  /** Indices in `input.gases` of the gases that are present. */
  readonly present: readonly number[];
  /** r₀, m */
  readonly baseRadius: number;
  /** GM/(r₀² k), K kg⁻¹ m⁻¹ per unit of 1/k; times m/T it is the inverse scale height in h */
  readonly gravityOverBoltzmann: number;
  /** ω² cos²φ/GM, m⁻³; 0 without the centrifugal term */
  readonly centrifugalFactor: number;
  /** Per present gas: mass (kg), thermal diffusion factor, cross section πd² (m²), ln p at the base (Pa). */
  readonly masses: Float64Array;
  readonly thermalFactors: Float64Array;
  readonly crossSections: Float64Array;
  readonly baseLogPressures: Float64Array;
  /** 1/A of each pair of present gases, lower triangle row by row, and which of `exponents` it has. */
  readonly inverseCoefficients: Float64Array;
  readonly exponentGroups: Int32Array;
  readonly exponents: Float64Array;
  readonly temperature: TemperatureAlong;
  readonly eddy: EddyAlong;
  /** ln of the total number density at the base, m⁻³ */
  readonly baseLogDensity: number;
}

/** T in terms of h: for Bates T∞ − amplitude · exp(−rate h). */
export type TemperatureAlong =
  | { readonly kind: "constant"; readonly temperature: number }
  | {
      readonly kind: "bates";
      readonly exosphere: number;
      readonly amplitude: number;
      readonly rate: number;
    }
  | {
      readonly kind: "points";
      readonly cubic: PiecewiseCubic;
      /** Geopotential heights of the knots. */
      readonly heights: Float64Array;
      readonly smallestAbove: Float64Array;
    };

/**
 * K: constant, a power of the density up to a ceiling, or points (cubic in ln K).
 * `power` is ln K = logScale − exponent ln n.
 */
export type EddyAlong =
  | { readonly kind: "none" }
  | { readonly kind: "constant"; readonly coefficient: number }
  | {
      readonly kind: "power";
      readonly exponent: number;
      readonly logScale: number;
      readonly ceiling: { readonly coefficient: number; readonly logDensity: number } | null;
    }
  | { readonly kind: "points"; readonly cubic: PiecewiseCubic; readonly heights: Float64Array };

/**
 * Checks a column and makes it ready.
 *
 * @throws  PhysicsDomainError if an input is impossible; see `requireColumnInput`
 */
export function columnProblem(input: ColumnInput): ColumnProblem {
  requireColumnInput(input);
  const present: number[] = [];
  for (let i = 0; i < input.gases.length; i += 1) if (input.gases[i].moleFraction > 0) present.push(i);

  const baseRadius = input.radius + input.baseAltitude;
  const temperature = temperatureAlong(input.temperature, input.radius, baseRadius);
  const basePiece = temperature.kind === "points" ? pieceAt(temperature.heights, 0, true) : 0;
  const baseTemperature = temperatureOf(temperature, 0, input.baseAltitude, basePiece);
  requirePositive("temperature at the base", baseTemperature);
  const basePressure = input.baseNumberDensity * boltzmann.value * baseTemperature;
  const sum = present.reduce((total, i) => total + input.gases[i].moleFraction, 0);
  const baseLogPressure = logarithm(basePressure / sum);
  const gas = (i: number) => input.gases[present[i]];
  const perGas = (value: (i: number) => number) => Float64Array.from(present, (_, i) => value(i));
  const cosineOfLatitude = input.centrifugal ? cosine(input.centrifugal.latitude) : 0;
  const spin = input.centrifugal ? input.centrifugal.angularSpeed * cosineOfLatitude : 0;

  return {
    input,
    present,
    baseRadius,
    gravityOverBoltzmann: input.gravitationalParameter / (baseRadius * baseRadius) / boltzmann.value,
    centrifugalFactor: (spin * spin) / input.gravitationalParameter,
    masses: perGas((i) => gas(i).mass),
    thermalFactors: perGas((i) => gas(i).thermalDiffusionFactor),
    crossSections: perGas((i) => Math.PI * gas(i).collisionDiameter * gas(i).collisionDiameter),
    baseLogPressures: perGas((i) => baseLogPressure + logarithm(gas(i).moleFraction)),
    ...pairs(input, present),
    temperature,
    eddy: eddyAlong(input.eddy, input.baseNumberDensity, input.radius, baseRadius),
    baseLogDensity: logarithm(input.baseNumberDensity),
  };
}

function temperatureAlong(profile: TemperatureProfile, radius: number, baseRadius: number): TemperatureAlong {
  if (profile.kind === "constant") return { kind: "constant", temperature: profile.temperature };
  if (profile.kind === "bates") {
    // ζ, the geopotential height above the reference altitude, is linear in h: ζ = ζ(base) + (r_ref/r₀)² h.
    const reference = radius + profile.referenceAltitude;
    const ratio = reference / baseRadius;
    const atBase = ratio * (baseRadius - reference);
    return {
      kind: "bates",
      exosphere: profile.exosphere,
      amplitude: (profile.exosphere - profile.base) * exponential(-profile.shape * atBase),
      rate: profile.shape * ratio * ratio,
    };
  }
  const smallestAbove = Float64Array.from(profile.temperatures);
  for (let k = smallestAbove.length - 2; k >= 0; k -= 1) {
    smallestAbove[k] = Math.min(smallestAbove[k], smallestAbove[k + 1]);
  }
  const cubic = piecewiseCubic(monotoneCubic(profile.altitudes, profile.temperatures));
  return {
    kind: "points",
    cubic,
    heights: knotHeights(profile.altitudes, radius, baseRadius),
    smallestAbove,
  };
}

function knotHeights(altitudes: Float64Array, radius: number, baseRadius: number): Float64Array {
  return altitudes.map((altitude) => heightOf(altitude, radius, baseRadius));
}

/** Geopotential height above the base, m, of an altitude. */
export function heightOf(altitude: number, radius: number, baseRadius: number): number {
  return ((altitude - (baseRadius - radius)) * baseRadius) / (radius + altitude);
}

/** Altitude above the body's radius, m, at a geopotential height. */
export function altitudeOf({ input, baseRadius }: ColumnProblem, height: number): number {
  return input.baseAltitude + (height * baseRadius) / (baseRadius - height);
}

/** T at geopotential height h, altitude z; `piece` is read for points only. */
export function temperatureOf(
  along: TemperatureAlong,
  height: number,
  altitude: number,
  piece: number,
): number {
  if (along.kind === "constant") return along.temperature;
  if (along.kind === "bates") return along.exosphere - along.amplitude * exponential(-along.rate * height);
  return pieceValue(along.cubic, piece, altitude);
}

/** dT/dz at geopotential height h, altitude z, K m⁻¹; `piece` is read for points only. */
export function temperatureGradientOf(
  { temperature: along, input, baseRadius }: ColumnProblem,
  height: number,
  altitude: number,
  piece: number,
): number {
  if (along.kind === "constant") return 0;
  if (along.kind === "points") return pieceSlope(along.cubic, piece, altitude);
  const stretch = baseRadius / (input.radius + altitude);
  return along.rate * along.amplitude * exponential(-along.rate * height) * stretch * stretch;
}

/** K, m² s⁻¹, at an altitude where ln n is `logDensity`; `isCapped` and `piece` tell which law holds. */
export function eddyOf(
  along: EddyAlong,
  altitude: number,
  logDensity: number,
  isCapped: boolean,
  piece: number,
): number {
  switch (along.kind) {
    case "none":
      return 0;
    case "constant":
      return along.coefficient;
    case "power":
      if (isCapped && along.ceiling !== null) return along.ceiling.coefficient;
      return exponential(along.logScale - along.exponent * logDensity);
    case "points":
      return exponential(pieceValue(along.cubic, piece, altitude));
  }
}

/** The lowest temperature at a height and anywhere above it. */
export function smallestTemperatureAbove(
  along: TemperatureAlong,
  temperature: number,
  piece: number,
): number {
  if (along.kind === "constant") return temperature;
  if (along.kind === "bates") return Math.min(temperature, along.exosphere);
  const { smallestAbove } = along;
  return piece < smallestAbove.length ? Math.min(temperature, smallestAbove[piece]) : temperature;
}

function eddyAlong(
  profile: EddyProfile,
  baseNumberDensity: number,
  radius: number,
  baseRadius: number,
): EddyAlong {
  switch (profile.kind) {
    case "none":
      return { kind: "none" };
    case "constant":
      return profile.coefficient === 0 ? { kind: "none" } : profile;
    case "power":
      return eddyPower(profile, logarithm(baseNumberDensity));
    case "points": {
      const logs = Float64Array.from(profile.coefficients, logarithm);
      const cubic = piecewiseCubic(monotoneCubic(profile.altitudes, logs));
      return { kind: "points", cubic, heights: knotHeights(profile.altitudes, radius, baseRadius) };
    }
  }
}

function eddyPower(
  { base, exponent, ceiling }: EddyProfile & { kind: "power" },
  baseLogDensity: number,
): EddyAlong {
  if (base === 0) return { kind: "none" };
  if (exponent === 0) {
    return { kind: "constant", coefficient: ceiling === null ? base : Math.min(base, ceiling) };
  }
  return {
    kind: "power",
    exponent,
    logScale: logarithm(base) + exponent * baseLogDensity,
    ceiling:
      ceiling === null
        ? null
        : { coefficient: ceiling, logDensity: baseLogDensity - logarithm(ceiling / base) / exponent },
  };
}

/** 1/A and the exponents of the pairs, in the order (1,0), (2,0), (2,1), (3,0) … of the present gases. */
function pairs({ collisionParameters }: ColumnInput, present: readonly number[]) {
  const inverseCoefficients: number[] = [];
  const groups: number[] = [];
  const exponents: number[] = [];
  for (let i = 1; i < present.length; i += 1) {
    for (let j = 0; j < i; j += 1) {
      const { coefficient, exponent } = collisionParameters[present[i]][present[j]];
      inverseCoefficients.push(1 / coefficient);
      if (!exponents.includes(exponent)) exponents.push(exponent);
      groups.push(exponents.indexOf(exponent));
    }
  }
  return {
    inverseCoefficients: Float64Array.from(inverseCoefficients),
    exponentGroups: Int32Array.from(groups),
    exponents: Float64Array.from(exponents),
  };
}

/**
 * g, the centrifugal term taken off where the column asks for it, m s⁻².
 *
 * @explained level_gravity
 */
export function gravityAt({ input, baseRadius, centrifugalFactor }: ColumnProblem, height: number): number {
  const radius = (baseRadius * baseRadius) / (baseRadius - height);
  const attraction = input.gravitationalParameter / (radius * radius);
  return attraction * (1 - centrifugalFactor * radius * radius * radius);
}
