import type { Annotation, Data } from "plotly.js";
import type { Strip } from "../../../shared/notebook/summary";
import { formatKilometres } from "../../lib/format";
import { drawnRows, interpolateProfile, type Profiles } from "./columnCurves";
import {
  acrossLine,
  altitudeAxis,
  baseLayout,
  decadeAxis,
  figureFonts,
  note,
  type FigureZoom,
} from "./figureLayout";
import type { FigureDrawing } from "./exportFigure";
import type { FigureRoom } from "./figureRoom";
import { knudsenBand } from "./knudsenBand";
import { exobaseNotes, panelScale } from "./panelLettering";
import { placeNames } from "./placeNames";
import type { FigureInks } from "./useFigureInks";

export interface CrossingPlotInput {
  profiles: Profiles;
  strip: Strip;
  room: FigureRoom;
  inks: FigureInks;
  zoom: FigureZoom | null;
}

const lengths = [
  { key: "mean_free_path", words: "mean free path", symbol: "l", width: 1.7, dash: "solid" as const },
  { key: "scale_height", words: "scale height", symbol: "H", width: 1.3, dash: "dash" as const },
];

/** Decades that hold all scale heights and the mean free path some way down from where the two meet. */
function lengthDecades(profiles: Profiles, rows: readonly number[]): [number, number] {
  const heights = rows.map((row) => profiles.scale_height![row]!);
  const paths = rows.map((row) => profiles.mean_free_path![row]!);
  const lowest = Math.log10(Math.min(...heights) / 1000);
  const highest = Math.log10(Math.max(...heights, paths.at(-1)!) / 1000);
  return [Math.floor(lowest) - 4, Math.ceil(highest * 4) / 4 + 0.1];
}

/** Mean free path and scale height against altitude: where they cross, Kn = 1. */
export function crossingPlot({ profiles, strip, room, inks, zoom }: CrossingPlotInput): FigureDrawing {
  const altitude = profiles.altitude!;
  const altitudes: [number, number] = zoom?.y ?? [strip.base / 1000, strip.top / 1000];
  const rows = drawnRows(profiles, strip);
  const decades = zoom?.x ?? lengthDecades(profiles, rows);
  const scale = panelScale(room, decades, altitudes);
  const { sans, serif } = figureFonts();
  const km = rows.map((row) => altitude[row]! / 1000);
  const lettering = exobaseNotes(strip, room, inks, scale, "left");
  const places = placeNames(
    lengths.map(({ key, words }) => ({
      key,
      nameWidth: words.length * 6.6 + 18,
      points: rows.map(
        (row, i) => [scale.x(Math.log10(profiles[key]![row]! / 1000)), scale.y(km[i]!)] as const,
      ),
    })),
    { left: 4, right: room.panel - 2, top: 4, bottom: room.tall - 6 },
    lettering.boxes,
  );
  const italic = (symbol: string) =>
    `<span style="font-family:${serif.replace(/"/g, "'")};font-style:italic">${symbol}</span>`;
  const names = lengths.flatMap(({ key, words, symbol }): Partial<Annotation>[] => {
    const place = places.get(key);
    if (!place) return [];
    const xanchor = place.anchor === "start" ? "left" : "right";
    return [
      note(
        `${words} ${italic(symbol)}`,
        { x: scale.decade(place.x), y: scale.km(place.y), xanchor, yanchor: "middle" },
        { family: sans, size: 13.5, color: inks.ink! },
      ),
    ];
  });
  const curves = lengths.map(({ key, words, width, dash }): Data => ({
    type: "scatter",
    mode: "lines",
    name: words,
    x: rows.map((row) => profiles[key]![row]! / 1000),
    y: km,
    line: { color: inks.ink!, width, dash: dash === "dash" ? ("7px,3px" as "dash") : dash },
    hoverinfo: "skip",
  }));
  const meeting: Data[] =
    strip.exobase === null
      ? []
      : [
          {
            type: "scatter",
            mode: "markers",
            x: [interpolateProfile(altitude, profiles.scale_height!, strip.exobase, true) / 1000],
            y: [strip.exobase / 1000],
            marker: { size: 8, color: inks.paper!, line: { color: inks.ink!, width: 1.6 } },
            hoverinfo: "skip",
          },
        ];
  return {
    data: [...curves, ...meeting],
    layout: {
      ...baseLayout(room),
      xaxis: { ...decadeAxis(inks, "length, km", room.panel, decades), anchor: "y" },
      yaxis: { ...altitudeAxis(inks, room, altitudes), anchor: "x" },
      shapes: [
        ...knudsenBand(profiles, ["x"], inks.ink!, 0.3),
        ...(strip.exobase === null ? [] : [acrossLine("x", strip.exobase / 1000, inks.ink!, 1.4)]),
      ],
      annotations: [...names, ...lettering.notes],
    },
  };
}

export function crossingLabel(strip: Strip): string {
  const meeting =
    strip.exobase === null
      ? "the two do not meet"
      : `the two meet at the exobase, ${formatKilometres(strip.exobase)} km`;
  return `Mean free path and scale height against altitude in ${strip.column}; ${meeting}`;
}
