/** Sweeps and spreads on the command line: on as many threads as the machine has, the same bits on any number. */
import { once } from "node:events";
import { performance } from "node:perf_hooks";
import { Worker } from "node:worker_threads";
import type { NotebookDocument } from "../../shared/notebook/document";
import { finishTask } from "../../shared/notebook/finishTask";
import { poolTask, type TaskProgress, type TaskWorker } from "../../shared/notebook/poolTask";
import { taskRunner } from "../../shared/notebook/runTask";
import type { SuppliedReferences } from "../../shared/notebook/references";
import type { LongTask, TaskAnswer, TaskPart } from "../../shared/notebook/tasks";

interface RunOptions {
  references: SuppliedReferences;
  /** Threads at most. */
  threads: number;
  onProgress: (task: LongTask, progress: TaskProgress) => void;
  isStopped: () => boolean;
}

/** Below this, in ms, a task is done before threads have started. */
const shortTask = 1500;
/** Points that tell how long one takes. */
const triedPoints = 4;

export async function runLongTasks(
  document: NotebookDocument,
  tasks: readonly LongTask[],
  options: RunOptions,
): Promise<Map<string, TaskAnswer>> {
  const answers = new Map<string, TaskAnswer>();
  for (const task of tasks) {
    const parts = await runOne(document, task, options);
    answers.set(task.key, finishTask(document, task, parts, options.references));
  }
  return answers;
}

async function runOne(
  document: NotebookDocument,
  task: LongTask,
  { references, threads, onProgress, isStopped }: RunOptions,
): Promise<TaskPart[]> {
  const run = taskRunner(document, task, references);
  const tried = performance.now();
  run(0, Math.min(task.points, triedPoints));
  const expected = ((performance.now() - tried) * task.points) / triedPoints;
  const pool = expected < shortTask || threads < 2 ? null : startThreads(document, task, threads, references);
  try {
    return await poolTask({
      task,
      workers: pool ?? [workerHere(run)],
      now: () => performance.now(),
      onProgress: (progress) => onProgress(task, progress),
      isStopped,
    });
  } finally {
    await Promise.all((pool ?? []).map((worker) => worker.end()));
  }
}

/** Leaves a moment for signals between two parts. */
function workerHere(run: (from: number, to: number) => TaskPart): TaskWorker {
  return {
    async run(from, to) {
      await new Promise((resolve) => setImmediate(resolve));
      return run(from, to);
    },
  };
}

interface ThreadWorker extends TaskWorker {
  end(): Promise<unknown>;
}

function startThreads(
  document: NotebookDocument,
  task: LongTask,
  threads: number,
  references: SuppliedReferences,
): ThreadWorker[] {
  return Array.from({ length: Math.min(threads, task.points) }, () => {
    const worker = new Worker(new URL("./taskWorker.sources.mjs", import.meta.url), {
      workerData: { document, task, references },
    });
    return {
      async run(from, to) {
        worker.postMessage({ from, to });
        const [part] = (await once(worker, "message")) as [TaskPart];
        return part;
      },
      end: () => worker.terminate(),
    };
  });
}
