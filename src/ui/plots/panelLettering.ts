import type { Annotation } from "plotly.js";
import type { Strip } from "../../../shared/notebook/summary";
import { formatKilometres, thinSpace } from "../../lib/format";
import { figureFonts, note } from "./figureLayout";
import type { FigureRoom } from "./figureRoom";
import type { Box } from "./placeNames";
import type { FigureInks } from "./useFigureInks";

/** From altitudes and decades to px of the main panel. */
export function panelScale(room: FigureRoom, decades: [number, number], altitudes: [number, number]) {
  return {
    x: (log10: number) => ((log10 - decades[0]) / (decades[1] - decades[0])) * room.panel,
    y: (km: number) => room.tall - ((km - altitudes[0]) / (altitudes[1] - altitudes[0])) * room.tall,
    decade: (x: number) => decades[0] + (x / room.panel) * (decades[1] - decades[0]),
    km: (y: number) => altitudes[0] + ((room.tall - y) / room.tall) * (altitudes[1] - altitudes[0]),
  };
}

export type PanelScale = ReturnType<typeof panelScale>;

/** Lettering of exobase and Knudsen band at the right end of the panel, with the room it takes. */
export function exobaseNotes(strip: Strip, room: FigureRoom, inks: FigureInks, scale: PanelScale) {
  const { sans, serif } = figureFonts();
  const notes: Partial<Annotation>[] = [];
  const boxes: Box[] = [];
  const add = (km: number | null, text: string, width: number, lift: number, size: number, color: string) => {
    if (km === null) return;
    const y = scale.y(km) - lift;
    if (y < 6 || y > room.tall - 6) return;
    const place = {
      x: 1,
      y: km,
      xref: "x domain" as const,
      xanchor: "right" as const,
      yanchor: "middle" as const,
    };
    notes.push(note(text, { ...place, xshift: -2, yshift: lift }, { family: sans, size, color }));
    boxes.push({ left: room.panel - width, right: room.panel, top: y - 9, bottom: y + 9 });
  };
  const inKm = (metres: number | null) => (metres === null ? null : metres / 1000);
  if (strip.exobase !== null) {
    const symbol = `<span style="font-family:${serif.replace(/"/g, "'")};font-style:italic;font-size:13.5px">l = H</span>`;
    const text = `<span style="font-weight:600">exobase</span> ${formatKilometres(strip.exobase)}${thinSpace}km, ${symbol}`;
    add(inKm(strip.exobase), text, 136, 10, 12.5, inks.ink!);
  }
  const isClear = (metres: number | null) =>
    metres !== null && Math.abs(scale.y(metres / 1000) - (scale.y((strip.exobase ?? 0) / 1000) - 10)) > 17;
  if (isClear(strip.upper)) add(inKm(strip.upper), "Kn 10", 44, 0, 12, inks.ink2!);
  if (isClear(strip.lower)) add(inKm(strip.lower), "Kn 0.1", 44, 0, 12, inks.ink2!);
  return { notes, boxes };
}
