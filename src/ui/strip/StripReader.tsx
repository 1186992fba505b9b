import type { CSSProperties } from "react";
import type { Strip } from "../../../shared/notebook/summary";
import type { useAltitudeReading } from "./useAltitudeReading";

interface StripReaderProps {
  strip: Strip;
  /** m; null while nothing is read. */
  reading: number | null;
  /** What is read there, in words. */
  spoken: string;
  handlers: ReturnType<typeof useAltitudeReading>["handlers"];
  orientation: "horizontal" | "vertical";
  style?: CSSProperties;
}

/** Over the drawing of a strip: what takes the pointer and the keys, and tells the altitude read. */
export function StripReader({ strip, reading, spoken, handlers, orientation, style }: StripReaderProps) {
  const kilometres = (altitude: number): number => Math.round(altitude / 1000);
  return (
    <div
      className="strip-reader"
      style={style}
      role="slider"
      tabIndex={0}
      aria-label={`Altitude read in ${strip.column}`}
      aria-orientation={orientation}
      aria-valuemin={kilometres(strip.base)}
      aria-valuemax={kilometres(strip.top)}
      aria-valuenow={kilometres(reading ?? strip.exobase ?? strip.base)}
      aria-valuetext={spoken}
      {...handlers}
    />
  );
}
