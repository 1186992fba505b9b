import { useId, useMemo } from "react";
import { formatKilometres } from "../../lib/format";
import { useElementSize } from "../../lib/useElementSize";
import "./strip.css";
import { StripBand } from "./StripBand";
import { stripLabels, type StripLabel } from "./stripLabels";
import { StripMarks } from "./StripMarks";
import type { AltitudeStripProps } from "./stripProps";
import { StripReader } from "./StripReader";
import { StripReadOut } from "./StripReadOut";
import { scaleAboveBase, stripTicks } from "./stripScale";
import { readStrip, stripLabel } from "./stripSentences";
import { StripWords } from "./StripWords";
import { useAltitudeReading } from "./useAltitudeReading";

const bandBreadth = 104;
const width = 252;
/** px at the low end for the air that is not computed, and at the high end for the column's name. */
const under = 46;
const reserved = 48;

/** Whether a leader runs through the numeral that stands at `along`. */
const crossesNumeral = (label: StripLabel, along: number): boolean =>
  label.kind !== "caption" &&
  Math.min(label.mark, label.label) < along + 8 &&
  Math.max(label.mark, label.label) > along - 8;

/** Lines that part downward: the air below the base, which is not computed. */
const airBelow = (top: number): string =>
  Array.from(
    { length: 8 },
    (_, i) => `M0 ${(top + 4 + i * i * 0.55 + i * 2.1).toFixed(1)}H${bandBreadth - i * 9}`,
  ).join("");

/** A column drawn to scale, standing: it fills the height of its box, and is 252 px wide. */
export function AltitudeStrip({ strip, exobaseSpread = null, unitSystem }: AltitudeStripProps) {
  const { ref, size } = useElementSize<HTMLDivElement>({ width, height: 800 });
  const height = size.height;
  const id = useId();
  const scale = useMemo(() => scaleAboveBase(strip, height, under), [strip, height]);
  const labels = useMemo(() => stripLabels(strip, scale, reserved), [strip, scale]);
  const ticks = useMemo(
    () => stripTicks(scale, 92).filter(({ altitude }) => altitude >= strip.base),
    [strip, scale],
  );
  const y = (altitude: number) => height - scale.along(altitude);
  const { reading, handlers } = useAltitudeReading({
    scale,
    from: strip.base,
    to: strip.top,
    direction: "standing",
    start: strip.exobase ?? (strip.base + strip.top) / 2,
  });
  const read = readStrip(strip, reading ?? strip.exobase ?? strip.base, unitSystem);
  const readY = reading === null ? 0 : y(reading);
  const edge = bandBreadth;
  const [lowerY, upperY] = [y(strip.lower ?? strip.top), y(Math.min(strip.upper ?? strip.top, strip.top))];
  const exobaseY = strip.exobase === null ? null : y(strip.exobase);

  return (
    <div ref={ref} className="strip-standing">
      <svg
        className="strip-svg"
        width={width}
        height={height}
        role="img"
        aria-label={stripLabel(strip, exobaseSpread)}
      >
        <StripBand strip={strip} scale={scale} breadth={edge} direction="standing" closest={5} dot={1.44} />
        <path className="strip-below" d={airBelow(y(strip.base))} />
        {exobaseY !== null && (
          <>
            <linearGradient id={id} x1="0" x2="0" y1="0" y2="1">
              <stop offset="0" stopOpacity="0" style={{ stopColor: "var(--ink)" }} />
              <stop
                offset={(exobaseY - upperY) / (lowerY - upperY || 1)}
                stopOpacity="0.85"
                style={{ stopColor: "var(--ink)" }}
              />
              <stop offset="1" stopOpacity="0" style={{ stopColor: "var(--ink)" }} />
            </linearGradient>
            <rect
              x={edge + 1}
              y={upperY}
              width="2.6"
              height={Math.max(0, lowerY - upperY)}
              fill={`url(#${id})`}
            />
          </>
        )}
        {ticks.map(({ altitude, isMajor }) => (
          <path
            key={altitude}
            className="strip-axis"
            d={`M${edge} ${y(altitude).toFixed(1)}h${isMajor ? 9 : 4}`}
          />
        ))}
        {ticks
          .filter(({ altitude, isMajor }) => {
            const along = scale.along(altitude);
            return isMajor && along < height - 8 && !labels.some((label) => crossesNumeral(label, along));
          })
          .map(({ altitude }) => (
            <text
              key={altitude}
              className="strip-tick strip-halo"
              x={edge + 13}
              y={(y(altitude) + 4).toFixed(1)}
            >
              {formatKilometres(altitude)}
            </text>
          ))}
        <StripMarks
          labels={labels}
          gases={strip.gases}
          exobaseSpread={exobaseSpread}
          height={height}
          edge={edge}
        />
        <text className="strip-name" x={edge + 56} y="20">
          {strip.column}
        </text>
        <text className="strip-tick" x={edge + 56} y="37">
          altitude, km
        </text>
        {reading !== null && (
          <g>
            <path className="strip-reading" d={`M0 ${readY.toFixed(1)}H${edge + 152}`} />
            <circle className="strip-ring" cx={edge} cy={readY} r="3.2" />
          </g>
        )}
      </svg>
      <StripReader
        strip={strip}
        reading={reading}
        spoken={read.spoken}
        handlers={handlers}
        orientation="vertical"
        style={{ width: edge + 40 }}
      />
      {reading !== null && (
        <StripReadOut
          reading={read}
          gases={strip.gases}
          side={readY > 130 ? "over" : "under"}
          style={{ left: edge + 14, top: readY }}
        />
      )}
      <StripWords strip={strip} exobaseSpread={exobaseSpread} />
    </div>
  );
}
