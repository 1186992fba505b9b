import { useCallback, useEffect, useRef, useState } from "react";
import { cellElement, type CellCommands } from "./useCellCommands";

/** How far the pointer goes before a press becomes a drag, px. */
const threshold = 5;

export interface CellDrag {
  id: string;
  /** Place between cells where it would land, counted before it is taken out. */
  gap: number;
}

/** Moves a cell by its handle: a line shows where it would land; Escape leaves it where it was. */
export function useCellDrag(cellIds: readonly string[], commands: CellCommands) {
  const [drag, setDrag] = useState<CellDrag | null>(null);
  const ids = useRef(cellIds);

  useEffect(function rememberOrder() {
    ids.current = cellIds;
  });

  const begin = useCallback(
    (id: string, event: React.PointerEvent) => {
      if (event.button !== 0) return;
      event.preventDefault();
      const handle = event.currentTarget as HTMLElement;
      const startY = event.clientY;
      let current: CellDrag | null = null;
      handle.setPointerCapture(event.pointerId);

      const follow = (moved: PointerEvent) => {
        if (!current && Math.abs(moved.clientY - startY) < threshold) return;
        current = { id, gap: gapAt(ids.current, moved.clientY) };
        setDrag(current);
        scrollAtEdge(moved.clientY);
      };
      const end = () => {
        handle.removeEventListener("pointermove", follow);
        handle.removeEventListener("pointerup", drop);
        handle.removeEventListener("pointercancel", end);
        window.removeEventListener("keydown", cancel, true);
        setDrag(null);
      };
      const drop = () => {
        end();
        if (!current) return;
        const from = ids.current.indexOf(id);
        commands.moveTo(id, current.gap > from ? current.gap - 1 : current.gap);
      };
      const cancel = (pressed: KeyboardEvent) => {
        if (pressed.key !== "Escape") return;
        pressed.stopPropagation();
        end();
      };
      handle.addEventListener("pointermove", follow);
      handle.addEventListener("pointerup", drop);
      handle.addEventListener("pointercancel", end);
      window.addEventListener("keydown", cancel, true);
    },
    [commands],
  );
  return { drag, begin };
}

function gapAt(ids: readonly string[], y: number): number {
  const index = ids.findIndex((id) => {
    const box = cellElement(id)?.getBoundingClientRect();
    return box !== undefined && y < box.top + box.height / 2;
  });
  return index < 0 ? ids.length : index;
}

function scrollAtEdge(y: number): void {
  const edge = 90;
  if (y < edge) window.scrollBy({ top: -16 });
  else if (y > window.innerHeight - edge) window.scrollBy({ top: 16 });
}
