import type { Annotation, Data, Layout } from "plotly.js";
import { formatNumber, formatPower, formatUnit } from "../../lib/format";
import { figureText, plainText } from "../../lib/richText";
import { axisScale, axisTicks, spansDecades, tickedAxis, type AxisScale } from "./axisTicks";
import { contourLabels, type ContourLabel } from "./contourLabels";
import { contourLines } from "./contourLines";
import type { FigureDrawing } from "./exportFigure";
import { baseLayout, figureFonts, inkValues, letteredText, note, type FigureZoom } from "./figureLayout";
import { bandAt, levelsOf, mapBands, paletteStep, type MapBands } from "./mapBands";
import { emptyMeshes, filledGrid, mapGrid, type MapGrid } from "./mapGrid";
import type { MapRoom } from "./mapRoom";
import { nameWidth, sweepScale, sweptRange } from "./sweepPlot";
import { shownNumber, steppedNumber, titleOf, type SweepResult, type SweptResult } from "./sweepResult";
import type { FigureInks } from "./useFigureInks";

export interface MapPlotInput {
  sweep: SweepResult;
  /** The watched quantity that is shown. */
  shown: SweptResult;
  room: MapRoom;
  inks: FigureInks;
  zoom: FigureZoom | null;
}

const steps = Array.from({ length: 10 }, (_, step) => step);

/** Colours of a map, by the names under which it asks for them. */
export const mapInks: Readonly<Record<string, string>> = {
  ...inkValues,
  redline: "var(--redline)",
  pale: "var(--on-deep)",
  deep: "var(--on-pale)",
  ...Object.fromEntries(steps.map((step) => [`map${step}`, `var(--map-${step})`])),
};

const isWhole = (number: number): boolean => Math.abs(number - Math.round(number)) < 1e-6;

/** How the shown quantity runs over the steps: by decades where it spans them. */
export function mapScale({ values, scale }: SweptResult): AxisScale {
  const known = values.filter((value) => value !== null);
  return axisScale(spansDecades(known), scale.factor);
}

function bandsOf(grid: MapGrid, { isLog }: AxisScale): MapBands {
  const known = grid.z.flat().filter((place) => place !== null);
  return known.length === 0 ? mapBands(0, 0, isLog) : mapBands(Math.min(...known), Math.max(...known), isLog);
}

/** "10^25.5"; plain numbers where the scale is even, with the digits that tell a level from its neighbours. */
function levelText(level: number, { isLog }: AxisScale, { step }: MapBands): string {
  if (isLog) return figureText(formatPower(level, isWhole(level) ? 0 : isWhole(2 * level) ? 1 : 2));
  if (Math.abs(level) < 1e-9 * step) return "0";
  const digits = Math.max(
    1,
    Math.floor(Math.log10(Math.abs(level)) + 1e-9) - Math.floor(Math.log10(step) + 1e-9) + 1,
  );
  return figureText(formatNumber(level, digits));
}

/** Of contours every quarter of a decade, every other is named. */
const isNamed = (level: number, { isLog }: AxisScale, { step }: MapBands): boolean =>
  !isLog || step >= 0.5 || isWhole(2 * level);

/** A line or letter that stands out from a step of the palette. */
function inkOn(colour: string, inks: FigureInks): string {
  return lightness(colour) > 0.25 ? inks.deep! : inks.pale!;
}

