import type { UnitSystem } from "../../lib/format";
import { Rich } from "../../lib/Rich";
import { TextButton } from "../../ui/TextButton";
import type { HandbookSection, TableRow } from "./handbookTable";
import { HandbookTableView } from "./HandbookTableView";
import { sourceUses } from "./numberedSources";
import { SourceList } from "./SourceList";
import { gasesSection } from "./tables/gasesSection";

interface HandbookSectionViewProps {
  section: HandbookSection;
  numbers: ReadonlyMap<string, number>;
  units: UnitSystem;
  /** Only for collision parameters: whether estimated pairs are shown, and the word that shows or folds them. */
  fold?: { isOpen: boolean; onToggle: () => void };
  onPut: (row: TableRow) => void;
}

const gases = gasesSection.tables.flatMap(({ rows }) => rows.map(({ key }) => key));

/** A heading, what its numbers are, their tables, and where they come from beside them. */
export function HandbookSectionView({ section, numbers, units, fold, onPut }: HandbookSectionViewProps) {
  const { id, title, about, tables } = section;
  return (
    <section className="handbook-section pt-28" aria-labelledby={id}>
      <div className="min-w-0">
        <h2 id={id} className="type-section">
          <a href={`#${id}`} className="text-ink no-underline hover:underline">
            {title}
          </a>
        </h2>
        <p className="max-w-[46em] pt-6 text-[16px]/[24px] text-ink2">
          <Rich text={about} />{" "}
          {fold && (
            <TextButton
              className="text-[14.5px]"
              aria-expanded={fold.isOpen}
              onClick={fold.onToggle}
              data-print="never"
            >
              {fold.isOpen ? "Measured pairs only" : "All pairs"}
            </TextButton>
          )}
        </p>
        {tables.map((table) => (
          <HandbookTableView
            key={table.id}
            table={table}
            gases={gases}
            sectionId={id}
            numbers={numbers}
            units={units}
            hasCaption={tables.length > 1}
            onPut={onPut}
          />
        ))}
        {tables.length === 0 && <p className="pt-18 type-abstract">No measured pair of that name.</p>}
      </div>
      {tables.length > 0 && (
        <SourceList sectionId={id} title={title} sources={sourceUses(section, numbers)} />
      )}
    </section>
  );
}
