import { partsOfPin, pinsIn } from "../language/readPin";
import type { OpenCell } from "./openCell";

/** Tells of references that a cell uses and that have a newer edition, or were withdrawn. Its numbers stay. */
export function sayHowReferencesStand(cell: OpenCell): void {
  for (const { node } of cell.entries) {
    for (const { pin, range } of pinsIn(node)) {
      const reference = cell.surroundings.reference(pin);
      if (!reference) continue;
      const { code, number, edition } = partsOfPin(pin)!;
      const words = `${code} ${number}, edition ${edition}`;
      if (reference.withdrawn !== null) {
        const reason = reference.withdrawn.replace(/[.\s]*$/, ".");
        cell.say("caution", "reference_withdrawn", `${words} was withdrawn: ${reason}`, range);
      }
      if (reference.newest > edition) {
        const newer = `${code}${number}.${reference.newest}`;
        const remedy = { label: `Change to ${newer}`, range, replacement: newer };
        const message = `${words} is superseded; the newest is edition ${reference.newest}.`;
        cell.say("remark", "newer_edition", message, range, remedy);
      }
    }
  }
}
