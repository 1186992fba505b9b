import { atomicMass } from "../constants/codata2022";
import { requirePositive } from "../guards";
import type { CollisionParameter } from "../types";
import { collisionRows } from "./collisionRows";
import type { HandbookGas } from "./handbookGases";

type CollidingGas = Pick<HandbookGas, "formula" | "mass">;

/** A of the estimate, m⁻¹ s⁻¹ K^−½, for masses in u. */
const estimateCoefficient = 1.52e20;

const isDeuterated = (gas: CollidingGas): boolean => gas.formula === "D" || gas.formula === "HD";

/**
 * Default binary collision parameter of two gases.
 *
 *   b = n D = A (T/1 K)^s: the first measured row of the pair in `collisionRows`; without one, and for D and HD
 *   with whatever gas, the estimate for rigid spheres (of 3 Å)
 *   b = 1.52×10¹⁸ cm⁻¹ s⁻¹ (1/Mᵢ + 1/Mⱼ)^½ (T/1 K)^½,   M in u
 *
 * @param gasA  formula, and mass of one particle m [kg] above zero
 * @param gasB  the same; the order of the two does not matter
 * @returns     A [m⁻¹ s⁻¹], s [1], its source, and whether it is the estimate
 *
 * @assumes a stated mass does not change a measured row
 * @throws  PhysicsDomainError if a mass is not above zero
 * @source  [BanksKockarts1973] eq. 15.29 for the estimate; each row names its own
 */
export function collisionParameter(gasA: CollidingGas, gasB: CollidingGas): CollisionParameter {
  requirePositive("particle mass", gasA.mass);
  requirePositive("particle mass", gasB.mass);
  const measured =
    isDeuterated(gasA) || isDeuterated(gasB) ? undefined : measuredRow(gasA.formula, gasB.formula);
  if (measured) {
    const { coefficient, exponent, provenance } = measured;
    return { coefficient, exponent, source: provenance.source, isEstimate: false };
  }
  const inverseMasses = atomicMass.value / gasA.mass + atomicMass.value / gasB.mass;
  return {
    coefficient: estimateCoefficient * Math.sqrt(inverseMasses),
    exponent: 0.5,
    source: "BanksKockarts1973",
    isEstimate: true,
  };
}

function measuredRow(formulaA: string, formulaB: string) {
  return collisionRows.find(
    ({ gases: [first, second], basis }) =>
      basis === "measured" &&
      ((first === formulaA && second === formulaB) || (first === formulaB && second === formulaA)),
  );
}
