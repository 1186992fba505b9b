/** A sweep or spread made ready to be computed point by point. */
import type { PhysicalBounds } from "../../physics";
import type { Cell, NotebookDocument } from "../document";
import { evaluateNotebook } from "../evaluateNotebook";
import type { Dimension } from "../language/dimensions";
import { siUnitText } from "../language/formatQuantity";
import type { Quantity, Uncertainty } from "../language/quantity";
import type { ParsedEntries } from "../language/syntax";
import { nothingSupplied, type SuppliedReferences } from "../references";
import type { Note, ResultValue } from "../result";
import { aboveMagnitude, belowMagnitude, type LongTask } from "../tasks";
import { evaluateCell, type EvaluatedCell } from "./evaluateCell";
import { boundsOf } from "./physicalRole";
import { addCell, nothingAbove, surroundingsOf, type NotebookAbove, type Replacements } from "./surroundings";
import type { TaskPlan } from "./taskPlan";
import type { Trace } from "./traceResults";

/** One cell that the watched results rest on. */
interface TaskCell {
  cell: Cell;
  parsed: ParsedEntries;
  /** As written. */
  evaluated: EvaluatedCell;
  /** Whether it rests on anything that is varied or drawn. */
  isMoved: boolean;
  /** Names of those of its values that are watched or that other cells use. */
  wanted: ReadonlySet<string>;
}

/** What is drawn, as the notebook has it. */
export interface WrittenInput {
  name: string;
  uncertainty: Uncertainty;
  dimension: Dimension;
  bounds: PhysicalBounds;
}

/** One point: the watched values, and the notes of the cells that were evaluated for it. */
export interface EvaluatedPoint {
  values: number[];
  said: { cell: string; note: Note }[];
}

export interface OpenTask {
  plan: TaskPlan;
  /** As written, for each watched name. */
  written: { name: string; value: number; unit: string }[];
  /** As written, for each axis of a sweep; with its uncertainty where it has one. */
  axes: { name: string; value: number; unit: string; uncertainty?: Uncertainty }[];
  /** Of a spread. */
  inputs: WrittenInput[];
  /** @param replacements by the id of a cell */
  evaluate(replacements: (cellId: string) => Replacements): EvaluatedPoint;
}

/** Throws where the document has no such task. */
export function openTask(
  document: NotebookDocument,
  task: LongTask,
  references: SuppliedReferences = nothingSupplied,
): OpenTask {
  const index = document.cells.findIndex(({ id }) => id === task.cellId);
  const cells = document.cells.slice(0, index + 1);
  const { memory } = evaluateNotebook({ ...document, cells }, undefined, undefined, references);
  const plan = memory.get(task.cellId)?.evaluated.plan;
  if (!plan || plan.key !== task.key) throw new Error(`The document has no task for ${task.name}.`);

  const moved = movedCells(plan);
  const used = [...plan.watch, ...plan.trace.names];
  const taskCells = cells.flatMap((cell): TaskCell[] => {
    const remembered = memory.get(cell.id)!;
    const nodes = plan.trace.nodes.filter(({ cellId }) => cellId === cell.id);
    if (nodes.length === 0) return [];
    const parsed = onlyEntries(remembered.parsed, nodes);
    const prefix = `${cell.name}.`;
    const wanted = used.flatMap((name) => (name.startsWith(prefix) ? [name.slice(prefix.length)] : []));
    return [
      {
        cell,
        parsed,
        evaluated: remembered.evaluated,
        isMoved: moved.has(cell.id),
        wanted: new Set(wanted),
      },
    ];
  });
  const evaluate = evaluatorOf(taskCells, plan, document.unitSystem, references);
  const above = aboveOf(taskCells);
  const resultOf = (name: string) => {
    const { value, unit = "1" } = resultAt(above, name)!;
    return { name, value: value as number, unit };
  };
  return {
    plan,
    written: plan.watch.map(resultOf),
    axes: plan.kind === "sweep" ? writtenAxes(plan.axes, memory) : [],
    inputs: plan.kind === "spread" ? writtenInputs(plan.trace, evaluate) : [],
    evaluate,
  };
}

/** Of a `values` cell, only the entries that matter. */
function onlyEntries(parsed: ParsedEntries, nodes: Trace["nodes"]): ParsedEntries {
  if (nodes.some(({ entry }) => entry === null)) return parsed;
  const keys = new Set(nodes.map(({ entry }) => entry));
  return { entries: parsed.entries.filter(({ key }) => keys.has(key)), notes: [] };
}

