import { once } from "node:events";
import { Worker } from "node:worker_threads";
import type { NotebookDocument } from "../../shared/notebook/document";
import type { NotebookSummary } from "../../shared/notebook/summary";
import type { KeptResult } from "../../shared/schemas/results";
import { places } from "../places";

/** What the server keeps of an evaluation. */
export interface EvaluationOutcome {
  result: KeptResult;
  summary: NotebookSummary;
}

export type EvaluationAnswer = { ok: true; outcome: EvaluationOutcome } | { ok: false; reason: string };

export interface Evaluator {
  /** One after the other; an urgent one goes before those that wait. Never rejects. */
  evaluate(document: NotebookDocument, options?: { isUrgent: boolean }): Promise<EvaluationAnswer>;
  close(): Promise<void>;
}

interface Task {
  document: NotebookDocument;
  answer: (answer: EvaluationAnswer) => void;
}

const memoryLimitMb = 512;

/**
 * Evaluates documents in a worker thread, so that no text, however heavy, holds up an answer or takes the server
 * down: what runs over the time or the memory ends with its thread, and the next gets a new one.
 */
export function createEvaluator({ timeLimit = 10_000 }: { timeLimit?: number } = {}): Evaluator {
  const waiting: Task[] = [];
  let worker: Worker | null = null;
  let running: Promise<void> | null = null;
  let isClosed = false;

  const run = async ({ document, answer }: Task): Promise<void> => {
    try {
      worker ??= await startWorker(() => (worker = null));
    } catch (error) {
      return answer({ ok: false, reason: `The evaluation could not begin: ${String(error)}` });
    }
    const reply = await askWorker(worker, document, timeLimit);
    if (!reply.isAlive) {
      await worker?.terminate();
      worker = null;
    }
    answer(reply.answer);
  };

  const runAll = async (): Promise<void> => {
    for (let task = waiting.shift(); task; task = waiting.shift()) await run(task);
    running = null;
  };

  return {
    evaluate: (document, { isUrgent } = { isUrgent: false }) =>
      new Promise((answer) => {
        if (isClosed) return answer({ ok: false, reason: "The server is stopping. Try again in a minute." });
        if (isUrgent) waiting.unshift({ document, answer });
        else waiting.push({ document, answer });
        running ??= runAll();
      }),

    close: async () => {
      isClosed = true;
      for (const { answer } of waiting.splice(0)) answer({ ok: false, reason: "The server is stopping." });
      await running;
      await worker?.terminate();
      worker = null;
    },
  };
}

/** A worker that has loaded what it needs, so that the time limit is the document's alone. */
async function startWorker(onExit: () => void): Promise<Worker> {
  const worker = new Worker(places.evaluationWorker, {
    resourceLimits: { maxOldGenerationSizeMb: memoryLimitMb },
  });
  await once(worker, "message");
  // Whoever asked is told by `askWorker`; a thread that breaks while nobody asks must not take the server down.
  worker.on("error", () => undefined).once("exit", onExit);
  worker.unref();
  return worker;
}

/** One question to a worker, with a limit in ms; says also whether the worker can be asked again. */
function askWorker(
  worker: Worker,
  document: NotebookDocument,
  timeLimit: number,
): Promise<{ answer: EvaluationAnswer; isAlive: boolean }> {
  return new Promise((resolve) => {
    const end = (answer: EvaluationAnswer, isAlive: boolean): void => {
      clearTimeout(timer);
      worker.off("message", onMessage).off("error", onError).off("exit", onExit);
      resolve({ answer, isAlive });
    };
    const onMessage = (answer: EvaluationAnswer): void => end(answer, true);
    const onError = (error: Error): void => {
      const isMemory = "code" in error && error.code === "ERR_WORKER_OUT_OF_MEMORY";
      const reason = isMemory
        ? `It needs more than ${memoryLimitMb} MB of memory. Make its cells smaller.`
        : `The evaluation broke off: ${error.message}`;
      end({ ok: false, reason }, false);
    };
    const onExit = (): void => end({ ok: false, reason: "The evaluation broke off." }, false);
    const timer = setTimeout(
      () => end({ ok: false, reason: `It takes over ${timeLimit / 1000} s. Make its cells smaller.` }, false),
      timeLimit,
    );
    worker.on("message", onMessage).on("error", onError).on("exit", onExit);
    worker.postMessage(document);
  });
}
