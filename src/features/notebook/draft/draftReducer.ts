import type { NotebookDocument } from "../../../../shared/notebook/document";
import { editDocument, type DocumentEdit } from "../../../../shared/notebook/editDocument";
import type { DraftState as ServerDraft } from "../../../../shared/schemas/notebooks";
import { isSameDocument, mergeDocuments, type SettledChange, type Side } from "./mergeDocuments";

/** A step that can be taken back, in words for the message that offers it. */
interface Step {
  inverse: DocumentEdit;
  words: string;
}

/** The notebook as it is being written here, and the last state that the server is known to have. */
export interface Draft {
  document: NotebookDocument;
  agreed: ServerDraft;
  /** Steps to take back, the newest last. Writing inside a cell is the editor's own to undo. */
  done: Step[];
  undone: Step[];
  /** A state saved by someone else on top of `agreed`, whose differences from ours need a choice. */
  theirs: ServerDraft | null;
  choices: Record<string, Side>;
  /** What went together by itself at the last meeting of two states, and who wrote the other one. */
  joined: { by: string; changes: SettledChange[] } | null;
}

export type DraftAction =
  | { type: "edit"; edit: DocumentEdit; words?: string }
  | { type: "undo" }
  | { type: "redo" }
  /** The server has taken this text. */
  | {
      type: "saved";
      document: NotebookDocument;
      revision: number;
      savedAt: string;
      savedBy: ServerDraft["savedBy"];
    }
  /** The server holds a newer state than the one agreed on. */
  | { type: "arrived"; theirs: ServerDraft }
  /** Text kept in this browser, written on `base`, is taken up again. */
  | { type: "resume"; base: NotebookDocument; document: NotebookDocument }
  | { type: "choose"; conflictId: string; side: Side }
  | { type: "chooseAll"; side: Side }
  /** What is chosen stands, and rests on their state. */
  | { type: "settle" }
  | { type: "dismissJoined" };

export function beginDraft(server: ServerDraft): Draft {
  return {
    document: server.document,
    agreed: server,
    done: [],
    undone: [],
    theirs: null,
    choices: {},
    joined: null,
  };
}

export const isUnsaved = (draft: Draft): boolean => !isSameDocument(draft.document, draft.agreed.document);

/** The open choices, what they give, and what needed none; null where nothing is to be settled. */
export function openMerge(draft: Draft) {
  if (!draft.theirs) return null;
  return mergeDocuments(
    { base: draft.agreed.document, mine: draft.document, theirs: draft.theirs.document },
    draft.choices,
  );
}

/** Every change of a draft. Pure: ids and times come with the action. */
export function draftReducer(draft: Draft, action: DraftAction): Draft {
  switch (action.type) {
    case "edit":
      return applyEdit(draft, action.edit, action.words);
    case "undo":
      return step(draft, "done", "undone");
    case "redo":
      return step(draft, "undone", "done");
    case "saved": {
      const { document, revision, savedAt, savedBy } = action;
      if (revision <= draft.agreed.revision) return draft;
      return { ...draft, agreed: { document, revision, savedAt, savedBy } };
    }
    case "arrived":
      return meet(draft, action.theirs);
    case "resume":
      return resume(draft, action.base, action.document);
    case "choose":
      return { ...draft, choices: { ...draft.choices, [action.conflictId]: action.side } };
    case "chooseAll": {
      const conflicts = openMerge(draft)?.conflicts ?? [];
      return { ...draft, choices: Object.fromEntries(conflicts.map(({ id }) => [id, action.side])) };
    }
    case "settle": {
      const merge = openMerge(draft);
      if (!merge || !draft.theirs) return draft;
      return { ...draft, document: merge.document, agreed: draft.theirs, theirs: null, choices: {} };
    }
    case "dismissJoined":
      return { ...draft, joined: null };
  }
}

function applyEdit(draft: Draft, edit: DocumentEdit, words: string | undefined): Draft {
  const { document, inverse } = editDocument(draft.document, edit);
  const isWriting = edit.type === "changeText";
  return {
    ...draft,
    document,
    done: isWriting ? draft.done : [...draft.done, { inverse, words: words ?? "" }].slice(-200),
    undone: isWriting ? draft.undone : [],
  };
}

function step(draft: Draft, from: "done" | "undone", to: "done" | "undone"): Draft {
  const last = draft[from].at(-1);
  if (!last) return draft;
  const rest = draft[from].slice(0, -1);
  try {
    const { document, inverse } = editDocument(draft.document, last.inverse);
    return { ...draft, document, [from]: rest, [to]: [...draft[to], { inverse, words: last.words }] };
  } catch (error) {
    // Someone else's saved change took the cell away that this step speaks of: there is nothing left to undo.
    if (error instanceof RangeError) return { ...draft, [from]: rest };
    throw error;
  }
}

function meet(draft: Draft, theirs: ServerDraft): Draft {
  if (theirs.revision <= (draft.theirs?.revision ?? draft.agreed.revision)) return draft;
  const merge = mergeDocuments({
    base: draft.agreed.document,
    mine: draft.document,
    theirs: theirs.document,
  });
  if (merge.conflicts.length > 0) return { ...draft, theirs, choices: keepChoices(draft, merge.conflicts) };
  const foreign = merge.settled.filter(({ side }) => side === "theirs");
  return {
    ...draft,
    document: merge.document,
    agreed: theirs,
    theirs: null,
    choices: {},
    joined: foreign.length > 0 ? { by: theirs.savedBy.name, changes: foreign } : draft.joined,
  };
}

function keepChoices(draft: Draft, conflicts: { id: string }[]): Record<string, Side> {
  const open = new Set(conflicts.map(({ id }) => id));
  return Object.fromEntries(Object.entries(draft.choices).filter(([id]) => open.has(id)));
}

/** Kept text is what was written on `base`; the server's present state is met as if it had been saved since. */
function resume(draft: Draft, base: NotebookDocument, document: NotebookDocument): Draft {
  const now = draft.agreed;
  const before: Draft = {
    ...draft,
    document,
    agreed: { ...now, document: base, revision: now.revision - 1 },
  };
  return meet(before, now);
}
