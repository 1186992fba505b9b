import type { Strip } from "../../../shared/notebook/summary";
import { coronaDensityAt, type ColumnCorona } from "../../lib/columnCorona";
import { displayScale, type UnitSystem } from "../../lib/format";

/** One gas against altitude: x in the unit shown, y in km, split where the gas stops being a fluid. */
export interface GasCurve {
  gas: string;
  below: { x: number[]; y: number[] };
  above: { x: number[]; y: number[] };
  /** Where a corona sets in: its density just below the exobase and just above, in the unit shown, at km. */
  step?: { from: number; to: number; km: number };
}

export type Profiles = Readonly<Record<string, readonly number[]>>;

/** Few points keep typing quick; a curve of a page's width needs no more. */
const pointsDrawn = 120;

/** Rows of a column that a figure up to the strip's top needs: about evenly spread, first and last included. */
export function drawnRows(profiles: Profiles, strip: Strip): number[] {
  const altitude = profiles.altitude ?? [];
  const past = altitude.findIndex((z) => z > strip.top);
  const count = past < 0 ? altitude.length : past + 1;
  const every = Math.max(1, Math.ceil(count / pointsDrawn));
  const rows: number[] = [];
  for (let row = 0; row < count - 1; row += every) rows.push(row);
  if (count > 0) rows.push(count - 1);
  return rows;
}

/** Value of a column between rows, at an altitude in m: straight in the logarithm where `log`. */
export function interpolateProfile(
  altitude: readonly number[],
  column: readonly number[],
  at: number,
  log: boolean,
): number {
  const high = altitude.findIndex((z) => z >= at);
  if (high < 0) return column.at(-1) ?? 0;
  if (high === 0) return column[0] ?? 0;
  const [z0, z1] = [altitude[high - 1]!, altitude[high]!];
  const [v0, v1] = [column[high - 1]!, column[high]!];
  const share = (at - z0) / (z1 - z0);
  return log && v0 > 0 && v1 > 0 ? v0 * (v1 / v0) ** share : v0 + share * (v1 - v0);
}

/** Altitude in m at which the Knudsen number first has the given decimal logarithm; null where it never does. */
export function altitudeOfKnudsen(profiles: Profiles, log10Knudsen: number): number | null {
  const altitude = profiles.altitude ?? [];
  const knudsen = profiles.knudsen ?? [];
  const high = knudsen.findIndex((value) => Math.log10(value) >= log10Knudsen);
  if (high <= 0) return null;
  const [k0, k1] = [Math.log10(knudsen[high - 1]!), Math.log10(knudsen[high]!)];
  const [z0, z1] = [altitude[high - 1]!, altitude[high]!];
  return z0 + ((log10Knudsen - k0) / (k1 - k0)) * (z1 - z0);
}

export const densityUnit = (unitSystem: UnitSystem) => displayScale("m^-3", unitSystem, 1);

/** The gas's way above the exobase as its corona has it. */
function coronaCurve(corona: ColumnCorona, top: number, factor: number): GasCurve["above"] {
  const drawn = corona.altitude.filter((z) => z < top);
  const altitudes = drawn.length < corona.altitude.length ? [...drawn, top] : drawn;
  return {
    x: altitudes.map((z) => coronaDensityAt(corona, z)! * factor),
    y: altitudes.map((z) => z / 1000),
  };
}

/** Curves of number density, one a gas. */
export function densityCurves(
  profiles: Profiles,
  strip: Strip,
  unitSystem: UnitSystem,
  coronae: readonly ColumnCorona[] = [],
): GasCurve[] {
  const altitude = profiles.altitude ?? [];
  const rows = drawnRows(profiles, strip);
  const { factor } = densityUnit(unitSystem);
  return strip.gases.flatMap((gas) => {
    const column = profiles[`${gas}.number_density`];
    if (!column) return [];
    const corona = coronae.find((each) => each.gas === gas && each.altitude[0]! < strip.top);
    const parting = corona ? corona.altitude[0]! : strip.exobase;
    const part = parting ?? Infinity;
    const curve: GasCurve = { gas, below: { x: [], y: [] }, above: { x: [], y: [] } };
    for (const row of rows) {
      const side = altitude[row]! < part ? curve.below : curve.above;
      side.x.push(column[row]! * factor);
      side.y.push(altitude[row]! / 1000);
    }
    if (parting !== null) {
      const meeting = interpolateProfile(altitude, column, parting, true) * factor;
      curve.below.x.push(meeting);
      curve.below.y.push(parting / 1000);
      curve.above.x.unshift(meeting);
      curve.above.y.unshift(parting / 1000);
    }
    if (!corona) return [curve];
    const from = corona.densityBelow * factor;
    const step = { from, to: from * corona.share, km: part / 1000 };
    return [{ ...curve, above: coronaCurve(corona, strip.top, factor), step }];
  });
}

/**
 * Decades worth drawing: up to the densest gas at the base, down to a few decades under what is left at the
 * top, where gases that have gone run off the left.
 */
export function densityDecades(curves: readonly GasCurve[]): [from: number, to: number] {
  const largest = Math.max(...curves.map(({ below, above }) => Math.max(...below.x, ...above.x)));
  const left = curves.reduce((sum, { below, above }) => sum + (above.x.at(-1) ?? below.x.at(-1) ?? 0), 0);
  const to = Math.log10(largest) + 0.15;
  const from = Math.floor(Math.log10(left) - 4);
  return [Math.min(from, Math.floor(to) - 4), to];
}
