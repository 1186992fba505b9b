import type { Shape } from "plotly.js";
import { altitudeOfKnudsen, type Profiles } from "./columnCurves";

/** Lines across the band; they part as the gas thins, and fade away from Kn = 1. */
const lines = 26;
/** Lines of like opacity are drawn as one, since each drawing costs time at every keystroke. */
const shades = 5;

/** The band round the exobase as hairlines that part and fade, never a filled box. */
export function knudsenBand(
  profiles: Profiles,
  panels: readonly ("x" | "x2")[],
  color: string,
  strength: number,
): Partial<Shape>[] {
  const groups = new Map<number, string[]>();
  for (let i = 0; i <= lines; i++) {
    const log10Knudsen = -1 + (2 * i) / lines;
    const altitude = altitudeOfKnudsen(profiles, log10Knudsen);
    if (altitude === null) continue;
    const shade = Math.min(shades - 1, Math.floor(Math.abs(log10Knudsen) * shades));
    const km = (altitude / 1000).toFixed(3);
    groups.set(shade, [...(groups.get(shade) ?? []), `M0,${km}L1,${km}`]);
  }
  return panels.flatMap((panel) =>
    [...groups].map(([shade, paths]): Partial<Shape> => {
      const middle = (shade + 0.5) / shades;
      return {
        type: "path",
        path: paths.join(""),
        xref: `${panel} domain` as Shape["xref"],
        yref: "y",
        layer: "below",
        line: { color, width: 0.7 },
        opacity: 0.02 + strength * Math.exp(-(middle * middle) / 0.34),
      };
    }),
  );
}
