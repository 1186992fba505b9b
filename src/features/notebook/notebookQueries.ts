import { queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import { z } from "zod";
import type { NotebookDocument } from "../../../shared/notebook/document";
import {
  notebookResponse,
  saveDraftResponse,
  staleDraftProblem,
  type NotebookResponse,
} from "../../../shared/schemas/notebooks";
import {
  versionListResponse,
  versionResponse,
  versionSummary,
  type KeepVersionBody,
} from "../../../shared/schemas/versions";
import { api } from "../../lib/api";
import { ApiError } from "../../lib/ApiError";
import type { SaveOutcome } from "./draft/saveQueue";

/** How often an open notebook asks whether someone else has saved, ms: while it is told of it, and while it is not. */
export const lookIntervals = { live: 60_000, alone: 5_000 } as const;

export const notebookQuery = (id: string) =>
  queryOptions({
    queryKey: ["notebook", id],
    queryFn: ({ signal }) => api.get(`/notebooks/${id}`, notebookResponse, { signal }),
    refetchInterval: lookIntervals.alone,
    refetchOnWindowFocus: "always",
    staleTime: 0,
    retry: (failures, error) =>
      !(error instanceof ApiError && error.status >= 400 && error.status < 500) && failures < 2,
  });

export const versionsQuery = (id: string) =>
  queryOptions({
    queryKey: ["notebook", id, "versions"],
    queryFn: ({ signal }) => api.get(`/notebooks/${id}/versions`, versionListResponse, { signal }),
  });

/** A version never changes, so it is fetched once. */
export const versionQuery = (id: string, number: number) =>
  queryOptions({
    queryKey: ["notebook", id, "versions", number],
    queryFn: ({ signal }) => api.get(`/notebooks/${id}/versions/${number}`, versionResponse, { signal }),
    staleTime: Infinity,
  });

/** Sends a draft; whatever happens becomes an outcome. */
export async function saveDraft(
  id: string,
  body: { revision: number; document: NotebookDocument },
): Promise<SaveOutcome> {
  try {
    return { ok: true, ...(await api.put(`/notebooks/${id}/draft`, body, saveDraftResponse)) };
  } catch (error) {
    return saveFailure(error);
  }
}

function saveFailure(error: unknown): SaveOutcome {
  if (!(error instanceof ApiError)) return { ok: false, reason: "server" };
  if (error.status === 409) {
    const stale = staleDraftProblem.safeParse(error.body);
    if (stale.success) return { ok: false, reason: "stale", current: stale.data.current };
  }
  if (error.isOffline) return { ok: false, reason: "offline" };
  if (error.status === 401) return { ok: false, reason: "signedOut" };
  if (error.status >= 400 && error.status < 500 && error.status !== 408 && error.status !== 429) {
    return { ok: false, reason: "refused", message: error.issues[0]?.message ?? error.message };
  }
  return { ok: false, reason: "server" };
}

export function useKeepVersion(id: string) {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: (body: KeepVersionBody) => api.post(`/notebooks/${id}/versions`, body, versionSummary),
    onSuccess: (version) => {
      queryClient.setQueryData<NotebookResponse>(notebookQuery(id).queryKey, (notebook) =>
        notebook ? { ...notebook, lastVersion: version.number } : notebook,
      );
      void queryClient.invalidateQueries({ queryKey: versionsQuery(id).queryKey, exact: true });
      void queryClient.invalidateQueries({ queryKey: ["notebooks"] });
    },
  });
}

export function useRestoreVersion(id: string) {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: ({ number, revision }: { number: number; revision: number }) =>
      api.post(`/notebooks/${id}/versions/${number}/restore`, { revision }, z.unknown()),
    onSettled: () => queryClient.invalidateQueries({ queryKey: notebookQuery(id).queryKey, exact: true }),
  });
}

export function useDeleteNotebook(id: string) {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: () => api.delete(`/notebooks/${id}`),
    onSuccess: () => {
      queryClient.removeQueries({ queryKey: notebookQuery(id).queryKey });
      void queryClient.invalidateQueries({ queryKey: ["notebooks"] });
    },
  });
}
