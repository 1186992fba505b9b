import type { Actor } from "./actor";
import { notebookPolicy, type NotebookFacts } from "./notebookPolicy";

/** Any thread, by who may resolve any; else those that one has begun. */
export function mayResolve(
  actor: Actor | null,
  notebook: NotebookFacts,
  thread: { begunBy: string },
): boolean {
  if (notebookPolicy.resolveAnyThread(actor, notebook)) return true;
  return actor?.id === thread.begunBy && notebookPolicy.resolveOwnThread(actor, notebook);
}
