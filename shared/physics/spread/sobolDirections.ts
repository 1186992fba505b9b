import { PhysicsDomainError } from "../errors";
import { directionNumbers } from "./directionNumbers";

/** Digits of a coordinate, and so the logarithm of the longest sequence. */
export const sobolDigits = 32;

/** Dimensions for which direction numbers are held. */
export const largestSobolDimension = directionNumbers.length + 1;

/**
 * Directions v₁ … v₃₂ of every dimension of Sobol's sequence, as fractions of 2³².
 *
 *   v_k = m_k/2^k,   m_k = m_{k−s} ⊕ 2^s m_{k−s} ⊕ 2 a₁ m_{k−1} ⊕ … ⊕ 2^{s−1} a_{s−1} m_{k−s+1}
 *
 * @param dimensions  1 to `largestSobolDimension`
 * @returns           directions[dimension][k − 1], unsigned 32-bit
 *
 * @throws  PhysicsDomainError if the input breaks the bound above
 * @source  [JoeKuo2008], [BratleyFox1988]
 */
export function sobolDirections(dimensions: number): Uint32Array[] {
  if (!Number.isInteger(dimensions) || dimensions < 1 || dimensions > largestSobolDimension) {
    throw new PhysicsDomainError(
      "dimensions of Sobol's sequence",
      dimensions,
      `whole, from 1 to ${largestSobolDimension}`,
    );
  }
  return Array.from({ length: dimensions }, (_, dimension) =>
    dimension === 0 ? firstDimension() : directionsOf(directionNumbers[dimension - 1]),
  );
}

/** The radical inverse: every m is 1. */
function firstDimension(): Uint32Array {
  return Uint32Array.from({ length: sobolDigits }, (_, k) => (1 << (sobolDigits - 1 - k)) >>> 0);
}

function directionsOf([inner, ...initial]: readonly number[]): Uint32Array {
  const degree = initial.length;
  const directions = new Uint32Array(sobolDigits);
  for (let k = 0; k < sobolDigits; k += 1) {
    if (k < degree) {
      directions[k] = initial[k] << (sobolDigits - 1 - k);
      continue;
    }
    let direction = directions[k - degree] ^ (directions[k - degree] >>> degree);
    for (let i = 1; i < degree; i += 1) {
      if ((inner >> (degree - 1 - i)) & 1) direction ^= directions[k - i];
    }
    directions[k] = direction;
  }
  return directions;
}
