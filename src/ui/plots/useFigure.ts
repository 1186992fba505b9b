import { useMemo } from "react";
import { useElementSize } from "../../lib/useElementSize";
import { resolveInks, useThemeRevision } from "./useFigureInks";
import { useFigureState } from "./useFigureState";

/** Width of the sheet, at which figures leave the page, px. */
export const sheetWidth = 736;

/** What all figures have in common: their width on the page, their inks in its light, what a reader did. */
export function useFigure(inkSources: Readonly<Record<string, string>>) {
  const { ref, size } = useElementSize<HTMLDivElement>({ width: sheetWidth, height: 486 });
  const state = useFigureState();
  const theme = useThemeRevision();
  // eslint-disable-next-line react-hooks/exhaustive-deps -- the theme changes what the same values resolve to
  const inks = useMemo(() => resolveInks(inkSources, "page"), [inkSources, theme]);
  return { ref, width: size.width, inks, dayInks: () => resolveInks(inkSources, "day"), ...state };
}
