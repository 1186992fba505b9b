/** Work that takes too long to be done while one types: sweeps and spreads, cut into parts that anyone may compute. */
import type { CellResult, Note, ResultSpread } from "./result";

/** What a sweep or spread cell asks for. `runTask` computes parts of it, `finishTask` makes its answer of them. */
export interface LongTask {
  cellId: string;
  kind: "sweep" | "spread";
  /** Name of the cell. */
  name: string;
  /** Text of all that the answer depends on: the same text, the same answer. */
  key: string;
  /** Points of a sweep, draws of a spread. */
  points: number;
}

/** A task that was stopped: its answer is that of the first `done` points. */
export interface PartialTask {
  task: LongTask;
  done: number;
}

/** Why a point has no answer for some watched name, or lies outside the validity of a model. */
export interface PointOutcome {
  level: "caution" | "fault";
  /** Of the note, stable. */
  code: string;
  /** Name of the cell that says it. */
  cell: string;
  /** As said at the first point that it concerns. */
  message: string;
  /** Points that it concerns, ascending. */
  points: number[];
}

/** Points `from` up to, but not including, `to`. How the points are cut into parts changes no bit of the answer. */
export interface TaskPart {
  key: string;
  from: number;
  to: number;
  /**
   * For each watched name in the order written, its value at each point, SI. NaN where there is no answer;
   * `belowMagnitude` or `aboveMagnitude` where only a log10 twin carries it.
   */
  values: Float64Array[];
  outcomes: PointOutcome[];
}

/** Stand for a magnitude below 1e-300 that is not zero, and for one above 1e300. */
export const belowMagnitude = Number.MIN_VALUE;
export const aboveMagnitude = Number.MAX_VALUE;

/** What `evaluateNotebook` needs to answer the cell. */
export interface TaskAnswer {
  key: string;
  points: number;
  /** Fewer than `points` where the work was stopped: the first so many. */
  done: number;
  values: CellResult["values"];
  tables: CellResult["tables"];
  notes: Pick<Note, "level" | "code" | "message">[];
  /** Of a spread: by watched name, what its own cell then carries. */
  spreads: Record<string, Omit<ResultSpread, "cell">>;
  /** Of a spread: names of the uncertain entries that were drawn. */
  drawn: string[];
  /** Watched values point by point, as in `TaskPart`. */
  watched: { name: string; values: Float64Array }[];
}

/** Answers that have been computed, by the key of their task. */
export type TaskAnswers = ReadonlyMap<string, TaskAnswer>;
