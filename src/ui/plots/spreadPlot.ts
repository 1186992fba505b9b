import type { Annotation, Data, Layout, Shape } from "plotly.js";
import { plainText } from "../../lib/richText";
import { airyRange, axisScale, axisTicks, tickedAxis, type AxisScale } from "./axisTicks";
import type { FigureDrawing } from "./exportFigure";
import { baseLayout, figureFonts, letteredText, note } from "./figureLayout";
import { nameWidth } from "./sweepPlot";
import { titleOf } from "./sweepResult";
import { keyEnd, keyHeight, keyPlaces, spreadRoom, type SpreadRoom } from "./spreadRoom";
import type { SpreadResult, SpreadWatched } from "./spreadResult";
import type { FigureInks } from "./useFigureInks";

export interface SpreadPlotInput {
  spread: SpreadResult;
  room: SpreadRoom;
  inks: FigureInks;
}

/** Code at 12.5 px. */
const codeWidth = (text: string): number => text.length * 7.6;

export function roomOfSpread(width: number, { watched, inputs }: SpreadResult): SpreadRoom {
  return spreadRoom(width, {
    histograms: watched.filter(({ bins }) => bins.length > 0).length,
    inputs: inputs.length,
    names: Math.max(0, ...inputs.map(codeWidth)),
    key: watched.map(({ label }) => nameWidth(label)),
  });
}

/** Marks of the watched results, none twice: filled and open by turns. */
const symbols = [
  "circle",
  "square",
  "diamond",
  "triangle-up",
  "triangle-down",
  "pentagon",
  "hexagon",
  "star",
  "hourglass",
  "bowtie",
  "cross",
  "x",
];

export function shareMark(index: number): { symbol: string; isOpen: boolean } {
  return { symbol: symbols[Math.floor(index / 2) % symbols.length]!, isOpen: index % 2 === 1 };
}

const axisName = (kind: "x" | "y", index: number): string => (index === 0 ? kind : `${kind}${index + 1}`);
const layoutName = (kind: "x" | "y", index: number): string => `${kind}axis${index === 0 ? "" : index + 1}`;

function domains({ left, top, width, height }: SpreadRoom["shares"], { across, tall }: SpreadRoom) {
  return {
    x: [left / across, (left + width) / across] as [number, number],
    y: [1 - (top + height) / tall, 1 - top / tall] as [number, number],
  };
}

/** The outline of a histogram in places along its axis; from `lower` to `upper` alone where these are given. */
export function outline(
  { bins }: SpreadWatched,
  { place }: AxisScale,
  [lower, upper]: readonly [number, number] = [-Infinity, Infinity],
): { x: number[]; y: number[] } {
  const kept = bins.filter(({ from, to }) => to > lower && from < upper);
  if (kept.length === 0) return { x: [], y: [] };
  const x: number[] = [];
  const y: number[] = [];
  const to = (at: number, count: number) => {
    x.push(place(at));
    y.push(count);
  };
  to(Math.max(lower, kept[0]!.from), 0);
  for (const bin of kept) {
    to(Math.max(lower, bin.from), bin.count);
    to(Math.min(upper, bin.to), bin.count);
  }
  to(Math.min(upper, kept.at(-1)!.to), 0);
  return { x, y };
}

/** px under the axis of a histogram: its quantiles, and its title. */
const quantilesUnder = 34;
const titleUnder = 48;

