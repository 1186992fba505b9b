import "./limb.css";
import { useMemo } from "react";
import { useElementSize } from "../../lib/useElementSize";
import { exobase, limbDots, limbOf, pointAt, type Box, type Limb } from "./limbDrawing";
import { sky, type SkyStop } from "./limbSky";

interface LimbArtProps {
  /** Where lettering stands over the art, in pixels from its corner: dots keep clear of it. */
  lettering: readonly Box[];
}

const names: readonly { altitude: number; name: string; drop: number }[] = [
  { altitude: 87, name: "sodium", drop: 13 },
  { altitude: 96, name: "oxygen, green line", drop: 1 },
  { altitude: 235, name: "oxygen, red line", drop: 22 },
  { altitude: exobase, name: `exobase, ${exobase}`, drop: -18 },
];

/** In a smaller window the scale of altitudes and its names give way. */
const leastForScale = { width: 700, height: 560 };

/** The limb of Ilmara, at dusk on the light page and at night on the dark one, drawn at the size it has. */
export function LimbArt({ lettering }: LimbArtProps) {
  const { ref, size } = useElementSize<HTMLDivElement>({ width: 0, height: 0 });
  return (
    <div ref={ref} className="absolute inset-0" aria-hidden="true">
      {size.width > 0 && <LimbDrawing width={size.width} height={size.height} lettering={lettering} />}
    </div>
  );
}

interface LimbDrawingProps extends LimbArtProps {
  width: number;
  height: number;
}

function LimbDrawing({ width, height, lettering }: LimbDrawingProps) {
  const limb = useMemo(() => limbOf(width, height), [width, height]);
  const hasScale = width >= leastForScale.width && height >= leastForScale.height;
  const dots = useMemo(
    () => dotPaths(limbDots(limb, hasScale ? [...lettering, ...scaleBoxes(limb)] : lettering)),
    [limb, lettering, hasScale],
  );
  const { centreX, centreY, radius } = limb;

  return (
    <svg className="limb absolute inset-0" width={width} height={height} viewBox={`0 0 ${width} ${height}`}>
      <defs>
        <SkyGradient id="limb-dusk" limb={limb} stops={sky.dusk} />
        <SkyGradient id="limb-night" limb={limb} stops={sky.night} />
        <radialGradient id="limb-ground" gradientUnits="userSpaceOnUse" cx={centreX} cy={centreY} r={radius}>
          <stop offset="90%" className="limb-ground-deep" />
          <stop offset="98.6%" className="limb-ground-middle" />
          <stop offset="100%" className="limb-ground-edge" />
        </radialGradient>
      </defs>
      <rect width={width} height={height} fill="url(#limb-dusk)" className="limb-sky-dusk" />
      <rect width={width} height={height} fill="url(#limb-night)" className="limb-sky-night" />
      <circle cx={centreX} cy={centreY} r={radius + exobase * limb.scale} className="limb-exobase" />
      {dots.map((path, index) => (
        <path key={index} d={path} className={`limb-dots limb-dots-${index}`} />
      ))}
      <circle cx={centreX} cy={centreY} r={radius} fill="url(#limb-ground)" />
      <GroundLines limb={limb} />
      {hasScale && <AltitudeScale limb={limb} />}
    </svg>
  );
}

function SkyGradient({ id, limb, stops }: { id: string; limb: Limb; stops: readonly SkyStop[] }) {
  return (
    <radialGradient
      id={id}
      gradientUnits="userSpaceOnUse"
      cx={limb.centreX}
      cy={limb.centreY}
      r={limb.skyRadius}
    >
      {stops.map(({ altitude, colour }) => (
        <stop
          key={altitude}
          offset={((limb.radius + altitude * limb.scale) / limb.skyRadius).toFixed(5)}
          stopColor={colour}
        />
      ))}
    </radialGradient>
  );
}

/** Engraved arcs under the limb, parting with depth as the altitude rule's ticks do. */
function GroundLines({ limb }: { limb: Limb }) {
  return Array.from({ length: 26 }, (_, index) => (
    <circle
      key={index}
      cx={limb.centreX}
      cy={limb.centreY}
      r={limb.radius - (6 + index * 5 + index * index * 0.75)}
      fill="none"
      stroke="#c8d4f0"
      strokeOpacity={(0.26 * Math.exp(-index / 9)).toFixed(3)}
      strokeWidth=".8"
    />
  ));
}

function AltitudeScale({ limb }: { limb: Limb }) {
  const angle = limb.scaleAngle;
  const foot = pointAt(limb, angle, 0);
  const top = pointAt(limb, angle, 440);
  let path = `M${foot.x.toFixed(1)} ${foot.y.toFixed(1)}L${top.x.toFixed(1)} ${top.y.toFixed(1)}`;
  for (let altitude = 0; altitude <= 440; altitude += 20) {
    const { x, y } = pointAt(limb, angle, altitude);
    const length = altitude % 100 === 0 ? 10 : 5;
    path += `M${x.toFixed(1)} ${y.toFixed(1)}l${(Math.cos(angle) * length).toFixed(1)} ${(Math.sin(angle) * length).toFixed(1)}`;
  }
  return (
    <g className="limb-scale">
      <path d={path} />
      {[100, 200, 300, 400].map((altitude) => {
        const { x, y } = pointAt(limb, angle, altitude);
        return (
          <text key={altitude} x={x + 17} y={y + 8}>
            {altitude}
            {altitude === 400 && " km"}
          </text>
        );
      })}
      {names.map(({ altitude, name, drop }) => {
        const { x, y } = pointAt(limb, angle, altitude);
        return (
          <g key={name}>
            <path d={`M${x - 3} ${y - 0.7}l-16 ${drop - 4}h-8`} className="limb-leader" />
            <text x={x - 31} y={y + drop} textAnchor="end">
              {name}
            </text>
          </g>
        );
      })}
    </g>
  );
}

/** Where the names and numerals of the scale stand, with air about them. */
function scaleBoxes(limb: Limb): Box[] {
  const boxes: Box[] = names.map(({ altitude, name, drop }) => {
    const { x, y } = pointAt(limb, limb.scaleAngle, altitude);
    return { left: x - 40 - name.length * 6.8, right: x - 4, top: y + drop - 16, bottom: y + drop + 8 };
  });
  for (const altitude of [100, 200, 300, 400]) {
    const { x, y } = pointAt(limb, limb.scaleAngle, altitude);
    boxes.push({ left: x - 6, right: x + (altitude === 400 ? 70 : 46), top: y - 8, bottom: y + 14 });
  }
  return boxes;
}

/** Three colours, as three gases: most of the dots in the first. */
function dotPaths(dots: readonly { x: number; y: number }[]): string[] {
  const paths = ["", "", ""];
  dots.forEach(({ x, y }, index) => {
    paths[index % 5 === 0 ? 1 : index % 3 === 0 ? 2 : 0] += `M${x.toFixed(1)} ${y.toFixed(1)}h.01`;
  });
  return paths;
}
