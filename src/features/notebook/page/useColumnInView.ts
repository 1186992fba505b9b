import { useEffect, useState } from "react";
import type { NotebookDocument } from "../../../../shared/notebook/document";
import type { CellEvaluation } from "../../../../shared/notebook/result";
import { cellElement } from "../cells/useCellCommands";

/** Share of the window's height at which a cell counts as read. */
const readingLine = 0.55;

/** Id of the column that the strip draws: the one in view, or the one that the cell in view rests on; else the first. */
export function useColumnInView(
  document: NotebookDocument,
  answers: ReadonlyMap<string, CellEvaluation> | undefined,
): string | null {
  const [inView, setInView] = useState<string | null>(null);
  const columns = columnsRead(document, answers);
  const key = columns.map(({ id, column }) => `${id} ${column}`).join("\n");

  useEffect(
    function followReading() {
      const read = columnsFromKey(key);
      let frame = 0;
      const look = () => {
        frame = 0;
        setInView(columnAt(read, window.innerHeight * readingLine));
      };
      const lookSoon = () => {
        if (frame === 0) frame = requestAnimationFrame(look);
      };
      lookSoon();
      window.addEventListener("scroll", lookSoon, { passive: true });
      window.addEventListener("resize", lookSoon);
      return () => {
        cancelAnimationFrame(frame);
        window.removeEventListener("scroll", lookSoon);
        window.removeEventListener("resize", lookSoon);
      };
    },
    [key],
  );

  const isThere = document.cells.some((cell) => cell.id === inView && cell.kind === "column");
  return isThere ? inView : (document.cells.find((cell) => cell.kind === "column")?.id ?? null);
}

/** A cell that speaks of a column, and the column's id. */
interface ColumnReader {
  id: string;
  column: string;
}

/** Columns and the escape cells that rest on them, in the order of the notebook. */
function columnsRead(
  { cells }: NotebookDocument,
  answers: ReadonlyMap<string, CellEvaluation> | undefined,
): ColumnReader[] {
  return cells.flatMap(({ id, kind }) => {
    if (kind === "column") return [{ id, column: id }];
    if (kind !== "escape") return [];
    const uses = answers?.get(id)?.uses ?? [];
    const column = cells.find((cell) => cell.kind === "column" && uses.includes(cell.name));
    return column ? [{ id, column: column.id }] : [];
  });
}

const columnsFromKey = (key: string): ColumnReader[] =>
  key
    .split("\n")
    .map((line) => line.split(" "))
    .map(([id = "", column = ""]) => ({ id, column }));

/** The column of the last cell that begins above a line of the window. */
function columnAt(readers: readonly ColumnReader[], line: number): string | null {
  let found: string | null = null;
  for (const { id, column } of readers) {
    const top = cellElement(id)?.getBoundingClientRect().top;
    if (top === undefined || top > line) break;
    found = column;
  }
  return found;
}
