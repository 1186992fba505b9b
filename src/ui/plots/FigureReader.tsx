import type { HTMLAttributes, PropsWithChildren } from "react";
import { formatKilometres } from "../../lib/format";
import { ReadOutPlate, type ReadOutRow } from "../strip/ReadOutPlate";
import { stripScale } from "../strip/stripScale";
import { useAltitudeReading } from "../strip/useAltitudeReading";
import type { FigureRoom } from "./figureRoom";

interface FigureReaderProps {
  room: FigureRoom;
  /** km drawn */
  altitudes: readonly [number, number];
  /** The altitude runs in decades. */
  isLog?: boolean;
  /** m at which reading begins by key */
  start: number;
  /** Name for those who listen: "Altitude read in figure 1". */
  label: string;
  /** What stands at an altitude in m. */
  rows: (altitude: number) => ReadOutRow[];
  spoken: (altitude: number) => string;
}

/** The stage of a figure: reads out what stands at the altitude under the pointer or moved to by arrow keys. */
export function FigureReader({
  room,
  altitudes,
  isLog = false,
  start,
  label,
  rows,
  spoken,
  children,
}: PropsWithChildren<FigureReaderProps>) {
  const place = (altitude: number) => (isLog ? Math.log10(altitude) : altitude);
  const [from, to] = [place(altitudes[0] * 1000), place(altitudes[1] * 1000)];
  const scale = stripScale(from, to, room.tall);
  const { reading: placeRead, handlers } = useAltitudeReading({
    scale,
    from,
    to,
    direction: "standing",
    start: Math.min(to, Math.max(from, place(start))),
    inset: room.bottom,
  });
  const reading = placeRead !== null && isLog ? 10 ** placeRead : placeRead;
  const { onPointerMove, onPointerDown, onPointerLeave, ...keys } = handlers;
  const pointer: HTMLAttributes<HTMLDivElement> = { onPointerMove, onPointerDown, onPointerLeave };
  const y = placeRead === null ? 0 : room.top + room.tall - scale.along(placeRead);
  return (
    <div className="figure-stage" style={{ height: room.height }} {...pointer}>
      {children}
      <div
        className="figure-reader"
        style={{ left: room.left, top: room.top, width: room.panel, height: room.tall }}
        role="slider"
        tabIndex={0}
        aria-label={label}
        aria-orientation="vertical"
        aria-valuemin={Math.round(altitudes[0])}
        aria-valuemax={Math.round(altitudes[1])}
        aria-valuenow={Math.round((reading ?? start) / 1000)}
        aria-valuetext={spoken(reading ?? start)}
        {...keys}
      />
      {reading !== null && (
        <>
          <div
            className="figure-line"
            style={{ left: room.left, top: y, width: room.width - room.left - room.right }}
            aria-hidden="true"
          />
          <ReadOutPlate
            rows={[{ key: "z", symbol: "z", value: `${formatKilometres(reading)} km` }, ...rows(reading)]}
            side={y > room.height / 2 ? "over" : "under"}
            style={{ left: room.left + room.panel - 146, top: y }}
          />
        </>
      )}
    </div>
  );
}
