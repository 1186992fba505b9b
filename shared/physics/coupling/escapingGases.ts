import { escapeParameter } from "../escape/escapeParameter";
import { logEffusionVelocity } from "../escape/logEffusionVelocity";
import { logarithm } from "../numerics/elementary";
import type { ColumnLevel, CoupledGas, CoupledInput } from "../types";

/**
 * What leaves of each gas at an exobase.
 *
 *   Φ_Jeans = n w,   Φ = c Φ_Jeans,   F = 4πr² Φ
 *
 * @param exobase       the level
 * @param supplyShares  wJ/(1 + wJ)  [1]  of each gas of the input
 */
export function escapingGases(
  { gravitationalParameter, gases, corrections }: CoupledInput,
  exobase: Pick<ColumnLevel, "radius" | "temperature" | "logNumberDensities">,
  supplyShares: ArrayLike<number>,
): CoupledGas[] {
  const { radius, temperature, logNumberDensities } = exobase;
  const logArea = logarithm(4 * Math.PI * radius * radius);
  return gases.map(({ formula, mass: particleMass }, i) => {
    const lambda = escapeParameter({ gravitationalParameter, particleMass, temperature, radius });
    const logVelocity = logEffusionVelocity({ temperature, particleMass, escapeParameter: lambda });
    const logJeansFlux = logNumberDensities[i] + logVelocity;
    const logFlux = logJeansFlux + logarithm(corrections[formula] ?? 1);
    return { formula, logFlux, logJeansFlux, logRate: logFlux + logArea, supplyShare: supplyShares[i] };
  });
}
