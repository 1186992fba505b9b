import type { NotebookDocument } from "../../../../shared/notebook/document";
import type { TaskProgress } from "../../../../shared/notebook/poolTask";
import type { LongTask, TaskAnswer } from "../../../../shared/notebook/tasks";
import type { TaskPool } from "./taskPool";

/** One sweep or spread that is waiting or under way. */
export interface TaskState extends TaskProgress {
  task: LongTask;
  isRunning: boolean;
  /** Ends the work; what is done so far becomes the answer, marked as partial. */
  stop(): void;
}

interface TaskQueueOptions {
  pool: TaskPool;
  /** Every task that is asked for and not answered, by the id of its cell. */
  onChange: (states: ReadonlyMap<string, TaskState>) => void;
  onAnswer: (answer: TaskAnswer) => void;
  onFailure: (error: unknown, task: LongTask) => void;
  /** How long writing must have rested before work begins, ms. */
  rest?: number;
}

interface Job {
  state: TaskState;
  document: NotebookDocument;
  /** Stopped by hand: the parts count. */
  isStopped: boolean;
  /** No longer asked for: the parts do not. */
  isDropped: boolean;
}

/**
 * Keeps a pool at what the latest text asks for. A task that is asked for again, with the same key, goes on; one that
 * no longer is, is dropped at its next part; a new one begins once writing has rested.
 */
export function createTaskQueue({ pool, onChange, onAnswer, onFailure, rest = 600 }: TaskQueueOptions) {
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

  const leave = (job: Job): void => {
    if (jobs.get(job.state.task.key) === job) jobs.delete(job.state.task.key);
    tell();
  };

  async function begin(job: Job): Promise<void> {
    const { task } = job.state;
    update(job, { isRunning: true });
    try {
      const answer = await pool.run(job.document, task, {
        onProgress: (progress) => update(job, progress),
        isStopped: () => job.isStopped || job.isDropped,
      });
      if (job.isDropped || isClosed) return;
      leave(job);
      if (answer) onAnswer(answer);
    } catch (error) {
      if (job.isDropped || isClosed) return;
      leave(job);
      onFailure(error, task);
    }
  }

  function beginAll(): void {
    timer = null;
    for (const job of jobs.values()) if (!job.state.isRunning) void begin(job);
  }

  function jobOf(document: NotebookDocument, task: LongTask): Job {
    const job: Job = {
      state: {
        task,
        done: 0,
        points: task.points,
        secondsLeft: null,
        isRunning: false,
        stop: () => {
          job.isStopped = true;
        },
      },
      document,
      isStopped: false,
      isDropped: false,
    };
    return job;
  }

  return {
    /** What a text asks for; `document` is that text. */
    ask(document: NotebookDocument, tasks: readonly LongTask[]): void {
      const wanted = new Map<string, Job>();
      for (const task of tasks) {
        const known = jobs.get(task.key);
        if (known && known.state.task.cellId === task.cellId) wanted.set(task.key, known);
        else wanted.set(task.key, jobOf(document, task));
      }
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
