import { useState, type KeyboardEvent, type PointerEvent } from "react";
import type { StripScale } from "./stripScale";

interface AltitudeReadingOptions {
  scale: StripScale;
  /** m; the read-out stays between these. */
  from: number;
  to: number;
  direction: "standing" | "lying";
  /** Where the arrow keys begin. */
  start: number;
  /** px between the low end of the scale and the edge of the element that is pointed at. */
  inset?: number;
}

/** The altitude that is read out: under the pointer, or moved by arrow keys; null while nothing is read. */
export function useAltitudeReading({ scale, from, to, direction, start, inset = 0 }: AltitudeReadingOptions) {
  const [altitude, setAltitude] = useState<number | null>(null);
  const [isByKey, setIsByKey] = useState(false);
  const within = (z: number) => Math.min(to, Math.max(from, z));
  const reading = altitude === null ? null : within(altitude);

  const handlePointer = (event: PointerEvent<HTMLElement>) => {
    const box = event.currentTarget.getBoundingClientRect();
    const along = direction === "lying" ? event.clientX - box.left : box.bottom - event.clientY;
    setIsByKey(false);
    setAltitude(within(scale.altitudeAt(along - inset)));
  };

  const handleKey = (event: KeyboardEvent<HTMLElement>) => {
    const step = (to - from) / (event.shiftKey ? 20 : 200);
    const moves: Record<string, number> = {
      ArrowUp: (reading ?? start) + step,
      ArrowRight: (reading ?? start) + step,
      ArrowDown: (reading ?? start) - step,
      ArrowLeft: (reading ?? start) - step,
      PageUp: (reading ?? start) + step * 20,
      PageDown: (reading ?? start) - step * 20,
      Home: from,
      End: to,
    };
    if (event.key === "Escape") {
      setAltitude(null);
      return;
    }
    const moved = moves[event.key];
    if (moved === undefined) return;
    event.preventDefault();
    setIsByKey(true);
    setAltitude(within(moved));
  };

  return {
    reading,
    handlers: {
      onPointerMove: handlePointer,
      onPointerDown: handlePointer,
      onPointerLeave: (event: PointerEvent<HTMLElement>) => {
        if (event.pointerType !== "touch" && !isByKey) setAltitude(null);
      },
      onKeyDown: handleKey,
      onFocus: () => setAltitude((before) => before ?? start),
      onBlur: () => setAltitude(null),
    },
  };
}
