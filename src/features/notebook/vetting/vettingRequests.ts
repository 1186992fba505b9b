import { queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import { z } from "zod";
import { vettingListResponse, vettingSummary, type RequestVettingBody } from "../../../../shared/schemas/vettings";
import { api } from "../../../lib/api";

/** Requests for versions of one notebook, newest first. */
export const notebookVettingsQuery = (notebookId: string) =>
  queryOptions({
    queryKey: ["notebooks", notebookId, "vettings"],
    queryFn: ({ signal }) => api.get(`/notebooks/${notebookId}/vettings`, vettingListResponse, { signal }),
  });

export function useRequestVetting(notebookId: string) {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: ({ number, body }: { number: number; body: RequestVettingBody }) =>
      api.post(`/notebooks/${notebookId}/versions/${number}/vetting`, body, vettingSummary),
    onSuccess: () => queryClient.invalidateQueries({ queryKey: notebookVettingsQuery(notebookId).queryKey }),
  });
}

export function useTakeBackVetting(notebookId: string) {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: (id: string) => api.post(`/vettings/${id}/take-back`, {}, z.undefined()),
    onSettled: () => queryClient.invalidateQueries({ queryKey: notebookVettingsQuery(notebookId).queryKey }),
  });
}
