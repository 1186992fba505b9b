import type { Data, Layout } from "plotly.js";
import type { Strip } from "../../../shared/notebook/summary";
import { formatUnit, type UnitSystem } from "../../lib/format";
import type { GasStyle } from "../../lib/gasStyle";
import { figureText } from "../../lib/richText";
import {
  densityCurves,
  densityDecades,
  densityUnit,
  drawnRows,
  type GasCurve,
  type Profiles,
} from "./columnCurves";
import { dashList } from "./dashList";
import { gasNames, namePlaces, temperaturePanel } from "./densityPlot";
import type { FigureDrawing } from "./exportFigure";
import { acrossLine, altitudeAxis, axis, baseLayout, decadeAxis, type FigureZoom } from "./figureLayout";
import type { FigureRoom } from "./figureRoom";
import { exobaseNotes, panelScale } from "./panelLettering";
import type { FigureInks } from "./useFigureInks";

export interface ComparedColumn {
  profiles: Profiles;
  strip: Strip;
}

export interface ComparisonPlotInput {
  older: ComparedColumn;
  newer: ComparedColumn;
  unitSystem: UnitSystem;
  styles: ReadonlyMap<string, GasStyle>;
  room: FigureRoom;
  inks: FigureInks;
  zoom: FigureZoom | null;
}

/** Range of altitudes that holds both columns, and the gases of either, m. */
export function commonStrip(older: Strip, newer: Strip): Strip {
  return {
    ...newer,
    base: Math.min(older.base, newer.base),
    top: Math.max(older.top, newer.top),
    gases: [...newer.gases, ...older.gases.filter((gas) => !newer.gases.includes(gas))],
  };
}

const whole = ({ below, above }: GasCurve) => ({ x: [...below.x, ...above.x], y: [...below.y, ...above.y] });

function line(curve: GasCurve, style: GasStyle, color: string, width: number): Data {
  return {
    type: "scatter",
    mode: "lines",
    name: curve.gas,
    ...whole(curve),
    line: { color, width, dash: dashList(style.dash) },
    hoverinfo: "skip",
  };
}

/** What lies between the two states of a gas. */
function tint(older: GasCurve, newer: GasCurve, color: string): Data {
  const [there, back] = [whole(older), whole(newer)];
  return {
    type: "scatter",
    mode: "none",
    fill: "toself",
    fillcolor: color,
    opacity: 0.14,
    x: [...there.x, ...back.x.reverse()],
    y: [...there.y, ...back.y.reverse()],
    hoverinfo: "skip",
  } as Data;
}

function temperatureTrace({ profiles }: ComparedColumn, strip: Strip, color: string, width: number): Data {
  const rows = drawnRows(profiles, strip);
  return {
    type: "scatter",
    mode: "lines",
    x: rows.map((row) => profiles.temperature![row]!),
    y: rows.map((row) => profiles.altitude![row]! / 1000),
    xaxis: "x2",
    yaxis: "y2",
    line: { color, width },
    hoverinfo: "skip",
  };
}

/** Number densities of two states of a column on one pair of axes: the older thin, the newer bold, between them tinted. */
export function comparisonPlot(input: ComparisonPlotInput): FigureDrawing {
  const { older, newer, unitSystem, styles, room, inks, zoom } = input;
  const common = commonStrip(older.strip, newer.strip);
  const within = ({ strip }: ComparedColumn): Strip => ({ ...strip, base: common.base, top: common.top });
  const before = densityCurves(older.profiles, within(older), unitSystem);
  const after = densityCurves(newer.profiles, within(newer), unitSystem);
  const altitudes: [number, number] = zoom?.y ?? [common.base / 1000, common.top / 1000];
  const decades = zoom?.x ?? densityDecades([...after, ...before]);
  const scale = panelScale(room, decades, altitudes);
  const panels: ("x" | "x2")[] = room.second > 0 ? ["x", "x2"] : ["x"];
  const lettering = exobaseNotes(newer.strip, room, inks, scale, "right");
  const gone = before.filter(({ gas }) => !after.some((curve) => curve.gas === gas));
  const named = [...after, ...gone];
  const places = namePlaces({ room, curves: named }, scale, lettering.boxes);
  const total = room.panel + room.gap + room.second;
  const exobaseOf = ({ strip }: ComparedColumn, color: string, width: number, dash: "solid" | "dash") =>
    strip.exobase === null
      ? []
      : panels.map((panel) => {
          const shape = acrossLine(panel, strip.exobase! / 1000, color, width);
          return { ...shape, line: { ...shape.line, dash } };
        });
  const temperatures = [
    temperatureTrace(older, within(older), inks.ink!, 0.9),
    temperatureTrace(newer, within(newer), inks.ink!, 2.2),
  ];
  const data: Data[] = [
    ...after.flatMap((curve) => {
      const twin = before.find(({ gas }) => gas === curve.gas);
      return twin ? [tint(twin, curve, inks[curve.gas]!)] : [];
    }),
    ...before.map((curve) => line(curve, styles.get(curve.gas)!, inks[curve.gas]!, 0.9)),
    ...after.map((curve) => line(curve, styles.get(curve.gas)!, inks[curve.gas]!, 2.2)),
    ...(room.second > 0 ? temperatures : []),
  ];
  const layout: Partial<Layout> = {
    ...baseLayout(room),
    xaxis: {
      ...decadeAxis(
        inks,
        `number density, ${figureText(formatUnit(densityUnit(unitSystem).unit))}`,
        room.panel,
        decades,
      ),
      domain: [0, room.panel / total],
      anchor: "y",
    },
    yaxis: { ...axis(inks, "altitude, km"), ...altitudeAxis(inks, room, altitudes), anchor: "x" },
    ...(room.second > 0 && temperaturePanel({ room, inks }, altitudes, rangeOf(temperatures))),
    shapes: [...exobaseOf(older, inks.dusk!, 1, "dash"), ...exobaseOf(newer, inks.ink!, 1.4, "solid")],
    annotations: [...gasNames({ styles, inks, hidden: new Set() }, named, places, scale), ...lettering.notes],
  };
  return { data, layout };
}

function rangeOf(traces: readonly Data[]): [number, number] {
  const values = traces.flatMap((trace) => (trace as { x: number[] }).x);
  return [Math.min(...values), Math.max(...values)];
}
