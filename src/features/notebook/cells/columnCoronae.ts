import type { CellEvaluation } from "../../../../shared/notebook/result";
import type { ColumnCorona } from "../../../lib/columnCorona";

type Cells = ReadonlyMap<string, CellEvaluation>;

/** The first cell of a kind among those that another uses. */
function usedOf(kind: "column" | "escape", { uses }: CellEvaluation, cells: Cells): CellEvaluation | undefined {
  return [...cells.values()].find(({ result }) => result.kind === kind && uses.includes(result.name));
}

/** Name of the column that a cell rests on: itself, the one an escape cell names, or by its escape cell. */
export function columnOf(evaluation: CellEvaluation, cells: Cells): string | null {
  const { kind, name } = evaluation.result;
  if (kind === "column") return name;
  const escape = kind === "escape" ? evaluation : usedOf("escape", evaluation, cells);
  return (escape && usedOf("column", escape, cells)?.result.name) ?? null;
}

/** Coronae that rest on a column, by its name; of two of one gas the first. */
export function columnCoronae(column: string, cells: Cells): ColumnCorona[] {
  const found = new Map<string, ColumnCorona>();
  for (const evaluation of cells.values()) {
    const corona = coronaIn(evaluation, cells);
    if (!corona || found.has(corona.gas) || columnOf(evaluation, cells) !== column) continue;
    found.set(corona.gas, corona);
  }
  return [...found.values()];
}

/** null where the cell has no answer. */
function coronaIn(evaluation: CellEvaluation, cells: Cells): ColumnCorona | null {
  const { corona, gases } = evaluation;
  const { profiles, values, name } = evaluation.result;
  const below = values["exobase.number_density"]?.value;
  if (!corona || !profiles || typeof below !== "number") return null;
  const escape = usedOf("escape", evaluation, cells);
  return {
    gas: gases[0]!,
    cell: name,
    escape: escape?.result.name ?? "",
    isCoupled: escape?.convention?.coupling === "coupled",
    share: corona.share,
    densityBelow: below,
    altitude: profiles.altitude!,
    numberDensity: profiles.number_density!,
  };
}
