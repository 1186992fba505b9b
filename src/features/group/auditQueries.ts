import { infiniteQueryOptions } from "@tanstack/react-query";
import { auditResponse, type AuditQuery } from "../../../shared/schemas/audit";
import { api } from "../../lib/api";

/** What of the trail is looked at; `from` in ISO 8601. */
export type AuditFilters = Pick<AuditQuery, "person" | "kind" | "from">;

/** The filters as an address holds them, with a leading question mark where there are any. */
export function auditAddress(filters: AuditFilters, before?: number): string {
  const given = Object.entries({ ...filters, before }).filter(([, value]) => value !== undefined);
  const search = new URLSearchParams(given.map(([name, value]) => [name, String(value)]));
  return search.size > 0 ? `?${search.toString()}` : "";
}

export const auditTrailQuery = (groupId: string, filters: AuditFilters) =>
  infiniteQueryOptions({
    queryKey: ["groups", groupId, "audit", filters],
    queryFn: ({ pageParam, signal }) =>
      api.get(`/groups/${groupId}/audit${auditAddress(filters, pageParam)}`, auditResponse, { signal }),
    initialPageParam: undefined as number | undefined,
    getNextPageParam: ({ next }) => next ?? undefined,
  });