function histogram(watched: SpreadWatched, index: number, { room, inks }: SpreadPlotInput) {
  const { bins, quantiles } = watched;
  const scale = axisScale(watched.isLog, watched.scale.factor);
  const range = airyRange([scale.place(bins[0]!.from), scale.place(bins.at(-1)!.to)], 0.01);
  const domain = domains(room.histograms[index]!, room);
  const [xaxis, yaxis] = [axisName("x", index), axisName("y", index)];
  const value = (name: keyof typeof quantiles): number => quantiles[name].value ?? NaN;
  const middle = outline(watched, scale, [value("lower"), value("upper")]);
  const trace = (line: { x: number[]; y: number[] }, more: object): Data =>
    ({ type: "scatter", mode: "lines", ...line, xaxis, yaxis, hoverinfo: "skip", ...more }) as Data;
  const under = (from: number, to: number, width: number, [low, high] = [0, 0]): Partial<Shape> => ({
    type: "line",
    xref: xaxis as Shape["xref"],
    x0: scale.place(from),
    x1: scale.place(to),
    yref: "paper",
    ysizemode: "pixel",
    yanchor: domain.y[0],
    y0: -quantilesUnder + low,
    y1: -quantilesUnder + high,
    line: { color: inks.ink!, width },
  });
  const lines: [number, number, number, [number, number]?][] = [
    [value("q2_5"), value("q97_5"), 0.9],
    [value("lower"), value("upper"), 3.2],
    [value("q2_5"), value("q2_5"), 0.9, [-3, 3]],
    [value("q97_5"), value("q97_5"), 0.9, [-3, 3]],
    [value("median"), value("median"), 1.6, [-6, 6]],
  ];
  const { sans } = figureFonts();
  return {
    data: [
      trace(middle, { fill: "toself", fillcolor: inks.ink!, opacity: 0.09, line: { width: 0 } }),
      trace(outline(watched, scale), { line: { color: inks.ink!, width: 1.3 } }),
    ],
    layout: {
      [layoutName("x", index)]: {
        ...tickedAxis(inks, "", range, axisTicks(scale, range, room.histograms[index]!.width, 48)),
        domain: domain.x,
        anchor: yaxis,
        fixedrange: true,
      },
      [layoutName("y", index)]: {
        range: [0, 1.04 * Math.max(...bins.map(({ count }) => count))],
        domain: domain.y,
        anchor: xaxis,
        visible: false,
        fixedrange: true,
      },
    },
    shapes: lines.filter(([from, to]) => !Number.isNaN(from + to)).map((line) => under(...line)),
    annotations: [
      note(
        letteredText(titleOf(watched.label, watched.scale)),
        {
          x: (domain.x[0] + domain.x[1]) / 2,
          y: domain.y[0],
          xref: "paper",
          yref: "paper",
          xanchor: "center",
          yanchor: "top",
          yshift: -titleUnder,
        },
        { family: sans, size: 13, color: inks.ink! },
      ),
    ],
  };
}

const wholeTitle = "share of the variance that this entry alone explains";

