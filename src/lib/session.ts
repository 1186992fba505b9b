/** Who is signed in, as every room may ask. */
import { queryOptions, useQuery } from "@tanstack/react-query";
import { sessionResponse, type Account } from "../../shared/schemas/session";
import { api } from "./api";

export const sessionQuery = queryOptions({
  queryKey: ["session"],
  queryFn: ({ signal }) => api.get("/session", sessionResponse, { signal }),
  staleTime: Infinity,
  gcTime: Infinity,
});

/** The person signed in; null before it is known and when nobody is. */
export function useAccount(): Account | null {
  return useQuery(sessionQuery).data?.user ?? null;
}
