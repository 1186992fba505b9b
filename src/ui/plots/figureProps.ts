import type { ReactNode } from "react";
import type { Strip } from "../../../shared/notebook/summary";
import type { ColumnCorona } from "../../lib/columnCorona";
import type { UnitSystem } from "../../lib/format";

/** What every figure of a column needs. */
export interface ColumnFigureProps {
  /** `result.profiles` of a column cell: columns of equal length against `altitude`, SI. */
  profiles: Readonly<Record<string, readonly number[]>>;
  /** The same column's strip: exobase, homopauses and the altitudes worth drawing. */
  strip: Strip;
  /** Coronae that rest on the column. */
  coronae?: readonly ColumnCorona[];
  /** Name of the escape cell whose flux the column feels here; null for the gas at rest. */
  escape?: string | null;
  unitSystem: UnitSystem;
  /** Number of the figure in the notebook, from 1. */
  number: number;
  /** What one sees, after "Figure 1."; each figure has its own words where this is left out. */
  caption?: ReactNode;
}
