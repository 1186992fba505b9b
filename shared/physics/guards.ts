import { PhysicsDomainError } from "./errors";

/** Refuses what is not a finite number. */
export function requireFinite(quantity: string, value: number): void {
  if (!Number.isFinite(value)) throw new PhysicsDomainError(quantity, value, "a finite number");
}

/** Refuses zero, negative and non-finite values. */
export function requirePositive(quantity: string, value: number): void {
  if (!(value > 0 && value < Infinity))
    throw new PhysicsDomainError(quantity, value, "finite and above zero");
}

/** Refuses negative and non-finite values. */
export function requireNonNegative(quantity: string, value: number): void {
  if (!(value >= 0 && value < Infinity))
    throw new PhysicsDomainError(quantity, value, "finite and zero or more");
}

/** Refuses what lies outside [0, 1]. */
export function requireFraction(quantity: string, value: number): void {
  if (!(value >= 0 && value <= 1)) throw new PhysicsDomainError(quantity, value, "between 0 and 1");
}

/** Refuses abscissae that are not finite and strictly ascending. */
export function requireAscending(quantity: string, values: ArrayLike<number>): void {
  for (let i = 0; i < values.length; i += 1) {
    requireFinite(quantity, values[i]);
    if (i > 0 && values[i] <= values[i - 1]) {
      throw new PhysicsDomainError(quantity, values[i], `above the one before it, ${values[i - 1]}`);
    }
  }
}
