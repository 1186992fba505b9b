import { useState } from "react";
import type { FigureZoom } from "./figureLayout";

/** What a reader does to a figure: draw a part closer, hide curves. Neither is kept. */
export function useFigureState() {
  const [zoom, setZoom] = useState<FigureZoom | null>(null);
  const [hidden, setHidden] = useState<ReadonlySet<string>>(new Set());
  const toggle = (name: string) =>
    setHidden((before) => {
      const after = new Set(before);
      if (!after.delete(name)) after.add(name);
      return after;
    });
  return { zoom, setZoom, hidden, toggle };
}