/** Shares of variance: a row an entry, a mark a watched result. */
function shares(index: number, { spread, room, inks }: SpreadPlotInput) {
  const { watched, inputs } = spread;
  const [xaxis, yaxis] = [axisName("x", index), axisName("y", index)];
  const domain = domains(room.shares, room);
  const all = watched.flatMap(({ shares: own }) => [...own.values()].flatMap(({ share }) => share ?? []));
  const range: [number, number] = [Math.min(-0.012, ...all) - 0.002, Math.max(1, ...all) + 0.006];
  const perPixel = (range[1] - range[0]) / room.shares.width;
  const { sans, mono } = figureFonts();
  const base = { type: "scatter", xaxis, yaxis, hoverinfo: "skip", cliponaxis: false } as const;
  const marked = (x: number[], y: number[], mark: number): Data => {
    const { symbol, isOpen } = shareMark(mark);
    // Open ones are larger, so that a ring is seen round a dot that lies on it.
    const marker = {
      symbol,
      size: isOpen ? 10 : 7.5,
      color: isOpen ? inks.paper! : inks.ink!,
      line: { color: inks.ink!, width: 1.6 },
    };
    return { ...base, mode: "markers", x, y, marker } as Data;
  };
  const known = (each: SpreadWatched) =>
    inputs.flatMap((input, row) => {
      const share = each.shares.get(input)?.share ?? null;
      return share === null ? [] : [{ share, row: -row }];
    });
  const reach = inputs.map((input) =>
    Math.max(0, ...watched.map(({ shares: own }) => own.get(input)?.share ?? 0)),
  );
  const key = keyPlaces(
    watched.map(({ label }) => nameWidth(label)),
    room.shares.width,
  );
  const keyAt = (mark: number) => ({
    x: key[mark]!.left * perPixel + range[0],
    y: 0.5 + keyHeight(key[mark]!.line, room.keyLines) / room.row,
  });
  return {
    data: [
      ...inputs.map(
        (_, row): Data =>
          ({
            ...base,
            mode: "lines",
            x: [0, reach[row]!],
            y: [-row, -row],
            line: { color: inks.ink3!, width: 0.8 },
          }) as Data,
      ),
      // The first watched result is drawn last, so that its dots are seen whole.
      ...watched
        .map((each, mark) =>
          marked(
            known(each).map(({ share }) => share),
            known(each).map(({ row }) => row),
            mark,
          ),
        )
        .reverse(),
      ...watched.map((_, mark) => marked([keyAt(mark).x], [keyAt(mark).y], mark)),
    ],
    layout: {
      [layoutName("x", index)]: {
        ...tickedAxis(inks, room.shares.width < 330 ? "share of variance, alone" : wholeTitle, range, {
          places: [0, 0.5, 1],
          texts: ["0", "0.5", "1"],
          minor: Array.from({ length: 11 }, (_, tenth) => tenth / 10),
        }),
        domain: domain.x,
        anchor: yaxis,
        fixedrange: true,
      },
      [layoutName("y", index)]: {
        range: [0.5 - inputs.length, 0.5 + keyEnd(room.keyLines) / room.row],
        domain: domain.y,
        anchor: xaxis,
        visible: false,
        fixedrange: true,
      },
    },
    annotations: [
      ...inputs.map((input, row) =>
        note(
          input,
          {
            x: 0,
            y: -row,
            xref: "paper",
            yref: yaxis as Annotation["yref"],
            xanchor: "left",
            yanchor: "middle",
            yshift: room.isStacked ? 15 : 0,
          },
          { family: mono, size: 12.5, color: inks.ink! },
        ),
      ),
      ...watched.map(({ label }, mark) =>
        note(
          letteredText(label),
          {
            ...keyAt(mark),
            xref: xaxis as Annotation["xref"],
            yref: yaxis as Annotation["yref"],
            xanchor: "left",
            yanchor: "middle",
            xshift: 9,
          },
          { family: sans, size: 13, color: inks.ink! },
        ),
      ),
    ],
  };
}

/** Histograms of what is watched with their quantiles, and under them which entry drives them. */
export function spreadPlot(input: SpreadPlotInput): FigureDrawing {
  const { spread, room } = input;
  const shown = spread.watched.filter(({ bins }) => bins.length > 0);
  const histograms = shown.map((watched, index) => histogram(watched, index, input));
  const drivers = shares(shown.length, input);
  const layout = Object.assign(
    {},
    ...histograms.map((each) => each.layout),
    drivers.layout,
  ) as Partial<Layout>;
  return {
    data: [...histograms.flatMap(({ data }) => data), ...drivers.data],
    layout: {
      ...baseLayout(room),
      dragmode: false,
      ...layout,
      shapes: histograms.flatMap((each) => each.shapes),
      annotations: [...histograms.flatMap((each) => each.annotations), ...drivers.annotations],
    },
  };
}

/** What the figure shows, for those who do not see it. */
export function spreadLabel({ name, watched, inputs }: SpreadResult): string {
  const results = watched.map(({ label }) => plainText(label)).join(", ");
  return `Spread ${name}: histograms of ${results}, and the share of their variance that each of ${inputs.join(", ")} explains alone`;
}
