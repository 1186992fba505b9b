import type { NotebookDocument } from "../../../../shared/notebook/document";
import { evaluateNotebook, type EvaluationMemory } from "../../../../shared/notebook/evaluateNotebook";
import type { CellEvaluation } from "../../../../shared/notebook/result";
import { summariseNotebook } from "../../../../shared/notebook/summariseNotebook";
import type { HeadlineItem } from "../../../../shared/notebook/summary";
import type { LongTask, TaskAnswer } from "../../../../shared/notebook/tasks";

export interface EvaluationAnswer {
  engine: string;
  /** In the order of the document; an id alone for a cell whose answer is as it was last time. */
  cells: (CellEvaluation | string)[];
  headline: HeadlineItem[];
  /** Sweeps and spreads that are still to be computed. */
  tasks: LongTask[];
  /** Time it took, ms. */
  took: number;
}

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

  return {
    evaluate(notebookKey: string, document: NotebookDocument): EvaluationAnswer {
      const begun = performance.now();
      if (notebookKey !== rememberedKey) {
        memory = undefined;
        sent = new Map();
        rememberedKey = notebookKey;
      }
      const answer = evaluateNotebook(document, memory, answers);
      memory = answer.memory;
      const { evaluation, tasks } = answer;

      const before = sent;
      sent = new Map(evaluation.cells.map((cell) => [cell.id, cell]));
      const cells = evaluation.cells.map((cell) => (before.get(cell.id) === cell ? cell.id : cell));
      const { headline } = summariseNotebook(document, evaluation);
      return { engine: evaluation.engine, cells, headline, tasks, took: performance.now() - begun };
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
    headlineOf(document: NotebookDocument): HeadlineItem[] {
      return summariseNotebook(document, evaluateNotebook(document).evaluation).headline;
    },
  };
}

export type EvaluationService = ReturnType<typeof createEvaluationService>;
