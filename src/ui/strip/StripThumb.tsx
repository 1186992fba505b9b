import { useMemo } from "react";
import "./strip.css";
import { StripBand } from "./StripBand";
import type { StripThumbProps } from "./stripProps";
import { stripScale } from "./stripScale";

const breadth = 26;
const height = 74;

/** A column on a scale of its own, the exobase at mid-height; what has none fills the height. */
export function StripThumb({ strip }: StripThumbProps) {
  const scale = useMemo(() => {
    const { base, exobase, top } = strip;
    return stripScale(base, exobase === null ? top : 2 * exobase - base, height);
  }, [strip]);
  const exobaseY = strip.exobase === null ? null : height - scale.along(strip.exobase);
  return (
    <svg className="strip-svg" width={breadth + 8} height={height} aria-hidden="true">
      <StripBand strip={strip} scale={scale} breadth={breadth} direction="standing" closest={2.6} dot={1.2} />
      {exobaseY !== null && <path className="strip-exobase" d={`M0 ${exobaseY.toFixed(1)}H${breadth + 7}`} />}
    </svg>
  );
}
