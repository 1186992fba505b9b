import type { ReactNode } from "react";
import type { UnitSystem } from "../../lib/format";
import type { SweepResult } from "./sweepResult";

export interface SweepFigureProps {
  sweep: SweepResult;
  /** Gases of the column that the sweep rests on, so that colours agree with its figures. */
  columnGases: readonly string[] | undefined;
  unitSystem: UnitSystem;
  /** Number of the figure in the notebook, from 1. */
  number: number;
  /** Why points have no answer, and where. */
  reasons: ReactNode;
}
