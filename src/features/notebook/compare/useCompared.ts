import { useQuery } from "@tanstack/react-query";
import { useMemo } from "react";
import type { NotebookDocument } from "../../../../shared/notebook/document";
import type { CellEvaluation } from "../../../../shared/notebook/result";
import type { NotebookResponse } from "../../../../shared/schemas/notebooks";
import type { UnitSystem } from "../../../lib/format";
import { useEvaluation } from "../evaluation/useEvaluation";
import { versionQuery } from "../notebookQueries";
import { withKeptResults } from "../versions/withKeptResults";

/** A state of a notebook that can be compared: its draft, or the number of a version. */
export type StateName = "draft" | number;

export interface Compared {
  document: NotebookDocument | null;
  /** In the order of the document; empty until it is computed. */
  cells: readonly CellEvaluation[];
  engine: string | null;
  error: unknown;
  retry: () => void;
  failure: string | null;
}

const nothing: NotebookDocument = {
  format: 1,
  title: "",
  unitSystem: "SI",
  headline: [],
  authors: [],
  cells: [],
};

/** A state with its results: those kept with a version, or those of the draft as the server has it. */
export function useCompared(notebook: NotebookResponse, state: StateName, unitSystem: UnitSystem): Compared {
  const isDraft = state === "draft";
  const version = useQuery({ ...versionQuery(notebook.id, isDraft ? 0 : state), enabled: !isDraft });
  const written = isDraft ? notebook.document : version.data?.document;
  const document = useMemo(() => (written ? { ...written, unitSystem } : nothing), [written, unitSystem]);
  const computed = useEvaluation(`${notebook.id} compared ${state}`, document);
  const kept = isDraft ? undefined : version.data?.result;
  const live = useMemo(
    () => (kept ? withKeptResults(computed, document, kept) : computed),
    [computed, document, kept],
  );
  return useMemo(() => {
    const evaluated = live.evaluated?.document === document ? live.evaluated : null;
    const cells = document.cells.flatMap(({ id }) => evaluated?.cells.get(id) ?? []);
    return {
      document: written ? document : null,
      cells,
      engine: kept?.engine ?? evaluated?.engine ?? null,
      error: version.error,
      retry: () => void version.refetch(),
      failure: live.failure,
    };
  }, [live, document, written, kept, version]);
}
