import type { NotebookDocument } from "../../../../shared/notebook/document";
import { finishTask } from "../../../../shared/notebook/finishTask";
import { taskRunner } from "../../../../shared/notebook/runTask";
import type { SuppliedReference, SuppliedReferences } from "../../../../shared/notebook/references";
import type { LongTask, TaskAnswer, TaskPart } from "../../../../shared/notebook/tasks";

/** Computes parts of one task at a time. Runs in a worker, beside others of its kind. */
export function createTaskService() {
  let supplied: SuppliedReferences = new Map();
  let run: ((from: number, to: number) => TaskPart) | null = null;
  return {
    open(document: NotebookDocument, task: LongTask, references: readonly SuppliedReference[] = []): void {
      supplied = new Map(references.map((reference) => [reference.pin, reference]));
      run = taskRunner(document, task, supplied);
    },
    run(from: number, to: number): TaskPart {
      if (!run) throw new Error("No task is open.");
      return run(from, to);
    },
    finish(document: NotebookDocument, task: LongTask, parts: TaskPart[]): TaskAnswer {
      return finishTask(document, task, parts, supplied);
    },
  };
}

export type TaskService = ReturnType<typeof createTaskService>;
