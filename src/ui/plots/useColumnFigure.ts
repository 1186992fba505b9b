import { useMemo } from "react";
import type { Strip } from "../../../shared/notebook/summary";
import { figureRoom, type FigureShape } from "./figureRoom";
import { sheetWidth, useFigure } from "./useFigure";

/** What figures of a column have in common: their room on the page, their inks in its light, what a reader did. */
export function useColumnFigure(
  strip: Strip,
  shape: FigureShape,
  inkSources: Readonly<Record<string, string>>,
) {
  const { width, dayInks, ...figure } = useFigure(inkSources);
  const room = useMemo(() => figureRoom(width, strip.top / 1000, shape), [width, strip.top, shape]);
  const altitudes: readonly [number, number] = figure.zoom?.y ?? [strip.base / 1000, strip.top / 1000];
  /** As it leaves the page: by day, at the width of the sheet, all of it. */
  const away = () => ({
    room: figureRoom(sheetWidth, strip.top / 1000, shape),
    inks: dayInks(),
    zoom: null,
  });
  return { ...figure, room, altitudes, away };
}
