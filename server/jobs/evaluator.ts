import { once } from "node:events";
import { Worker } from "node:worker_threads";
import type { NotebookDocument } from "../../shared/notebook/document";
import type { SuppliedReference } from "../../shared/notebook/references";
import type { NotebookSummary } from "../../shared/notebook/summary";
import type { KeptResult } from "../../shared/schemas/results";
import { places } from "../places";

/** What the server keeps of an evaluation. */
export interface EvaluationOutcome {
  result: KeptResult;
  summary: NotebookSummary;
  /** What its body cells hand on to notebooks that use it once it is published. */
  bodies: SuppliedReference["bodies"];
}

export type EvaluationAnswer = { ok: true; outcome: EvaluationOutcome } | { ok: false; reason: string };

export interface EvaluationOptions {
  isKept?: boolean;
  /** Published references that the document pins and whoever it is evaluated for may see. */
  references?: readonly SuppliedReference[];
}

export interface Evaluator {
  /**
   * One after the other; documents to be kept do not wait for others, and have their sweeps and spreads computed.
   * Never rejects.
   */
  evaluate(document: NotebookDocument, options?: EvaluationOptions): Promise<EvaluationAnswer>;
  close(): Promise<void>;
}

/** What a worker is asked. */
export interface EvaluationRequest {
  document: NotebookDocument;
  references: readonly SuppliedReference[];
  /** ms for sweeps and spreads; null leaves them out. */
  longWork: number | null;
}

interface Limits {
  /** ms for a document, its sweeps and spreads aside. */
  timeLimit?: number;
  /** ms for the sweeps and spreads of a document that is kept; what is not done by then is marked as partial. */
  longWork?: number;
}

const memoryLimitMb = 512;

/**
 * Evaluates documents in worker threads, one for drafts and one for what is kept, so that no text, however heavy, holds
 * up an answer or takes the server down: what runs over the time or the memory ends with its thread, and the next gets
 * a new one.
 */
export function createEvaluator({ timeLimit = 10_000, longWork = 60_000 }: Limits = {}): Evaluator {
  const drafts = createLane(null, timeLimit);
  const kept = createLane(longWork, timeLimit + longWork);
  return {
    evaluate: (document, { isKept = false, references = [] } = {}) =>
      (isKept ? kept : drafts).evaluate(document, references),
    close: async () => {
      await Promise.all([drafts.close(), kept.close()]);
    },
  };
}

interface WaitingDocument {
  document: NotebookDocument;
  references: readonly SuppliedReference[];
  answer: (answer: EvaluationAnswer) => void;
}

interface Lane {
  evaluate(document: NotebookDocument, references: readonly SuppliedReference[]): Promise<EvaluationAnswer>;
  close(): Promise<void>;
}

/** One thread with its queue. */
function createLane(longWork: number | null, timeLimit: number): Lane {
  const waiting: WaitingDocument[] = [];
  let worker: Worker | null = null;
  let running: Promise<void> | null = null;
  let isClosed = false;

  const run = async ({ document, references, answer }: WaitingDocument): Promise<void> => {
    try {
      worker ??= await startWorker(() => (worker = null));
    } catch (error) {
      return answer({ ok: false, reason: `The evaluation could not begin: ${String(error)}` });
    }
    const reply = await askWorker(worker, { document, references, longWork }, timeLimit);
    if (!reply.isAlive) {
      await worker?.terminate();
      worker = null;
    }
    answer(reply.answer);
  };

  const runAll = async (): Promise<void> => {
    for (let next = waiting.shift(); next; next = waiting.shift()) await run(next);
    running = null;
  };

  return {
    evaluate: (document, references) =>
      new Promise((answer) => {
        if (isClosed) return answer({ ok: false, reason: "The server is stopping. Try again in a minute." });
        waiting.push({ document, references, answer });
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
  request: EvaluationRequest,
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
    worker.postMessage(request);
  });
}
