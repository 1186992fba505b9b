import { avogadro, boltzmann, gravitationalConstant } from "../../physics";
import { dimensionless } from "./dimensions";
import type { Quantity } from "./quantity";
import type { ConstantName } from "./reservedWord";

/** Constants that an expression may name, in SI. */
export const constants: Readonly<Record<ConstantName, Quantity>> = {
  pi: { value: Math.PI, dimension: dimensionless },
  k_B: { value: boltzmann.value, dimension: [2, 1, -2, -1, 0, 0] },
  G: { value: gravitationalConstant.value, dimension: [3, -1, -2, 0, 0, 0] },
  N_A: { value: avogadro.value, dimension: [0, 0, 0, 0, -1, 0] },
};

export const findConstant = (name: string): Quantity | undefined =>
  Object.hasOwn(constants, name) ? constants[name as ConstantName] : undefined;
