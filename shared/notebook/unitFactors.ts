export interface UnitFactor {
  symbol: string;
  exponent: number;
}

const raised = "⁰¹²³⁴⁵⁶⁷⁸⁹";

/** "m³ kg⁻¹ s⁻²", or the same as "m^3 kg^-1 s^-2", taken apart. Nothing for a pure number. */
export function unitFactors(unit: string): UnitFactor[] {
  if (unit === "1" || unit === "") return [];
  return unit.split(" ").map((factor) => {
    const plain = factor
      .replace(/⁻/g, "-")
      .replace(/[⁰¹²³⁴⁵⁶⁷⁸⁹]/g, (digit) => String(raised.indexOf(digit)));
    const [, symbol, exponent] = /^(.*?)\^?(-?\d+)?$/.exec(plain)!;
    return { symbol: symbol ?? plain, exponent: exponent === undefined ? 1 : Number(exponent) };
  });
}
