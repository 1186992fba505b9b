import { useMemo } from "react";
import type { CellEvaluation } from "../../../../shared/notebook/result";
import type { Strip } from "../../../../shared/notebook/summary";
import type { NumberSpread } from "../../../lib/formatSpread";
import { stripWithCoronae } from "../../../ui/strip/stripWithCoronae";
import { columnCoronae } from "../cells/columnCoronae";
import { drawnColumn } from "../cells/drawnColumn";
import { exobaseSpread } from "./exobaseSpread";

/** The strip of a column, with what the cells below say of it: its coronae, and how sure its exobase is. */
export function useDrawnStrip(
  columnId: string | null,
  cells: ReadonlyMap<string, CellEvaluation> | undefined,
): { strip: Strip | null; spread: NumberSpread | null } {
  const column = columnId === null || !cells ? null : drawnColumn(cells.get(columnId), cells);
  const plain = column?.strip ?? null;
  const coronae = plain && cells ? columnCoronae(plain.column, cells) : null;
  const strip = useMemo(() => plain && coronae && stripWithCoronae(plain, coronae), [plain, coronae]);
  const spread = useMemo(
    () => (plain?.exobase && cells ? exobaseSpread(plain.column, plain.exobase, cells) : null),
    [plain, cells],
  );
  return { strip, spread };
}
