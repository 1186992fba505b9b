import type { Annotation, Data, Layout, Shape } from "plotly.js";
import type { GasStyle } from "../../lib/gasStyle";
import { plainText, type RichPiece, type RichText } from "../../lib/richText";
import { airyRange, axisScale, axisTicks, spansDecades, tickedAxis, type AxisScale } from "./axisTicks";
import type { FigureDrawing } from "./exportFigure";
import { baseLayout, dashList, figureFonts, letteredText, note, type FigureZoom } from "./figureLayout";
import { steppedNumber, titleOf, type SweepAxis, type SweepResult, type SweptResult } from "./sweepResult";
import type { SweepRoom } from "./sweepRoom";
import type { FigureInks } from "./useFigureInks";

export interface SweepPlotInput {
  sweep: SweepResult;
  styles: ReadonlyMap<string, GasStyle>;
  room: SweepRoom;
  inks: FigureInks;
  zoom: FigureZoom | null;
}

/** Results that are told by one axis: the same quantity in the same unit. */
export interface SweepPanel {
  title: RichText;
  results: SweptResult[];
}

/** In the order in which the results are watched. */
export function sweepPanels({ watched }: SweepResult): SweepPanel[] {
  const panels = new Map<string, SweepPanel>();
  for (const result of watched) {
    // Entries of a values cell have names of their own, and nothing says that two of them belong together.
    const isEntry = !result.name.includes(".");
    const key = isEntry ? result.name : `${plainText(result.quantity)} ${result.unit}`;
    const panel = panels.get(key);
    if (panel) panel.results.push(result);
    else panels.set(key, { title: [], results: [result] });
  }
  return [...panels.values()].map(({ results }) => ({ results, title: panelTitle(results) }));
}

function panelTitle(results: readonly SweptResult[]): RichText {
  const [first] = results;
  return titleOf(results.length === 1 ? first!.label : first!.quantity, sharedScale(results));
}

/** One unit for all curves of a panel: that of the largest. */
export function sharedScale(results: readonly SweptResult[]) {
  const size = ({ values }: SweptResult) => Math.max(0, ...values.map((value) => Math.abs(value ?? 0)));
  return results.reduce((best, result) => (size(result) > size(best) ? result : best)).scale;
}

/** What is written beside a curve: the gas where the panel's curves differ by it. */
export function curveName(
  { results }: SweepPanel,
  result: SweptResult,
  style: GasStyle | undefined,
): RichText {
  if (result.gas !== null && style && results.every(({ gas }) => gas !== null) && isUnlike(results))
    return style.name;
  return result.label;
}

const isUnlike = (results: readonly SweptResult[]): boolean =>
  new Set(results.map(({ gas }) => gas)).size === results.length;

/** Sans at 13.5 px. */
export const nameWidth = (name: RichText): number =>
  name.reduce((sum, piece) => {
    const text = plainText([piece]);
    return sum + text.length * (typeof piece === "string" ? 6.7 : "code" in piece ? 7.9 : 5.5);
  }, 4);

/** Dashes of curves that belong to no gas, in their order within a panel. */
const plainDashes = ["", "7 3", "2 2.5", "12 3 2 3", "4 4"];

export const sweepScale = ({ isLog, scale }: SweepAxis): AxisScale => axisScale(isLog, scale.factor);

interface DrawnCurve {
  result: SweptResult;
  name: RichText;
  colour: string;
  dash: string;
  width: number;
  x: (number | null)[];
  y: (number | null)[];
}

interface DrawnPanel {
  panel: SweepPanel;
  scale: AxisScale;
  range: [number, number];
  curves: DrawnCurve[];
}

function drawnPanel(
  panel: SweepPanel,
  across: readonly number[],
  xs: [number, number],
  input: SweepPlotInput,
): DrawnPanel {
  const { styles, inks } = input;
  const isSeen = (index: number) => across[index]! >= xs[0] && across[index]! <= xs[1];
  const known = panel.results.flatMap(({ values }) =>
    values.filter((value, index): value is number => value !== null && isSeen(index)),
  );
  const scale = axisScale(spansDecades(known), sharedScale(panel.results).factor);
  const curves = panel.results.map((result, index): DrawnCurve => {
    const style = result.gas === null ? undefined : styles.get(result.gas);
    const dash = plainDashes[index % plainDashes.length]!;
    return {
      result,
      name: curveName(panel, result, style),
      colour: (style && inks[style.formula]) ?? inks.ink!,
      dash: style ? style.dash : dash,
      width: style ? style.width : 1.6,
      x: [...across],
      y: result.values.map((value) => (value === null ? null : finite(scale.place(value)))),
    };
  });
  const places = curves.flatMap(({ y }) =>
    y.filter((place, index): place is number => place !== null && isSeen(index)),
  );
  return { panel, scale, range: places.length > 0 ? airyRange(places, 0.06) : [0, 1], curves };
}