/** Relative luminance of "rgb(…)" or "#rrggbb", roughly. */
function lightness(colour: string): number {
  const hex = /^#([0-9a-f]{2})([0-9a-f]{2})([0-9a-f]{2})$/i.exec(colour);
  const channels = hex
    ? hex.slice(1).map((digits) => parseInt(digits, 16))
    : (colour.match(/[\d.]+/g) ?? []).map(Number);
  const [r = 0, g = 0, b = 0] = channels.map((channel) => (channel / 255) ** 2.2);
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

const bandColour = (band: number, bands: MapBands, inks: FigureInks): string =>
  inks[`map${paletteStep(band, bands)}`]!;

function bandTraces({ x, y }: MapGrid, filled: number[][], bands: MapBands, inks: FigureInks): Data[] {
  const levels = levelsOf(bands);
  const count = bands.edges.length - 1;
  const shared = { type: "contour", x, y, z: filled, showscale: false, hoverinfo: "skip" } as const;
  const colours = Array.from({ length: count }, (_, band) => bandColour(band, bands, inks));
  if (levels.length === 0) {
    const colour = colours[0] ?? inks.map5!;
    return [
      {
        type: "heatmap",
        x,
        y,
        z: filled,
        showscale: false,
        hoverinfo: "skip",
        colorscale: [
          [0, colour],
          [1, colour],
        ],
      } as Data,
    ];
  }
  const fill = {
    ...shared,
    autocontour: false,
    contours: {
      start: levels[0]!,
      end: levels.at(-1)!,
      size: bands.step,
      coloring: "fill",
      showlines: false,
    },
    colorscale: colours.map((colour, band) => [band / (count - 1), colour]),
    line: { width: 0, smoothing: 0 },
  } as Data;
  const lines = levels.map((level, index): Data => {
    const ink = inkOn(
      bandColour(
        lightness(colours[index]!) < lightness(colours[index + 1]!) ? index + 1 : index,
        bands,
        inks,
      ),
      inks,
    );
    return {
      ...shared,
      autocontour: false,
      contours: { start: level, end: level, size: bands.step, coloring: "none", showlines: true },
      line: { width: isWhole(level) ? 1.3 : 0.7, color: ink, smoothing: 0 },
    } as Data;
  });
  return [fill, ...lines];
}

/** Hatching over what has no answer: whole meshes, so that its edge follows the points. */
function hatching(grid: MapGrid, inks: FigureInks): Data[] {
  const meshes = emptyMeshes(grid);
  if (meshes.length === 0) return [];
  const [x, y]: (number | null)[][] = [[], []];
  for (const { column, row } of meshes) {
    const [x0, x1, y0, y1] = [grid.x[column]!, grid.x[column + 1]!, grid.y[row]!, grid.y[row + 1]!];
    x!.push(x0, x1, x1, x0, x0, null);
    y!.push(y0, y0, y1, y1, y0, null);
  }
  const area = {
    type: "scatter",
    mode: "lines",
    x,
    y,
    fill: "toself",
    line: { width: 0 },
    hoverinfo: "skip",
  } as const;
  return [
    { ...area, fillcolor: inks.paper!, line: { width: 1, color: inks.paper! } } as Data,
    {
      ...area,
      fillcolor: inks.redline!,
      fillpattern: {
        shape: "/",
        size: 7,
        solidity: 0.12,
        fgcolor: inks.redline!,
        fgopacity: 0.62,
        bgcolor: inks.paper!,
      },
    } as Data,
  ];
}

/** The notebook as written; null where it lies beyond the map. */
function writtenPlace({ axes }: SweepResult, { x, y }: MapGrid): [number, number] | null {
  const [across, up] = axes.map((axis) =>
    axis.written === null ? NaN : sweepScale(axis).place(axis.written),
  );
  const isWithin = (place: number, places: number[]) => place >= places[0]! && place <= places.at(-1)!;
  return isWithin(across!, x) && isWithin(up!, y) ? [across!, up!] : null;
}

/** A cross about a ring, in ink that stands out from where it is. */
function cross(
  [x, y]: [number, number],
  { shown, inks }: MapPlotInput,
  scale: AxisScale,
  bands: MapBands,
): Data[] {
  const place = shown.written === null ? NaN : scale.place(shown.written);
  const ground = Number.isFinite(place) ? bandColour(bandAt(place, bands), bands, inks) : inks.paper!;
  const ink = Number.isFinite(place) ? inkOn(ground, inks) : inks.ink!;
  const mark = (marker: object): Data =>
    ({
      type: "scatter",
      mode: "markers",
      x: [x],
      y: [y],
      marker,
      cliponaxis: false,
      hoverinfo: "skip",
    }) as Data;
  return [
    mark({ symbol: "cross-thin", size: 26, line: { color: ink, width: 1.4 } }),
    mark({ symbol: "circle", size: 9, color: ground, line: { color: ink, width: 1.8 } }),
  ];
}

function labels(
  grid: MapGrid,
  bands: MapBands,
  scale: AxisScale,
  input: MapPlotInput,
  ranges: Ranges,
): ContourLabel[] {
  const { room, sweep } = input;
  const pixel = pixelsOf(room, ranges);
  const written = writtenPlace(sweep, grid);
  const named = levelsOf(bands).filter((level) => isNamed(level, scale, bands));
  const contours = named.map((level) => ({
    level,
    lines: contourLines(grid, level).map((line) => line.map(pixel)),
    labelWidth: 7 * plainText([levelText(level, scale, bands).replace(/<[^>]*>/g, "")]).length + 6,
  }));
  return contourLabels(contours, { width: room.panel, height: room.tall }, written ? [pixel(written)] : []);
}

interface Ranges {
  x: [number, number];
  y: [number, number];
}

/** From places to px of the map, and back. */
const pixelsOf =
  ({ panel, tall }: MapRoom, { x, y }: Ranges) =>
  ([across, up]: readonly [number, number]): [number, number] => [
    ((across - x[0]) / (x[1] - x[0])) * panel,
    tall * (1 - (up - y[0]) / (y[1] - y[0])),
  ];

const placeAt =
  ({ panel, tall }: MapRoom, { x, y }: Ranges) =>
  (left: number, top: number) => ({
    x: x[0] + (left / panel) * (x[1] - x[0]),
    y: y[0] + (1 - top / tall) * (y[1] - y[0]),
  });

function labelNotes(
  found: readonly ContourLabel[],
  bands: MapBands,
  scale: AxisScale,
  { room, inks }: MapPlotInput,
  ranges: Ranges,
): Partial<Annotation>[] {
  const place = placeAt(room, ranges);
  return found.map(({ level, x, y, angle }) => {
    const ground = bandColour(bandAt(level, bands), bands, inks);
    const font = { family: figureFonts().sans, size: 12, color: inkOn(ground, inks) };
    return {
      // On a patch of its band, a halo of paper would only blur it.
      ...note(
        `<span style="stroke:none">${levelText(level, scale, bands)}</span>`,
        { ...place(x, y), xanchor: "center", yanchor: "middle" },
        font,
      ),
      // Its types ask for words, the library for a number.
      ...({ textangle: angle } as object),
      bgcolor: ground,
      borderpad: 1,
    };
  });
}

/** The colour bar: as many steps as the map has bands, each level at its border. */
function colourBar(
  bands: MapBands,
  scale: AxisScale,
  { room, inks, shown }: MapPlotInput,
): { data: Data[]; layout: Partial<Layout> } {
  const count = bands.edges.length - 1;
  const total = room.panel + room.gap + room.bar;
  const { sans } = figureFonts();
  const known = levelsOf(bands);
  const tall = Math.min(room.tall - 44, Math.max(80, 27 * count));
  const named = known.filter((level) => isNamed(level, scale, bands));
  const every = named.length > 0 ? Math.max(1, Math.ceil((16 * named.length) / tall)) : 1;
  const told = named.filter((_, index) => index % every === 0);
  const edges = bands.step === 0 ? [0, 1] : bands.edges;
  const isShort = nameWidth(shown.label) < room.bar + room.right;
  const title = {
    x: isShort ? 1 - room.bar / total : 1,
    xref: "paper",
    y: tall / room.tall,
    yref: "paper",
    // A long name begins left of the bar and ends at the edge of the figure.
    xanchor: isShort ? "left" : "right",
    xshift: isShort ? 0 : room.right - 2,
    yanchor: "bottom",
    yshift: 8,
  } as const;
  const unit = figureText(formatUnit(shown.scale.unit));
  const words = letteredText(shown.label);
  const isOnly = bands.step === 0;
  return {
    data: [
      {
        type: "bar",
        x: edges.slice(0, -1).map(() => 0.5),
        y: edges.slice(0, -1).map((edge, band) => edges[band + 1]! - edge),
        base: edges.slice(0, -1),
        width: edges.slice(0, -1).map(() => 1),
        marker: {
          color: edges.slice(0, -1).map((_, band) => bandColour(band, bands, inks)),
          line: { width: 0 },
        },
        xaxis: "x2",
        yaxis: "y2",
        hoverinfo: "skip",
      } as unknown as Data,
    ],
    layout: {
      xaxis2: {
        domain: [1 - room.bar / total, 1],
        range: [0, 1],
        visible: false,
        fixedrange: true,
        anchor: "y2",
      },
      yaxis2: {
        ...tickedAxis(inks, "", [edges[0]!, edges.at(-1)!], {
          places: isOnly ? [0.5] : told,
          texts: isOnly
            ? [shown.values.some((value) => value !== null) ? onlyText(shown) : ""]
            : told.map((level) => levelText(level, scale, bands)),
          minor: known,
        }),
        domain: [0, tall / room.tall],
        anchor: "x2",
        side: "right",
        ticklen: 6,
        showline: false,
        fixedrange: true,
      },
      annotations: [
        {
          ...note(unit === "" ? words : `${words}<br>${unit}`, title, {
            family: sans,
            size: 12.5,
            color: inks.ink!,
          }),
          align: isShort ? "left" : "right",
        },
      ],
    },
  };
}

const onlyText = ({ values, scale }: SweptResult): string =>
  figureText(formatNumber(values.find((value) => value !== null)! * scale.factor));

/** One watched quantity over two varied ones: bands between contours, hatched where there is no answer. */
export function mapPlot(input: MapPlotInput): FigureDrawing {
  const { sweep, shown, room, inks, zoom } = input;
  const [first, second] = sweep.axes as [SweepResult["axes"][number], SweepResult["axes"][number]];
  const scale = mapScale(shown);
  const grid = mapGrid(sweep.axes, shown.values, scale);
  const bands = bandsOf(grid, scale);
  const ranges: Ranges = zoom ?? { x: sweptRange(first), y: sweptRange(second) };
  const bar = colourBar(bands, scale, input);
  const written = writtenPlace(sweep, grid);
  const total = room.panel + room.gap + room.bar;
  const axes = { x: sweepScale(first), y: sweepScale(second) };
  return {
    data: [
      ...bandTraces(grid, filledGrid(grid), bands, inks),
      ...hatching(grid, inks),
      ...(written ? cross(written, input, scale, bands) : []),
      ...bar.data,
    ],
    layout: {
      ...baseLayout(room),
      ...bar.layout,
      bargap: 0,
      xaxis: {
        ...tickedAxis(
          inks,
          letteredText(titleOf([{ code: first.name }], first.scale)),
          ranges.x,
          axisTicks(axes.x, ranges.x, room.panel, 46),
        ),
        domain: [0, room.panel / total],
        anchor: "y",
      },
      yaxis: {
        ...tickedAxis(
          inks,
          letteredText(titleOf([{ code: second.name }], second.scale)),
          ranges.y,
          axisTicks(axes.y, ranges.y, room.tall, 34),
        ),
        anchor: "x",
      },
      annotations: [
        ...labelNotes(labels(grid, bands, scale, input, ranges), bands, scale, input, ranges),
        ...(bar.layout.annotations ?? []),
      ],
    },
  };
}

/** In words, how far apart the contours are. */
export function contourWords(shown: SweptResult, sweep: SweepResult): string {
  const scale = mapScale(shown);
  const bands = bandsOf(mapGrid(sweep.axes, shown.values, scale), scale);
  if (levelsOf(bands).length === 0) return "It is the same all over the map";
  if (!scale.isLog) return `Lines every ${plainText(steppedNumber(bands.step / scale.factor, shown.scale))}`;
  const words: Record<number, string> = { 0.25: "quarter of a decade", 0.5: "half decade", 1: "decade" };
  const apart = words[bands.step] ?? `${bands.step} decades`;
  return bands.step < 1 ? `Lines every ${apart}, whole decades heavier` : `Lines every ${apart}`;
}

/** What the map shows, for those who do not see it. */
export function mapLabel({ name, axes, outcomes }: SweepResult, shown: SweptResult): string {
  const ends = axes.map((axis) => {
    const [low, high] = [axis.values[0]!, axis.values.at(-1)!].map((value) =>
      plainText(steppedNumber(value, axis.scale)),
    );
    return `${axis.name} from ${low} to ${high}`;
  });
  const known = shown.values.filter((value) => value !== null);
  const range =
    known.length === 0
      ? "no point has an answer"
      : `between ${[Math.min(...known), Math.max(...known)].map((value) => plainText(shownNumber(value, shown.scale))).join(" and ")}`;
  const missing = outcomes.length > 0 ? ", with points without an answer" : "";
  return `Map ${name}: ${plainText(shown.label)} over ${ends.join(" and ")}, ${range}${missing}`;
}
