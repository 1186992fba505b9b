/** Entry of the worker thread: says that it is ready; then a document in, what the server keeps of its evaluation out. */
import { parentPort } from "node:worker_threads";
import type { EvaluationAnswer, EvaluationRequest } from "./evaluator";
import { evaluateDocument } from "./evaluateDocument";

parentPort?.on("message", ({ document, references, longWork }: EvaluationRequest) => {
  const supplied = new Map(references.map((reference) => [reference.pin, reference]));
  const answer: EvaluationAnswer = { ok: true, outcome: evaluateDocument(document, longWork, supplied) };
  parentPort?.postMessage(answer);
});

parentPort?.postMessage("ready");
