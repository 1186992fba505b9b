import type { Note } from "../result";
import { linesOf } from "./splitEntries";
import type { Entry } from "./syntax";

/** The last of ascending starts that is at or before a place. */
function lastAtOrBefore(starts: readonly number[], place: number): number {
  let low = 0;
  let high = starts.length - 1;
  while (low < high) {
    const middle = (low + high + 1) >> 1;
    if (starts[middle] <= place) low = middle;
    else high = middle - 1;
  }
  return low;
}

/** Gives each note that has a range its line, and the key of the entry in which it lies. What is there stays. */
export function locateNotes(notes: readonly Note[], text: string, entries: readonly Entry[]): Note[] {
  if (notes.length === 0) return [];
  const lineStarts = linesOf(text).map((line) => line.from);
  const entryStarts = entries.map((entry) => entry.range.from);
  return notes.map((note) => {
    if (!note.range) return note;
    const line = note.line ?? lastAtOrBefore(lineStarts, note.range.from) + 1;
    if (note.entry !== undefined || entries.length === 0) return { ...note, line };
    const entry = entries[lastAtOrBefore(entryStarts, note.range.from)];
    const isInside = note.range.from >= entry.range.from && line <= entry.endLine;
    return isInside ? { ...note, line, entry: entry.key } : { ...note, line };
  });
}
