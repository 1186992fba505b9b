import { columnNotes } from "../column/columnNotes";
import { nodeSlope, type ColumnPath } from "../column/columnPath";
import { altitudeOf, heightOf } from "../column/columnProblem";
import { columnReaders } from "../column/columnReaders";
import { fractions, maximumGases, setComposition } from "../column/composition";
import { findHomopauses } from "../column/findHomopauses";
import { joinPaths } from "../column/joinPaths";
import { marchOnFromExobase, smallestEscapeParameter } from "../column/marchUp";
import { exobaseNumber } from "../exobase/exobaseNumber";
import { exobaseAt, exobaseOutcome, findExobaseBand, type ExobaseBand } from "../exobase/findExobase";
import { numberAlong } from "../exobase/numberAlong";
import type { Column, ExobaseCriterion, ExobaseOutcome } from "../types";
import type { EscapingColumn } from "./escapingColumn";
import type { CoupledExobase } from "./findCoupledExobase";

export type UncountedColumn = Omit<Column, "evaluations">;

/** A column, its exobase, and the path that it is read from. */
export interface CoupledColumn {
  column: UncountedColumn;
  exobase: Extract<ExobaseOutcome, { found: true }>;
  path: ColumnPath;
}

/** The column of an exobase that was found: with the fluxes below it, hydrostatic above. */
export function coupledColumn(
  { problem, number, bulk }: EscapingColumn,
  found: Extract<CoupledExobase, { converged: true }>,
  tolerance: number,
): CoupledColumn {
  const { height, state, down } = found;
  const { input } = problem;
  const upward = marchOnFromExobase(problem, height, state, baseScaleHeight(down.path), tolerance);
  const path = joinPaths(down.path, upward.march.path);
  const given = input.top === "auto" ? upward.top : heightOf(input.top, input.radius, problem.baseRadius);
  const isCutShort = upward.isCutShort && upward.top < given;
  const top = isCutShort ? upward.top : given;
  const topAltitude = input.top === "auto" || isCutShort ? altitudeOf(problem, top) : input.top;

  const knudsen = numberAlong(path, bulk);
  const along = number === bulk ? knudsen : numberAlong(path, number);
  const band = bandRound(findExobaseBand(along, knudsen), height);
  const exobase = exobaseAt({ along, band, top }, height);
  const exobaseBy = (criterion: ExobaseCriterion): ExobaseOutcome => {
    if (isSame(criterion, number.criterion)) return exobase;
    const other = criterion.kind === "bulk" ? knudsen : numberAlong(path, exobaseNumber(problem, criterion));
    return exobaseOutcome({
      along: other,
      band: findExobaseBand(other, knudsen),
      top: input.top === "auto" ? path.positions[path.steps] : top,
      baseEscapeParameter: smallestEscapeParameter(path, 0),
      isRunaway: upward.isRunaway,
    });
  };
  const homopauses = findHomopauses(path, top);
  return {
    path,
    exobase,
    column: {
      input,
      topAltitude,
      exobase,
      exobaseBy,
      homopauses: homopauses.map(({ outcome }) => outcome),
      ...columnReaders(path, topAltitude),
      notes: columnNotes(input, topAltitude, homopauses, isCutShort && input.top !== "auto"),
    },
  };
}

/** Of the whole gas, from the end of a march down, m of geopotential height. */
function baseScaleHeight(path: ColumnPath): number {
  const size = path.problem.masses.length;
  setComposition(path.problem.baseLogPressures, size);
  nodeSlope(path, path.steps, slope);
  let fall = 0;
  for (let i = 0; i < size; i += 1) fall += fractions[i] * slope[i];
  return 1 / Math.abs(fall);
}

const slope = new Float64Array(maximumGases);

/** The band round the exobase that was solved for; all other crossings are other exobases. */
function bandRound(band: ExobaseBand, height: number): ExobaseBand {
  const crossings = band.exobase === null ? band.others : [...band.others, band.exobase];
  const others = crossings.filter((other) => Math.abs(other - height) > sameHeight * height);
  return { ...band, exobase: height, others };
}

const sameHeight = 1e-7;

function isSame(one: ExobaseCriterion, other: ExobaseCriterion): boolean {
  if (one.kind === "gas" && other.kind === "gas") return one.formula === other.formula;
  return one.kind === other.kind;
}
