import { useMemo } from "react";
import type { Strip } from "../../../shared/notebook/summary";
import { useElementSize } from "../../lib/useElementSize";
import { figureRoom, type FigureShape } from "./figureRoom";
import { resolveInks, useThemeRevision } from "./useFigureInks";
import { useFigureState } from "./useFigureState";

/** What figures of a column have in common: their room on the page, their inks in its light, what a reader did. */
export function useColumnFigure(
  strip: Strip,
  shape: FigureShape,
  inkSources: Readonly<Record<string, string>>,
) {
  const { ref, size } = useElementSize<HTMLDivElement>({ width: 736, height: 486 });
  const state = useFigureState();
  const theme = useThemeRevision();
  // eslint-disable-next-line react-hooks/exhaustive-deps -- the theme changes what the same values resolve to
  const inks = useMemo(() => resolveInks(inkSources, "page"), [inkSources, theme]);
  const room = useMemo(() => figureRoom(size.width, strip.top / 1000, shape), [size.width, strip.top, shape]);
  const altitudes: readonly [number, number] = state.zoom?.y ?? [strip.base / 1000, strip.top / 1000];
  /** As it leaves the page: by day, at the width of the sheet, all of it. */
  const away = () => ({
    room: figureRoom(736, strip.top / 1000, shape),
    inks: resolveInks(inkSources, "day"),
    zoom: null,
  });
  return { ref, inks, room, altitudes, away, ...state };
}
