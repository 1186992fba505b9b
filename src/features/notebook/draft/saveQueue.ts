import type { NotebookDocument } from "../../../../shared/notebook/document";
import type { DraftState } from "../../../../shared/schemas/notebooks";
import { isSameDocument } from "./mergeDocuments";

/** What came of one attempt to save. */
export type SaveOutcome =
  | { ok: true; revision: number; savedAt: string }
  | { ok: false; reason: "stale"; current: DraftState }
  | { ok: false; reason: "offline" | "server" | "signedOut" }
  | { ok: false; reason: "refused"; message: string };

/** Where the draft stands between this page and the server. */
export type SaveState =
  | { kind: "saved" }
  | { kind: "saving" }
  | { kind: "kept"; reason: "offline" | "server" | "signedOut"; since: number }
  | { kind: "refused"; message: string; since: number }
  | { kind: "stale" };

interface SaveQueueOptions {
  /** Revision that the text at hand was written on. */
  revision: number;
  /** Sends one state; answers with an outcome and never rejects. */
  send: (body: { revision: number; document: NotebookDocument }) => Promise<SaveOutcome>;
  onState: (state: SaveState) => void;
  onSaved: (saved: { document: NotebookDocument; revision: number; savedAt: string }) => void;
  onStale: (current: DraftState) => void;
  /** Rest after the last change before it is sent, ms. */
  rest?: number;
}

/** Waits between attempts while the server can't be reached, ms; the last one repeats. */
const retryWaits = [2_000, 5_000, 15_000, 30_000];

/**
 * Sends drafts one at a time: the newest text wins, nothing is sent twice, and whatever fails is tried again until it
 * is saved, refused or overtaken by someone else's revision.
 */
export function createSaveQueue({
  send,
  onState,
  onSaved,
  onStale,
  rest = 600,
  ...options
}: SaveQueueOptions) {
  let revision = options.revision;
  let waiting: NotebookDocument | null = null;
  let timer: ReturnType<typeof setTimeout> | null = null;
  let sending: Promise<void> | null = null;
  /** Sent without an answer: the server may have taken it all the same. */
  let inDoubt: NotebookDocument | null = null;
  let failures = 0;
  let since: number | null = null;
  let state: SaveState = { kind: "saved" };
  let isStopped = false;
  let hasOffered = false;

  function show(next: SaveState): void {
    state = next;
    if (!isStopped) onState(next);
  }

  function wait(milliseconds: number): void {
    if (timer !== null) clearTimeout(timer);
    timer = isStopped ? null : setTimeout(() => void sendNow(), milliseconds);
  }

  function settleSaved(document: NotebookDocument, saved: { revision: number; savedAt: string }): void {
    failures = 0;
    since = null;
    inDoubt = null;
    revision = saved.revision;
    onSaved({ document, revision, savedAt: saved.savedAt });
    if (waiting === null) {
      show({ kind: "saved" });
    } else {
      show({ kind: "saving" });
      if (timer === null) wait(0);
    }
  }

  function settle(document: NotebookDocument, outcome: SaveOutcome): void {
    if (outcome.ok) {
      settleSaved(document, outcome);
      return;
    }
    waiting ??= document;
    if (outcome.reason === "stale" && inDoubt && isSameDocument(outcome.current.document, inDoubt)) {
      // Nobody else wrote: the server took the last attempt, only its answer was lost.
      if (isSameDocument(waiting, inDoubt)) waiting = null;
      settleSaved(inDoubt, outcome.current);
      return;
    }
    since ??= Date.now();
    if (outcome.reason === "stale") {
      show({ kind: "stale" });
      onStale(outcome.current);
    } else if (outcome.reason === "refused") {
      show({ kind: "refused", message: outcome.message, since });
    } else {
      inDoubt = outcome.reason === "signedOut" ? inDoubt : document;
      show({ kind: "kept", reason: outcome.reason, since });
      // Only the person can sign in again; until then asking would be in vain.
      if (outcome.reason !== "signedOut") wait(retryWaits[Math.min(failures, retryWaits.length - 1)]);
      failures += 1;
    }
  }

  async function sendNow(): Promise<void> {
    if (timer !== null) clearTimeout(timer);
    timer = null;
    if (sending) await sending;
    if (waiting === null || isStopped || state.kind === "stale") return;
    const document = waiting;
    waiting = null;
    if (state.kind !== "kept") show({ kind: "saving" });
    sending = send({ revision, document }).then((outcome) => {
      sending = null;
      if (!isStopped) settle(document, outcome);
    });
    await sending;
  }

  return {
    /** Puts the newest text in line. */
    offer(document: NotebookDocument): void {
      waiting = document;
      hasOffered = true;
      if (state.kind === "stale") return;
      if (state.kind === "refused") show({ kind: "saving" });
      if (state.kind === "kept") {
        if (timer === null && state.reason !== "signedOut") wait(rest);
        return;
      }
      show({ kind: "saving" });
      wait(rest);
    },
    /** The text is again as the server has it. */
    withdraw(): void {
      waiting = null;
      if (timer !== null) clearTimeout(timer);
      timer = null;
      if (sending === null && state.kind !== "stale") {
        since = null;
        show({ kind: "saved" });
      }
    },
    isSending: (): boolean => sending !== null,
    /** Sends what waits at once; resolves when it has been answered. */
    flush: sendNow,
    /** Nothing more will come: sends what waits, then is silent. True if all that was offered has been saved. */
    async close(): Promise<boolean> {
      await sendNow();
      const isDone = hasOffered && state.kind === "saved" && waiting === null;
      this.stop();
      return isDone;
    },
    /** Tries again now: the network is back, or the person signed in. */
    retry(): void {
      if (state.kind === "kept" && waiting !== null) void sendNow();
    },
    /** The text at hand now rests on another revision; `document` is what remains to be saved of it. */
    rebase(next: number, document: NotebookDocument | null): void {
      revision = next;
      waiting = document;
      failures = 0;
      since = null;
      if (timer !== null) clearTimeout(timer);
      timer = null;
      if (document === null) {
        show({ kind: "saved" });
      } else {
        show({ kind: "saving" });
        wait(0);
      }
    },
    revision: (): number => revision,
    isSaved: (): boolean => state.kind === "saved",
    stop(): void {
      isStopped = true;
      if (timer !== null) clearTimeout(timer);
      timer = null;
    },
  };
}

export type SaveQueue = ReturnType<typeof createSaveQueue>;
