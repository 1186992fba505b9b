import type { NotebookDocument } from "../../../../shared/notebook/document";
import { evaluateNotebook, type EvaluationMemory } from "../../../../shared/notebook/evaluateNotebook";
import type { SuppliedReference, SuppliedReferences } from "../../../../shared/notebook/references";
import type { CellEvaluation } from "../../../../shared/notebook/result";
import { summariseNotebook } from "../../../../shared/notebook/summariseNotebook";
import type { HeadlineItem } from "../../../../shared/notebook/summary";
import type { LongTask, PartialTask, TaskAnswer } from "../../../../shared/notebook/tasks";

export interface EvaluationAnswer {
  engine: string;
  /** In the order of the document; an id alone for a cell whose answer is as it was last time. */
  cells: (CellEvaluation | string)[];
  headline: HeadlineItem[];
  /** Sweeps and spreads that are still to be computed. */
  tasks: LongTask[];
  /** Those that are answered in part. */
  partial: PartialTask[];
  /** Time it took, ms. */
  took: number;
}

/** Evaluations by which the engine learns the code before someone waits for it, and the time they may take, ms. */
const warmUps = { runs: 12, time: 1200 };

/** Answers of sweeps and spreads that are kept, so that going back to an earlier text finds them. */
const keptAnswers = 12;

/**
 * Evaluates notebooks and remembers the last one, so that only what a change touches is computed and sent again.
 * Runs in a worker; `notebookKey` says whether the memory still belongs to what is asked.
 */
export function createEvaluationService() {
  let rememberedKey: string | null = null;
  let memory: EvaluationMemory | undefined;
  let sent = new Map<string, CellEvaluation>();
  const answers = new Map<string, TaskAnswer>();
  let warm: { runs: number; time: number } | null = null;

  /** One evaluation from nothing in a task of its own, so that what is asked meanwhile waits for one at most. */
  function warmUp(document: NotebookDocument): void {
    if (!warm || warm.runs >= warmUps.runs || warm.time >= warmUps.time) return;
    const begun = performance.now();
    evaluateNotebook(document);
    warm = { runs: warm.runs + 1, time: warm.time + performance.now() - begun };
    setTimeout(() => warmUp(document), 0);
  }

  return {
    evaluate(
      notebookKey: string,
      document: NotebookDocument,
      references: readonly SuppliedReference[] = [],
    ): EvaluationAnswer {
      const begun = performance.now();
      if (notebookKey !== rememberedKey) {
        memory = undefined;
        sent = new Map();
        rememberedKey = notebookKey;
      }
      const supplied = byPin(references);
      const answer = evaluateNotebook(document, memory, answers, supplied);
      memory = answer.memory;
      const { evaluation, tasks, partial } = answer;

      const before = sent;
      sent = new Map(evaluation.cells.map((cell) => [cell.id, cell]));
      const cells = evaluation.cells.map((cell) => (before.get(cell.id) === cell ? cell.id : cell));
      const { headline } = summariseNotebook(document, evaluation);
      const took = performance.now() - begun;
      if (!warm) {
        warm = { runs: 0, time: took };
        setTimeout(() => warmUp(document), 0);
      }
      return { engine: evaluation.engine, cells, headline, tasks, partial, took };
    },

    /** Takes the answer of a sweep or spread; the next evaluation has it. */
    supply(answer: TaskAnswer): void {
      answers.delete(answer.key);
      answers.set(answer.key, answer);
      for (const key of answers.keys()) {
        if (answers.size <= keptAnswers) break;
        answers.delete(key);
      }
    },

    /** The headline of a state that is only being considered. */
    headlineOf(document: NotebookDocument, references: readonly SuppliedReference[] = []): HeadlineItem[] {
      const { evaluation } = evaluateNotebook(document, undefined, undefined, byPin(references));
      return summariseNotebook(document, evaluation).headline;
    },
  };
}

function byPin(references: readonly SuppliedReference[]): SuppliedReferences {
  return new Map(references.map((reference) => [reference.pin, reference]));
}

export type EvaluationService = ReturnType<typeof createEvaluationService>;
