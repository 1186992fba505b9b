import { eq } from "drizzle-orm";
import { pino } from "pino";
import { afterAll, beforeAll, beforeEach, describe, expect, it } from "vitest";
import { postLetter } from "../../../server/commands/postLetter";
import { claimLetter } from "../../../server/commands/sendLetters";
import type { Db } from "../../../server/db/client";
import { letters } from "../../../server/db/tables/letters";
import { createPost } from "../../../server/jobs/post";
import type { Delivery } from "../../../server/mail/transport";
import { openTestDatabase } from "../testDatabase";

let db: Db;
let close: () => Promise<void>;
beforeAll(async () => {
  ({ db, close } = await openTestDatabase());
});
beforeEach(async () => {
  await db.delete(letters);
});
afterAll(() => close());

const past = new Date("2026-10-01T00:00:00Z");

const write = (tx: Db, subject: string) =>
  postLetter(
    tx,
    {
      kind: "group_invitation",
      toAddress: "a@b.example",
      toUserId: null,
      subject,
      plain: "Come: secret-link",
      html: "<p>Come: secret-link</p>",
    },
    past,
  );

/** A post that takes down what it delivers, and answers as told. */
function startPost(answer: (subject: string) => Delivery | Promise<Delivery> = () => ({ outcome: "sent" })) {
  const delivered: string[] = [];
  const post = createPost({
    db,
    logger: pino({ level: "silent" }),
    transport: {
      deliver: async ({ subject }) => {
        delivered.push(subject);
        return answer(subject);
      },
      close: () => undefined,
    },
  });
  const run = async (): Promise<void> => {
    post.request();
    await post.idle();
  };
  return { delivered, post, run };
}

const rows = () => db.select().from(letters).orderBy(letters.subject);
const makeDue = () => db.update(letters).set({ dueAt: past }).where(eq(letters.state, "waiting"));

describe("the post", () => {
  it("sends each letter once and forgets what it said", async () => {
    await write(db, "one");
    await write(db, "two");
    const { delivered, run } = startPost();
    await run();
    await run();
    expect(delivered.sort()).toEqual(["one", "two"]);
    expect(await rows()).toMatchObject([
      { state: "sent", plain: "", html: "", tries: 1 },
      { state: "sent", plain: "", html: "", tries: 1 },
    ]);
    expect(JSON.stringify(await rows())).not.toContain("secret-link");
  });

  it("sends nothing of what did not come to pass", async () => {
    const undone = db.transaction(async (tx) => {
      await write(tx, "undone");
      throw new Error("refused after all");
    });
    await expect(undone).rejects.toThrow("refused after all");
    const { delivered, run } = startPost();
    await run();
    expect(delivered).toEqual([]);
  });

  it("two at work never take the same letter", async () => {
    for (let count = 0; count < 8; count += 1) await write(db, `letter ${count}`);
    const [one, two] = [startPost(), startPost()];
    await Promise.all([one.run(), two.run()]);
    const all = [...one.delivered, ...two.delivered];
    expect(all).toHaveLength(8);
    expect(new Set(all).size).toBe(8);
  });

  it("tries again with growing pauses what was surely not taken, and gives up after the sixth time", async () => {
    await write(db, "unlucky");
    const { delivered, run } = startPost(() => ({ outcome: "later", failure: "busy" }));
    const pauses: number[] = [];
    for (let tries = 1; tries <= 7; tries += 1) {
      const from = Date.now();
      await run();
      const [letter] = await rows();
      if (letter!.state === "waiting") pauses.push(Math.round((letter!.dueAt.getTime() - from) / 60_000));
      await run();
      await makeDue();
    }
    expect(pauses).toEqual([1, 5, 30, 120, 720]);
    expect(delivered).toHaveLength(6);
    expect(await rows()).toMatchObject([{ state: "failed", failure: "busy", tries: 6 }]);
  });

  it("sends on a later try", async () => {
    await write(db, "busy at first");
    const answers: Delivery[] = [{ outcome: "later", failure: "busy" }, { outcome: "sent" }];
    const { delivered, run } = startPost(() => answers.shift()!);
    await run();
    await makeDue();
    await run();
    expect(delivered).toHaveLength(2);
    expect(await rows()).toMatchObject([{ state: "sent", failure: null, tries: 2 }]);
  });

  it("does not try again what was refused for good, and goes on with the rest", async () => {
    await write(db, "bad");
    await write(db, "good");
    const { delivered, run } = startPost((subject) =>
      subject === "bad" ? { outcome: "never", failure: "no such person" } : { outcome: "sent" },
    );
    await run();
    await run();
    expect(delivered.sort()).toEqual(["bad", "good"]);
    expect((await rows()).map(({ state }) => state)).toEqual(["failed", "sent"]);
  });

  it("never sends again what a stopped server had taken up, before or after it had gone out", async () => {
    await write(db, "half sent");
    // The server stops here: the letter is claimed, and nobody knows whether it went out.
    const claimed = await claimLetter(db, new Date());
    expect(claimed).toMatchObject({ subject: "half sent", state: "sending" });

    const { delivered, run } = startPost();
    await run();
    expect(await rows()).toMatchObject([{ state: "sending" }]);
    await db.update(letters).set({ dueAt: past });
    await run();
    await run();
    expect(delivered).toEqual([]);
    expect(await rows()).toMatchObject([{ state: "failed" }]);
    expect((await rows())[0]!.failure).toMatch(/may have arrived/);
  });

  it("does not send again where what became of a letter could not be written down", async () => {
    await write(db, "sent, then silence");
    const { delivered, run } = startPost(() => Promise.reject(new Error("the server broke down")));
    await run();
    await run();
    expect(delivered).toEqual(["sent, then silence"]);
    expect(await rows()).toMatchObject([{ state: "sending" }]);
  });

  it("closes after the letter under way", async () => {
    await write(db, "one");
    await write(db, "two");
    let finish!: (delivery: Delivery) => void;
    const { delivered, post } = startPost(() => new Promise((resolve) => (finish = resolve)));
    post.request();
    await expect.poll(() => delivered.length).toBe(1);
    const closing = post.close();
    finish({ outcome: "sent" });
    await closing;
    expect(delivered).toHaveLength(1);
    expect((await rows()).map(({ state }) => state).sort()).toEqual(["sent", "waiting"]);
  });
});
