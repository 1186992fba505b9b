import type { Logger } from "pino";
import { engineVersion } from "../../shared/notebook/engine";
import { storeSummary } from "../commands/storeSummary";
import type { Db } from "../db/client";
import { findDraft, listDraftsToSummarise } from "../db/reads/draftsToSummarise";
import { supplyReferences } from "../references/supplyReferences";
import type { Evaluator } from "./evaluator";

export interface Summaries {
  /** Asks for the summary of a draft; requests made while an earlier one waits become one. */
  request(notebookId: string): void;
  /** Asks for every summary that is missing, older than its draft, or of another engine. */
  catchUp(): Promise<void>;
  /** Resolves when nothing asked for is left. */
  idle(): Promise<void>;
  /** Ends after the one under way; what is left is caught up with at the next start. */
  close(): Promise<void>;
}

/** Computes summaries of saved drafts beside the answers. Acts for the server itself: a summary tells nobody new.
 * What a draft takes from references is what whoever saved it may see. */
export function createSummaries(parts: { db: Db; evaluator: Evaluator; logger: Logger }): Summaries {
  const { db, evaluator, logger } = parts;
  const wanted = new Set<string>();
  let running: Promise<void> | null = null;
  let isClosed = false;

  const summarise = async (notebookId: string): Promise<void> => {
    const draft = await findDraft(db, notebookId);
    if (!draft) return;
    const answer = await evaluator.evaluate(draft.document, {
      references: await supplyReferences(db, draft.document, draft.savedBy),
    });
    if (isClosed && !answer.ok) return;
    if (!answer.ok) logger.warn({ notebookId, reason: answer.reason }, "a draft could not be summarised");
    const summary = answer.ok ? answer.outcome.summary : null;
    await storeSummary(db, { notebookId, revision: draft.revision, engine: engineVersion, summary });
  };

  const runAll = async (): Promise<void> => {
    for (const notebookId of wanted) {
      if (isClosed) break;
      // Taken off first: a save that comes in the meantime asks anew and is not lost.
      wanted.delete(notebookId);
      await summarise(notebookId).catch((error: unknown) =>
        logger.error({ err: error, notebookId }, "a summary was not stored"),
      );
    }
    running = null;
  };

  const request = (notebookId: string): void => {
    if (isClosed) return;
    wanted.add(notebookId);
    running ??= runAll();
  };

  return {
    request,
    catchUp: async () => (await listDraftsToSummarise(db, engineVersion)).forEach(request),
    idle: async () => {
      while (running) await running;
    },
    close: async () => {
      isClosed = true;
      await running;
    },
  };
}
