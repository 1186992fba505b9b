import type { Db } from "../client";

/** Threads of a notebook that are not resolved. There are no threads yet, so none is open. */
export async function countOpenThreads(_db: Db, _notebookId: string): Promise<number> {
  return 0;
}
