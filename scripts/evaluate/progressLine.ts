import type { TaskProgress } from "../../shared/notebook/poolTask";
import type { LongTask } from "../../shared/notebook/tasks";

/** Time between two lines where they cannot be written over, ms. */
const betweenLines = 5000;

/** "spread sure: 1,200 of 4,096 draws, 25 s left" */
export function progressText({ kind, name }: LongTask, { done, points, secondsLeft }: TaskProgress): string {
  const what = kind === "sweep" ? "points" : "draws";
  const left = secondsLeft === null ? "" : `, ${timeInWords(secondsLeft)} left`;
  return `${kind} ${name}: ${done} of ${points} ${what}${left}`;
}

function timeInWords(seconds: number): string {
  if (seconds < 90) return `${Math.ceil(seconds)} s`;
  if (seconds < 5400) return `${Math.ceil(seconds / 60)} min`;
  return `${Math.ceil(seconds / 3600)} h`;
}

/**
 * Progress on a stream beside the answer: one line that is written over on a terminal, else a line now and then. Work
 * that is over at once says nothing.
 */
export function progressLine(
  stream: { isTTY?: boolean; write(text: string): unknown },
  now: () => number,
): { show(task: LongTask, progress: TaskProgress): void; clear(): void } {
  let lastShown = now();
  let isShown = false;
  return {
    show(task, progress) {
      const isDue = now() - lastShown >= (stream.isTTY ? 100 : betweenLines);
      if (!isDue) return;
      lastShown = now();
      const text = progressText(task, progress);
      stream.write(stream.isTTY ? `\r\u001b[K${text}` : `${text}\n`);
      isShown = true;
    },
    clear() {
      if (isShown && stream.isTTY) stream.write("\r\u001b[K");
      isShown = false;
    },
  };
}
