import type { NotebookDocument } from "../../../../shared/notebook/document";
import { finishTask } from "../../../../shared/notebook/finishTask";
import { taskRunner } from "../../../../shared/notebook/runTask";
import type { LongTask, TaskAnswer, TaskPart } from "../../../../shared/notebook/tasks";

/** Computes parts of one task at a time. Runs in a worker, beside others of its kind. */
export function createTaskService() {
  let run: ((from: number, to: number) => TaskPart) | null = null;
  return {
    open(document: NotebookDocument, task: LongTask): void {
      run = taskRunner(document, task);
    },
    run(from: number, to: number): TaskPart {
      if (!run) throw new Error("No task is open.");
      return run(from, to);
    },
    finish(document: NotebookDocument, task: LongTask, parts: TaskPart[]): TaskAnswer {
      return finishTask(document, task, parts);
    },
  };
}

export type TaskService = ReturnType<typeof createTaskService>;
