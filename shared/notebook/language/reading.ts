import type { Note } from "../result";

/** What was read, with remarks and cautions; or the faults that prevented it. No notes where they were given before. */
export type Reading<Value> = { ok: true; value: Value; notes: Note[] } | { ok: false; notes: Note[] };

export const refused = (...notes: Note[]): { ok: false; notes: Note[] } => ({ ok: false, notes });

/** The value of each reading, or every note of those that failed. */
export function allOf<Values extends readonly unknown[]>(
  ...readings: { [Index in keyof Values]: Reading<Values[Index]> }
): Reading<Values> {
  const notes = readings.flatMap((reading) => reading.notes);
  const values: unknown[] = [];
  for (const reading of readings) if (reading.ok) values.push(reading.value);
  if (values.length < readings.length) return { ok: false, notes };
  return { ok: true, value: values as unknown as Values, notes };
}

/** The same for a list of any length. */
export function eachOf<Value>(readings: readonly Reading<Value>[]): Reading<Value[]> {
  const notes = readings.flatMap((reading) => reading.notes);
  const values = readings.flatMap((reading) => (reading.ok ? [reading.value] : []));
  return values.length < readings.length ? { ok: false, notes } : { ok: true, value: values, notes };
}

/** Reads what may be left out; null where it is. */
export const ifGiven = <Node, Value>(
  node: Node | undefined,
  read: (node: Node) => Reading<Value>,
): Reading<Value | null> => (node === undefined ? { ok: true, value: null, notes: [] } : read(node));