const finite = (place: number): number | null => (Number.isFinite(place) ? place : null);

const axisNames = (index: number) =>
  index === 0
    ? ({ trace: "y", layout: "yaxis" } as const)
    : { trace: `y${index + 1}`, layout: `yaxis${index + 1}` };

function traces({ curves }: DrawnPanel, index: number): Data[] {
  const yaxis = axisNames(index).trace;
  return curves.flatMap(({ result, colour, dash, width, x, y }): Data[] => {
    const line: Data = {
      type: "scatter",
      mode: "lines",
      name: result.name,
      x,
      y,
      yaxis,
      connectgaps: false,
      line: { color: colour, width, dash: dashList(dash) },
      hoverinfo: "skip",
    };
    // A point between two without an answer makes no line.
    const lone = y.flatMap((place, i) =>
      place !== null && (y[i - 1] ?? null) === null && (y[i + 1] ?? null) === null ? [i] : [],
    );
    if (lone.length === 0) return [line];
    const points: Data = {
      type: "scatter",
      mode: "markers",
      x: lone.map((i) => x[i]!),
      y: lone.map((i) => y[i]!),
      yaxis,
      marker: { size: 5, color: colour },
      hoverinfo: "skip",
    };
    return [line, points];
  });
}

/** Names at the ends of their curves, pushed apart where two would meet. */
function names(
  drawn: DrawnPanel,
  index: number,
  across: readonly number[],
  xs: [number, number],
  room: SweepRoom,
): Partial<Annotation>[] {
  const { sans } = figureFonts();
  const { tall } = room.panels[index]!;
  const { range, curves } = drawn;
  const pixelAt = (place: number) => tall * (1 - (place - range[0]) / (range[1] - range[0]));
  const placed = curves
    .flatMap((curve) => {
      const seen = across.flatMap((x, i) => (curve.y[i] !== null && x >= xs[0] && x <= xs[1] ? [i] : []));
      if (seen.length === 0) return [];
      const last = seen.reduce((best, i) => (across[i]! > across[best]! ? i : best));
      return [{ curve, x: across[last]!, pixel: pixelAt(curve.y[last]!) }];
    })
    .sort((a, b) => a.pixel - b.pixel);
  spreadApart(placed, tall);
  return placed.map(({ curve, x, pixel }) =>
    note(
      nameText(curve, room.right - beside),
      {
        x,
        y: range[0] + (1 - pixel / tall) * (range[1] - range[0]),
        yref: axisNames(index).trace as Annotation["yref"],
        xanchor: "left",
        yanchor: "middle",
        xshift: 7,
        align: "left",
      },
      { family: sans, size: 13.5, color: curve.colour },
    ),
  );
}

/** px between the end of a curve and the edge of the figure that its name cannot have. */
const beside = 12;

/** A name that is too long for its room stands word under word. */
function nameText({ name, result }: DrawnCurve, room: number): string {
  const text = letteredText(nameWidth(name) > room ? name.map(wordUnderWord) : name);
  const set = text.replace(/\n/g, "<br>");
  return result.gas === null ? set : `<span style="font-weight:650">${set}</span>`;
}

const wordUnderWord = (piece: RichPiece): RichPiece =>
  typeof piece === "string" ? piece.trim().replace(/ /g, "\n") : piece;

const lineOfNames = 16;

function spreadApart(placed: { pixel: number }[], tall: number): void {
  for (let i = 1; i < placed.length; i++)
    placed[i]!.pixel = Math.max(placed[i]!.pixel, placed[i - 1]!.pixel + lineOfNames);
  const over = (placed.at(-1)?.pixel ?? 0) - (tall - 4);
  if (over <= 0) return;
  placed.at(-1)!.pixel -= over;
  for (let i = placed.length - 2; i >= 0; i--)
    placed[i]!.pixel = Math.min(placed[i]!.pixel, placed[i + 1]!.pixel - lineOfNames);
}

