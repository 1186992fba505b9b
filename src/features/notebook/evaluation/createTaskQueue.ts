import type { NotebookDocument } from "../../../../shared/notebook/document";
import type { TaskProgress } from "../../../../shared/notebook/poolTask";
import type { LongTask, PartialTask, TaskAnswer, TaskPart } from "../../../../shared/notebook/tasks";
import type { TaskPool } from "./taskPool";

/**
 * Where a task stands: it waits for writing to rest; is under way; is done, and its answer about to be shown; was told
 * to stop and finishes what it has in hand; was stopped; or broke.
 */
export type TaskStatus = "waiting" | "running" | "done" | "stopping" | "stopped" | "failed";

/** One sweep or spread that is not answered in full. */
export interface TaskState extends TaskProgress {
  task: LongTask;
  status: TaskStatus;
  /** Why it broke. */
  failure: string | null;
  /** Ends the work; what is done so far becomes the answer, marked as partial. */
  stop(): void;
  /** After it was stopped or broke: computes the rest. */
  resume(): void;
}

/** What a text asks for. */
interface AskedTasks {
  tasks: readonly LongTask[];
  partial: readonly PartialTask[];
}

interface TaskQueueOptions {
  pool: TaskPool;
  /** Every task that is asked for and not answered in full, by the id of its cell. */
  onChange: (states: ReadonlyMap<string, TaskState>) => void;
  onAnswer: (answer: TaskAnswer) => void;
  /** How long writing must have rested before work begins, ms. */
  rest?: number;
}

interface Job {
  state: TaskState;
  document: NotebookDocument;
  /** Done before it was stopped. */
  parts: TaskPart[];
  /** No longer asked for: what it gives does not count. */
  isDropped: boolean;
}

/**
 * Keeps a pool at what the latest text asks for. A task that is asked for again, with the same key, goes on; one that
 * no longer is, is dropped at its next part; a new one begins once writing has rested. One that was stopped stays so
 * until it is resumed, which goes on from what was done.
 */
export function createTaskQueue({ pool, onChange, onAnswer, rest = 600 }: TaskQueueOptions) {
  let jobs = new Map<string, Job>();
  let timer: ReturnType<typeof setTimeout> | null = null;
  let isClosed = false;

  const tell = (): void => {
    if (!isClosed) onChange(new Map([...jobs.values()].map(({ state }) => [state.task.cellId, state])));
  };

  const update = (job: Job, change: Partial<TaskState>): void => {
    job.state = { ...job.state, ...change };
    if (!job.isDropped) tell();
  };

  async function begin(job: Job): Promise<void> {
    const { task } = job.state;
    update(job, { status: "running", failure: null });
    const isStopped = (): boolean => job.isDropped || job.state.status === "stopping";
    try {
      const onProgress = (progress: TaskProgress): void => update(job, progress);
      const run = await pool.run(job.document, task, { onProgress, isStopped, begun: job.parts });
      if (job.isDropped || isClosed) return;
      job.parts = run?.parts ?? [];
      const done = run?.answer.done ?? 0;
      update(job, { status: done < task.points ? "stopped" : "done", done, secondsLeft: null });
      if (run) onAnswer(run.answer);
    } catch (error) {
      if (job.isDropped || isClosed) return;
      update(job, { status: "failed", failure: error instanceof Error ? error.message : String(error) });
    }
  }

  function beginAll(): void {
    timer = null;
    for (const job of jobs.values()) if (job.state.status === "waiting") void begin(job);
  }

  function jobOf(document: NotebookDocument, task: LongTask, status: TaskStatus, done: number): Job {
    const job: Job = {
      state: {
        task,
        done,
        points: task.points,
        secondsLeft: null,
        status,
        failure: null,
        stop() {
          if (job.state.status === "running") update(job, { status: "stopping" });
          else if (job.state.status === "waiting") update(job, { status: "stopped" });
        },
        resume() {
          if (job.isDropped || !["stopped", "failed"].includes(job.state.status)) return;
          void begin(job);
        },
      },
      document,
      parts: [],
      isDropped: false,
    };
    return job;
  }

  return {
    /** What a text asks for; `document` is that text. */
    ask(document: NotebookDocument, { tasks, partial }: AskedTasks): void {
      const wanted = new Map<string, Job>();
      const want = (task: LongTask, status: TaskStatus, done: number): void => {
        const known = jobs.get(task.key);
        const isKnown = known?.state.task.cellId === task.cellId;
        wanted.set(task.key, isKnown ? known : jobOf(document, task, status, done));
      };
      for (const task of tasks) want(task, "waiting", 0);
      for (const { task, done } of partial) want(task, "stopped", done);
      for (const [key, job] of jobs) if (wanted.get(key) !== job) job.isDropped = true;
      jobs = wanted;
      tell();
      if (timer !== null) clearTimeout(timer);
      timer = setTimeout(beginAll, rest);
    },
    close(): void {
      isClosed = true;
      for (const job of jobs.values()) job.isDropped = true;
      if (timer !== null) clearTimeout(timer);
    },
  };
}
