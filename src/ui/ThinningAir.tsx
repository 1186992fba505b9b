import { useMemo } from "react";
import { seededSequence } from "../lib/seededSequence";

interface ThinningAirProps {
  width: number;
  height: number;
  /** Where the lines give way to dots, as a share of the height from the foot. */
  ground?: number;
  className?: string;
}

interface Point {
  x: number;
  y: number;
}

/** Darts kept apart by a distance that grows with height, as the air thins. */
function thinningDots(width: number, height: number): Point[] {
  const next = seededSequence(11);
  const dots: Point[] = [];
  for (let dart = 0; dart < width * 12; dart += 1) {
    const x = 1 + next() * (width - 2);
    const rise = next();
    const apart = 8.5 * Math.exp(1.05 * rise + 1.9 * rise * rise);
    const y = height * (1 - rise);
    if (dots.every((dot) => (dot.x - x) ** 2 + (dot.y - y) ** 2 > apart * apart)) dots.push({ x, y });
  }
  return dots;
}

/** Lines that part, dots that thin: what stands where there is nothing to show. */
export function ThinningAir({ width, height, ground = 0.42, className = "" }: ThinningAirProps) {
  const { lines, dots } = useMemo(() => {
    const floor = height * (1 - ground);
    const count = 11;
    const linesPath = Array.from({ length: count }, (_, index) => {
      const y = floor + (height - floor - 1) * (1 - (1 - index / (count - 1)) ** 2);
      return `M0 ${y.toFixed(1)}H${width}`;
    }).join("");
    const dotsPath = thinningDots(width, floor - 8)
      .map(({ x, y }) => `M${x.toFixed(1)} ${y.toFixed(1)}h.01`)
      .join("");
    return { lines: linesPath, dots: dotsPath };
  }, [width, height, ground]);

  return (
    <svg
      className={`block w-full text-ink ${className}`}
      height={height}
      viewBox={`0 0 ${width} ${height}`}
      preserveAspectRatio="xMinYMax slice"
      aria-hidden="true"
      fill="none"
      stroke="currentColor"
    >
      <path d={lines} strokeWidth="1" strokeOpacity=".55" />
      <path d={dots} strokeWidth="1.7" strokeLinecap="round" strokeOpacity=".85" />
    </svg>
  );
}
