import { parseEntries } from "../../../../shared/notebook/language/parseEntries";

/** An entry with the remarks and blank lines over it: what is kept or dropped as one when two texts are joined. */
export interface EntryBlock {
  /** The key, numbered where a cell has it twice; "remarks" for what stands after the last entry. */
  id: string;
  /** Whole lines, without the last line end. */
  text: string;
}

/** A cell's text cut into blocks; joined again they give the text to the character, save spaces at its end. */
export function entryBlocks(text: string): EntryBlock[] {
  const lines = text.split("\n");
  const blocks: EntryBlock[] = [];
  const seen = new Map<string, number>();
  let next = 0;
  for (const entry of parseEntries(text).entries) {
    // Two entries on one line belong together.
    if (entry.endLine <= next) continue;
    const count = (seen.get(entry.key) ?? 0) + 1;
    seen.set(entry.key, count);
    blocks.push({
      id: count === 1 ? entry.key : `${entry.key} ${count}`,
      text: lines.slice(next, entry.endLine).join("\n"),
    });
    next = entry.endLine;
  }
  const rest = lines.slice(next).join("\n");
  if (rest.trim() !== "") blocks.push({ id: "remarks", text: rest });
  return blocks;
}

export function joinBlocks(blocks: readonly EntryBlock[]): string {
  return blocks.map(({ text }) => text).join("\n");
}
