import type { Layout, PlotlyHTMLElement } from "plotly.js";
import type { FigureDrawing } from "./exportFigure";

type Range = readonly [number, number];

/** How far an end of an axis may have to move before its curves are drawn with it at once, as a share of the axis. */
const nearby = 0.1;

const axes = ["xaxis", "yaxis", "xaxis2", "yaxis2"] as const;

function isNear(drawn: Range | undefined, next: Range | undefined): boolean {
  if (!drawn || !next) return drawn === next;
  const allowed = nearby * Math.abs(drawn[1] - drawn[0]);
  return Math.abs(next[0] - drawn[0]) < allowed && Math.abs(next[1] - drawn[1]) < allowed;
}

const rangeOf = (layout: Partial<Layout>, axis: (typeof axes)[number]) =>
  layout[axis]?.range as Range | undefined;

/** All that the look of a curve rests on besides its points. */
const styleOf = (trace: FigureDrawing["data"][number]): string =>
  JSON.stringify({ ...trace, x: null, y: null, z: null });

/** Whether two drawings differ in little but where their curves and lines run. */
export function isMove(drawn: FigureDrawing, next: FigureDrawing): boolean {
  return (
    drawn.data.length === next.data.length &&
    drawn.layout.width === next.layout.width &&
    drawn.layout.height === next.layout.height &&
    drawn.layout.shapes?.length === next.layout.shapes?.length &&
    axes.every((axis) => isNear(rangeOf(drawn.layout, axis), rangeOf(next.layout, axis))) &&
    drawn.data.every((trace, i) => styleOf(trace) === styleOf(next.data[i]!))
  );
}

/** px along an axis for a value on it, from its origin. */
function alongAxis(layout: Partial<Layout>, name: string, pixels: number): (value: number) => number {
  const { range, type, domain = [0, 1] } = layout[name as "xaxis"]!;
  const [from, to] = range as Range;
  const length = (domain[1]! - domain[0]!) * pixels;
  return (value) => (((type === "log" ? Math.log10(value) : value) - from) / (to - from)) * length;
}

interface Line {
  x: ArrayLike<number>;
  y: ArrayLike<number>;
  xaxis?: string;
  yaxis?: string;
}

/** The path of one curve on the axes of `layout`, as the figure library draws it within its panel. */
export function curvePath({ x, y, xaxis = "x", yaxis = "y" }: Line, layout: Partial<Layout>): string {
  const { l = 0, r = 0, t = 0, b = 0 } = layout.margin ?? {};
  const { domain: [low = 0, high = 1] = [0, 1] } = layout[yaxis.replace("y", "yaxis") as "yaxis"]!;
  const whole = layout.height! - t - b;
  const tall = (high - low) * whole;
  const across = alongAxis(layout, xaxis.replace("x", "xaxis"), layout.width! - l - r);
  const up = alongAxis(layout, yaxis.replace("y", "yaxis"), whole);
  let path = "";
  for (let i = 0; i < x.length; i++) {
    path += `${i === 0 ? "M" : "L"}${across(x[i]!).toFixed(2)},${(tall - up(y[i]!)).toFixed(2)}`;
  }
  return path;
}

/**
 * Moves the lines of a drawn figure on axes that hold still, so that they can follow every key: a hundredth of the
 * work of drawing the figure anew. The library knows no such move, so its paths are written here; it draws them
 * itself, with names, ticks and ends of axes, once writing rests.
 *
 * @param graph   the element in which the library has drawn `drawn`
 */
export function moveCurves(graph: PlotlyHTMLElement, drawn: FigureDrawing, next: FigureDrawing): void {
  const paths = graph.querySelectorAll(".scatterlayer .js-line");
  const lines = (next.data as (Line & { visible?: boolean; mode?: string })[]).filter(
    ({ visible = true, mode }) => visible && mode === "lines",
  );
  if (paths.length !== lines.length) return;
  paths.forEach((path, i) => path.setAttribute("d", curvePath(lines[i]!, drawn.layout)));
}

/** Moves what is drawn across the curves: the exobase, its band, homopauses. */
export async function moveMarks(graph: PlotlyHTMLElement, { layout }: FigureDrawing): Promise<void> {
  const { Plotly } = await import("./loadPlotly");
  await Plotly.relayout(graph, { shapes: layout.shapes ?? [] });
}
