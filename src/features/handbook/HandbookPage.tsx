import { lazy, Suspense, useCallback, useEffect, useMemo, useState } from "react";
import { useLocation } from "react-router-dom";
import { engineVersion } from "../../../shared/notebook/engine";
import type { UnitSystem } from "../../lib/format";
import { AltitudeRule } from "../../ui/AltitudeRule";
import { Page } from "../../ui/Page";
import { SearchField } from "../../ui/SearchField";
import { TextButton } from "../../ui/TextButton";
import { WordMenu } from "../../ui/WordMenu";
import { shownSections } from "./handbookSections";
import type { TableRow } from "./handbookTable";
import { HandbookSectionView } from "./HandbookSectionView";
import { numberSources } from "./numberedSources";
import { useHandbookFilters, type HandbookFilters } from "./useHandbookFilters";
import "./handbook.css";

const PutDialog = lazy(() => import("./PutDialog").then((file) => ({ default: file.PutDialog })));

const shows: readonly { value: HandbookFilters["show"]; label: string }[] = [
  { value: "everything", label: "everything" },
  { value: "bodies", label: "bodies" },
  { value: "gases", label: "gases" },
  { value: "collisions", label: "collision parameters" },
  { value: "corrections", label: "kinetic corrections" },
  { value: "recombination", label: "recombination" },
  { value: "constants", label: "constants" },
];
const systems: readonly { value: UnitSystem; label: string }[] = [
  { value: "SI", label: "SI" },
  { value: "cgs", label: "cgs" },
];

/** The built-in constants, each with its source, open to everyone. */
export function HandbookPage() {
  const [filters, change] = useHandbookFilters();
  const { show, units, pairs, q } = filters;
  const [put, setPut] = useState<TableRow | null>(null);
  const sections = useMemo(() => shownSections({ show, units, pairs, q }), [show, units, pairs, q]);
  const numbers = useMemo(() => numberSources(sections), [sections]);
  const handleSearch = useCallback((next: string) => change({ q: next }), [change]);
  useAnchor();

  return (
    <Page title="Handbook" width={1124}>
      <AltitudeRule width={1124} className="mt-28 wide:mt-44" />
      <h1 className="pt-28 type-display">Handbook</h1>
      <p className="pt-6 text-[18px]/[28px] text-ink2 italic">
        Published constants, each with its source. Part of engine {engineVersion}.
      </p>
      <div className="flex flex-wrap items-center justify-between gap-x-44 gap-y-12 pt-28" data-print="never">
        <p className="font-serif text-[20px]/[32px]">
          Show{" "}
          <WordMenu label="Show" value={show} options={shows} onChange={(next) => change({ show: next })} />
          {", in "}
          <WordMenu
            label="Units"
            value={units}
            options={systems}
            onChange={(next) => change({ units: next })}
          />
        </p>
        <div className="flex w-full wide:w-auto">
          <SearchField label="Search names and formulas" value={q} onChange={handleSearch} />
        </div>
      </div>
      {sections.map((section) => (
        <HandbookSectionView
          key={section.id}
          section={section}
          numbers={numbers}
          units={units}
          fold={
            section.id === "collisions"
              ? {
                  isOpen: pairs === "all",
                  onToggle: () => change({ pairs: pairs === "all" ? "measured" : "all" }),
                }
              : undefined
          }
          onPut={setPut}
        />
      ))}
      {sections.length === 0 && (
        <p className="mt-18 border-t-[1.5px] border-ink pt-18 type-abstract" role="status">
          Nothing {show === "everything" ? "in the handbook" : "here"} with “{q}” in its name or formula.
          <TextButton className="ml-12" onClick={() => change({ q: "", show: "everything" })}>
            Show everything
          </TextButton>
        </p>
      )}
      <Suspense>{put && <PutDialog row={put} onClose={() => setPut(null)} />}</Suspense>
    </Page>
  );
}

/** The page is made after its address was read, so what the address points at is gone to once it is there. */
function useAnchor(): void {
  const { hash } = useLocation();
  useEffect(
    function goToAnchor() {
      if (hash.length > 1) document.getElementById(decodeURIComponent(hash.slice(1)))?.scrollIntoView();
    },
    [hash],
  );
}
