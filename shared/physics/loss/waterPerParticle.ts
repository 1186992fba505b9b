const water = new Map([
  ["H", 0.5],
  ["H2", 1],
  ["O", 1],
  ["H2O", 1],
]);

/**
 * Molecules of water that the loss of one particle of a gas stands for.
 *
 *   H ½, H2 1, O 1, H2O 1
 *
 * @param formula  of the gas, such as "H"
 * @returns        [1]; null for a gas that stands for no water
 *
 * @assumes what escapes came from water and its other atoms left or were bound in step
 * @source  by the atoms in H2O
 */
export function waterPerParticle(formula: string): number | null {
  return water.get(formula) ?? null;
}
