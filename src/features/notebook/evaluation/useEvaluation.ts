import { useCallback, useEffect, useLayoutEffect, useMemo, useRef, useState } from "react";
import type { NotebookDocument } from "../../../../shared/notebook/document";
import type { CellEvaluation } from "../../../../shared/notebook/result";
import type { HeadlineItem } from "../../../../shared/notebook/summary";
import type { LongTask, PartialTask, TaskAnswer } from "../../../../shared/notebook/tasks";
import { createLatestRunner } from "./createLatestRunner";
import type { EvaluationAnswer } from "./evaluationService";
import { workerEvaluator, type Evaluator } from "./evaluator";
import { knownReferences } from "./knownReferences";
import { staleCells } from "./staleCells";
import { usePinnedReferences } from "./usePinnedReferences";

/** From here on an answer that is still being computed hides the old one, ms. */
const lateAfter = 100;

interface Evaluated {
  engine: string;
  /** What was computed, and the text of each of its cells by id. */
  document: NotebookDocument;
  texts: ReadonlyMap<string, string>;
  cells: ReadonlyMap<string, CellEvaluation>;
  headline: HeadlineItem[];
  /** Sweeps and spreads that are still to be computed; see `useLongTasks`. */
  tasks: LongTask[];
  /** Those that were stopped, and answered in part. */
  partial: PartialTask[];
}

export interface LiveEvaluation {
  /** null until the first answer. */
  evaluated: Evaluated | null;
  /** Cells whose numbers must not be shown now: the computation of what is written takes a while. */
  late: ReadonlySet<string>;
  /** Why nothing could be computed. */
  failure: string | null;
  /** Takes the answer of a sweep or spread, and evaluates anew with it. */
  supply: (answer: TaskAnswer) => void;
}

const none: ReadonlySet<string> = new Set();

/** Computes a document in the worker at each change; cells that stay as they are stay the same objects. */
export function useEvaluation(
  notebookKey: string,
  document: NotebookDocument,
  evaluator: () => Evaluator = workerEvaluator,
): LiveEvaluation {
  const [evaluated, setEvaluated] = useState<Evaluated | null>(null);
  const [failure, setFailure] = useState<string | null>(null);
  const runnerRef = useRef<ReturnType<typeof createLatestRunner<NotebookDocument, EvaluationAnswer>> | null>(
    null,
  );

  const hasReferences = usePinnedReferences(document);

  // Both before the page is painted, so that the worker computes while it is.
  useLayoutEffect(
    function runEvaluations() {
      const service = evaluator();
      // A fresh memory in the worker for each mount: it sends every cell once, whatever it sent before.
      const key = `${notebookKey} ${nextMount++}`;
      let last: Evaluated | null = null;
      const runner = createLatestRunner<NotebookDocument, EvaluationAnswer>({
        run: (input) => service.evaluate(key, input, knownReferences(input)) as Promise<EvaluationAnswer>,
        onResult: (answer, input) => {
          last = withAnswer(last, answer, input);
          setEvaluated(last);
          setFailure(null);
        },
        // In the worker: an answer that waited for a busy page was not slow to compute.
        tookOf: ({ took }) => took,
        onFailure: (error) => setFailure(error instanceof Error ? error.message : String(error)),
      });
      runnerRef.current = runner;
      return () => {
        runner.stop();
        runnerRef.current = null;
      };
    },
    [notebookKey, evaluator],
  );

  useLayoutEffect(
    function evaluateText() {
      if (hasReferences) runnerRef.current?.offer(document);
    },
    [document, hasReferences, notebookKey, evaluator],
  );

  const documentRef = useRef(document);
  useEffect(function rememberText() {
    documentRef.current = document;
  });
  const supply = useCallback(
    (answer: TaskAnswer) => {
      // The worker takes messages in order: the answer is there before the evaluation that is to use it.
      void evaluator().supply(answer);
      runnerRef.current?.offer(documentRef.current);
    },
    [evaluator],
  );

  const isLate = useIsLate(document, evaluated?.document ?? null);
  const late = useMemo(
    () => (isLate ? staleCells(document, evaluated?.document ?? null, evaluated?.cells ?? new Map()) : none),
    [isLate, document, evaluated],
  );
  return { evaluated, late, failure, supply };
}

let nextMount = 0;

function withAnswer(last: Evaluated | null, answer: EvaluationAnswer, document: NotebookDocument): Evaluated {
  const cells = new Map<string, CellEvaluation>();
  for (const cell of answer.cells) {
    const evaluation = typeof cell === "string" ? last?.cells.get(cell) : cell;
    if (evaluation) cells.set(evaluation.id, evaluation);
  }
  const texts = new Map(document.cells.map(({ id, text }) => [id, text]));
  const { engine, headline, tasks, partial } = answer;
  return { engine, document, texts, cells, headline, tasks, partial };
}

/** True once what is written has gone without an answer for a while. */
function useIsLate(written: NotebookDocument, evaluated: NotebookDocument | null): boolean {
  const [lateSince, setLateSince] = useState<NotebookDocument | null | undefined>(undefined);
  const isCurrent = written === evaluated;

  useEffect(
    function callItLate() {
      if (isCurrent) return;
      const timer = setTimeout(() => setLateSince(evaluated), lateAfter);
      return () => clearTimeout(timer);
    },
    [isCurrent, evaluated],
  );
  return !isCurrent && lateSince === evaluated && lateSince !== undefined;
}
