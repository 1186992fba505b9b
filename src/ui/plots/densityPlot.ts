import type { Annotation, Data, Layout, Shape } from "plotly.js";
import type { Strip } from "../../../shared/notebook/summary";
import { formatKilometres, formatUnit, type UnitSystem } from "../../lib/format";
import type { GasStyle } from "../../lib/gasStyle";
import { figureText, plainText } from "../../lib/richText";
import { densityDecades, densityUnit, drawnRows, type GasCurve, type Profiles } from "./columnCurves";
import type { FigureRoom } from "./figureRoom";
import {
  acrossLine,
  altitudeAxis,
  axis,
  baseLayout,
  dashList,
  decadeAxis,
  figureFonts,
  note,
  plainAxis,
  type FigureZoom,
} from "./figureLayout";
import { knudsenBand } from "./knudsenBand";
import { exobaseNotes, panelScale, type PanelScale } from "./panelLettering";
import { placeNames, type Box, type PlacedName } from "./placeNames";
import type { FigureInks } from "./useFigureInks";

export interface DensityPlotInput {
  profiles: Profiles;
  strip: Strip;
  unitSystem: UnitSystem;
  curves: readonly GasCurve[];
  styles: ReadonlyMap<string, GasStyle>;
  room: FigureRoom;
  inks: FigureInks;
  hidden: ReadonlySet<string>;
  zoom: FigureZoom | null;
}

export interface DensityPlot {
  data: Data[];
  layout: Partial<Layout>;
  /** Gases in the order of the name annotations, which are the first ones of the layout. */
  named: string[];
  /** Gases whose names found no place. */
  unnamed: string[];
}

/** Curves above the exobase: thinner than below; a corona in dashes of its own. */
const hydrostatic = { opacity: 0.75, thinned: 0.72, dash: null };
const ofCorona = { opacity: 0.86, thinned: 0.86, dash: "6 4.5" };

function gasTraces({ curves, styles, inks, hidden }: DensityPlotInput): Data[] {
  return curves.flatMap(({ gas, below, above, step }) => {
    const { dash, width } = styles.get(gas)!;
    const look = step ? ofCorona : hydrostatic;
    const trace = (part: typeof below, isAbove: boolean): Data => ({
      type: "scatter",
      mode: "lines",
      name: gas,
      x: part.x,
      y: part.y,
      visible: !hidden.has(gas),
      opacity: isAbove ? look.opacity : 1,
      line: {
        color: inks[gas]!,
        width: isAbove ? width * look.thinned : width,
        dash: dashList(isAbove ? (look.dash ?? dash) : dash),
      },
      hoverinfo: "skip",
    });
    return above.x.length > 1 ? [trace(below, false), trace(above, true)] : [trace(below, false)];
  });
}

function temperatureTrace({ profiles, strip, inks }: DensityPlotInput): Data {
  const rows = drawnRows(profiles, strip);
  return {
    type: "scatter",
    mode: "lines",
    name: "temperature",
    x: rows.map((row) => profiles.temperature![row]!),
    y: rows.map((row) => profiles.altitude![row]! / 1000),
    xaxis: "x2",
    yaxis: "y",
    line: { color: inks.ink!, width: 1.5 },
    hoverinfo: "skip",
  };
}

/** Sans at 14.5 px: a capital is about 9 px wide, a subscript 6. */
const nameWidth = (gas: string): number =>
  [...gas].reduce(
    (sum, character) => sum + (/\d/.test(character) ? 6 : /[a-z]/.test(character) ? 7.5 : 9.6),
    4,
  );

/** Where the names of gases stand beside their curves. */
export function namePlaces(
  { room, curves }: Pick<DensityPlotInput, "room" | "curves">,
  scale: PanelScale,
  obstacles: readonly Box[],
): Map<string, PlacedName> {
  const frame: Box = { left: 4, right: room.panel - 2, top: 4, bottom: room.tall - 6 };
  const placed = curves.map(({ gas, below, above }) => ({
    key: gas,
    nameWidth: nameWidth(gas),
    points: [...below.x, ...above.x]
      .map((value, i) => [scale.x(Math.log10(value)), scale.y([...below.y, ...above.y][i]!)] as const)
      .filter(([x, y], i) => i % 2 === 0 && x > -60 && x < room.panel + 60 && y > -60 && y < room.tall + 60),
  }));
  return placeNames(placed, frame, obstacles);
}

/** Short bars in the gases' colours at the altitude axis: where each gas parts from the mixture. */
function homopauseTicks({ strip, inks }: DensityPlotInput): Partial<Shape>[] {
  return strip.homopauses
    .filter(({ gas, altitude }) => inks[gas] !== undefined && altitude > strip.base)
    .map(({ gas, altitude }) => ({
      type: "line",
      xref: "x domain" as Shape["xref"],
      yref: "y",
      xsizemode: "pixel",
      xanchor: 0,
      x0: 1,
      x1: 12,
      y0: altitude / 1000,
      y1: altitude / 1000,
      line: { color: inks[gas]!, width: 2 },
    }));
}

