/** Entry of a thread that computes parts of a task: a document and its task first, then ranges in, parts out. */
import { parentPort, workerData } from "node:worker_threads";
import type { NotebookDocument } from "../../shared/notebook/document";
import { taskRunner } from "../../shared/notebook/runTask";
import type { SuppliedReferences } from "../../shared/notebook/references";
import type { LongTask } from "../../shared/notebook/tasks";

const { document, task, references } = workerData as {
  document: NotebookDocument;
  task: LongTask;
  references: SuppliedReferences;
};
const run = taskRunner(document, task, references);

parentPort?.on("message", ({ from, to }: { from: number; to: number }) => {
  parentPort?.postMessage(run(from, to));
});
