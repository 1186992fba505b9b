/** An input that no model can answer for: what it is, its value, and what is required of it. */
export class PhysicsDomainError extends Error {
  readonly quantity: string;
  readonly value: number;
  readonly requirement: string;

  constructor(quantity: string, value: number, requirement: string) {
    super(`The ${quantity} is ${value}; it must be ${requirement}.`);
    this.name = "PhysicsDomainError";
    this.quantity = quantity;
    this.value = value;
    this.requirement = requirement;
  }
}
