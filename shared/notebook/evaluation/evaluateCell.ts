import { cellSchemas } from "../cellSchemas";
import type { Cell } from "../document";
import { evaluateBody } from "./evaluateBody";
import type { CellAnswer } from "./cellAnswer";
import { evaluateColumn } from "./evaluateColumn";
import { evaluateCorona } from "./evaluateCorona";
import { evaluateEscape } from "./evaluateEscape";
import { evaluateGas } from "./evaluateGas";
import { evaluateLoss } from "./evaluateLoss";
import { evaluateNonthermal } from "./evaluateNonthermal";
import { evaluateSpread } from "./evaluateSpread";
import { evaluateSweep } from "./evaluateSweep";
import { evaluateValues } from "./evaluateValues";
import { locateNotes } from "../language/locateNotes";
import type { ParsedEntries } from "../language/syntax";
import type { CellEvaluation, CellResult, CellStatus, Note } from "../result";
import { openCell, type OpenCell } from "./openCell";
import { sayHowReferencesStand } from "./sayHowReferencesStand";
import type { TaskPlan } from "./taskPlan";
import { usedNames, type CellAbove, type RecordedSurroundings } from "./surroundings";
import type { TaskAnswer } from "../tasks";

export interface EvaluatedCell extends Pick<
  CellEvaluation,
  | "result"
  | "understood"
  | "defaults"
  | "gases"
  | "strip"
  | "convention"
  | "column"
  | "corona"
  | "ion"
  | "lightHistory"
> {
  /** What the cells below see of it. */
  above: CellAbove;
  /** Of a sweep or spread that can be computed. */
  plan: TaskPlan | null;
  taskAnswer: TaskAnswer | null;
}

const evaluators: Readonly<Record<Cell["kind"], (cell: OpenCell) => CellAnswer>> = {
  prose: () => ({}),
  values: evaluateValues,
  body: evaluateBody,
  gas: evaluateGas,
  column: evaluateColumn,
  escape: evaluateEscape,
  corona: evaluateCorona,
  nonthermal: evaluateNonthermal,
  sweep: evaluateSweep,
  spread: evaluateSpread,
  loss: evaluateLoss,
};

/**
 * One cell in its surroundings. Never throws: what cannot be answered becomes a fault of the cell.
 *
 * @param wanted  at a point of a sweep or spread, the names of the values that are asked for; null for all there is
 */
export function evaluateCell(
  cell: Cell,
  parsed: ParsedEntries,
  surroundings: RecordedSurroundings,
  unitSystem: "SI" | "cgs",
  last: EvaluatedCell | undefined,
  wanted: ReadonlySet<string> | null = null,
): EvaluatedCell {
  const lastModel = last?.above.model ?? null;
  const open = openCell(cell, parsed, cellSchemas[cell.kind], surroundings, unitSystem, lastModel, wanted);
  const answer = evaluateSafely(open, cell.kind);
  if (!open.isDraw) sayHowReferencesStand(open);
  const values = finiteValues(open, answer.values ?? {});
  const notes = orderNotes(locateNotes(open.notes, open.text, open.entries));
  const result: CellResult = {
    kind: cell.kind,
    name: cell.name,
    status: worst(notes),
    values,
    tables: answer.tables ?? {},
    ...(answer.profiles ? { profiles: answer.profiles } : {}),
    notes,
  };
  return {
    result,
    understood: [...open.understood.values()],
    defaults: open.defaults,
    gases: answer.gases ?? [],
    ...(answer.strip ? { strip: answer.strip } : {}),
    ...(answer.convention ? { convention: answer.convention } : {}),
    ...(answer.column ? { column: answer.column } : {}),
    ...(answer.corona ? { corona: answer.corona } : {}),
    ...(answer.ion === undefined ? {} : { ion: answer.ion }),
    ...(answer.lightHistory ? { lightHistory: answer.lightHistory } : {}),
    plan: answer.plan ?? null,
    taskAnswer: answer.taskAnswer ?? null,
    above: {
      id: cell.id,
      kind: cell.kind,
      name: cell.name,
      values,
      globals: answer.globals ?? {},
      model: answer.model ?? null,
      isFaulty: result.status === "fault",
      entries: open.entries,
      uses: usedNames(surroundings.questions),
    },
  };
}

function evaluateSafely(cell: OpenCell, kind: Cell["kind"]): CellAnswer {
  try {
    return evaluators[kind](cell);
  } catch (error) {
    const reason = error instanceof Error ? error.message : String(error);
    cell.say("fault", "not_computed", `This cell cannot be computed. ${reason}`);
    return {};
  }
}

/** Leaves out what overflowed, and says so. */
function finiteValues(cell: OpenCell, values: CellResult["values"]): CellResult["values"] {
  const broken = Object.keys(values).filter((name) => {
    const { value } = values[name];
    return typeof value === "number" && !Number.isFinite(value);
  });
  if (broken.length === 0) return values;
  cell.say(
    "fault",
    "beyond_numbers",
    `Beyond what can be computed: ${broken.map((name) => `*${name}*`).join(", ")}.`,
  );
  return Object.fromEntries(Object.entries(values).filter(([name]) => !broken.includes(name)));
}

const severity: Readonly<Record<Note["level"], number>> = { fault: 0, caution: 1, remark: 2 };

/** Faults first, then by place; notes on the cell as a whole before those on a line. */
function orderNotes(notes: Note[]): Note[] {
  return notes.toSorted(
    (a, b) =>
      severity[a.level] - severity[b.level] ||
      (a.line ?? 0) - (b.line ?? 0) ||
      (a.range?.from ?? 0) - (b.range?.from ?? 0),
  );
}

function worst(notes: readonly Note[]): CellStatus {
  if (notes.some(({ level }) => level === "fault")) return "fault";
  return notes.some(({ level }) => level === "caution") ? "caution" : "fine";
}
