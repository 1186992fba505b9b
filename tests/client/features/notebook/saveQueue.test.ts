import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import {
  createSaveQueue,
  type SaveOutcome,
  type SaveState,
} from "../../../../src/features/notebook/draft/saveQueue";
import { aNotebook, aServerDraft, withTexts, wiremu } from "./aNotebook";

const first = withTexts(aNotebook(), { text: "One." });
const second = withTexts(aNotebook(), { text: "Two." });
const third = withTexts(aNotebook(), { text: "Three." });

/** A queue whose server answers when the test says so. */
function aQueue() {
  const asked: { revision: number; document: unknown; answer: (outcome: SaveOutcome) => void }[] = [];
  const states: SaveState[] = [];
  const saved: number[] = [];
  const stale: number[] = [];
  const queue = createSaveQueue({
    revision: 7,
    send: (body) => new Promise((answer) => asked.push({ ...body, answer })),
    onState: (state) => states.push(state),
    onSaved: ({ revision }) => saved.push(revision),
    onStale: (current) => stale.push(current.revision),
  });
  const answer = async (outcome: SaveOutcome) => {
    asked.at(-1)!.answer(outcome);
    await vi.advanceTimersByTimeAsync(0);
  };
  return { queue, asked, states, saved, stale, answer };
}

const took = (revision: number): SaveOutcome => ({ ok: true, revision, savedAt: "2031-04-02T10:42:00.000Z" });

beforeEach(() => {
  vi.useFakeTimers();
  vi.setSystemTime(new Date("2031-04-02T10:42:00.000Z"));
});
afterEach(() => vi.useRealTimers());

