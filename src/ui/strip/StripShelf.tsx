import { useMemo } from "react";
import { formatKilometres, unitSpace } from "../../lib/format";
import { useElementSize } from "../../lib/useElementSize";
import "./strip.css";
import { StripBand } from "./StripBand";
import type { ShelfBody, StripShelfProps } from "./stripProps";
import { stripScale, stripTicks, type StripScale } from "./stripScale";

const axisRoom = 58;
const top = 8;
const lettering = 48;
const widest = { apart: 193, band: 104, height: 266 };
const narrowest = { apart: 138, band: 76, height: 192 };

/** An exobase this many times the middle one would press all others flat. */
const outlier = 6;

/** One scale for all: from the ground to a fifth above the highest exobase that leaves the others legible. */
function shelfScale(bodies: readonly ShelfBody[], length: number): StripScale {
  const exobases = bodies.flatMap(({ strip }) => strip.exobase ?? []).sort((a, b) => a - b);
  const middle = exobases[Math.floor((exobases.length - 1) / 2)];
  const highest =
    middle === undefined
      ? Math.max(...bodies.map(({ strip }) => strip.top))
      : Math.max(...exobases.filter((exobase) => exobase <= outlier * middle));
  return stripScale(0, highest * 1.2, length);
}

/** Lines that part downward from the base to the ground: the air that is not computed. */
function airBelow(base: number, ground: number, breadth: number): string {
  const depth = ground - base;
  const lines = Math.max(2, Math.min(9, Math.round(Math.sqrt(depth) * 1.1)));
  return Array.from({ length: lines }, (_, i) => {
    const y = base + depth * ((i + 0.6) / lines) ** 1.5;
    return `M0 ${y.toFixed(1)}H${breadth}`;
  }).join("");
}

interface ShelfBandProps {
  body: ShelfBody;
  scale: StripScale;
  breadth: number;
  /** px to the next band */
  apart: number;
}

function ShelfBand({ body: { body, note, strip }, scale, breadth, apart }: ShelfBandProps) {
  const y = (altitude: number) => scale.length - scale.along(altitude);
  // Where the next band is too near, the words stand on the tone itself.
  const beside = apart - breadth > 84 ? breadth + 10 : 8;
  return (
    <>
      <StripBand strip={strip} scale={scale} breadth={breadth} direction="standing" closest={4} dot={1.3} />
      <path className="strip-below" d={airBelow(y(strip.base), scale.length, breadth)} />
      {strip.exobase === null || strip.exobase > scale.high ? (
        <>
          <path className="strip-unbound" d={`M${breadth + 4} 8l5-6l5 6`} />
          <text className="strip-label strip-strong strip-halo" x={beside} y="23">
            {strip.exobase === null ? "no exobase" : altitudeText(strip.exobase)}
          </text>
          <text className="strip-halo" x={beside} y="39">
            {strip.exobase === null ? "the gas runs on" : "above this scale"}
          </text>
        </>
      ) : (
        <>
          <path className="strip-exobase" d={`M0 ${y(strip.exobase).toFixed(1)}H${breadth + 8}`} />
          <text className="strip-label" x={breadth + 12} y={(y(strip.exobase) + 4).toFixed(1)}>
            {altitudeText(strip.exobase)}
          </text>
        </>
      )}
      <text className="strip-body" y={scale.length + 22}>
        {body}
      </text>
      <text y={scale.length + 40}>{note}</text>
    </>
  );
}

const altitudeText = (altitude: number): string => `${formatKilometres(altitude)}${unitSpace}km`;

const bodySentence = ({ body, strip }: ShelfBody): string =>
  strip.exobase === null
    ? `${body}: no exobase, the gas runs on`
    : `${body}: exobase at ${altitudeText(strip.exobase)}`;

/** All bodies side by side on one scale; where they do not fit, the shelf is drawn past by hand or by key. */
export function StripShelf({ bodies }: StripShelfProps) {
  const { ref, size } = useElementSize<HTMLDivElement>({ width: 1244, height: 320 });
  const fits = (size.width - axisRoom) / bodies.length >= narrowest.apart * 1.15;
  const { height } = fits ? widest : narrowest;
  const apart = fits ? Math.min(widest.apart, (size.width - axisRoom) / bodies.length) : narrowest.apart;
  const breadth = fits ? Math.min(widest.band, apart - 74) : narrowest.band;
  const scale = useMemo(() => shelfScale(bodies, height), [bodies, height]);
  const ticks = useMemo(() => stripTicks(scale, 56), [scale]);
  if (bodies.length === 0) return null;
  const width = Math.max(fits ? size.width : 0, axisRoom + apart * bodies.length);
  const y = (altitude: number) => scale.length - scale.along(altitude);

  return (
    <div
      ref={ref}
      className="strip-shelf"
      role="group"
      aria-label="Bodies, to scale"
      tabIndex={fits ? undefined : 0}
    >
      <svg
        className="strip-svg"
        width={width}
        height={top + height + lettering}
        role="img"
        aria-label={`On one scale of altitude: ${bodies.map(bodySentence).join("; ")}`}
      >
        <g transform={`translate(0 ${top})`}>
          <path className="strip-rail" d={`M${axisRoom} 0V${height}H${width}`} />
          {ticks.map(({ altitude, isMajor }) => (
            <path
              key={altitude}
              className="strip-axis"
              d={`M${axisRoom} ${y(altitude).toFixed(1)}h${isMajor ? -7 : -3.5}`}
            />
          ))}
          {ticks
            .filter(({ isMajor }) => isMajor)
            .map(({ altitude }) => (
              <text
                key={altitude}
                className="strip-tick"
                x={axisRoom - 11}
                y={(y(altitude) + 4).toFixed(1)}
                textAnchor="end"
              >
                {formatKilometres(altitude).replace(/^0\.00$/, "0")}
              </text>
            ))}
          <text textAnchor="middle" transform={`translate(8 ${height / 2}) rotate(-90)`}>
            altitude, km
          </text>
          {bodies.map((body, index) => (
            <g key={body.id} transform={`translate(${(axisRoom + 22 + index * apart).toFixed(1)} 0)`}>
              <ShelfBand body={body} scale={scale} breadth={breadth} apart={apart} />
            </g>
          ))}
        </g>
      </svg>
    </div>
  );
}
