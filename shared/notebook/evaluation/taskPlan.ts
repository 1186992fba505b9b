import { engineVersion } from "../engine";
import { readWatch } from "../language/readWatch";
import type { NameNode } from "../language/syntax";
import type { Variation } from "../language/readVariation";
import type { TaskAnswer } from "../tasks";
import type { CellAnswer } from "./cellAnswer";
import type { OpenCell } from "./openCell";
import { readEntry } from "./readEntries";
import { entryText, type Trace } from "./traceResults";
import { changeTo } from "../language/notes";
import { nearestName } from "../language/nearestName";

/** What a sweep or spread cell asks for, read and checked. */
export type TaskPlan = SweepPlan | SpreadPlan;

interface PlanBase {
  /** See `LongTask.key`. */
  key: string;
  points: number;
  watch: string[];
  /** Of the watched results. */
  trace: Trace;
}

export interface SweepPlan extends PlanBase {
  kind: "sweep";
  /** The first varies fastest. */
  axes: Variation[];
}

export interface SpreadPlan extends PlanBase {
  kind: "spread";
  seed: number;
}

/** Results that the entry `watch` names, all of them numbers above; undefined if one is not. */
export function readWatched(cell: OpenCell): { names: string[]; trace: Trace } | undefined {
  const watched = readEntry(cell, "watch", readWatch);
  if (!watched) return undefined;
  const sound = watched.map((name) => checkWatched(cell, name));
  if (!sound.every((isSound) => isSound)) return undefined;
  const names = watched.map(({ path }) => path);
  const trace = cell.surroundings.trace(names.join(" "));
  if (trace.longWork === null) return { names, trace };
  const message = `What is watched rests on *${trace.longWork}*, which is a sweep or spread itself. Watch results that do not.`;
  cell.say("fault", "watch", message, cell.entry("watch"));
  return undefined;
}

function checkWatched(cell: OpenCell, { path, range }: NameNode): boolean {
  const found = cell.surroundings.lookup(path);
  if (typeof found === "object" && "dimension" in found) return true;
  if (found === undefined) {
    const nearest = nearestName(path, cell.surroundings.names());
    const hint = nearest === undefined ? "" : ` The nearest is *${nearest}*.`;
    const remedy = nearest === undefined ? undefined : changeTo(range, nearest);
    cell.say("fault", "unknown_name", `No result above is called *${path}*.${hint}`, range, remedy);
  } else if (typeof found === "string") {
    const isCell = cell.surroundings.cell(path).found === "above";
    const message = isCell
      ? `*${path}* is ${found}; name one of its results, such as leak.exobase.altitude.`
      : `*${path}* is *${found}*, no number; only numbers can be watched.`;
    cell.say("fault", "not_a_quantity", message, range);
  } else cell.say("fault", "unavailable", found.unavailable, range);
  return false;
}

/** Text of all that the answer depends on: the engine, the cell's own entries, and what the watched results rest on. */
export function planKey(cell: OpenCell, trace: Trace): string {
  return [engineVersion, cell.schema.kind, ...cell.entries.map(entryText), trace.key].join("\n");
}

/** The answer where it is known; else that it is still to be computed. */
export function answerPlan(cell: OpenCell, plan: TaskPlan): CellAnswer {
  const answer: TaskAnswer | undefined = cell.surroundings.taskAnswer(plan.key);
  if (!answer) {
    const what = plan.kind === "sweep" ? "points" : "draws";
    cell.say("remark", "to_be_computed", `${plan.points} ${what} are to be computed.`);
    return { plan };
  }
  for (const { level, code, message } of answer.notes) cell.say(level, code, message);
  return { plan, taskAnswer: answer, values: answer.values, tables: answer.tables };
}
