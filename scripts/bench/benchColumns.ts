import { collisionParameter, findGas, type ColumnInput } from "../../shared/physics/index";

/** Mole fractions of the columns that are timed: a cold planet of carbon dioxide with 3 to 12 gases. */
const mixtures: Record<number, Record<string, number>> = {
  3: { CO2: 0.99, O: 9e-3, H: 1e-6 },
  5: { CO2: 0.95, N2: 0.03, Ar: 0.016, O: 4e-3, H: 1e-6 },
  8: { CO2: 0.95, N2: 0.027, Ar: 0.016, CO: 1e-3, O2: 1.2e-3, O: 4e-3, H2: 1.5e-5, H: 1e-6 },
  12: {
    ...{ CO2: 0.95, N2: 0.027, Ar: 0.016, CO: 1e-3, O2: 1.2e-3, O: 4e-3, H2: 1.5e-5, H: 1e-6 },
    ...{ He: 2e-6, HD: 1e-8, D: 1e-9, Ne: 2.5e-6 },
  },
};

export const benchGasCounts = [3, 5, 8, 12] as const;

/**
 * A column with a Bates temperature and a growing K with a ceiling, from Kn near 1e-9 up.
 *
 * @param gases      3, 5, 8 or 12
 * @param exponents  of the collision parameters: all ½, or all as measured
 */
export function benchColumn(
  gases: (typeof benchGasCounts)[number],
  exponents: "half" | "measured",
): ColumnInput {
  const fractions = mixtures[gases];
  const sum = Object.values(fractions).reduce((a, b) => a + b, 0);
  const handbook = Object.keys(fractions).map((formula) => {
    const gas = findGas(formula);
    if (!gas) throw new Error(`The handbook has no ${formula}.`);
    return gas;
  });
  const parameters = handbook.map((a) => handbook.map((b) => collisionParameter(a, b)));
  return {
    gravitationalParameter: 4.2828e13,
    radius: 3389.5e3,
    centrifugal: null,
    baseAltitude: 70e3,
    baseNumberDensity: 8e20,
    gases: handbook.map(({ formula, mass, collisionDiameter, thermalDiffusionFactor }) => ({
      formula,
      mass,
      collisionDiameter,
      thermalDiffusionFactor,
      moleFraction: fractions[formula] / sum,
    })),
    collisionParameters:
      exponents === "measured"
        ? parameters
        : parameters.map((row) =>
            row.map((b) => ({ ...b, coefficient: b.coefficient * 200 ** (b.exponent - 0.5), exponent: 0.5 })),
          ),
    temperature: { kind: "bates", base: 140, exosphere: 240, shape: 4e-5, referenceAltitude: 70e3 },
    eddy: { kind: "power", base: 30, exponent: 0.5, ceiling: 3000 },
    top: "auto",
  };
}
