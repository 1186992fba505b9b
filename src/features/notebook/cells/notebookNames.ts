import { useMemo } from "react";
import type { CellKind, NotebookDocument } from "../../../../shared/notebook/document";
import type { CellEvaluation } from "../../../../shared/notebook/result";
import { findGas } from "../../../../shared/physics";

/** What the names in a notebook stand for. */
export interface NotebookNames {
  cells: ReadonlyMap<string, CellKind>;
  /** Names of cells and of values. */
  names: ReadonlySet<string>;
  isGas: (name: string) => boolean;
}

/** Names of a notebook; the same object for as long as they are the same, so that writing numbers redraws no other cell. */
export function useNotebookNames(
  document: NotebookDocument,
  answers: ReadonlyMap<string, CellEvaluation> | undefined,
): NotebookNames {
  const named = document.cells.filter(({ kind, name }) => kind !== "prose" && name !== "");
  const values = named
    .filter(({ kind }) => kind === "values")
    .flatMap(({ id }) => Object.keys(answers?.get(id)?.result.values ?? {}));
  const key = `${named.map(({ kind, name }) => `${kind} ${name}`).join("\n")}\n\n${values.join("\n")}`;
  return useMemo(() => readNames(key), [key]);
}

function readNames(key: string): NotebookNames {
  const [cellLines = "", valueLines = ""] = key.split("\n\n");
  const cells = new Map<string, CellKind>();
  for (const line of cellLines.split("\n")) {
    const [kind, name] = line.split(" ");
    if (kind && name) cells.set(name, kind as CellKind);
  }
  const names = new Set([...cells.keys(), ...valueLines.split("\n")].filter((name) => name !== ""));
  return { cells, names, isGas: (name) => findGas(name) !== undefined || cells.get(name) === "gas" };
}
