import type { HandbookSection, SectionId } from "./handbookTable";
import { bodiesSection } from "./tables/bodiesSection";
import { collisionsSection } from "./tables/collisionsSection";
import { constantsSection } from "./tables/constantsSection";
import { correctionsSection } from "./tables/correctionsSection";
import { gasesSection } from "./tables/gasesSection";
import { recombinationSection } from "./tables/recombinationSection";
import { findRows } from "./handbookTable";
import type { HandbookFilters } from "./useHandbookFilters";

const makers: Record<SectionId, (hasAllPairs: boolean) => HandbookSection> = {
  bodies: () => bodiesSection,
  gases: () => gasesSection,
  collisions: collisionsSection,
  corrections: () => correctionsSection,
  recombination: () => recombinationSection,
  constants: () => constantsSection,
};

/**
 * The sections that filters leave, without tables in which nothing is found. Collision parameters stay without a table
 * where only pairs that are folded away would be found.
 */
export function shownSections({ show, q, pairs }: HandbookFilters): HandbookSection[] {
  const isFolded = (id: SectionId): boolean =>
    id === "collisions" && pairs === "measured" && found(collisionsSection(true), q).tables.length > 0;
  return Object.entries(makers)
    .filter(([id]) => show === "everything" || show === id)
    .map(([, make]) => found(make(pairs === "all"), q))
    .filter(({ tables, id }) => tables.length > 0 || isFolded(id));
}

function found(section: HandbookSection, query: string): HandbookSection {
  const tables = section.tables.map((table) => ({ ...table, rows: findRows(table.rows, query) }));
  return { ...section, tables: tables.filter(({ rows }) => rows.length > 0) };
}
