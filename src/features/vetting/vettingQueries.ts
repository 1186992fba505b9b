import { queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import { z } from "zod";
import { vettingListResponse, vettingResponse, type ApproveVettingBody } from "../../../shared/schemas/vettings";
import { api } from "../../lib/api";

/** What waits for one's decision as a lead. */
export const queueQuery = queryOptions({
  queryKey: ["vettings"],
  queryFn: ({ signal }) => api.get("/vettings", vettingListResponse, { signal }),
});

export const vettingQuery = (id: string) =>
  queryOptions({
    queryKey: ["vettings", id],
    queryFn: ({ signal }) => api.get(`/vettings/${id}`, vettingResponse, { signal }),
  });

const published = z.object({ pin: z.string() });

/** What the lead may do with a request; whatever the answer, the queue is asked for anew. */
export function useVettingActs(id: string) {
  const queryClient = useQueryClient();
  const onSettled = () => queryClient.invalidateQueries({ queryKey: queueQuery.queryKey, exact: true });
  const address = `/vettings/${id}`;
  return {
    accept: useMutation({
      mutationFn: (accepted: string[]) => api.put(`${address}/accepted`, { accepted }, vettingResponse),
      onSuccess: (vetting) => queryClient.setQueryData(vettingQuery(id).queryKey, vetting),
    }),
    sendBack: useMutation({
      mutationFn: (remarks: string) => api.post(`${address}/return`, { remarks }, z.undefined()),
      onSettled,
    }),
    approve: useMutation({
      mutationFn: (body: ApproveVettingBody) => api.post(`${address}/approve`, body, published),
      onSettled,
    }),
  };
}
