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

  useEffect(
    function followReading() {
      let frame = 0;
      const look = () => {
        frame = 0;
        setInView(columnAt(document, answers, window.innerHeight * readingLine));
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
    [document, answers],
  );

  const isThere = document.cells.some((cell) => cell.id === inView && cell.kind === "column");
  return isThere ? inView : (document.cells.find((cell) => cell.kind === "column")?.id ?? null);
}

function columnAt(
  document: NotebookDocument,
  answers: ReadonlyMap<string, CellEvaluation> | undefined,
  line: number,
): string | null {
  let found: string | null = null;
  for (const { id, kind } of document.cells) {
    if (kind !== "column" && kind !== "escape") continue;
    const top = cellElement(id)?.getBoundingClientRect().top;
    if (top === undefined || top > line) break;
    found = kind === "column" ? id : (columnUnder(id, document, answers) ?? found);
  }
  return found;
}

function columnUnder(
  id: string,
  document: NotebookDocument,
  answers: ReadonlyMap<string, CellEvaluation> | undefined,
): string | null {
  const uses = answers?.get(id)?.uses ?? [];
  return document.cells.find((cell) => cell.kind === "column" && uses.includes(cell.name))?.id ?? null;
}
