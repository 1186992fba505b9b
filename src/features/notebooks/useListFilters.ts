import { useSearchParams } from "react-router-dom";
import type { NotebookListQuery } from "../../../shared/schemas/notebooks";

export type ListOrder = NotebookListQuery["order"];
export type ListPlace = NotebookListQuery["place"];

const shortest: NotebookListQuery = { q: "", order: "changed", place: "shelf" };

const places: readonly ListPlace[] = ["shelf", "archived", "bin"];

/** The filters as an address holds them; whatever it does not say, or says wrongly, is as usual. */
export function readListFilters(address: URLSearchParams): NotebookListQuery {
  return {
    q: (address.get("q") ?? "").slice(0, 200),
    order: address.get("order") === "title" ? "title" : "changed",
    place: places.find((place) => place === address.get("place")) ?? "shelf",
  };
}

/** The address of filters: what is as usual is left out. */
export function writeListFilters(filters: NotebookListQuery): Record<string, string> {
  return Object.fromEntries(
    Object.entries(filters).filter(([name, value]) => value !== shortest[name as keyof NotebookListQuery]),
  );
}

/** What the list shows, kept in the address so that it survives a reload and can be sent to another. */
export function useListFilters(): [NotebookListQuery, (change: Partial<NotebookListQuery>) => void] {
  const [address, setAddress] = useSearchParams();
  const filters = readListFilters(address);
  const change = (next: Partial<NotebookListQuery>): void =>
    setAddress(writeListFilters({ ...filters, ...next }), { replace: true, preventScrollReset: true });
  return [filters, change];
}