/** Ids of the cells that are to be evaluated at every point. */
function movedCells(plan: TaskPlan): Set<string> {
  const { nodes, inputs } = plan.trace;
  const varied = new Set(plan.kind === "sweep" ? plan.axes.map(({ name }) => name) : []);
  const isDrawn = (node: Trace["nodes"][number]) =>
    inputs.some(
      ({ cellId, path }) =>
        cellId === node.cellId && (node.entry === null || node.entry === path.split(/[.[]/, 1)[0]),
    );
  const moved = nodes.map((node) =>
    plan.kind === "spread" ? isDrawn(node) : node.entry !== null && varied.has(node.entry),
  );
  // A node rests only on nodes before it.
  nodes.forEach(({ uses }, index) => {
    if (uses.some((used) => moved[used])) moved[index] = true;
  });
  return new Set(nodes.flatMap(({ cellId }, index) => (moved[index] ? [cellId] : [])));
}

const noPlaces = new Map<string, number>();
const noAnswer = (): undefined => undefined;

function evaluatorOf(
  cells: readonly TaskCell[],
  { watch }: TaskPlan,
  unitSystem: NotebookDocument["unitSystem"],
  references: SuppliedReferences,
): OpenTask["evaluate"] {
  const firstMoved = cells.findIndex(({ isMoved }) => isMoved);
  const still = firstMoved < 0 ? cells : cells.slice(0, firstMoved);
  const stillAbove = aboveOf(still);
  // What was found at the last point, to be used again where it is sure to be the same, as in `evaluateNotebook`.
  const last = new Map<string, EvaluatedCell>();
  return (replacements) => {
    let above = stillAbove;
    const said: EvaluatedPoint["said"] = [];
    for (const { cell, parsed, evaluated, isMoved, wanted } of cells.slice(still.length)) {
      if (!isMoved) {
        above = addCell(above, evaluated.above);
        continue;
      }
      const surroundings = {
        ...surroundingsOf(above, noPlaces, 0, noAnswer, references),
        ...replacements(cell.id),
        questions: [],
      };
      const answer = evaluateCell(
        cell,
        parsed,
        surroundings,
        unitSystem,
        last.get(cell.id) ?? evaluated,
        wanted,
      );
      last.set(cell.id, answer);
      for (const note of answer.result.notes) said.push({ cell: cell.name, note });
      above = addCell(above, answer.above);
    }
    return { values: watch.map((name) => numberOf(above, name)), said };
  };
}

function aboveOf(cells: readonly TaskCell[]): NotebookAbove {
  return cells.reduce((above, { evaluated }) => addCell(above, evaluated.above), nothingAbove);
}

/** A `values` entry or a result, as the cells below would see it. */
function resultAt(above: NotebookAbove, name: string): ResultValue | undefined {
  const global = above.globals.get(name);
  const [cellName = "", ...rest] = name.split(".");
  const [cell, key] = global ? [global.cell, name] : [above.byName.get(cellName), rest.join(".")];
  return cell && Object.hasOwn(cell.values, key) ? cell.values[key] : undefined;
}

function numberOf(above: NotebookAbove, name: string): number {
  const found = resultAt(above, name);
  if (!found || typeof found.value === "string") return NaN;
  if (found.value !== null) return found.value;
  const twin = resultAt(above, name.replace(/([^.]+)$/, "log10_$1"))?.value;
  return typeof twin === "number" && twin > 0 ? aboveMagnitude : belowMagnitude;
}

function writtenAxes(
  axes: Extract<TaskPlan, { kind: "sweep" }>["axes"],
  memory: ReadonlyMap<string, { evaluated: EvaluatedCell }>,
): OpenTask["axes"] {
  return axes.map(({ name, dimension }) => {
    const quantities = [...memory.values()].map(({ evaluated }) => evaluated.above.globals[name] ?? null);
    const { value, uncertainty } = quantities.find((quantity): quantity is Quantity => quantity !== null)!;
    return { name, value, unit: siUnitText(dimension), ...(uncertainty ? { uncertainty } : {}) };
  });
}

/** The uncertain numbers as they are distributed while all others keep to their centres. */
function writtenInputs({ inputs }: Trace, evaluate: OpenTask["evaluate"]): WrittenInput[] {
  const found = new Map<string, { uncertainty: Uncertainty; dimension: Dimension }>();
  evaluate((cellId) => ({
    draw(path, uncertainty, dimension) {
      found.set(`${cellId} ${path}`, { uncertainty, dimension });
      return centreOf(uncertainty);
    },
  }));
  return inputs.flatMap(({ name, cellId, path, roles }) => {
    const input = found.get(`${cellId} ${path}`);
    return input ? [{ name, ...input, bounds: boundsOf(roles, input.dimension) }] : [];
  });
}

function centreOf(uncertainty: Uncertainty): number {
  switch (uncertainty.form) {
    case "normal":
      return uncertainty.mean;
    case "uniform":
      return (uncertainty.lower + uncertainty.upper) / 2;
    case "log_normal":
      return uncertainty.median;
  }
}
