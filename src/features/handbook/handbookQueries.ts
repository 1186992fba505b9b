import { queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import { addHandbookCell, type CellPlace } from "../../../shared/notebook/addHandbookCell";
import type { Cell } from "../../../shared/notebook/document";
import type { HandbookCell } from "../../../shared/notebook/handbookCells";
import { notebookListResponse, notebookResponse, saveDraftResponse } from "../../../shared/schemas/notebooks";
import { ApiError } from "../../lib/ApiError";
import { api } from "../../lib/api";

/** Notebooks that one may write in, last changed first. */
export const writableNotebooksQuery = queryOptions({
  queryKey: ["notebooks", "writable"],
  queryFn: ({ signal }) => api.get("/notebooks?order=changed&place=shelf", notebookListResponse, { signal }),
  select: ({ notebooks }) => notebooks.filter(({ abilities }) => abilities.edit),
});

interface PutCell {
  notebookId: string;
  choices: readonly HandbookCell[];
  place: CellPlace;
}

/** Why a cell could not be put in, where it is not the server that says so. */
export class CellRefused extends Error {}

/** Someone else's save in between is answered by beginning again from what they saved, once. */
const attempts = 2;

/** Puts a cell into a draft as the server has it now, and answers with the cell as it stands there. */
export async function putHandbookCell({ notebookId, choices, place }: PutCell): Promise<Cell> {
  for (let attempt = 1; ; attempt += 1) {
    const { revision, document } = await api.get(`/notebooks/${notebookId}`, notebookResponse);
    const added = addHandbookCell(document, choices, crypto.randomUUID(), place);
    if (!added.ok) throw new CellRefused(added.message);
    try {
      const body = { revision, document: added.document };
      await api.put(`/notebooks/${notebookId}/draft`, body, saveDraftResponse);
      return added.cell;
    } catch (error) {
      const isStale = error instanceof ApiError && error.status === 409;
      if (!isStale) throw error;
      if (attempt === attempts)
        throw new CellRefused(
          "Someone else is saving this notebook at the moment, twice in a row. Nothing was put in; try again in a minute.",
        );
    }
  }
}

export function usePutHandbookCell() {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: putHandbookCell,
    onSuccess: (_cell, { notebookId }) => {
      void queryClient.invalidateQueries({ queryKey: ["notebook", notebookId] });
      void queryClient.invalidateQueries({ queryKey: ["notebooks"] });
    },
  });
}
