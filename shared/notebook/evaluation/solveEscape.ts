/** The exobase of an escape cell and what leaves there, on a column without flux or with the flux it sustains. */
import {
  log10,
  magnitude,
  solveCoupledColumn,
  thermalEscape,
  type ColumnLevel,
  type CoupledInput,
  type CoupledOutcome,
  type ExobaseOutcome,
  type PhysicsNote,
  type ThermalEscape,
} from "../../physics";
import type { ColumnModel, EscapeModel } from "./models";
import type { OpenCell } from "./openCell";
import type { EscapeConvention } from "./readEscape";
import { sameValue } from "./sameValue";

/** A gas that leaves, by its place in the column; rates with the correction factor. */
export interface LeavingGas {
  formula: string;
  index: number;
  rate: number | null;
  log10Rate: number;
  massRate: number | null;
  log10MassRate: number;
}

export type EscapeSolution =
  | {
      found: true;
      /** The column that the gases leave from: with their fluxes, where they are coupled. */
      source: ColumnModel;
      exobase: Extract<ExobaseOutcome, { found: true }>;
      escape: ThermalEscape;
      /** All gases of the column, in its order. */
      leaving: LeavingGas[];
      /** Of the coupling. */
      notes: PhysicsNote[];
      coupled: EscapeModel["coupled"];
    }
  | { found: false; reason: string; message: string };

export function solveEscape(
  cell: OpenCell,
  source: ColumnModel,
  convention: EscapeConvention,
): EscapeSolution {
  return convention.coupling === "open"
    ? solveOpen(source, convention)
    : solveCoupled(cell, source, convention);
}

function solveOpen(source: ColumnModel, { criterion, corrections }: EscapeConvention): EscapeSolution {
  const { column } = source;
  const exobase = criterion.kind === "bulk" ? column.exobase : column.exobaseBy(criterion);
  if (!exobase.found) return exobase;
  const escape = escapeFrom(source, exobase.level);
  const leaving = escape.gases.map((gas, index): LeavingGas => {
    const factor = corrections[gas.formula];
    if (factor === undefined) return { ...gas, index };
    return leavingAt(gas.formula, index, gas.log10Rate + log10(factor), column.input.gases[index].mass);
  });
  return { found: true, source, exobase, escape, leaving, notes: [], coupled: null };
}

function solveCoupled(
  cell: OpenCell,
  source: ColumnModel,
  { criterion, corrections }: EscapeConvention,
): EscapeSolution {
  const input: CoupledInput = { ...source.column.input, criterion, corrections };
  const outcome = coupledOutcome(cell, input);
  if (!outcome.converged) return { found: false, reason: outcome.reason, message: outcome.message };
  const { column, exobase, notes } = outcome;
  const own: ColumnModel = { kind: "column", column, body: source.body };
  const leaving = outcome.gases.map(({ formula, logRate }, index) =>
    leavingAt(formula, index, logRate / Math.LN10, column.input.gases[index].mass),
  );
  return {
    found: true,
    source: own,
    exobase,
    escape: escapeFrom(own, exobase.level),
    leaving,
    notes,
    coupled: { input, outcome },
  };
}

/** The solution of the last evaluation where its input is the same to the last bit. */
function coupledOutcome(cell: OpenCell, input: CoupledInput): CoupledOutcome {
  const last = cell.lastModel?.kind === "escape" ? cell.lastModel.coupled : null;
  return last && sameValue(last.input, input) ? last.outcome : solveCoupledColumn(input);
}

function leavingAt(formula: string, index: number, log10Rate: number, mass: number): LeavingGas {
  const log10MassRate = log10Rate + log10(mass);
  return {
    formula,
    index,
    rate: magnitude(log10Rate * Math.LN10),
    log10Rate,
    massRate: magnitude(log10MassRate * Math.LN10),
    log10MassRate,
  };
}

/** Jeans escape of all gases of a column from a level. */
function escapeFrom({ column, body }: ColumnModel, level: ColumnLevel): ThermalEscape {
  return thermalEscape({
    gravitationalParameter: body.gravitationalParameter,
    radius: level.radius,
    temperature: level.temperature,
    meanMass: level.meanMass,
    hillRadius: body.hillRadius,
    gases: column.input.gases.map(({ formula, mass }, index) => ({
      formula,
      mass,
      logNumberDensity: level.logNumberDensities[index],
    })),
  });
}
