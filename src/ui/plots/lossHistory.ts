import type { CellResult, LightHistory } from "../../../shared/notebook/result";
import { displayScale, type DisplayScale, type UnitSystem } from "../../lib/format";

/** How a loss went, ready to be drawn. Ages in s; `lost` in SI as `measure` says. */
export interface LossCourse {
  age: number[];
  rate: number[];
  lost: number[];
  /** What `lost` counts: water where the gas stands for some, else mass. */
  measure: { words: string; unit: string };
  light: LightHistory;
  /** Age at which half of all had gone; null where nothing has. */
  half: number | null;
}

/** null without a history. */
export function lossCourse({ tables, values }: CellResult, light: LightHistory): LossCourse | null {
  const rows = tables.history ?? [];
  const column = (key: string) => rows.map((row) => Number(row[key]));
  const numberOf = (name: string) => {
    const value = values[name]?.value;
    return typeof value === "number" ? value : null;
  };
  const particles = numberOf("particles");
  if (rows.length < 2 || particles === null) return null;
  const water = numberOf("water_layer");
  const all = water ?? numberOf("mass") ?? 0;
  const measure = water === null ? { words: "lost", unit: "kg" } : { words: "lost, of water", unit: "m" };
  const [age, gone] = [column("age"), column("lost")];
  const lost = gone.map((count) => (particles > 0 ? (count / particles) * all : 0));
  return { age, rate: column("rate"), lost, measure, light, half: ageOfHalf(age, lost) };
}

/** Straight between the rows on either side. */
function ageOfHalf(age: readonly number[], lost: readonly number[]): number | null {
  const half = lost.at(-1)! / 2;
  const high = lost.findIndex((value) => value >= half);
  if (!(half > 0) || high <= 0) return null;
  const share = (half - lost[high - 1]!) / (lost[high]! - lost[high - 1]!);
  return age[high - 1]! + share * (age[high]! - age[high - 1]!);
}

/** Value of a column at an age, straight between rows. */
export function atAge({ age }: LossCourse, column: readonly number[], at: number): number {
  const high = age.findIndex((value) => value >= at);
  if (high < 0) return column.at(-1)!;
  if (high === 0) return column[0]!;
  const share = (at - age[high - 1]!) / (age[high]! - age[high - 1]!);
  return column[high - 1]! + share * (column[high]! - column[high - 1]!);
}

const julianYear = 31_557_600;

/** Ages in billions, millions or plain years, by the greatest. */
export function ageScale(greatest: number): DisplayScale {
  const [size, unit] = (
    [
      [1e9, "Gyr"],
      [1e6, "Myr"],
      [1, "yr"],
    ] as const
  ).find(([years]) => greatest >= 0.1 * years * julianYear) ?? [1, "yr"];
  return { factor: 1 / (size * julianYear), unit };
}

export interface LossScales {
  age: DisplayScale;
  rate: DisplayScale;
  lost: DisplayScale;
}

export function lossScales({ age, lost, measure }: LossCourse, unitSystem: UnitSystem): LossScales {
  return {
    age: ageScale(age.at(-1)!),
    rate: displayScale("s^-1", unitSystem, 1),
    lost: displayScale(measure.unit, unitSystem, lost.at(-1)!),
  };
}
