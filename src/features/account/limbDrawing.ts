/** Where the parts of the limb stand in a window of a given size. Lengths in pixels, altitudes in km. */
import { seededSequence } from "../../lib/seededSequence";
import { skyTop } from "./limbSky";

export interface Box {
  left: number;
  top: number;
  right: number;
  bottom: number;
}

export interface Limb {
  width: number;
  height: number;
  /** The planet's disc. */
  centreX: number;
  centreY: number;
  radius: number;
  /** Pixels a km, upward. */
  scale: number;
  /** Radius of the drawing's sky. */
  skyRadius: number;
  /** Angle from the vertical at which the scale of altitudes stands. */
  scaleAngle: number;
}

/** Exobase of Ilmara's dayside, and the altitude of Kn = 0.1 below it, in km. */
export const exobase = 245;
const firstFree = 188;
const dotsTop = 640;

export function limbOf(width: number, height: number): Limb {
  const scale = (1.16 * height) / 900;
  const radius = 2500 * Math.max(width / 1000, height / 900);
  const centreX = 0.3 * width;
  return {
    width,
    height,
    centreX,
    centreY: 0.8 * height + radius,
    radius,
    scale,
    skyRadius: radius + skyTop * scale,
    scaleAngle: Math.asin((0.79 * width - centreX) / radius),
  };
}

/** The point over the ground at an angle from the vertical. */
export function pointAt(limb: Limb, angle: number, altitude: number): { x: number; y: number } {
  const distance = limb.radius + altitude * limb.scale;
  return { x: limb.centreX + distance * Math.sin(angle), y: limb.centreY - distance * Math.cos(angle) };
}

/**
 * Number density as a share of that at the exobase, on a log scale: oxygen and one part in a hundred of hydrogen,
 * each hydrostatic at Ilmara's 425 K.
 */
function log10Density(altitude: number): number {
  const rise = altitude - exobase;
  return Math.log10(0.99 * Math.exp(-rise / 36) + 0.01 * Math.exp(-rise / 581));
}

function smoothStep(x: number): number {
  const bounded = Math.min(1, Math.max(0, x));
  return bounded * bounded * (3 - 2 * bounded);
}

/** How densely dots stand at an altitude, from 0 to 1: none where the gas is a fluid, most at the exobase, fewer above. */
function dotDensity(altitude: number): number {
  const bottom = firstFree * 0.86;
  if (altitude < bottom || altitude > dotsTop) return 0;
  const top = log10Density(dotsTop);
  const share = Math.max(0, Math.min(1.1, (log10Density(altitude) - top) / -top));
  const free = (altitude - bottom) / (exobase - bottom);
  return (share ** 2.1 * 0.95 + 0.05) * (smoothStep(free) * 0.92 + 0.08);
}

const cellSize = 48;

/** Darts thrown with a fixed seed and kept apart by a distance that grows as the gas thins; none falls on lettering. */
export function limbDots(limb: Limb, lettering: readonly Box[]): { x: number; y: number }[] {
  const next = seededSequence(99);
  const dots: { x: number; y: number }[] = [];
  const columns = Math.ceil(limb.width / cellSize) + 1;
  const cells = new Map<number, { x: number; y: number }[]>();
  const closest = 10.5 * Math.sqrt(limb.height / 900);
  const lowest = pointAt(limb, 0, 0).y;
  const darts = Math.round((limb.width * lowest) / 12);

  for (let dart = 0; dart < darts; dart += 1) {
    const x = next() * limb.width;
    const y = next() * lowest;
    const altitude = (Math.hypot(x - limb.centreX, y - limb.centreY) - limb.radius) / limb.scale;
    const density = dotDensity(altitude);
    if (density < 0.012) continue;
    if (lettering.some((box) => x > box.left && x < box.right && y > box.top && y < box.bottom)) continue;

    const apart = closest / Math.sqrt(density);
    const reach = Math.ceil(apart / cellSize);
    const column = Math.floor(x / cellSize);
    const row = Math.floor(y / cellSize);
    let isFree = true;
    for (let nearRow = row - reach; isFree && nearRow <= row + reach; nearRow += 1) {
      for (let nearColumn = column - reach; isFree && nearColumn <= column + reach; nearColumn += 1) {
        const near = cells.get(nearRow * columns + nearColumn);
        if (near?.some((dot) => (dot.x - x) ** 2 + (dot.y - y) ** 2 < apart * apart)) isFree = false;
      }
    }
    if (!isFree) continue;
    const dot = { x, y };
    dots.push(dot);
    const key = row * columns + column;
    const cell = cells.get(key);
    if (cell) cell.push(dot);
    else cells.set(key, [dot]);
  }
  return dots;
}
