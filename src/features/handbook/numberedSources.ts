import { rowSources, type HandbookSection, type Sourcing } from "./handbookTable";

/** Numbers of the sources of all that is shown, in the order in which one meets them. */
export function numberSources(sections: readonly HandbookSection[]): ReadonlyMap<string, number> {
  const numbers = new Map<string, number>();
  for (const { source } of sections.flatMap(sourcingsOf))
    if (!numbers.has(source)) numbers.set(source, numbers.size + 1);
  return numbers;
}

export interface SourceUse {
  source: string;
  number: number;
  /** What was taken from it and how, in words. */
  uses: string[];
}

/** The sources of one section, by number, each with what was taken from it. */
export function sourceUses(section: HandbookSection, numbers: ReadonlyMap<string, number>): SourceUse[] {
  const found = new Map<string, Set<string>>();
  for (const sourcing of sourcingsOf(section)) {
    const uses = found.get(sourcing.source) ?? new Set<string>();
    found.set(sourcing.source, uses);
    const words = wordsOf(sourcing);
    if (words) uses.add(words);
  }
  return [...found]
    .map(([source, uses]) => ({ source, number: numbers.get(source)!, uses: [...uses] }))
    .sort((a, b) => a.number - b.number);
}

const sourcingsOf = ({ tables }: HandbookSection): Sourcing[] =>
  tables.flatMap((table) => table.rows.flatMap((row) => rowSources(table, row)));

const markWords: Record<NonNullable<Sourcing["mark"]>, string> = {
  read: "read there",
  secondary: "as later works quote it",
  "from memory": "from memory",
  "by analogy": "by analogy",
};

function wordsOf({ mark, note }: Sourcing): string {
  return [note, mark && markWords[mark]].filter((word) => word !== undefined).join(", ");
}
