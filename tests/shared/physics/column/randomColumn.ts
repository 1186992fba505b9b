import { atomicMass } from "../../../../shared/physics/constants/codata2022";
import type { ColumnInput, EddyProfile, TemperatureProfile } from "../../../../shared/physics/types";
import { seededRandom } from "../seededRandom";
import { collisionParametersOf, sampleGases } from "./sampleColumns";

/**
 * A column of a planet that nobody has seen: R 2e5–8e7 m, mean density 600–6000 kg/m³, T 50–5000 K, K 0–1e6 m²/s,
 * 1 to 12 gases of which a third are rich in hydrogen, 1e16–1e22 m⁻³ at the base. The same seed gives the same one.
 */
export function randomColumn(seed: number): ColumnInput {
  const random = seededRandom(seed);
  const between = (low: number, high: number) => low + (high - low) * random();
  const spread = (low: number, high: number) => Math.exp(between(Math.log(low), Math.log(high)));
  const oneOf = <T>(values: readonly T[]) => values[Math.floor(random() * values.length)];

  const radius = spread(2e5, 8e7);
  const density = between(600, 6000);
  const gravitationalParameter = 6.6743e-11 * density * (4 / 3) * Math.PI * radius ** 3;
  const baseAltitude = oneOf([0, 0.01, 0.03]) * radius;
  const size = 1 + Math.floor(random() * 12);
  const pool = [...sampleGases].sort(() => random() - 0.5).slice(0, size);
  const isHydrogenRich = random() < 0.3;
  const shares = pool.map((gas) => {
    const isLight = gas.molarMass <= 4;
    return isHydrogenRich === isLight ? spread(0.05, 1) : spread(1e-9, 0.3);
  });
  const sum = shares.reduce((a, b) => a + b, 0);
  const gases = pool.map((gas, i) => ({
    formula: gas.formula,
    mass: gas.molarMass * atomicMass.value,
    collisionDiameter: gas.diameter,
    thermalDiffusionFactor: gas.alpha,
    moleFraction: shares[i] / sum,
  }));

  const coldest = spread(50, 3000);
  const meanMass = gases.reduce((total, gas) => total + gas.mass * gas.moleFraction, 0);
  const gravity = gravitationalParameter / (radius + baseAltitude) ** 2;
  const scaleHeight = (1.380649e-23 * coldest) / (meanMass * gravity);
  const knots = (count: number) =>
    Float64Array.from(
      { length: count },
      (_, k) => baseAltitude + (k + between(-0.4, 0.4)) * between(1, 3) * scaleHeight,
    ).sort();
  const temperature = oneOf<() => TemperatureProfile>([
    () => ({ kind: "constant", temperature: coldest }),
    () => ({
      kind: "bates",
      base: coldest,
      exosphere: Math.min(5000, coldest * between(0.7, 5)),
      shape: between(0.1, 0.6) / scaleHeight,
      referenceAltitude: baseAltitude,
    }),
    () => {
      const altitudes = knots(2 + Math.floor(random() * 8));
      return { kind: "points", altitudes, temperatures: altitudes.map(() => coldest * between(0.8, 2)) };
    },
  ])();
  const baseEddy = spread(1, 1e6);
  const eddy = oneOf<() => EddyProfile>([
    () => ({ kind: "none" }),
    () => ({ kind: "constant", coefficient: baseEddy }),
    () => ({ kind: "power", base: baseEddy, exponent: between(0.2, 1), ceiling: baseEddy * spread(1, 1e3) }),
    () => {
      const altitudes = knots(2 + Math.floor(random() * 6));
      return { kind: "points", altitudes, coefficients: altitudes.map(() => baseEddy * spread(0.3, 30)) };
    },
  ])();
  const orbital = Math.sqrt(gravitationalParameter / (radius + baseAltitude) ** 3);
  const centrifugal =
    random() < 0.2 ? { angularSpeed: between(0, 0.3) * orbital, latitude: between(-1.5, 1.5) } : null;
  return {
    gravitationalParameter,
    radius,
    centrifugal,
    baseAltitude,
    baseNumberDensity: spread(1e16, 1e22),
    gases,
    collisionParameters: collisionParametersOf(gases, oneOf([0, 0.35])),
    temperature,
    eddy,
    top: centrifugal === null && random() < 0.3 ? baseAltitude + between(3, 40) * scaleHeight : "auto",
  };
}
