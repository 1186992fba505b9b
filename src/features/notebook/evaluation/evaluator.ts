import { wrap, type Remote } from "comlink";
import type { EvaluationService } from "./evaluationService";

/** The service as the page sees it: every call answers later. */
export type Evaluator = Pick<Remote<EvaluationService>, "evaluate" | "headlineOf" | "supply">;

let running: Evaluator | null = null;

/** The one worker of this page, started when first asked for. */
export function workerEvaluator(): Evaluator {
  running ??= wrap<EvaluationService>(
    new Worker(new URL("./evaluation.worker.ts", import.meta.url), { type: "module", name: "evaluation" }),
  );
  return running;
}
