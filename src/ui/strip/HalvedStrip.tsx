import { useMemo } from "react";
import type { Strip } from "../../../shared/notebook/summary";
import { formatKilometres } from "../../lib/format";
import { useElementSize } from "../../lib/useElementSize";
import "./strip.css";
import { StripBand } from "./StripBand";
import { stripLabels } from "./stripLabels";
import { StripMarks } from "./StripMarks";
import { scaleAboveBase, stripTicks } from "./stripScale";
import { stripLabel } from "./stripSentences";

interface HalvedStripProps {
  older: Strip;
  newer: Strip;
  /** One or two characters over each half: "6", "7". */
  heads: readonly [older: string, newer: string];
}

const half = 51;
const edge = 104;
const width = 252;
const under = 46;
const reserved = 76;
/** px that the two labels of an exobase need between them. */
const apart = 32;

/** Two states of a column drawn side by side on one axis, to the same scale; the marks are those of the newer. */
export function HalvedStrip({ older, newer, heads }: HalvedStripProps) {
  const { ref, size } = useElementSize<HTMLDivElement>({ width, height: 800 });
  const height = size.height;
  const common = useMemo(
    () => ({ ...newer, base: Math.min(older.base, newer.base), top: Math.max(older.top, newer.top) }),
    [older, newer],
  );
  const scale = useMemo(() => scaleAboveBase(common, height, under), [common, height]);
  const labels = useMemo(
    () => stripLabels({ ...newer, top: common.top }, scale, reserved),
    [newer, common, scale],
  );
  const y = (altitude: number) => height - scale.along(altitude);
  const olderY = older.exobase === null ? null : y(older.exobase);
  const taken = labels.filter(({ kind }) => kind === "exobase").map(({ label }) => height - label);
  const isTooNear = olderY !== null && taken.some((at) => Math.abs(at - olderY) < apart);
  const newerY = taken[0] ?? 0;
  const olderLabelY = olderY === null ? 0 : isTooNear ? newerY + (olderY >= newerY ? apart : -apart) : olderY;

  return (
    <div ref={ref} className="strip-standing">
      <svg
        className="strip-svg"
        width={width}
        height={height}
        role="img"
        aria-label={`${heads[0]}: ${stripLabel(older)} ${heads[1]}: ${stripLabel(newer)}`}
      >
        <StripBand
          strip={{ ...older, top: common.top }}
          scale={scale}
          breadth={half}
          direction="standing"
          closest={5}
          dot={1.44}
        />
        <g transform={`translate(${edge - half} 0)`}>
          <StripBand
            strip={{ ...newer, top: common.top }}
            scale={scale}
            breadth={half}
            direction="standing"
            closest={5}
            dot={1.44}
          />
        </g>
        {stripTicks(scale, 92)
          .filter(({ altitude }) => altitude >= common.base)
          .map(({ altitude, isMajor }) => (
            <g key={altitude}>
              <path className="strip-axis" d={`M${edge} ${y(altitude).toFixed(1)}h${isMajor ? 9 : 4}`} />
              {isMajor && (
                <text className="strip-tick strip-halo" x={edge + 13} y={(y(altitude) + 4).toFixed(1)}>
                  {formatKilometres(altitude)}
                </text>
              )}
            </g>
          ))}
        <StripMarks labels={labels} gases={newer.gases} exobaseSpread={null} height={height} edge={edge} />
        {olderY !== null && (
          <>
            <path
              className="strip-older"
              d={`M0 ${olderY.toFixed(1)}H${edge + 10}L${edge + 46} ${olderLabelY.toFixed(1)}H${edge + 52}`}
            />
            <text className="strip-label strip-older-label" x={edge + 56} y={(olderLabelY + 4).toFixed(1)}>
              {formatKilometres(older.exobase!)} km, {heads[0]}
            </text>
          </>
        )}
        <text className="strip-half strip-older-label" x={half / 2} y="24" textAnchor="middle">
          {heads[0]}
        </text>
        <text className="strip-half" x={edge - half / 2} y="24" textAnchor="middle">
          {heads[1]}
        </text>
        <text className="strip-name" x={edge + 56} y="20">
          {newer.column}
        </text>
        <text className="strip-tick" x={edge + 56} y="37">
          altitude, km
        </text>
      </svg>
    </div>
  );
}