/** The step from column to corona, drawn to scale between two short bars, one down and one up. */
function coronaSteps({ curves, inks, hidden }: DensityPlotInput): Partial<Shape>[] {
  return curves.flatMap(({ gas, step }): Partial<Shape>[] => {
    if (!step || hidden.has(gas)) return [];
    const line = { color: inks[gas]!, width: 1.6 };
    const bar = (x: number, y1: number): Partial<Shape> => ({
      ...{ type: "line", xref: "x", yref: "y", x0: x, x1: x, line },
      ...{ ysizemode: "pixel", yanchor: step.km, y0: 0, y1 },
    });
    const across = { ...bar(step.from, 0), x1: step.to };
    return [bar(step.from, -4.5), across, bar(step.to, 4.5)];
  });
}

/** Names at their places, those that found one, in the order of the curves. */
export function gasNames(
  { styles, inks, hidden }: Pick<DensityPlotInput, "styles" | "inks" | "hidden">,
  curves: readonly GasCurve[],
  places: ReadonlyMap<string, PlacedName>,
  scale: PanelScale,
): Partial<Annotation>[] {
  const { sans } = figureFonts();
  return curves.flatMap(({ gas }) => {
    const place = places.get(gas);
    if (!place) return [];
    const { x, y, anchor } = place;
    const at = {
      x: scale.decade(x),
      y: scale.km(y),
      xanchor: anchor === "start" ? "left" : "right",
    } as const;
    return {
      ...note(
        `<span style="font-weight:650">${figureText(styles.get(gas)!.name)}</span>`,
        { ...at, yanchor: "middle" },
        { family: sans, size: 14.5, color: inks[gas]! },
      ),
      captureevents: true,
      opacity: hidden.has(gas) ? 0.4 : 1,
    };
  });
}

/** The axes of the temperature beside the densities, for temperatures from `low` to `high`. */
export function temperaturePanel(
  { room, inks }: Pick<DensityPlotInput, "room" | "inks">,
  altitudes: [number, number],
  [low, high]: readonly [number, number],
): Partial<Layout> {
  const total = room.panel + room.gap + room.second;
  const margin = Math.max(0.12 * (high - low), 0.04 * high);
  return {
    xaxis2: {
      ...plainAxis(inks, "temperature, K", room.second, [Math.max(0, low - margin), high + margin]),
      domain: [(room.panel + room.gap) / total, 1],
      anchor: "y2",
      fixedrange: true,
    },
    yaxis2: {
      ...altitudeAxis(inks, room, altitudes),
      title: { text: "" },
      anchor: "x2",
      matches: "y",
      showticklabels: false,
    },
  };
}

function temperatureEnds({ profiles, strip }: DensityPlotInput): [number, number] {
  const values = drawnRows(profiles, strip).map((row) => profiles.temperature![row]!);
  return [Math.min(...values), Math.max(...values)];
}

/** Number density of each gas against altitude, and the temperature it rests on. */
export function densityPlot(input: DensityPlotInput): DensityPlot {
  const { profiles, strip, room, inks, curves, zoom, unitSystem } = input;
  const altitudes: [number, number] = zoom?.y ?? [strip.base / 1000, strip.top / 1000];
  const decades = zoom?.x ?? densityDecades(curves);
  const scale = panelScale(room, decades, altitudes);
  const panels: ("x" | "x2")[] = room.second > 0 ? ["x", "x2"] : ["x"];
  const lettering = exobaseNotes(strip, room, inks, scale, "right");
  const homopauseBoxes = strip.homopauses.map(({ altitude }): Box => {
    const y = scale.y(altitude / 1000);
    return { left: 0, right: 16, top: y - 2, bottom: y + 2 };
  });
  const places = namePlaces(input, scale, [...lettering.boxes, ...homopauseBoxes]);
  const named = curves.map(({ gas }) => gas).filter((gas) => places.has(gas));
  const exobaseLines =
    strip.exobase === null
      ? []
      : panels.map((panel) => acrossLine(panel, strip.exobase! / 1000, inks.ink!, 1.4));
  const total = room.panel + room.gap + room.second;
  const temperature = { ...temperatureTrace(input), yaxis: "y2" } as Data;
  const unit = figureText(formatUnit(densityUnit(unitSystem).unit));
  return {
    data: [...gasTraces(input), ...(room.second > 0 ? [temperature] : [])],
    layout: {
      ...baseLayout(room),
      xaxis: {
        ...decadeAxis(inks, `number density, ${unit}`, room.panel, decades),
        domain: [0, room.panel / total],
        anchor: "y",
      },
      yaxis: { ...axis(inks, "altitude, km"), ...altitudeAxis(inks, room, altitudes), anchor: "x" },
      ...(room.second > 0 && temperaturePanel(input, altitudes, temperatureEnds(input))),
      shapes: [
        ...knudsenBand(profiles, panels, inks.ink!, 0.3),
        ...exobaseLines,
        ...homopauseTicks(input),
        ...coronaSteps(input),
      ],
      annotations: [...gasNames(input, curves, places, scale), ...lettering.notes],
    },
    named,
    unnamed: curves.map(({ gas }) => gas).filter((gas) => !places.has(gas)),
  };
}

/** What the figure shows, for those who do not see it. */
export function densityLabel(strip: Strip, styles: ReadonlyMap<string, GasStyle>): string {
  const gases = strip.gases.map((gas) => plainText(styles.get(gas)!.name)).join(", ");
  return `Number density of ${gases} against altitude in ${strip.column}, from ${formatKilometres(strip.base)} to ${formatKilometres(strip.top)} km`;
}
