import type { Annotation } from "plotly.js";
import type { Strip } from "../../../shared/notebook/summary";
import { formatKilometres, unitSpace } from "../../lib/format";
import { figureFonts, note } from "./figureLayout";
import type { FigureRoom } from "./figureRoom";
import type { Box } from "./placeNames";
import type { FigureInks } from "./useFigureInks";

/** From altitudes and decades to px of the main panel. */
export function panelScale(
  room: Pick<FigureRoom, "panel" | "tall">,
  decades: [number, number],
  altitudes: [number, number],
) {
  return {
    x: (log10: number) => ((log10 - decades[0]) / (decades[1] - decades[0])) * room.panel,
    y: (km: number) => room.tall - ((km - altitudes[0]) / (altitudes[1] - altitudes[0])) * room.tall,
    decade: (x: number) => decades[0] + (x / room.panel) * (decades[1] - decades[0]),
    km: (y: number) => altitudes[0] + ((room.tall - y) / room.tall) * (altitudes[1] - altitudes[0]),
  };
}

export type PanelScale = ReturnType<typeof panelScale>;

/** Lettering of exobase and Knudsen band at one end of the panel, with the room it takes. */
export function exobaseNotes(
  strip: Strip,
  room: FigureRoom,
  inks: FigureInks,
  scale: PanelScale,
  side: "left" | "right",
) {
  const { sans, serif } = figureFonts();
  const notes: Partial<Annotation>[] = [];
  const boxes: Box[] = [];
  const [x, xshift] = side === "left" ? [0, 6] : [1, -2];
  const add = (
    altitude: number | null,
    text: string,
    width: number,
    lift: number,
    font: [number, string],
  ) => {
    if (altitude === null) return;
    const y = scale.y(altitude / 1000) - lift;
    if (y < 6 || y > room.tall - 6) return;
    const place = { x, y: altitude / 1000, xref: "x domain", xanchor: side, yanchor: "middle" } as const;
    notes.push(
      note(text, { ...place, xshift, yshift: lift }, { family: sans, size: font[0], color: font[1] }),
    );
    const left = side === "left" ? 0 : room.panel - width;
    boxes.push({ left, right: left + width, top: y - 9, bottom: y + 9 });
  };
  if (strip.exobase !== null) {
    const symbol = `<span style="font-family:${serif.replace(/"/g, "'")};font-style:italic;font-size:13.5px">l = H</span>`;
    const text = `<span style="font-weight:600">exobase</span> ${formatKilometres(strip.exobase)}${unitSpace}km, ${symbol}`;
    add(strip.exobase, text, 140, 10, [12.5, inks.ink!]);
  }
  const exobaseY = scale.y((strip.exobase ?? 0) / 1000) - 10;
  const isClear = (altitude: number | null) =>
    altitude !== null && Math.abs(scale.y(altitude / 1000) - exobaseY) > 17;
  if (isClear(strip.upper)) add(strip.upper, "Kn 10", 44, 0, [12, inks.ink2!]);
  if (isClear(strip.lower)) add(strip.lower, "Kn 0.1", 44, 0, [12, inks.ink2!]);
  return { notes, boxes };
}
