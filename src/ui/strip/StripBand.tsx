import { useId, useMemo } from "react";
import type { Strip } from "../../../shared/notebook/summary";
import { gasStyles } from "../../lib/gasStyle";
import { stripDots, type Dot } from "./stripDots";
import type { StripScale } from "./stripScale";
import { stripTone } from "./stripTone";

interface StripBandProps {
  strip: Strip;
  scale: StripScale;
  /** px across the altitude axis */
  breadth: number;
  direction: "standing" | "lying";
  /** Least spacing of the dots, px. */
  closest: number;
  /** Diameter of a dot, px. */
  dot: number;
}

const round = (x: number): number => Math.round(x * 100) / 100;

/** The band itself: continuous tone below, dissolving into particles across the Knudsen band. */
export function StripBand({ strip, scale, breadth, direction, closest, dot }: StripBandProps) {
  const id = useId();
  const styles = gasStyles(strip.gases);
  const tones = useMemo(() => stripTone(strip, scale), [strip, scale]);
  const dots = useMemo(() => stripDots(strip, scale, breadth, closest), [strip, scale, breadth, closest]);
  const isLying = direction === "lying";
  const [width, height] = isLying ? [scale.length, breadth] : [breadth, scale.length];
  const from = isLying ? 0 : scale.length - scale.along(strip.base);
  const place = ({ along, across }: Dot) =>
    isLying ? `M${round(along)} ${round(across)}h.01` : `M${round(across)} ${round(height - along)}h.01`;
  const ends = isLying ? { x1: 0, x2: width, y1: 0, y2: 0 } : { x1: 0, x2: 0, y1: height, y2: 0 };

  return (
    <g>
      <defs>
        {tones.map(({ gas, stops }) => (
          <linearGradient
            key={gas}
            id={`${id}${gas}`}
            gradientUnits="userSpaceOnUse"
            style={{ color: styles.get(gas)!.tint }}
            {...ends}
          >
            {stops.map(({ offset, opacity }) => (
              <stop
                key={offset}
                offset={round(offset)}
                stopOpacity={round(opacity)}
                stopColor="currentColor"
              />
            ))}
          </linearGradient>
        ))}
      </defs>
      {tones.map(({ gas }) => (
        <rect
          key={gas}
          x={isLying ? scale.along(strip.base) : 0}
          width={isLying ? width - scale.along(strip.base) : width}
          height={isLying ? height : from}
          fill={`url(#${id}${gas})`}
        />
      ))}
      {dots.map(({ gas, opacity, dots: some }) => (
        <path
          key={`${gas}${opacity}`}
          d={some.map(place).join("")}
          style={{ stroke: styles.get(gas)!.colour }}
          strokeOpacity={opacity}
          strokeWidth={dot}
          strokeLinecap="round"
          fill="none"
        />
      ))}
    </g>
  );
}
