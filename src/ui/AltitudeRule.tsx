const tickCount = 64;
/** Width of the drawing in its own units; the rule is cut at the right where the page is narrower. */
const drawnWidth = 1600;

/** Tick k stands at −H ln(1 − k/N): heights at which equal shares of the air lie below. */
function tickPath(scaleHeight: number): string {
  let path = "";
  for (let tick = 0; tick < tickCount; tick += 1) {
    const x = -scaleHeight * Math.log(1 - tick / tickCount);
    if (x > drawnWidth) break;
    path += `M${(x + 0.5).toFixed(2)} 0V${tick % 8 === 0 ? 7 : 4}`;
  }
  return path;
}

interface AltitudeRuleProps {
  /** Width of the page it stands over, in pixels: the last tick falls near its end. */
  width?: number;
  className?: string;
}

/** The rule over a title, once a page: its ticks thin out to the right as an atmosphere does upward. */
export function AltitudeRule({ width = 736, className = "" }: AltitudeRuleProps) {
  return (
    <svg
      className={`block w-full overflow-hidden text-ink ${className}`}
      height="8"
      viewBox={`0 0 ${width} 8`}
      preserveAspectRatio="xMinYMin slice"
      aria-hidden="true"
      fill="none"
      stroke="currentColor"
    >
      <path d={`M0 .5H${drawnWidth}`} strokeWidth="1" />
      <path d={tickPath(width / 4.1)} strokeWidth=".8" />
    </svg>
  );
}
