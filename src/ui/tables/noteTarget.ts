import type { Note } from "../../../shared/notebook/result";

/** Which number of an escape table a note speaks of; `key` null marks the gas itself. */
export interface NoteTarget {
  gas: string;
  key: string | null;
}

/** Columns by a word of the note's code. */
const columns: readonly [word: string, key: string][] = [
  ["collision", "diffusion_limit"],
  ["supply", "supply_fraction"],
  ["limit", "diffusion_limit"],
  ["depletion", "depletion_time"],
  ["drift", "jeans_flux"],
  ["jeans", "jeans_flux"],
];

/** null where a note speaks of the whole table. */
export function noteTarget({ code, message }: Note, gases: readonly string[]): NoteTarget | null {
  const words = message.split(/[^A-Za-z0-9]+/);
  const gas = words.find((word) => gases.includes(word));
  if (gas === undefined) return null;
  return { gas, key: columns.find(([word]) => code.includes(word))?.[1] ?? null };
}
