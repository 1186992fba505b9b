import { useQueryClient } from "@tanstack/react-query";
import { useCallback, useEffect, useMemo, useReducer, useRef, useState } from "react";
import type { DocumentEdit } from "../../../../shared/notebook/editDocument";
import type { NotebookResponse } from "../../../../shared/schemas/notebooks";
import type { Person } from "../../../../shared/schemas/people";
import { notebookQuery, saveDraft } from "../notebookQueries";
import { beginDraft, draftReducer, isUnsaved, openMerge, type Draft } from "./draftReducer";
import { dropDraft, keepDraft, readKeptDrafts, type KeptDraft } from "./keptDrafts";
import type { Side } from "./mergeDocuments";
import { createSaveQueue, type SaveQueue, type SaveState } from "./saveQueue";
import { claimTab, livingTabs } from "./tabIdentity";

interface NotebookDraftOptions {
  /** As last heard from the server. */
  notebook: NotebookResponse;
  person: Person;
  canEdit: boolean;
}

/** Wait after a change before it is copied into this browser's store, ms. */
const keepRest = 200;

/**
 * The draft of one notebook and everything that keeps it: saving, keeping it in this browser while it can't be saved,
 * and meeting what others save. One per page; mount it with the notebook's id as key.
 */
export function useNotebookDraft({ notebook, person, canEdit }: NotebookDraftOptions) {
  const [draft, dispatch] = useReducer(draftReducer, notebook, beginDraft);
  const [saveState, setSaveState] = useState<SaveState>({ kind: "saved" });
  const queueRef = useRef<SaveQueue | null>(null);
  const draftRef = useRef(draft);
  const queryClient = useQueryClient();
  const notebookId = notebook.id;

  useEffect(function rememberDraft() {
    draftRef.current = draft;
  });

  useEffect(
    function runSaveQueue() {
      if (!canEdit) return;
      const queue = createSaveQueue({
        revision: draftRef.current.agreed.revision,
        send: (body) => saveDraft(notebookId, body),
        onState: setSaveState,
        onSaved: (saved) => {
          dispatch({ type: "saved", ...saved, savedBy: person });
          queryClient.setQueryData(notebookQuery(notebookId).queryKey, (known) =>
            known ? { ...known, ...saved, title: saved.document.title, savedBy: person } : known,
          );
        },
        onStale: (theirs) => dispatch({ type: "arrived", theirs }),
      });
      queueRef.current = queue;
      return () => {
        queueRef.current = null;
        void closeQueue(queue, notebookId);
      };
    },
    [canEdit, notebookId, person, queryClient],
  );

  useEffect(
    function saveChanges() {
      const queue = queueRef.current;
      if (!queue) return;
      if (draft.agreed.revision !== queue.revision()) {
        queue.rebase(draft.agreed.revision, isUnsaved(draft) ? draft.document : null);
      } else if (draft.theirs === null) {
        if (isUnsaved(draft)) queue.offer(draft.document);
        else queue.withdraw();
      }
    },
    [draft],
  );

  useEffect(
    function meetOthersChanges() {
      // While a save is under way its own revision may come back this way before its answer does.
      if (queueRef.current?.isSending()) return;
      dispatch({ type: "arrived", theirs: notebook });
    },
    [notebook],
  );

  const isKept = useKeptCopy({ draft, notebookId, personId: person.id, canEdit, dispatch });
  useLeaveGuard(isUnsaved(draft));
  useRetries(queueRef);

  const edit = useCallback(
    (change: DocumentEdit, words?: string) => dispatch({ type: "edit", edit: change, words }),
    [],
  );
  const undo = useCallback(() => dispatch({ type: "undo" }), []);
  const redo = useCallback(() => dispatch({ type: "redo" }), []);
  /** Saves what waits; answers with the revision that the server then has of it, or null where it could not. */
  const flush = useCallback(async (): Promise<number | null> => {
    const queue = queueRef.current;
    await queue?.flush();
    return queue?.isSaved() ? queue.revision() : null;
  }, []);
  const merge = useMemo(() => openMerge(draft), [draft]);
  const settling = useMemo(
    () => ({
      choose: (conflictId: string, side: Side) => dispatch({ type: "choose", conflictId, side }),
      chooseAll: (side: Side) => dispatch({ type: "chooseAll", side }),
      settle: () => dispatch({ type: "settle" }),
      dismissJoined: () => dispatch({ type: "dismissJoined" }),
    }),
    [],
  );

  return { draft, merge, saveState, isKept, edit, undo, redo, flush, settling };
}

