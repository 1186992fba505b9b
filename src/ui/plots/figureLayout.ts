import type { Annotation, Layout, Shape } from "plotly.js";
import { askMedia } from "../../lib/askMedia";
import { formatPower, thinSpace } from "../../lib/format";
import { figureText, type RichText } from "../../lib/richText";
import { tickSteps } from "../strip/stripScale";
import type { FigureRoom } from "./figureRoom";
import type { FigureInks } from "./useFigureInks";

/** The part of a figure one has drawn closer, in what its axes count; null shows all. */
export interface FigureZoom {
  x: [number, number];
  y: [number, number];
}

export const inkValues = {
  ink: "var(--ink)",
  ink2: "var(--ink2)",
  ink3: "var(--ink3)",
  paper: "var(--paper)",
  dusk: "var(--dusk)",
};

const fontOf = (token: string): string =>
  getComputedStyle(document.documentElement).getPropertyValue(token).trim() || "sans-serif";

/** Families as the page has them; the figure library wants them written out. */
export const figureFonts = () => ({
  sans: fontOf("--sans"),
  serif: fontOf("--serif"),
  mono: fontOf("--mono"),
});

/** Lettering of a figure with words of the cell language in their own type. */
export function letteredText(rich: RichText): string {
  const { mono } = figureFonts();
  const style = `font-family:${mono.replace(/"/g, "'")};font-size:0.94em`;
  return rich
    .map((piece) => {
      const text = figureText([piece]);
      return typeof piece === "object" && "code" in piece ? `<span style="${style}">${text}</span>` : text;
    })
    .join("");
}

type Axis = NonNullable<Layout["xaxis"]>;

/** Under a finger a drag scrolls the page; drawing closer is for those who have a pointer. */
const isTouched = (): boolean => askMedia("(pointer: coarse)")?.matches ?? false;

/** Axis ink 1, ticks outside .8, 7 px for major and 4 for minor ones; no grid, no frame. */
export function axis(inks: FigureInks, title: string): Partial<Axis> {
  const { sans } = figureFonts();
  return {
    title: { text: title, font: { family: sans, size: 13, color: inks.ink }, standoff: 12 },
    showgrid: false,
    zeroline: false,
    showline: true,
    linecolor: inks.ink,
    linewidth: 1,
    ticks: "outside",
    ticklen: 7,
    tickwidth: 0.8,
    tickcolor: inks.ink2,
    tickfont: { family: sans, size: 12, color: inks.ink2 },
    exponentformat: "power",
    separatethousands: true,
    automargin: false,
    fixedrange: isTouched(),
  };
}

const minorTicks = (inks: FigureInks, dtick: number) => ({
  minor: { ticks: "outside" as const, ticklen: 4, tickwidth: 0.8, tickcolor: inks.ink2, dtick, tick0: 0 },
});

/** Altitude upward, in km, with ticks at round values whatever is drawn closer. */
export function altitudeAxis(inks: FigureInks, room: FigureRoom, range: [number, number]): Partial<Axis> {
  const { major, minor } = tickSteps(((range[1] - range[0]) / room.tall) * 62);
  return {
    ...axis(inks, "altitude, km"),
    range: [...range],
    tick0: 0,
    dtick: major,
    ...minorTicks(inks, minor),
  };
}

/** Decades across: a tick each, a numeral every one, two or five of them as they fit. */
export function decadeAxis(
  inks: FigureInks,
  title: string,
  pixels: number,
  range: [number, number],
): Partial<Axis> {
  const across: Partial<Axis> = { ...axis(inks, title), type: "log", range: [...range] };
  const decades = range[1] - range[0];
  if (decades < 2) return across;
  const every = [1, 2, 5, 10, 20].find((step) => (pixels / decades) * step >= 46) ?? 50;
  const told: number[] = [];
  for (let power = Math.ceil(range[0] / every) * every; power <= range[1]; power += every) told.push(power);
  return {
    ...across,
    tickmode: "array",
    tickvals: told.map((power) => 10 ** power),
    ticktext: told.map((power) => figureText(formatPower(power, 0))),
    ...minorTicks(inks, 1),
  };
}

/** A quantity across in plain numbers, with few ticks. */
export function plainAxis(
  inks: FigureInks,
  title: string,
  pixels: number,
  range: [number, number],
): Partial<Axis> {
  const { major, minor } = tickSteps(((range[1] - range[0]) / pixels) * 46);
  return { ...axis(inks, title), range: [...range], tick0: 0, dtick: major, ...minorTicks(inks, minor) };
}

type FigureDash = NonNullable<NonNullable<Shape["line"]>["dash"]>;

/** A list of lengths, which the library takes though its types name only a few patterns. */
export const dashList = (dash: string): FigureDash =>
  (dash === "" ? "solid" : dash.replace(/ /g, "px,").concat("px")) as FigureDash;

/** An ink line right across one panel. */
export function acrossLine(panel: "x" | "x2", km: number, color: string, width: number): Partial<Shape> {
  return {
    type: "line",
    xref: `${panel} domain` as Shape["xref"],
    yref: "y",
    x0: 0,
    x1: 1,
    y0: km,
    y1: km,
    line: { color, width },
  };
}

export function note(
  text: string,
  place: Partial<Annotation> & { x: number; y: number },
  font: { family: string; size: number; color: string },
): Partial<Annotation> {
  return { text, showarrow: false, borderpad: 0, xref: "x", yref: "y", font, ...place };
}

type Margins = Pick<FigureRoom, "width" | "height" | "left" | "right" | "top" | "bottom">;

export function baseLayout(room: Margins): Partial<Layout> {
  return {
    width: room.width,
    height: room.height,
    margin: { l: room.left, r: room.right, t: room.top, b: room.bottom, pad: 0 },
    paper_bgcolor: "rgba(0,0,0,0)",
    plot_bgcolor: "rgba(0,0,0,0)",
    separators: `.${thinSpace}`,
    showlegend: false,
    hovermode: false,
    dragmode: isTouched() ? false : "zoom",
  };
}
