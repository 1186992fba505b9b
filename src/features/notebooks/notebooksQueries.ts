import { keepPreviousData, queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import { z } from "zod";
import {
  notebookListResponse,
  type CreateNotebookBody,
  type ImportNotebookBody,
  type NotebookListQuery,
} from "../../../shared/schemas/notebooks";
import { api } from "../../lib/api";

/** How often a list asks for summaries that are still to come, ms. */
const summaryInterval = 2500;

const listKey = ["notebooks"] as const;

export const notebooksQuery = ({ q, order, place }: NotebookListQuery) =>
  queryOptions({
    queryKey: [...listKey, { q, order, place }],
    queryFn: ({ signal }) =>
      api.get(`/notebooks?${new URLSearchParams({ q, order, place }).toString()}`, notebookListResponse, {
        signal,
      }),
    placeholderData: keepPreviousData,
    // The server computes a summary shortly after each save; a list that waits for one asks again.
    refetchInterval: ({ state }) =>
      state.data?.notebooks.some((notebook) => notebook.summary === null) ? summaryInterval : false,
  });

/** Of a notebook just made only the id is needed: its page asks for the rest. */
const madeNotebook = z.object({ id: z.string() });

function useListChange<Input, Answer>(change: (input: Input) => Promise<Answer>) {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: change,
    onSettled: () => queryClient.invalidateQueries({ queryKey: listKey }),
  });
}

/** An imported one comes with what was noticed on the way. */
const importedNotebook = madeNotebook.extend({
  notes: z.array(z.object({ message: z.string(), line: z.number().optional() })).default([]),
});

export const useCreateNotebook = () =>
  useListChange((body: CreateNotebookBody) => api.post("/notebooks", body, madeNotebook));

export const useImportNotebook = () =>
  useListChange((body: ImportNotebookBody) => api.post("/notebooks/import", body, importedNotebook));

export const useRenameNotebook = () =>
  useListChange(({ id, title }: { id: string; title: string }) =>
    api.patch(`/notebooks/${id}`, { title }, z.unknown()),
  );

/** To the bin, from which it can be put back for 30 days. */
export const useDeleteNotebook = () => useListChange((id: string) => api.delete(`/notebooks/${id}`));

export const useRestoreNotebook = () =>
  useListChange((id: string) => api.post(`/notebooks/${id}/restore-from-bin`, {}, z.unknown()));

/** A copy of one's own, on one's own shelf. */
export const useDuplicateNotebook = () =>
  useListChange((id: string) => api.post(`/notebooks/${id}/duplicate`, { groupId: null }, madeNotebook));

export const useArchiveNotebook = () =>
  useListChange(({ id, isArchived }: { id: string; isArchived: boolean }) =>
    api.post(`/notebooks/${id}/${isArchived ? "archive" : "unarchive"}`, {}, z.unknown()),
  );

/** To a group, or with null to one's own shelf. */
export const useMoveNotebook = () =>
  useListChange(({ id, groupId }: { id: string; groupId: string | null }) =>
    api.post(`/notebooks/${id}/move`, { groupId }, z.unknown()),
  );