/** Left for another page: the last text is still sent, and its copy here put away once the server has it. */
async function closeQueue(queue: SaveQueue, notebookId: string): Promise<void> {
  if (await queue.close()) dropDraft(notebookId, await claimTab());
}

interface KeptCopyOptions {
  draft: Draft;
  notebookId: string;
  personId: string;
  canEdit: boolean;
  dispatch: React.Dispatch<Parameters<typeof draftReducer>[1]>;
}

/** Copies unsaved text into this browser's store, and takes up what an earlier visit left there. False: no room. */
function useKeptCopy({ draft, notebookId, personId, canEdit, dispatch }: KeptCopyOptions): boolean {
  const [isKept, setKept] = useState(true);
  const [tabId, setTabId] = useState<string | null>(null);

  useEffect(
    function takeUpKeptDrafts() {
      if (!canEdit) return;
      let isGone = false;
      void claimTab().then(async (claimed) => {
        const living = await livingTabs();
        if (isGone) return;
        for (const { tabId: owner, draft: kept } of readKeptDrafts(notebookId, personId)) {
          if (owner !== claimed && living?.has(owner)) continue;
          dispatch({ type: "resume", base: kept.base, document: kept.document });
          if (owner !== claimed) dropDraft(notebookId, owner);
        }
        setTabId(claimed);
      });
      return () => {
        isGone = true;
      };
    },
    [canEdit, notebookId, personId, dispatch],
  );

  useEffect(
    function keepUnsavedText() {
      if (tabId === null || !canEdit) return;
      if (!isUnsaved(draft)) {
        dropDraft(notebookId, tabId);
        setKept(true);
        return;
      }
      const keep = () => keepDraft(notebookId, tabId, copyOf(draft, personId));
      const timer = setTimeout(() => setKept(keep()), keepRest);
      window.addEventListener("pagehide", keep);
      return () => {
        clearTimeout(timer);
        window.removeEventListener("pagehide", keep);
      };
    },
    [draft, tabId, canEdit, notebookId, personId],
  );

  const latest = useRef({ draft, tabId });
  useEffect(function rememberLatest() {
    latest.current = { draft, tabId };
  });
  useEffect(
    function keepOnLeaving() {
      return () => {
        const last = latest.current;
        if (last.tabId === null || !canEdit || !isUnsaved(last.draft)) return;
        keepDraft(notebookId, last.tabId, copyOf(last.draft, personId));
      };
    },
    [canEdit, notebookId, personId],
  );

  return isKept;
}

function copyOf({ agreed, document }: Draft, userId: string): KeptDraft {
  return { userId, revision: agreed.revision, base: agreed.document, document, changedAt: Date.now() };
}

/** Asks before the page is left while the server lacks something. */
function useLeaveGuard(hasUnsaved: boolean): void {
  useEffect(
    function askBeforeLeaving() {
      if (!hasUnsaved) return;
      const ask = (event: BeforeUnloadEvent) => event.preventDefault();
      window.addEventListener("beforeunload", ask);
      return () => window.removeEventListener("beforeunload", ask);
    },
    [hasUnsaved],
  );
}

/** Tries again when the network is back, or when the person comes back to the page, perhaps signed in again. */
function useRetries(queueRef: React.RefObject<SaveQueue | null>): void {
  useEffect(
    function listenForChances() {
      const retry = () => queueRef.current?.retry();
      const whenSeen = () => document.visibilityState === "visible" && retry();
      window.addEventListener("online", retry);
      window.addEventListener("focus", retry);
      document.addEventListener("visibilitychange", whenSeen);
      return () => {
        window.removeEventListener("online", retry);
        window.removeEventListener("focus", retry);
        document.removeEventListener("visibilitychange", whenSeen);
      };
    },
    [queueRef],
  );
}
