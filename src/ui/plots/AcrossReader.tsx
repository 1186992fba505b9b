import type { HTMLAttributes, PropsWithChildren } from "react";
import { ReadOutPlate, type ReadOutRow } from "../strip/ReadOutPlate";
import { stripScale } from "../strip/stripScale";
import { useAltitudeReading } from "../strip/useAltitudeReading";
import type { FigureRoom } from "./figureRoom";

interface AcrossReaderProps {
  room: FigureRoom;
  /** What is drawn along the axis across. */
  range: readonly [number, number];
  /** Where reading begins by key. */
  start: number;
  /** Name for those who listen: "Age read in figure 2". */
  label: string;
  rows: (place: number) => ReadOutRow[];
  spoken: (place: number) => string;
}

/** The stage of a figure whose axis runs across: reads out what stands under the pointer or is moved to by arrow keys. */
export function AcrossReader({
  room,
  range,
  start,
  label,
  rows,
  spoken,
  children,
}: PropsWithChildren<AcrossReaderProps>) {
  const [from, to] = range;
  const scale = stripScale(from, to, room.panel);
  const { reading, handlers } = useAltitudeReading({
    scale,
    from,
    to,
    direction: "lying",
    start: Math.min(to, Math.max(from, start)),
    inset: room.left,
  });
  const { onPointerMove, onPointerDown, onPointerLeave, ...keys } = handlers;
  const pointer: HTMLAttributes<HTMLDivElement> = { onPointerMove, onPointerDown, onPointerLeave };
  const x = reading === null ? 0 : room.left + scale.along(reading);
  return (
    <div className="figure-stage" style={{ height: room.height }} {...pointer}>
      {children}
      <div
        className="figure-reader"
        style={{ left: room.left, top: room.top, width: room.panel, height: room.tall }}
        role="slider"
        tabIndex={0}
        aria-label={label}
        aria-orientation="horizontal"
        aria-valuemin={from}
        aria-valuemax={to}
        aria-valuenow={reading ?? start}
        aria-valuetext={spoken(reading ?? start)}
        {...keys}
      />
      {reading !== null && (
        <>
          <div
            className="figure-upright"
            style={{ left: x, top: room.top, height: room.tall }}
            aria-hidden="true"
          />
          <ReadOutPlate
            rows={rows(reading)}
            side="under"
            style={{ left: x > room.left + room.panel / 2 ? x - plateWidth - 8 : x + 8, top: room.top }}
          />
        </>
      )}
    </div>
  );
}

/** px */
const plateWidth = 138;
