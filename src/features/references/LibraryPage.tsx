import { useQuery } from "@tanstack/react-query";
import { useCallback, useState } from "react";
import { Link } from "react-router-dom";
import type { ReferenceSummary } from "../../../shared/schemas/references";
import { formatDay } from "../../lib/format";
import { Opening } from "../../ui/Opening";
import { Page } from "../../ui/Page";
import { ProblemPage } from "../../ui/ProblemPage";
import { SearchField } from "../../ui/SearchField";
import { WordMenu } from "../../ui/WordMenu";
import { libraryQuery, type LibraryFilters } from "./referenceQueries";
import { ReferenceStanding } from "./ReferenceStanding";

const states: readonly { value: LibraryFilters["state"]; label: string }[] = [
  { value: "current", label: "that are current" },
  { value: "superseded", label: "that are superseded" },
  { value: "withdrawn", label: "that were withdrawn" },
  { value: "any", label: "of any standing" },
];

/** Published references that one may read: a sentence to filter them, and a search. */
export function LibraryPage() {
  const [filters, setFilters] = useState<LibraryFilters>({ q: "", state: "current" });
  const library = useQuery(libraryQuery(filters));
  const handleSearch = useCallback((q: string) => setFilters((before) => ({ ...before, q })), []);
  if (library.isPending) return <Opening what="the references" />;
  if (!library.data) return <ProblemPage error={library.error} onRetry={() => void library.refetch()} />;
  return (
    <Page title="References" width={880}>
      <div className="flex flex-wrap items-center justify-between gap-18 pt-28 wide:pt-44">
        <h1 className="type-display">References</h1>
        <SearchField label="Search titles, summaries and authors" value={filters.q} onChange={handleSearch} />
      </div>
      <p data-print="never" className="pt-28 pb-10 font-serif text-[20px]/[32px]">
        References{" "}
        <WordMenu
          label="Standing"
          value={filters.state}
          options={states}
          onChange={(state) => setFilters((before) => ({ ...before, state }))}
        />
      </p>
      {library.data.length > 0 ? (
        <ul className="ruled-list" aria-label="References" aria-busy={library.isPlaceholderData}>
          {library.data.map((reference) => (
            <ReferenceLine key={reference.pin} reference={reference} />
          ))}
        </ul>
      ) : (
        <p className="max-w-[34em]" role="status">
          {filters.q !== "" || filters.state !== "current"
            ? "No reference answers to this. Search for less, or for any standing."
            : "No reference can be read here yet. One is published when a group’s lead approves a version that was put before them."}
        </p>
      )}
    </Page>
  );
}

function ReferenceLine({ reference }: { reference: ReferenceSummary }) {
  const { pin, group, number, edition, title, summary, authors, state, publishedAt } = reference;
  return (
    <li className="reference-line">
      <p className="reference-line-number">
        {group.code} {number}
        <span> edition {edition}</span>
      </p>
      <div className="min-w-0">
        <Link to={`/references/${pin}`} className="font-serif text-[20px]/[28px]">
          {title}
        </Link>
        <p className="font-serif text-ink2 italic">{authors.join(", ")}</p>
        <p className="line-clamp-2">{summary}</p>
        <p className="type-label text-ink3">
          <ReferenceStanding state={state} />, {group.name}, {formatDay(new Date(publishedAt), new Date())}
        </p>
      </div>
    </li>
  );
}
