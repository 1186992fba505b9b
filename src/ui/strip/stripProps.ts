import type { Strip } from "../../../shared/notebook/summary";
import type { UnitSystem } from "../../lib/format";
import type { NumberSpread } from "../../lib/formatSpread";

/** The strip of one column, standing in a box whose height it fills, or lying in one whose width it fills. */
export interface AltitudeStripProps {
  strip: Strip;
  /** Where a spread watches the exobase: altitudes between which the middle 68 % of its draws lie, m. */
  exobaseSpread?: NumberSpread | null;
  unitSystem: UnitSystem;
}

/** 26 × 74, decoration beside a row that says the same in words. */
export interface StripThumbProps {
  strip: Strip;
}

export interface ShelfBody {
  /** Stable key, such as the notebook's id with the body's name. */
  id: string;
  /** Name of the body, under its band. */
  body: string;
  /** One quiet line under the name: "2 notebooks", "1 notebook, CAR 4". */
  note: string;
  strip: Strip;
}

export interface StripShelfProps {
  bodies: readonly ShelfBody[];
}
