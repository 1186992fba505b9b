import { wrap } from "comlink";
import type { NotebookDocument } from "../../../../shared/notebook/document";
import { poolTask, type TaskProgress } from "../../../../shared/notebook/poolTask";
import type { LongTask, TaskAnswer, TaskPart } from "../../../../shared/notebook/tasks";
import { knownReferences } from "./knownReferences";
import type { TaskService } from "./taskService";

/** The service as the pool sees it: every call answers later. */
export type RemoteTaskService = {
  [Call in keyof TaskService]: (
    ...args: Parameters<TaskService[Call]>
  ) => Promise<ReturnType<TaskService[Call]>>;
};

interface TaskWatch {
  onProgress: (progress: TaskProgress) => void;
  /** Asked between parts, every fifth of a second or so. */
  isStopped: () => boolean;
  /** What was done before it was stopped. */
  begun?: readonly TaskPart[];
}

export interface TaskRun {
  /** Partial where it was stopped. */
  answer: TaskAnswer;
  /** What it was made of, to go on from. */
  parts: TaskPart[];
}

export interface TaskPool {
  /** null where nothing was done at all. One task after the other. */
  run(document: NotebookDocument, task: LongTask, watch: TaskWatch): Promise<TaskRun | null>;
}

/** Workers beside the page and its evaluation. */
const mostWorkers = 8;

export function createTaskPool(startWorker: () => RemoteTaskService, size: number): TaskPool {
  let services: RemoteTaskService[] | null = null;
  let last: Promise<unknown> = Promise.resolve();

  async function run(
    document: NotebookDocument,
    task: LongTask,
    { onProgress, isStopped, begun }: TaskWatch,
  ): Promise<TaskRun | null> {
    if (isStopped()) return null;
    const references = knownReferences(document);
    services ??= Array.from({ length: size }, startWorker);
    await Promise.all(services.map((service) => service.open(document, task, references)));
    const now = () => performance.now();
    const parts = await poolTask({ task, workers: services, now, onProgress, isStopped, begun });
    if (parts.length === 0) return null;
    return { answer: await services[0]!.finish(document, task, parts), parts };
  }

  return {
    run(document, task, watch) {
      const answer = last.then(() => run(document, task, watch));
      last = answer.catch(() => undefined);
      return answer;
    },
  };
}

let running: TaskPool | null = null;

/** The one pool of this page; its workers start when first needed. */
export function workerTaskPool(): TaskPool {
  const size = Math.min(mostWorkers, Math.max(1, navigator.hardwareConcurrency - 1));
  running ??= createTaskPool(startTaskWorker, size);
  return running;
}

function startTaskWorker(): RemoteTaskService {
  return wrap<TaskService>(
    new Worker(new URL("./task.worker.ts", import.meta.url), { type: "module", name: "task" }),
  );
}
