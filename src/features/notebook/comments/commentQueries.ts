import { queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import { z } from "zod";
import {
  readersResponse,
  thread,
  threadListResponse,
  type BeginThreadBody,
  type ThreadListResponse,
} from "../../../../shared/schemas/comments";
import { api } from "../../../lib/api";
import { noticesQuery } from "../../../lib/notices";

/** Threads of the draft, or of a kept version. */
export const threadsQuery = (id: string, version: number | null) =>
  queryOptions({
    queryKey: ["notebook", id, "threads", version],
    queryFn: ({ signal }) =>
      api.get(
        `/notebooks/${id}/threads${version === null ? "" : `?version=${version}`}`,
        threadListResponse,
        {
          signal,
        },
      ),
    // Others' comments are told of as they come; this is for when nothing can be told.
    refetchInterval: 60_000,
  });

export const readersQuery = (id: string) =>
  queryOptions({
    queryKey: ["notebook", id, "readers"],
    queryFn: ({ signal }) => api.get(`/notebooks/${id}/readers`, readersResponse, { signal }),
    staleTime: 60_000,
  });

/** What can be done to the threads of one place. What the server answers is shown at once. */
export function useThreadActs(id: string, version: number | null) {
  const queryClient = useQueryClient();
  const at = `/notebooks/${id}/threads`;
  const { queryKey } = threadsQuery(id, version);
  const refresh = () => queryClient.invalidateQueries({ queryKey });

  const put = (changed: ThreadListResponse[number]) => {
    queryClient.setQueryData(queryKey, (known = []) =>
      known.some((one) => one.id === changed.id)
        ? known.map((one) => (one.id === changed.id ? changed : one))
        : [...known, changed],
    );
    void refresh();
  };

  const begin = useMutation({
    mutationFn: (body: Omit<BeginThreadBody, "version">) => api.post(at, { ...body, version }, thread),
    onSuccess: put,
  });
  const reply = useMutation({
    mutationFn: ({ threadId, text }: { threadId: string; text: string }) =>
      api.post(`${at}/${threadId}/comments`, { text }, thread),
    onSuccess: put,
  });
  const edit = useMutation({
    mutationFn: ({ threadId, commentId, text }: { threadId: string; commentId: string; text: string }) =>
      api.patch(`${at}/${threadId}/comments/${commentId}`, { text }, thread),
    onSuccess: put,
  });
  const remove = useMutation({
    mutationFn: ({ threadId, commentId }: { threadId: string; commentId: string }) =>
      api.delete(`${at}/${threadId}/comments/${commentId}`),
    onSettled: refresh,
  });
  const resolve = useMutation({
    mutationFn: ({ threadId, isResolved }: { threadId: string; isResolved: boolean }) =>
      api.put(`${at}/${threadId}/resolution`, { isResolved }, thread),
    onSuccess: put,
    onError: refresh,
  });
  const see = useMutation({
    mutationFn: async ({ threadId, commentId }: { threadId: string; commentId: string }) => {
      await api.put(`${at}/${threadId}/seen`, { commentId }, z.unknown());
    },
    onSuccess: () => {
      void refresh();
      void queryClient.invalidateQueries({ queryKey: noticesQuery.queryKey });
    },
  });
  return { begin, reply, edit, remove, resolve, see };
}

export type ThreadActs = ReturnType<typeof useThreadActs>;
