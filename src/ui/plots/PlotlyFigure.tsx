import type { Layout } from "plotly.js";
import { lazy, Suspense, useEffect, useMemo, useState } from "react";
import { fetchPart } from "../../lib/fetchPart";
import { Message } from "../Message";
import { PartBoundary } from "../PartBoundary";
import type { FigureDrawing } from "./exportFigure";
import type { FigureZoom } from "./figureLayout";
import { isPagePrinting } from "./useFigureInks";
import { useDrawn } from "./useDrawn";

/** The figure library is large: it is fetched once, after the page has been painted. */
const Plot = lazy(async () => {
  const { createPlot } = await fetchPart(() => import("./loadPlotly"));
  return { default: createPlot };
});

interface PlotlyFigureProps {
  /** The same object as long as nothing changes. */
  plot: FigureDrawing;
  /** Called with what a drag drew closer, or null to show all again. */
  onZoom: (zoom: FigureZoom | null) => void;
  /** Called with the place in `layout.annotations` of a name that was pressed. */
  onNamePress?: (index: number) => void;
}

const config = {
  displayModeBar: false,
  responsive: false,
  doubleClick: false,
  showTips: false,
  scrollZoom: false,
};

function useAfterFirstPaint(): boolean {
  const [isPainted, setIsPainted] = useState(false);
  useEffect(() => {
    let timer: ReturnType<typeof setTimeout> | undefined;
    const frame = requestAnimationFrame(() => {
      timer = setTimeout(() => setIsPainted(true), 0);
    });
    return () => {
      cancelAnimationFrame(frame);
      clearTimeout(timer);
    };
  }, []);
  return isPainted;
}

type RelayoutEvent = Record<string, number | undefined>;

function zoomOf(event: RelayoutEvent, layout: Partial<Layout>): FigureZoom | null {
  const range = (name: "xaxis" | "yaxis"): [number, number] => {
    const [from, to] = [event[`${name}.range[0]`], event[`${name}.range[1]`]];
    if (from !== undefined && to !== undefined) return [from, to];
    return layout[name]?.range as [number, number];
  };
  const isZoom = Object.keys(event).some((key) => key.includes(".range["));
  return isZoom ? { x: range("xaxis"), y: range("yaxis") } : null;
}

/** A copy for the figure library, which writes into what it draws. */
function useOwn({ data, layout }: FigureDrawing): FigureDrawing {
  return useMemo(
    () => ({ data: data.map((trace) => ({ ...trace })), layout: { ...layout } }),
    [data, layout],
  );
}

/** Drag to draw closer, double press to go back; touch scrolls the page instead. */
export function PlotlyFigure({ plot, onZoom, onNamePress }: PlotlyFigureProps) {
  const isPainted = useAfterFirstPaint();
  const { drawn, holdGraph } = useDrawn(plot);
  const { data, layout } = useOwn(isPagePrinting() ? plot : drawn);
  const place = <div style={{ width: layout.width, height: layout.height }} />;
  if (!isPainted) return place;
  const unfetched = (
    <Message state="fault">
      The figure could not be drawn: its program did not come. Load the page again; the numbers stand in the
      tables.
    </Message>
  );
  return (
    <PartBoundary instead={unfetched}>
      <Suspense fallback={place}>
        <Plot
          className="figure-plot"
          data={data}
          layout={layout}
          config={config}
          style={{ width: layout.width, height: layout.height }}
          onInitialized={holdGraph}
          onRelayout={(event: RelayoutEvent) => {
            const zoom = zoomOf(event, layout);
            if (zoom) onZoom(zoom);
          }}
          onDoubleClick={() => onZoom(null)}
          onClickAnnotation={({ index }: { index: number }) => onNamePress?.(index)}
        />
      </Suspense>
    </PartBoundary>
  );
}
