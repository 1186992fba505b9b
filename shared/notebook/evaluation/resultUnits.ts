import type { Dimension } from "../language/dimensions";

const baseUnits = ["m", "kg", "s", "K", "mol", "A"];

/** Units that have a name of their own in results; see `siUnitText`. */
const named: Readonly<Record<string, Dimension>> = {
  Pa: [-1, 1, -2, 0, 0, 0],
  N: [1, 1, -2, 0, 0, 0],
  J: [2, 1, -2, 0, 0, 0],
  W: [2, 1, -3, 0, 0, 0],
  "W m^-2": [0, 1, -3, 0, 0, 0],
  T: [0, 1, -2, 0, 0, -1],
};

/** The dimension behind a unit as results carry it, "m^-2 s^-1": the inverse of `siUnitText`. */
export function dimensionOfUnit(unit: string): Dimension {
  const known = named[unit];
  if (known) return known;
  const exponents: [number, number, number, number, number, number] = [0, 0, 0, 0, 0, 0];
  if (unit === "1") return exponents;
  for (const factor of unit.split(" ")) {
    const [symbol, exponent = "1"] = factor.split("^");
    exponents[baseUnits.indexOf(symbol)] = Number(exponent);
  }
  return exponents;
}
