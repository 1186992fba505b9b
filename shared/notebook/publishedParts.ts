/** What other notebooks may take from a notebook once it is published. */
import type { NotebookDocument } from "./document";
import { evaluateNotebook } from "./evaluateNotebook";
import type { BodyModel } from "./evaluation/models";
import type { SuppliedReference, SuppliedReferences } from "./references";
import type { CellResult } from "./result";

/** Results by the name that cells of the same notebook use: entries of `values` cells bare, all else after its cell. */
export function publishedValues(
  cells: readonly Pick<CellResult, "kind" | "name" | "values">[],
): SuppliedReference["values"] {
  const named = cells.flatMap(({ kind, name, values }) =>
    Object.entries(values).map(([key, { value, unit }]) => [
      kind === "values" ? key : `${name}.${key}`,
      unit === undefined ? { value } : { value, unit },
    ]),
  );
  return Object.fromEntries(named) as SuppliedReference["values"];
}

/** What the body cells hand on, by name. */
export function publishedBodies(
  document: NotebookDocument,
  references: SuppliedReferences,
): Record<string, BodyModel> {
  const last = document.cells.findLastIndex(({ kind }) => kind === "body");
  const cells = document.cells.slice(0, last + 1);
  const { memory } = evaluateNotebook({ ...document, cells }, undefined, undefined, references);
  const bodies: Record<string, BodyModel> = {};
  for (const { id, name } of cells) {
    const model = memory.get(id)?.evaluated.above.model;
    if (model?.kind === "body") bodies[name] = model;
  }
  return bodies;
}
