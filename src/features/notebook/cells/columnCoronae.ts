import type { CellEvaluation } from "../../../../shared/notebook/result";
import type { ColumnCorona } from "../../../lib/columnCorona";

type Cells = ReadonlyMap<string, CellEvaluation>;

/** The first cell of a kind among those that another uses. */
function usedOf(
  kind: "column" | "escape",
  { uses }: CellEvaluation,
  cells: Cells,
): CellEvaluation | undefined {
  return [...cells.values()].find(({ result }) => result.kind === kind && uses.includes(result.name));
}

/** Name of the column that a cell rests on: itself, the one an escape cell names, or by its escape cell. */
export function columnOf(evaluation: CellEvaluation, cells: Cells): string | null {
  const { kind, name } = evaluation.result;
  if (kind === "column") return name;
  const escape = kind === "escape" ? evaluation : usedOf("escape", evaluation, cells);
  return (escape && usedOf("column", escape, cells)?.result.name) ?? null;
}

const none: readonly ColumnCorona[] = [];

/**
 * Coronae that rest on a column, by its name; of two of one gas the first. The same list as long as it holds the same,
 * so that figures are not drawn anew.
 */
export function columnCoronae(column: string, cells: Cells): readonly ColumnCorona[] {
  const found = new Map<string, ColumnCorona>();
  for (const evaluation of cells.values()) {
    const corona = coronaIn(evaluation);
    if (!corona || found.has(corona.gas) || columnOf(evaluation, cells) !== column) continue;
    found.set(corona.gas, corona);
  }
  return sameList([...found.values()]);
}

const lists = new WeakMap<ColumnCorona, readonly ColumnCorona[]>();

function sameList(list: readonly ColumnCorona[]): readonly ColumnCorona[] {
  const [first] = list;
  if (!first) return none;
  const last = lists.get(first);
  if (last?.length === list.length && last.every((corona, i) => corona === list[i])) return last;
  lists.set(first, list);
  return list;
}

const known = new WeakMap<CellEvaluation, ColumnCorona>();

/** null where the cell has no answer; the same object for the same evaluation. */
function coronaIn(evaluation: CellEvaluation): ColumnCorona | null {
  const last = known.get(evaluation);
  if (last) return last;
  const { corona, gases } = evaluation;
  const { profiles, values, name } = evaluation.result;
  const below = values["exobase.number_density"]?.value;
  if (!corona || !profiles || typeof below !== "number") return null;
  const fresh: ColumnCorona = {
    gas: gases[0]!,
    cell: name,
    share: corona.share,
    densityBelow: below,
    altitude: profiles.altitude!,
    numberDensity: profiles.number_density!,
  };
  known.set(evaluation, fresh);
  return fresh;
}
