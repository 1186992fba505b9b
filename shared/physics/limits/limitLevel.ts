import type { Column, ColumnLevel, PhysicsNote } from "../types";

/** Where the limits of one gas are reckoned. */
export interface LimitLevel {
  level: ColumnLevel;
  isAtHomopause: boolean;
  notes: PhysicsNote[];
}

/**
 * Level of a column at which the limits of a gas are reckoned: its homopause, else the base with a remark.
 *
 * @param column  solved, with or without flux
 * @param gas     index of the gas in `column.input.gases`
 * @returns       the level; whether it is the homopause; why not
 *
 * @source  [Hunten1973]
 */
export function limitLevel(
  column: Pick<Column, "input" | "homopauses" | "levelAt">,
  gas: number,
): LimitLevel {
  const homopause = column.homopauses[gas];
  if (homopause.found) return { level: column.levelAt(homopause.altitude), isAtHomopause: true, notes: [] };
  const { formula } = column.input.gases[gas];
  const message = `${formula} has no homopause here (${why[homopause.reason]}); its diffusion limit and crossover mass are taken at the base of the column.`;
  return {
    level: column.levelAt(column.input.baseAltitude),
    isAtHomopause: false,
    notes: [{ level: "remark", code: "limits_at_base", message }],
  };
}

const why = {
  no_eddy_mixing: "there is no eddy mixing",
  mixed_throughout: "eddy mixing outdoes diffusion up to the top",
  separated_throughout: "diffusion outdoes eddy mixing from the base up",
  single_gas: "it is the only gas",
} as const;