describe("createSaveQueue", () => {
  it("sends only the newest text, once writing has rested", async () => {
    const { queue, asked } = aQueue();
    queue.offer(first);
    await vi.advanceTimersByTimeAsync(500);
    queue.offer(second);
    await vi.advanceTimersByTimeAsync(599);
    expect(asked).toHaveLength(0);
    await vi.advanceTimersByTimeAsync(1);
    expect(asked).toMatchObject([{ revision: 7, document: second }]);
  });

  it("sends one at a time, each on the revision that the last one made", async () => {
    const { queue, asked, answer, saved, states } = aQueue();
    queue.offer(first);
    await vi.advanceTimersByTimeAsync(600);
    queue.offer(second);
    await vi.advanceTimersByTimeAsync(5_000);
    expect(asked).toHaveLength(1);
    await answer(took(8));
    expect(asked).toHaveLength(2);
    expect(asked[1]).toMatchObject({ revision: 8, document: second });
    await answer(took(9));
    expect(saved).toEqual([8, 9]);
    expect(states.at(-1)).toEqual({ kind: "saved" });
  });

  it("keeps what could not be sent and tries again, ever more slowly", async () => {
    const { queue, asked, answer, states } = aQueue();
    queue.offer(first);
    await vi.advanceTimersByTimeAsync(600);
    await answer({ ok: false, reason: "offline" });
    expect(states.at(-1)).toEqual({ kind: "kept", reason: "offline", since: Date.now() });
    await vi.advanceTimersByTimeAsync(2_000);
    expect(asked).toHaveLength(2);
    await answer({ ok: false, reason: "offline" });
    await vi.advanceTimersByTimeAsync(4_999);
    expect(asked).toHaveLength(2);
    await vi.advanceTimersByTimeAsync(1);
    expect(asked).toHaveLength(3);
    await answer(took(8));
    expect(states.at(-1)).toEqual({ kind: "saved" });
  });

  it("says since when the text has been kept here, not when it last failed", async () => {
    const { queue, answer, states } = aQueue();
    const begun = Date.now() + 600;
    queue.offer(first);
    await vi.advanceTimersByTimeAsync(600);
    await answer({ ok: false, reason: "server" });
    await vi.advanceTimersByTimeAsync(2_000);
    await answer({ ok: false, reason: "offline" });
    expect(states.at(-1)).toEqual({ kind: "kept", reason: "offline", since: begun });
  });

  it("tries at once when there is a chance", async () => {
    const { queue, asked, answer } = aQueue();
    queue.offer(first);
    await vi.advanceTimersByTimeAsync(600);
    await answer({ ok: false, reason: "offline" });
    queue.retry();
    await vi.advanceTimersByTimeAsync(0);
    expect(asked).toHaveLength(2);
  });

  it("does not ask again while the person is signed out, until told to", async () => {
    const { queue, asked, answer } = aQueue();
    queue.offer(first);
    await vi.advanceTimersByTimeAsync(600);
    await answer({ ok: false, reason: "signedOut" });
    queue.offer(second);
    await vi.advanceTimersByTimeAsync(120_000);
    expect(asked).toHaveLength(1);
    queue.retry();
    await vi.advanceTimersByTimeAsync(0);
    expect(asked[1]).toMatchObject({ document: second });
  });

  it("stops at someone else's revision and goes on from the one it is given", async () => {
    const { queue, asked, answer, stale, states } = aQueue();
    queue.offer(first);
    await vi.advanceTimersByTimeAsync(600);
    await answer({ ok: false, reason: "stale", current: aServerDraft({ revision: 9, savedBy: wiremu }) });
    expect(stale).toEqual([9]);
    queue.offer(second);
    await vi.advanceTimersByTimeAsync(60_000);
    expect(asked).toHaveLength(1);
    expect(states.at(-1)).toEqual({ kind: "stale" });
    queue.rebase(9, third);
    await vi.advanceTimersByTimeAsync(0);
    expect(asked[1]).toMatchObject({ revision: 9, document: third });
  });

  it("knows its own text again when only the answer was lost", async () => {
    const { queue, asked, answer, saved, stale } = aQueue();
    queue.offer(first);
    await vi.advanceTimersByTimeAsync(600);
    await answer({ ok: false, reason: "offline" });
    queue.offer(second);
    await vi.advanceTimersByTimeAsync(2_000);
    await answer({ ok: false, reason: "stale", current: aServerDraft({ revision: 8, document: first }) });
    expect(stale).toEqual([]);
    expect(saved).toEqual([8]);
    await vi.advanceTimersByTimeAsync(0);
    expect(asked.at(-1)).toMatchObject({ revision: 8, document: second });
  });

  it("says why the server will not have a text, and sends the next one", async () => {
    const { queue, asked, answer, states } = aQueue();
    queue.offer(first);
    await vi.advanceTimersByTimeAsync(600);
    await answer({ ok: false, reason: "refused", message: "This text holds a null." });
    expect(states.at(-1)).toMatchObject({ kind: "refused", message: "This text holds a null." });
    await vi.advanceTimersByTimeAsync(60_000);
    expect(asked).toHaveLength(1);
    queue.offer(second);
    await vi.advanceTimersByTimeAsync(600);
    expect(asked[1]).toMatchObject({ document: second });
  });

  it("sends what waits at once when asked to", async () => {
    const { queue, asked, answer } = aQueue();
    queue.offer(first);
    const flushed = queue.flush();
    await vi.advanceTimersByTimeAsync(0);
    expect(asked).toHaveLength(1);
    await answer(took(8));
    await flushed;
    expect(queue.isSaved()).toBe(true);
    expect(queue.revision()).toBe(8);
  });

  it("sends nothing when the text is again as the server has it", async () => {
    const { queue, asked, states } = aQueue();
    queue.offer(first);
    queue.withdraw();
    await vi.advanceTimersByTimeAsync(10_000);
    expect(asked).toHaveLength(0);
    expect(states.at(-1)).toEqual({ kind: "saved" });
  });

  it("is silent once stopped", async () => {
    const { queue, asked, states } = aQueue();
    queue.offer(first);
    queue.stop();
    const count = states.length;
    await vi.advanceTimersByTimeAsync(10_000);
    expect(asked).toHaveLength(0);
    expect(states).toHaveLength(count);
  });
});
