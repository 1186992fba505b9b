import { keepPreviousData, queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import {
  libraryResponse,
  referenceResponse,
  type DescribeReferenceBody,
  type LibraryQuery,
} from "../../../shared/schemas/references";
import { api } from "../../lib/api";

export type LibraryFilters = Pick<LibraryQuery, "q" | "state">;

export const libraryQuery = ({ q, state }: LibraryFilters) =>
  queryOptions({
    queryKey: ["references", "library", q, state],
    queryFn: ({ signal }) =>
      api.get(`/references?${new URLSearchParams({ q, state }).toString()}`, libraryResponse, { signal }),
    placeholderData: keepPreviousData,
  });

export const referenceQuery = (pin: string) =>
  queryOptions({
    queryKey: ["references", "edition", pin],
    queryFn: ({ signal }) => api.get(`/references/${encodeURIComponent(pin)}`, referenceResponse, { signal }),
  });

export function useReferenceActs(pin: string) {
  const queryClient = useQueryClient();
  const onSuccess = () => queryClient.invalidateQueries({ queryKey: ["references"] });
  return {
    withdraw: useMutation({
      mutationFn: (reason: string) => api.post(`/references/${pin}/withdraw`, { reason }, referenceResponse),
      onSuccess,
    }),
    describe: useMutation({
      mutationFn: (body: DescribeReferenceBody) => api.patch(`/references/${pin}`, body, referenceResponse),
      onSuccess,
    }),
  };
}
