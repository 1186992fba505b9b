import { useEffect } from "react";

/** Undo and redo of what is done to cells, where no editor or field takes the keys first. */
export function useDeskKeys(steps: { undo: () => void; redo: () => void } | null): void {
  const undo = steps?.undo;
  const redo = steps?.redo;
  useEffect(
    function listenForSteps() {
      if (!undo || !redo) return;
      const take = (event: KeyboardEvent) => {
        if (event.defaultPrevented || !(event.ctrlKey || event.metaKey) || event.altKey) return;
        if ((event.target as HTMLElement | null)?.closest?.("input, textarea")) return;
        const key = event.key.toLowerCase();
        if (key === "z") (event.shiftKey ? redo : undo)();
        else if (key === "y") redo();
        else return;
        event.preventDefault();
      };
      window.addEventListener("keydown", take);
      return () => window.removeEventListener("keydown", take);
    },
    [undo, redo],
  );
}
