import type { LongTask, TaskPart } from "./tasks";

/** Computes parts of one task elsewhere: in a thread, a worker of the page, or right here. */
export interface TaskWorker {
  run(from: number, to: number): Promise<TaskPart>;
}

export interface TaskProgress {
  done: number;
  points: number;
  /** Estimate from what has been done; null at the beginning. */
  secondsLeft: number | null;
}

interface PoolOptions {
  task: LongTask;
  workers: readonly TaskWorker[];
  /** Time in ms, from any beginning. */
  now: () => number;
  onProgress: (progress: TaskProgress) => void;
  /** Asked before each part; where it says yes, no other is begun. */
  isStopped: () => boolean;
  /** What was done before the work was stopped, from the first point on without a gap. */
  begun?: readonly TaskPart[];
}

/** Points of a first part, and how long a part should take, ms. */
const firstPoints = 2;
const partDuration = 200;

/**
 * Shares a task out among workers, from the first point to the last, in parts that take each worker about a fifth of a
 * second. How it is shared out depends on time and load; what comes out does not.
 *
 * @returns the parts that were done, with those begun: all, or where it was stopped, those from the first point on without a gap
 */
export async function poolTask({
  task,
  workers,
  now,
  onProgress,
  isStopped,
  begun = [],
}: PoolOptions): Promise<TaskPart[]> {
  const parts: TaskPart[] = [...begun];
  // The pace is taken from the first finished part on, so that starting a worker does not count.
  let first: { at: number; done: number } | null = null;
  let done = begun.reduce((sum, { from, to }) => sum + to - from, 0);
  let next = done;

  const secondsLeft = (): number | null => {
    if (!first || done === first.done) return null;
    return ((task.points - done) * (now() - first.at)) / (done - first.done) / 1000;
  };

  const work = async (worker: TaskWorker): Promise<void> => {
    let size = firstPoints;
    while (next < task.points && !isStopped()) {
      const from = next;
      const to = Math.min(task.points, from + size);
      next = to;
      const started = now();
      const part = await worker.run(from, to);
      parts.push(part);
      done += part.to - part.from;
      const took = Math.max(1, now() - started);
      size = Math.max(1, Math.min(4 * size, Math.floor((size * partDuration) / took)));
      first ??= { at: now(), done };
      onProgress({ done, points: task.points, secondsLeft: secondsLeft() });
    }
  };
  onProgress({ done, points: task.points, secondsLeft: null });
  await Promise.all(workers.map(work));
  return parts;
}
