import { useEffect, useRef, useState } from "react";
import { createTaskQueue, type TaskState } from "./createTaskQueue";
import { workerTaskPool, type TaskPool } from "./taskPool";
import type { LiveEvaluation } from "./useEvaluation";

export interface LongTasks {
  /** Sweeps and spreads that wait or are under way, by the id of their cell. */
  states: ReadonlyMap<string, TaskState>;
  /** Why one could not be computed. */
  failure: string | null;
}

const none: ReadonlyMap<string, TaskState> = new Map();

/**
 * Computes the sweeps and spreads that an evaluation asks for, in workers beside it, and hands their answers back to it.
 * What was stopped comes back as a partial answer, which its cell says in a note (`partial`).
 */
export function useLongTasks(
  notebookKey: string,
  { evaluated, supply }: LiveEvaluation,
  pool: () => TaskPool = workerTaskPool,
): LongTasks {
  const [states, setStates] = useState<ReadonlyMap<string, TaskState>>(none);
  const [failure, setFailure] = useState<string | null>(null);
  const queueRef = useRef<ReturnType<typeof createTaskQueue> | null>(null);

  useEffect(
    function openQueue() {
      const queue = createTaskQueue({
        pool: pool(),
        onChange: setStates,
        onAnswer: (answer) => {
          setFailure(null);
          supply(answer);
        },
        onFailure: (error) => setFailure(error instanceof Error ? error.message : String(error)),
      });
      queueRef.current = queue;
      return () => {
        queue.close();
        queueRef.current = null;
        setStates(none);
      };
    },
    [notebookKey, supply, pool],
  );

  useEffect(
    function askForTasks() {
      if (evaluated) queueRef.current?.ask(evaluated.document, evaluated.tasks);
    },
    [evaluated, notebookKey, supply, pool],
  );

  return { states, failure };
}
