import { PhysicsDomainError } from "../errors";
import { requireNonNegative } from "../guards";
import { sobolDigits, sobolDirections } from "./sobolDirections";

/** Points of a scrambled Sobol sequence; see `scrambledSobol`. */
export interface ScrambledSobol {
  /** Fills `point` with the coordinates of point `index` of one scrambling: each strictly between 0 and 1. */
  pointAt(index: number, scrambling: number, point: Float64Array): void;
}

/**
 * Sobol's sequence, randomised by nested uniform scrambling: each binary digit is flipped or not by a coin that belongs
 * to the digits before it. The coins are a hash of seed, scrambling, dimension and those digits, so that a point is
 * a pure function of its index. A scrambled sequence keeps every equidistribution of Sobol's; each of its points is
 * uniform; scramblings of different number are independent of one another.
 *
 * Beyond 32 digits the sequence says nothing; 20 more digits are coins alone.
 *
 * @param dimensions  1 to `largestSobolDimension`
 * @param seed        whole, zero or more, below 2³²
 * @returns           points by index (whole, below 2³²) and number of the scrambling (whole, zero or more)
 *
 * @assumes that the hash is as good as chance; the tests look at means, variances and pairs
 * @throws  PhysicsDomainError if an input breaks a bound above
 * @source  [Owen1995], [JoeKuo2008]
 * @explained spread_median_error, spread_lower_error, spread_upper_error, spread_q2_5_error, spread_q97_5_error,
 *            spread_draws
 */
export function scrambledSobol(dimensions: number, seed: number): ScrambledSobol {
  requireNonNegative("seed", seed);
  if (!Number.isInteger(seed) || seed >= twoTo32) {
    throw new PhysicsDomainError("seed", seed, "whole and below 2^32");
  }
  const directions = sobolDirections(dimensions);
  const ofSeed = mix(seed ^ 0x9e3779b9);
  return {
    pointAt(index, scrambling, point) {
      const ofScrambling = mix(ofSeed ^ mix(scrambling + 0x85ebca6b));
      for (let dimension = 0; dimension < dimensions; dimension += 1) {
        const digits = sobolAt(directions[dimension], index);
        point[dimension] = scramble(digits, mix(ofScrambling ^ mix(dimension + 0xc2b2ae35)));
      }
    },
  };
}

const twoTo20 = 1048576;
const twoTo32 = 4294967296;

/** Coordinate of point `index` without scrambling, as a fraction of 2³². */
export function sobolAt(directions: Uint32Array, index: number): number {
  let digits = 0;
  for (let left = index >>> 0, k = 0; left !== 0; left >>>= 1, k += 1) {
    if (left & 1) digits ^= directions[k];
  }
  return digits >>> 0;
}

function scramble(digits: number, key: number): number {
  let scrambled = 0;
  for (let k = 0; k < sobolDigits; k += 1) {
    const before = k === 0 ? 0 : digits >>> (sobolDigits - k);
    const coin = mix(key ^ mix(before ^ Math.imul(k + 1, 0x27d4eb2f))) & 1;
    scrambled = (scrambled << 1) | (((digits >>> (sobolDigits - 1 - k)) & 1) ^ coin);
  }
  const beyond = mix(key ^ mix(digits ^ 0x165667b1)) >>> 12;
  return ((scrambled >>> 0) * twoTo20 + beyond + 0.5) / (twoTo20 * twoTo32);
}

/** Every bit of the result depends on every bit of the input: a bijection of 32-bit words. */
function mix(word: number): number {
  let x = word | 0;
  x = Math.imul(x ^ (x >>> 16), 0x21f0aaad);
  x = Math.imul(x ^ (x >>> 15), 0x735a2d97);
  return (x ^ (x >>> 15)) | 0;
}
