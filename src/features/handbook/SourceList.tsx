import { references } from "../../../shared/physics";
import type { SourceUse } from "./numberedSources";

interface SourceListProps {
  sectionId: string;
  title: string;
  sources: readonly SourceUse[];
}

/** Where the numbers of a section come from, in full, with what was taken from each and how. */
export function SourceList({ sectionId, title, sources }: SourceListProps) {
  return (
    <aside aria-label={`Sources of ${title}`} className="mt-28 border-t border-ink pt-10 handbook-sources">
      <h3 className="pb-6 font-sans text-[13px]/[18px] font-semibold">Sources</h3>
      <ol>
        {sources.map(({ source, number, uses }) => (
          <li key={source} id={`${sectionId}-source-${number}`} value={number}>
            <span aria-hidden="true">{number}</span>
            <span className="min-w-0">
              {references[source]}
              {uses.map((use) => (
                <small key={use}>{use}</small>
              ))}
            </span>
          </li>
        ))}
      </ol>
    </aside>
  );
}