/** The value as written as a hairline with its words, and one standard deviation of it as a grey ground. */
function asWritten(axis: SweepAxis, scale: AxisScale, xs: [number, number], { room, inks }: SweepPlotInput) {
  const shapes: Partial<Shape>[] = [];
  const notes: Partial<Annotation>[] = [];
  const across = { yref: "paper", y0: 0, y1: 1, xref: "x" } as const;
  if (axis.sigma) {
    const [from, to] = sigmaPlaces(axis.sigma, scale, xs);
    if (to > from)
      shapes.push({
        type: "rect",
        ...across,
        x0: from,
        x1: to,
        fillcolor: inks.ink!,
        opacity: 0.06,
        line: { width: 0 },
        layer: "below",
      });
  }
  const place = axis.written === null ? NaN : scale.place(axis.written);
  if (place >= xs[0] && place <= xs[1]) {
    shapes.push({ type: "line", ...across, x0: place, x1: place, line: { color: inks.ink2!, width: 0.9 } });
    const text = letteredText([...steppedNumber(axis.written!, axis.scale), ", as written"]);
    const isRight = (place - xs[0]) / (xs[1] - xs[0]) < 1 - 120 / room.panel;
    notes.push(
      note(
        text,
        {
          x: place,
          y: 1,
          yref: "paper",
          xanchor: isRight ? "left" : "right",
          yanchor: "top",
          xshift: isRight ? 5 : -5,
        },
        { family: figureFonts().sans, size: 12, color: inks.ink2! },
      ),
    );
  }
  return { shapes, notes };
}

/** What of it lies on the axis; on decades, nothing lies below zero. */
function sigmaPlaces(
  sigma: readonly [number, number],
  scale: AxisScale,
  xs: [number, number],
): [number, number] {
  const lower = scale.isLog && sigma[0] <= 0 ? xs[0] : scale.place(sigma[0]);
  return [Math.max(xs[0], lower), Math.min(xs[1], scale.place(sigma[1]))];
}

/** The ends of the varied quantity, the lower first. */
export function sweptRange(axis: SweepAxis): [number, number] {
  const places = axis.values.map(sweepScale(axis).place);
  const [low, high] = [Math.min(...places), Math.max(...places)];
  return high > low ? [low, high] : airyRange([low, high]);
}

/** Watched results over one varied quantity, one panel above the other. */
export function sweepPlot(input: SweepPlotInput): FigureDrawing {
  const { sweep, room, inks, zoom } = input;
  const axis = sweep.axes[0]!;
  const scale = sweepScale(axis);
  const xs: [number, number] = zoom?.x ?? sweptRange(axis);
  const across = axis.values.map(scale.place);
  const panels = sweepPanels(sweep).map((panel) => drawnPanel(panel, across, xs, input));
  const written = asWritten(axis, scale, xs, input);
  const yAxes = panels.map(({ scale: own, range, panel }, index): [string, Layout["yaxis"]] => {
    const { from, tall } = room.panels[index]!;
    const ticks = axisTicks(own, range, tall, own.isLog ? 26 : 34);
    return [
      axisNames(index).layout,
      {
        ...tickedAxis(inks, letteredText(panel.title), range, ticks),
        domain: [1 - (from + tall) / room.tall, 1 - from / room.tall],
        anchor: "x",
        fixedrange: true,
      } as Layout["yaxis"],
    ];
  });
  return {
    data: panels.flatMap(traces),
    layout: {
      ...baseLayout(room),
      xaxis: {
        ...tickedAxis(
          inks,
          letteredText(titleOf([{ code: axis.name }], axis.scale)),
          xs,
          axisTicks(scale, xs, room.panel, 46),
        ),
        anchor: axisNames(panels.length - 1).trace as "y",
      },
      ...Object.fromEntries(yAxes),
      shapes: written.shapes,
      annotations: [
        ...panels.flatMap((panel, index) => names(panel, index, across, xs, room)),
        ...written.notes,
      ],
    },
  };
}

/** What the figure shows, for those who do not see it. */
export function sweepLabel({ name, axes, watched }: SweepResult): string {
  const [axis] = axes;
  const ends = [axis!.values[0]!, axis!.values.at(-1)!].map((value) =>
    plainText(steppedNumber(value, axis!.scale)),
  );
  const results = watched.map(({ label }) => plainText(label)).join(", ");
  return `Sweep ${name}: ${results} over ${axis!.name} from ${ends.join(" to ")}`;
}
