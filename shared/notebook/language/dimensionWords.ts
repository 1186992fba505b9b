import { quantityKinds, type Dimension, type QuantityKind } from "./dimensions";
import { isDimensionless, sameDimension } from "./measure";

const kinds: readonly QuantityKind[] = Object.values(quantityKinds);

const baseUnits = ["m", "kg", "s", "K", "mol", "A"] as const;

/** "m^2 s^-1"; "1" for a pure number. Positive exponents first. */
export function baseUnitText(dimension: Dimension): string {
  const factors = baseUnits.map((symbol, index) => ({ symbol, exponent: dimension[index] }));
  const written = [
    ...factors.filter(({ exponent }) => exponent > 0),
    ...factors.filter(({ exponent }) => exponent < 0),
  ];
  if (written.length === 0) return "1";
  return written.map(({ symbol, exponent }) => (exponent === 1 ? symbol : `${symbol}^${exponent}`)).join(" ");
}

/** "a temperature", or the unit where it has no common name: "in m^2 K". */
export function dimensionWords(dimension: Dimension): string {
  if (isDimensionless(dimension)) return "a number without unit";
  const kind = kinds.find((candidate) => sameDimension(candidate.dimension, dimension));
  return kind ? kind.words : `in ${baseUnitText(dimension)}`;
}
