import type { Annotation, Data, Layout, Shape } from "plotly.js";
import { formatKilometres, formatUnit, unitSpace, type DisplayScale } from "../../lib/format";
import { figureText } from "../../lib/richText";
import type { CoronaCurve } from "./coronaCurves";
import type { CoronaRoom } from "./coronaRoom";
import type { FigureDrawing } from "./exportFigure";
import { axis, baseLayout, decadeAxis, figureFonts, note, type FigureZoom } from "./figureLayout";
import { panelScale } from "./panelLettering";
import { placeNames, type Box } from "./placeNames";
import type { FigureInks } from "./useFigureInks";

export interface CoronaPlotInput {
  /** Densities by kind of orbit, and columns along lines of sight. */
  orbits: readonly CoronaCurve[];
  sights: readonly CoronaCurve[];
  density: DisplayScale;
  column: DisplayScale;
  /** m */
  exobase: number;
  /** Density at the exobase just below and just above it, in the unit shown. */
  step: { from: number; to: number };
  room: CoronaRoom;
  /** `gas` is the colour of the gas. */
  inks: FigureInks;
  zoom: FigureZoom | null;
}

const looks: Readonly<Record<string, { ink: "gas" | "ink"; width: number; dash: string }>> = {
  number_density: { ink: "gas", width: 2.4, dash: "solid" },
  ballistic: { ink: "ink", width: 1.2, dash: "solid" },
  satellite: { ink: "ink", width: 1.3, dash: "7px,3px" },
  escaping: { ink: "ink", width: 1.4, dash: "1.2px,3px" },
  limb_column: { ink: "gas", width: 2.4, dash: "solid" },
  overhead_column: { ink: "gas", width: 1.5, dash: "7px,3px" },
};

/** Decades that a heavy gas may fall off by before its curve leaves the panel. */
const mostDecades = 14;

/** Decades that hold all curves of a panel. */
export function coronaDecades(curves: readonly CoronaCurve[]): [number, number] {
  const all = curves.flatMap(({ x }) => x);
  const to = Math.log10(Math.max(...all)) + 0.2;
  return [Math.max(Math.log10(Math.min(...all)) - 0.2, to - mostDecades), to];
}

/** Decimal logarithms of the altitudes drawn, km: all levels, and below the exobase room for its name. */
export function coronaAltitudes(orbits: readonly CoronaCurve[], exobase: number): [number, number] {
  const [from, to] = [Math.log10(exobase / 1000), Math.log10(orbits[0]?.y.at(-1) ?? exobase / 500)];
  return [from - 0.08 * (to - from), to];
}

/** The figure library's axes by panel. */
const axes = [
  { x: "x", y: "y" },
  { x: "x2", y: "y2" },
] as const;
type PanelAxes = (typeof axes)[number];

function traces(curves: readonly CoronaCurve[], inks: FigureInks, { x, y }: PanelAxes): Data[] {
  return curves.map((curve): Data => {
    const { ink, width, dash } = looks[curve.key]!;
    return {
      type: "scatter",
      mode: "lines",
      name: curve.words,
      x: curve.x,
      y: curve.y,
      xaxis: x,
      yaxis: y,
      line: { color: inks[ink]!, width, dash: dash as "solid", simplify: false },
      hoverinfo: "skip",
    };
  });
}

function names(
  curves: readonly CoronaCurve[],
  panel: { width: number; tall: number; decades: [number, number]; altitudes: [number, number] },
  inks: FigureInks,
  { x: xref, y: yref }: PanelAxes,
): Partial<Annotation>[] {
  const scale = panelScale({ panel: panel.width, tall: panel.tall }, panel.decades, panel.altitudes);
  const frame: Box = { left: 4, right: panel.width - 2, top: 4, bottom: panel.tall - 6 };
  const places = placeNames(
    curves.map(({ key, words, x, y }) => ({
      key,
      nameWidth: words.length * 6.6 + 4,
      points: x
        .map((value, i) => [scale.x(Math.log10(value)), scale.y(Math.log10(y[i]!))] as const)
        .filter(([px]) => px > -60 && px < panel.width + 60),
    })),
    frame,
    [],
  );
  return curves.flatMap(({ key, words }) => {
    const place = places.get(key);
    if (!place) return [];
    const { ink } = looks[key]!;
    const text = ink === "gas" && key === "number_density" ? `<b>${words}</b>` : words;
    const xanchor = place.anchor === "start" ? "left" : "right";
    return [
      note(
        text,
        { x: scale.decade(place.x), y: scale.km(place.y), xref, yref, xanchor, yanchor: "middle" },
        { family: figureFonts().sans, size: 13.5, color: inks[ink]! },
      ),
    ];
  });
}

