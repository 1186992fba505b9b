import type { Strip } from "../../../shared/notebook/summary";
import { fanLabels } from "./fanLabels";
import type { StripScale } from "./stripScale";

export type StripLabelKind = "base" | "homopause" | "caption" | "lower" | "exobase" | "upper";

export interface StripLabel {
  kind: StripLabelKind;
  altitude: number;
  gas?: string;
  /** px from the low end where the mark is, and where its label's centre stands. */
  mark: number;
  label: number;
}

const heights: Record<StripLabelKind, number> = {
  base: 15.5,
  homopause: 15.5,
  caption: 17,
  lower: 15,
  exobase: 31,
  upper: 15,
};
const weights: Record<StripLabelKind, number> = {
  base: 400,
  homopause: 1,
  caption: 0.2,
  lower: 3,
  exobase: 400,
  upper: 3,
};

/** Marks of the strip with labels that never touch, in ascending order; no more than `reserved` px from the high end. */
export function stripLabels(strip: Strip, scale: StripScale, reserved: number): StripLabel[] {
  const marks: Omit<StripLabel, "mark" | "label">[] = [{ kind: "base", altitude: strip.base }];
  for (const { gas, altitude } of strip.homopauses) {
    if (altitude > strip.base && altitude < strip.top) marks.push({ kind: "homopause", altitude, gas });
  }
  const add = (kind: StripLabelKind, altitude: number | null) => {
    if (altitude !== null && altitude < strip.top) marks.push({ kind, altitude });
  };
  add("lower", strip.lower);
  add("exobase", strip.exobase);
  add("upper", strip.upper);
  marks.sort((a, b) => a.altitude - b.altitude);
  const topmost = marks.findLastIndex(({ kind }) => kind === "homopause");
  if (topmost >= 0) marks.splice(topmost + 1, 0, { kind: "caption", altitude: marks[topmost]!.altitude });

  const wishes = marks.map(({ kind, altitude }) => ({
    wanted: scale.along(altitude) + (kind === "caption" ? heights.caption : 0),
    height: heights[kind],
    weight: weights[kind],
  }));
  const centres = fanLabels(wishes, { from: 4, to: scale.length - reserved });
  return marks.map((mark, i) => ({ ...mark, mark: scale.along(mark.altitude), label: centres[i]! }));
}
