import { nameFault } from "../language/reservedWord";
import { findGas } from "../../physics";
import type { TextRange } from "../result";
import type { OpenCell } from "./openCell";

/** Says why a name cannot be given to a cell (`at` undefined) or to an entry; true where it can. */
export function checkName(cell: OpenCell, name: string, at?: TextRange): boolean {
  const reason = nameFault(name) ?? gasFault(name);
  if (reason !== null) {
    cell.say("fault", "bad_name", reason, at);
    return false;
  }
  const earlier = cell.surroundings.definedAbove(name);
  if (earlier === null) return true;
  cell.say(
    "fault",
    "name_twice",
    `*${name}* is already the name of ${earlier} above; names are given once. Choose another.`,
    at,
  );
  return false;
}

function gasFault(name: string): string | null {
  return findGas(name) === undefined ? null : `*${name}* is a gas, so it can't be a name.`;
}
