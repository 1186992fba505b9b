import { z } from "zod";
import { notebookDocumentSchema } from "../../../../shared/notebook/document";

/** A draft that the server does not have yet, kept in this browser. */
const keptDraft = z.object({
  /** Who wrote it; nobody else is shown it. */
  userId: z.string(),
  /** The state it was written on. */
  revision: z.number().int(),
  base: notebookDocumentSchema,
  document: notebookDocumentSchema,
  /** ms since 1970, of the last change. */
  changedAt: z.number(),
});
export type KeptDraft = z.infer<typeof keptDraft>;

const prefix = (notebookId: string): string => `tenuity:draft:${notebookId}:`;

/** Keeps a draft in this browser, one place a tab. False where the browser has no room or refuses. */
export function keepDraft(notebookId: string, tabId: string, draft: KeptDraft): boolean {
  try {
    localStorage.setItem(prefix(notebookId) + tabId, JSON.stringify(draft));
    return true;
  } catch {
    return false;
  }
}

export function dropDraft(notebookId: string, tabId: string): void {
  try {
    localStorage.removeItem(prefix(notebookId) + tabId);
  } catch {
    // A browser that keeps nothing has nothing to drop.
  }
}

/** Drafts of this notebook that this person left in this browser, by tab, the oldest first. */
export function readKeptDrafts(notebookId: string, userId: string): { tabId: string; draft: KeptDraft }[] {
  const found: { tabId: string; draft: KeptDraft }[] = [];
  try {
    for (let index = 0; index < localStorage.length; index += 1) {
      const key = localStorage.key(index);
      if (key === null || !key.startsWith(prefix(notebookId))) continue;
      const parsed = keptDraft.safeParse(readJson(localStorage.getItem(key)));
      if (parsed.success && parsed.data.userId === userId) {
        found.push({ tabId: key.slice(prefix(notebookId).length), draft: parsed.data });
      }
    }
  } catch {
    return [];
  }
  return found.sort((one, other) => one.draft.changedAt - other.draft.changedAt);
}

function readJson(text: string | null): unknown {
  try {
    return text === null ? null : JSON.parse(text);
  } catch {
    return null;
  }
}
