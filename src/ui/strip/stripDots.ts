import type { Strip } from "../../../shared/notebook/summary";
import { seededSequence } from "../../lib/seededSequence";
import { sampleStrip } from "./stripSample";
import type { StripScale } from "./stripScale";
import { fluidShare } from "./stripTone";

/**
 * Particles above the fluid.
 *
 * A band of a given size has one fixed set of candidate places, thrown as darts at ever closer spacing; each
 * remembers the spacing at which it was let in. Where the gas asks for a spacing r, exactly the candidates
 * let in at r or more are shown, so neighbours never stand closer than r, and a change of the text lets a
 * few appear or fade at the edge instead of throwing all anew. The same text gives the same dots.
 */
export interface Dot {
  /** px from the low end of the band */
  along: number;
  /** px from its side */
  across: number;
}

/** Dots of one gas that are equally faint. */
export interface GasDots {
  gas: string;
  opacity: number;
  dots: Dot[];
}

interface Candidate {
  along: number;
  across: number;
  spacing: number;
  /** 0 to 1; decides which gas of the mixture the dot shows */
  draw: number;
}

const widestSpacing = 46;

function throwDarts(length: number, width: number, closest: number): Candidate[] {
  const uniform = seededSequence(12345);
  const cell = 3 * closest;
  const columns = Math.max(1, Math.ceil(width / cell));
  const grid = new Map<number, Candidate[]>();
  const placed: Candidate[] = [];
  const isFree = (along: number, across: number, spacing: number): boolean => {
    const reach = Math.ceil(spacing / cell);
    const [row, column] = [Math.floor(along / cell), Math.floor(across / cell)];
    for (let r = row - reach; r <= row + reach; r++) {
      for (let c = Math.max(0, column - reach); c <= Math.min(columns - 1, column + reach); c++) {
        for (const other of grid.get(r * columns + c) ?? []) {
          const [dx, dy] = [other.along - along, other.across - across];
          if (dx * dx + dy * dy < spacing * spacing) return false;
        }
      }
    }
    return true;
  };
  const margin = Math.min(1.5, width / 8);
  for (let spacing = widestSpacing; spacing >= closest; spacing *= 0.92) {
    const throws = Math.ceil((4 * length * width) / (spacing * spacing));
    for (let i = 0; i < throws; i++) {
      const along = uniform() * length;
      const across = margin + uniform() * (width - 2 * margin);
      const draw = uniform();
      if (!isFree(along, across, spacing)) continue;
      const dart = { along, across, spacing, draw };
      placed.push(dart);
      const key = Math.floor(along / cell) * columns + Math.min(columns - 1, Math.floor(across / cell));
      const bucket = grid.get(key);
      if (bucket) bucket.push(dart);
      else grid.set(key, [dart]);
    }
  }
  return placed;
}

/** Darts are thrown for lengths in these steps, so that a window drawn larger does not throw anew at each pixel. */
const lengthStep = 200;
const thrown = new Map<string, Candidate[]>();

/** Candidates of a band, kept for the last few sizes, since throwing takes longer than a keystroke may. */
function candidatesOf(length: number, width: number, closest: number): Candidate[] {
  const thrownLength = Math.ceil(length / lengthStep) * lengthStep;
  const key = `${thrownLength} ${Math.round(width)} ${closest.toFixed(2)}`;
  const known = thrown.get(key);
  if (known) return known;
  const candidates = throwDarts(thrownLength, width, closest);
  if (thrown.size >= 12) thrown.delete(thrown.keys().next().value!);
  thrown.set(key, candidates);
  return candidates;
}

/** Spacing in px that the gas asks for at an altitude; null where it is still a fluid. */
function spacingAt(strip: Strip, altitude: number, closest: number, ends: [exobase: number, top: number]) {
  const sample = sampleStrip(strip, altitude);
  const height = Math.min(
    1.15,
    Math.max(0, (sample.log10NumberDensity - ends[1]) / (ends[0] - ends[1] || 1)),
  );
  const wanted = (0.93 * height ** 1.9 + 0.07) * (1 - fluidShare(sample.log10Knudsen)) ** 0.55;
  return wanted < 0.01 ? null : { spacing: closest / Math.sqrt(wanted), sample };
}

/**
 * @param width    across the band, px
 * @param closest  least spacing, px: about 5 on the large strip, 2.5 on a thumbnail
 */
export function stripDots(strip: Strip, scale: StripScale, width: number, closest: number): GasDots[] {
  if (strip.exobase === null) return [];
  const ends: [number, number] = [
    sampleStrip(strip, strip.exobase).log10NumberDensity,
    sampleStrip(strip, scale.high).log10NumberDensity,
  ];
  const onset = (strip.lower ?? strip.exobase) * 0.9;
  const groups = new Map<string, GasDots>();
  for (const { along, across, spacing, draw } of candidatesOf(scale.length, width, closest)) {
    const altitude = scale.altitudeAt(along);
    if (altitude < onset || along > scale.length) continue;
    const asked = spacingAt(strip, altitude, closest, ends);
    if (asked === null || asked.spacing > widestSpacing || spacing < asked.spacing) continue;
    let left = draw;
    const drawn = asked.sample.moleFractions.findIndex((share) => (left -= share) <= 0);
    const gas = strip.gases[Math.max(0, drawn)]!;
    // Those barely let in are faint, so that typing makes them fade rather than flash.
    const opacity = Math.min(1, Math.ceil((0.5 + 8 * (spacing / asked.spacing - 1)) * 4) / 4);
    const key = `${gas} ${opacity}`;
    const group = groups.get(key) ?? { gas, opacity, dots: [] };
    group.dots.push({ along, across });
    groups.set(key, group);
  }
  return [...groups.values()];
}