function exobaseLine(km: number, inks: FigureInks, { x, y }: PanelAxes): Partial<Shape> {
  const line = { color: inks.ink!, width: 1.4 };
  return { type: "line", xref: `${x} domain` as Shape["xref"], yref: y, x0: 0, x1: 1, y0: km, y1: km, line };
}

/** The step drawn to scale between two short bars. */
function stepShapes({ from, to }: CoronaPlotInput["step"], km: number, inks: FigureInks): Partial<Shape>[] {
  const bar = (x: number, y1: number): Partial<Shape> => ({
    ...{ type: "line", xref: "x", yref: "y", x0: x, x1: x, line: { color: inks.gas!, width: 1.6 } },
    ...{ ysizemode: "pixel", yanchor: km, y0: 0, y1 },
  });
  return [bar(from, -5), bar(to, 5)];
}

/** Where the panels stand, as shares of what the margins leave. */
function domains({
  panel,
  second,
  gap,
  tall,
  isStacked,
}: CoronaRoom): Record<"x" | "y" | "x2" | "y2", [number, number]> {
  const whole: [number, number] = [0, 1];
  if (isStacked) {
    const total = 2 * tall + gap;
    return { x: whole, y: [(tall + gap) / total, 1], x2: whole, y2: [0, tall / total] };
  }
  const total = panel + gap + second;
  return { x: [0, panel / total], y: whole, x2: [(panel + gap) / total, 1], y2: whole };
}

/** Densities above the exobase by kind of orbit, and columns along lines of sight, against altitude in decades. */
export function coronaPlot(input: CoronaPlotInput): FigureDrawing {
  const { orbits, sights, density, column, exobase, step, room, inks, zoom } = input;
  const altitudes = zoom?.y ?? coronaAltitudes(orbits, exobase);
  const decades = zoom?.x ?? coronaDecades(orbits);
  const columnDecades = coronaDecades(sights);
  const km = exobase / 1000;
  const { sans } = figureFonts();
  const at = domains(room);
  const upright = (title: string): Partial<NonNullable<Layout["yaxis"]>> => ({
    ...axis(inks, title),
    type: "log",
    range: [...altitudes],
    exponentformat: "none",
    dtick: 1,
    minor: { ticks: "outside", ticklen: 4, tickwidth: 0.8, tickcolor: inks.ink2, dtick: "D1" },
  });
  const first = { width: room.panel, tall: room.tall, decades, altitudes };
  const second = { width: room.second, tall: room.tall, decades: columnDecades, altitudes };
  return {
    data: [...traces(orbits, inks, axes[0]), ...traces(sights, inks, axes[1])],
    layout: {
      ...baseLayout(room),
      xaxis: {
        ...decadeAxis(inks, `number density, ${figureText(formatUnit(density.unit))}`, room.panel, decades),
        domain: at.x,
        anchor: "y",
      },
      yaxis: { ...upright("altitude, km"), domain: at.y, anchor: "x" },
      xaxis2: {
        ...decadeAxis(inks, `column, ${figureText(formatUnit(column.unit))}`, room.second, columnDecades),
        domain: at.x2,
        anchor: "y2",
        fixedrange: true,
      },
      yaxis2: {
        ...upright(room.isStacked ? "altitude, km" : ""),
        domain: at.y2,
        anchor: "x2",
        matches: "y",
        showticklabels: room.isStacked,
      },
      shapes: [exobaseLine(km, inks, axes[0]), exobaseLine(km, inks, axes[1]), ...stepShapes(step, km, inks)],
      annotations: [
        ...names(orbits, first, inks, axes[0]),
        ...names(sights, second, inks, axes[1]),
        note(
          `<span style="font-weight:600">exobase</span> ${formatKilometres(exobase)}${unitSpace}km`,
          {
            x: 0,
            y: Math.log10(km),
            xref: "x domain",
            xanchor: "left",
            yanchor: "middle",
            xshift: 6,
            yshift: -12,
          },
          { family: sans, size: 12.5, color: inks.ink! },
        ),
      ],
    },
  };
}
