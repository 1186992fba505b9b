import type { PlotlyHTMLElement } from "plotly.js";
import { useCallback, useLayoutEffect, useRef, useState } from "react";
import type { FigureDrawing } from "./exportFigure";
import { isMove, moveCurves, moveMarks } from "./moveCurves";
import { takeTurn } from "./takeTurn";

/** How long a figure rests before its names and axes follow its curves, ms. */
const rest = 250;

/**
 * What a figure has drawn of the latest drawing. Where only curves moved, they follow at once on axes that hold
 * still, the marks across them a moment later, and all else once writing rests; anything else is drawn whole when its turn comes. What was overtaken
 * meanwhile is never drawn.
 */
export function useDrawn<Drawing extends FigureDrawing>(latest: Drawing) {
  const [drawn, setDrawn] = useState(latest);
  const graph = useRef<PlotlyHTMLElement | null>(null);
  const shown = useRef<Drawing>(latest);

  useLayoutEffect(
    function follow() {
      if (latest === shown.current) return undefined;
      shown.current = latest;
      if (!graph.current || !isMove(drawn, latest)) return takeTurn(() => setDrawn(latest));
      const { current: element } = graph;
      moveCurves(element, drawn, latest);
      let giveBack = takeTurn(() => void moveMarks(element, latest));
      const timer = setTimeout(() => {
        giveBack = takeTurn(() => setDrawn(latest));
      }, rest);
      return () => {
        clearTimeout(timer);
        giveBack();
      };
    },
    [latest, drawn],
  );

  const holdGraph = useCallback((_figure: unknown, element: Readonly<HTMLElement>) => {
    graph.current = element as PlotlyHTMLElement;
  }, []);
  return { drawn, holdGraph };
}
