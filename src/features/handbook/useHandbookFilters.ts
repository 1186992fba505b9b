import { useCallback } from "react";
import { useSearchParams } from "react-router-dom";
import type { UnitSystem } from "../../lib/format";
import { sectionIds, type SectionId } from "./handbookTable";

export interface HandbookFilters {
  show: SectionId | "everything";
  units: UnitSystem;
  /** Whether the pairs of which only an estimate acts are shown too. */
  pairs: "measured" | "all";
  q: string;
}

const usual: HandbookFilters = { show: "everything", units: "SI", pairs: "measured", q: "" };

/** The filters as an address holds them; whatever it does not say, or says wrongly, is as usual. */
export function readHandbookFilters(address: URLSearchParams): HandbookFilters {
  return {
    show: sectionIds.find((id) => id === address.get("show")) ?? usual.show,
    units: address.get("units") === "cgs" ? "cgs" : "SI",
    pairs: address.get("pairs") === "all" ? "all" : "measured",
    q: (address.get("q") ?? "").slice(0, 100),
  };
}

/** What the page shows, kept in the address so that it survives a reload and can be sent to another. */
export function useHandbookFilters(): [HandbookFilters, (change: Partial<HandbookFilters>) => void] {
  const [address, setAddress] = useSearchParams();
  const change = useCallback(
    (next: Partial<HandbookFilters>) =>
      setAddress(
        (now) => {
          const filters = Object.entries({ ...readHandbookFilters(now), ...next });
          return Object.fromEntries(
            filters.filter(([name, value]) => value !== usual[name as keyof HandbookFilters]),
          );
        },
        { replace: true, preventScrollReset: true },
      ),
    [setAddress],
  );
  return [readHandbookFilters(address), change];
}
