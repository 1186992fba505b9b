import { useEffect, useRef, useState } from "react";
import { createTaskQueue, type TaskState } from "./createTaskQueue";
import { workerTaskPool, type TaskPool } from "./taskPool";
import type { LiveEvaluation } from "./useEvaluation";

/** Sweeps and spreads that are not answered in full, by the id of their cell. */
export type TaskStates = ReadonlyMap<string, TaskState>;

const none: TaskStates = new Map();

/**
 * Computes the sweeps and spreads that an evaluation asks for, in workers beside it, and hands their answers back to it.
 * What was stopped comes back as a partial answer, which its cell says in a note (`partial`).
 */
export function useLongTasks(
  notebookKey: string,
  { evaluated, supply }: LiveEvaluation,
  pool: () => TaskPool = workerTaskPool,
): TaskStates {
  const [states, setStates] = useState<TaskStates>(none);
  const queueRef = useRef<ReturnType<typeof createTaskQueue> | null>(null);

  useEffect(
    function openQueue() {
      const queue = createTaskQueue({ pool: pool(), onChange: setStates, onAnswer: supply });
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
      if (evaluated) queueRef.current?.ask(evaluated.document, evaluated);
    },
    [evaluated, notebookKey, supply, pool],
  );

  return states;
}
