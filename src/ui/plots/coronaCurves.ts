import type { ResultRow } from "../../../shared/notebook/result";

/** One curve against altitude in km; only where it has a value. */
export interface CoronaCurve {
  key: string;
  words: string;
  x: number[];
  y: number[];
}

type Profiles = Readonly<Record<string, readonly number[]>>;

const orbits = [
  { key: "number_density", words: "all orbits" },
  { key: "ballistic", words: "ballistic" },
  { key: "satellite", words: "satellite" },
  { key: "escaping", words: "escaping" },
] as const;

/** Densities by kind of orbit, in the unit shown; a kind that nothing flies on is left out. */
export function orbitCurves(profiles: Profiles, factor: number): CoronaCurve[] {
  const altitude = profiles.altitude ?? [];
  return orbits.flatMap(({ key, words }) => {
    const rows = altitude.map((z, row) => [profiles[key]![row]! * factor, z / 1000] as const);
    const present = rows.filter(([x]) => x > 0);
    return present.length < 2
      ? []
      : [{ key, words, x: present.map(([x]) => x), y: present.map(([, y]) => y) }];
  });
}

const sights = [
  { key: "limb_column", words: "along the limb" },
  { key: "overhead_column", words: "overhead" },
] as const;

/**
 * Columns along both lines of sight, in the unit shown. They are known at every so manieth of the corona's levels, which
 * are evenly spaced in the potential; between, their logarithms are carried on by a cubic through four neighbours.
 */
export function sightCurves(profiles: Profiles, rows: readonly ResultRow[], factor: number): CoronaCurve[] {
  const altitude = profiles.altitude ?? [];
  const every = (altitude.length - 1) / (rows.length - 1);
  if (!Number.isInteger(every)) return [];
  return sights.flatMap(({ key, words }) => {
    const logs = rows.map((row) => (typeof row[key] === "number" ? Math.log10(row[key] * factor) : NaN));
    const curve: CoronaCurve = { key, words, x: [], y: [] };
    altitude.forEach((z, level) => {
      const log = between(logs, level / every);
      if (!Number.isFinite(log)) return;
      curve.x.push(10 ** log);
      curve.y.push(z / 1000);
    });
    return curve.x.length < 2 ? [] : [curve];
  });
}

/** Catmull and Rom's cubic; where a neighbour is missing, as if the span went on straight. */
function between(values: readonly number[], place: number): number {
  const low = Math.min(Math.floor(place), values.length - 2);
  const t = place - low;
  const [p1, p2] = [values[low]!, values[low + 1]!];
  if (t === 0 || t === 1) return t === 0 ? p1 : p2;
  const [before, after] = [values[low - 1] ?? NaN, values[low + 2] ?? NaN];
  const p0 = Number.isFinite(before) ? before : 2 * p1 - p2;
  const p3 = Number.isFinite(after) ? after : 2 * p2 - p1;
  const cubic = 2 * p0 - 5 * p1 + 4 * p2 - p3;
  return p1 + 0.5 * t * (p2 - p0 + t * (cubic + t * (3 * (p1 - p2) + p3 - p0)));
}
