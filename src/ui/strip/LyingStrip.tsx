import { useMemo } from "react";
import { formatKilometres } from "../../lib/format";
import { gasStyle } from "../../lib/gasStyle";
import { useElementSize } from "../../lib/useElementSize";
import "./strip.css";
import { StripBand } from "./StripBand";
import type { AltitudeStripProps } from "./stripProps";
import { StripReader } from "./StripReader";
import { StripReadOut } from "./StripReadOut";
import { stripScale, stripTicks } from "./stripScale";
import { exobaseText, readStrip, stripLabel } from "./stripSentences";
import { StripWords } from "./StripWords";
import { useAltitudeReading } from "./useAltitudeReading";

const breadth = 44;
const height = 68;
const plateWidth = 138;

/** The strip lying down for narrow pages: altitude to the right, drawn at the real width of its box. */
export function LyingStrip({ strip, exobaseSpread = null, unitSystem }: AltitudeStripProps) {
  const { ref, size } = useElementSize<HTMLDivElement>({ width: 390, height });
  const width = size.width;
  const scale = useMemo(() => stripScale(strip.base, strip.top, width), [strip, width]);
  const ticks = useMemo(() => stripTicks(scale, 64), [scale]);
  const x = (altitude: number) => scale.along(altitude);
  const { reading, handlers } = useAltitudeReading({
    scale,
    from: strip.base,
    to: strip.top,
    direction: "lying",
    start: strip.exobase ?? (strip.base + strip.top) / 2,
  });
  const read = readStrip(strip, reading ?? strip.exobase ?? strip.base, unitSystem);
  const exobaseX = strip.exobase === null ? null : x(strip.exobase);
  const isLabelLeft = exobaseX !== null && exobaseX > width - (exobaseSpread ? 150 : 120);

  return (
    <div ref={ref} className="strip-lying">
      <svg
        className="strip-svg"
        width={width}
        height={height}
        role="img"
        aria-label={stripLabel(strip, exobaseSpread)}
      >
        <StripBand strip={strip} scale={scale} breadth={breadth} direction="lying" closest={4.4} dot={1.5} />
        {ticks.map(({ altitude, isMajor }) => (
          <path
            key={altitude}
            className="strip-axis"
            d={`M${x(altitude).toFixed(1)} ${breadth}v${isMajor ? 7 : 3.5}`}
          />
        ))}
        {ticks
          .filter(({ altitude, isMajor }) => isMajor && x(altitude) < width - 40)
          .map(({ altitude }) => (
            <text
              key={altitude}
              className="strip-tick"
              x={Math.max(3, x(altitude))}
              y={breadth + 18}
              textAnchor={x(altitude) < 14 ? "start" : "middle"}
            >
              {formatKilometres(altitude)}
            </text>
          ))}
        <text className="strip-tick" x={width - 4} y={breadth + 18} textAnchor="end">
          km
        </text>
        {strip.homopauses.map(({ gas, altitude }) => (
          <path
            key={gas}
            className="strip-homopause"
            d={`M${x(altitude).toFixed(1)} ${breadth - 12}v12`}
            style={{ stroke: gasStyle(gas, strip.gases).colour }}
          />
        ))}
        {exobaseX === null ? (
          <text className="strip-label strip-strong strip-halo" x={width - 8} y="14" textAnchor="end">
            no exobase in this column
          </text>
        ) : (
          <>
            <path className="strip-exobase" d={`M${exobaseX.toFixed(1)} 0V${breadth + 6}`} />
            <text
              className="strip-label strip-strong strip-halo"
              x={exobaseX + (isLabelLeft ? -5 : 5)}
              y="13"
              textAnchor={isLabelLeft ? "end" : "start"}
            >
              exobase {exobaseText(strip.exobase!, exobaseSpread)}
            </text>
          </>
        )}
        {reading !== null && (
          <g>
            <path className="strip-reading" d={`M${x(reading).toFixed(1)} 0V${height}`} />
            <circle className="strip-ring" cx={x(reading)} cy={breadth} r="3.2" />
          </g>
        )}
      </svg>
      <StripReader
        strip={strip}
        reading={reading}
        spoken={read.spoken}
        handlers={handlers}
        orientation="horizontal"
      />
      {reading !== null && (
        <StripReadOut
          reading={read}
          gases={strip.gases}
          side="under"
          style={{
            top: height,
            left: Math.min(width - plateWidth - 8, Math.max(8, x(reading) - plateWidth / 2)),
          }}
        />
      )}
      <StripWords strip={strip} exobaseSpread={exobaseSpread} />
    </div>
  );
}
