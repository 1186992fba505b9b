import { eq } from "drizzle-orm";
import { pino } from "pino";
import { afterAll, beforeAll, beforeEach, describe, expect, it } from "vitest";
import { saveDraft } from "../../../server/commands/saveDraft";
import type { Db } from "../../../server/db/client";
import { notebooks } from "../../../server/db/tables/notebooks";
import { evaluateDocument } from "../../../server/jobs/evaluateDocument";
import type { EvaluationAnswer, Evaluator } from "../../../server/jobs/evaluator";
import { createSummaries } from "../../../server/jobs/summaries";
import type { Actor } from "../../../server/policies/actor";
import type { NotebookDocument } from "../../../shared/notebook/document";
import { engineVersion } from "../../../shared/notebook/engine";
import { buildDocument } from "../../factories/buildDocument";
import { buildNotebook } from "../../factories/buildNotebook";
import { buildUser } from "../../factories/buildUser";
import { openTestDatabase } from "../testDatabase";

const logger = pino({ level: "silent" });

let db: Db;
let close: () => Promise<void>;
let owner: Actor;
beforeAll(async () => {
  ({ db, close } = await openTestDatabase());
});
beforeEach(async () => {
  owner = await buildUser(db);
});
afterAll(() => close());

const rowOf = async (id: string) => (await db.select().from(notebooks).where(eq(notebooks.id, id)))[0]!;

/** An evaluator that waits to be told; it says which documents it was asked for. */
function heldEvaluator(answerFor: (document: NotebookDocument) => EvaluationAnswer) {
  const asked: string[] = [];
  let release: () => void = () => undefined;
  const held = new Promise<void>((resolve) => (release = resolve));
  const evaluator: Evaluator = {
    evaluate: async (document) => {
      asked.push(document.title);
      await held;
      return answerFor(document);
    },
    close: async () => undefined,
  };
  return { evaluator, asked, release: () => release() };
}

const truly = (document: NotebookDocument): EvaluationAnswer => ({
  ok: true,
  outcome: evaluateDocument(document),
});

describe("summaries", () => {
  it("asked for many times while one is computed are computed once more", async () => {
    const { id } = await buildNotebook(db, { owner });
    const { evaluator, asked, release } = heldEvaluator(truly);
    const summaries = createSummaries({ db, evaluator, logger });
    summaries.request(id);
    while (asked.length === 0) await new Promise((resolve) => setTimeout(resolve, 5));
    for (const revision of [1, 2, 3]) {
      const document = buildDocument({ title: `Revision ${revision + 1}` });
      await saveDraft(db, { notebookId: id, revision, document, actorId: owner.id, at: new Date() });
      summaries.request(id);
    }
    release();
    await summaries.idle();
    expect(asked).toEqual(["Nirel, a first look", "Revision 4"]);
    expect(await rowOf(id)).toMatchObject({ summaryRevision: 4, summaryEngine: engineVersion });
    await summaries.close();
  });

  it("catch up with all that are missing or of another engine, and with no other", async () => {
    const missing = await buildNotebook(db, { owner, document: buildDocument({ title: "Missing" }) });
    const older = await buildNotebook(db, { owner, document: buildDocument({ title: "Older engine" }) });
    const current = await buildNotebook(db, { owner, document: buildDocument({ title: "Current" }) });
    await db
      .update(notebooks)
      .set({ summaryRevision: 1, summaryEngine: "0.1.0" })
      .where(eq(notebooks.id, older.id));
    const fresh = { summaryRevision: 1, summaryEngine: engineVersion };
    await db.update(notebooks).set(fresh).where(eq(notebooks.id, current.id));
    const { evaluator, asked, release } = heldEvaluator(truly);
    release();
    const summaries = createSummaries({ db, evaluator, logger });
    await summaries.catchUp();
    await summaries.idle();
    expect(asked).toEqual(expect.arrayContaining(["Missing", "Older engine"]));
    expect(asked).not.toContain("Current");
    expect((await rowOf(missing.id)).summary).not.toBeNull();
    await summaries.close();
  });

  it("that cannot be computed leave none, rather than one of another text", async () => {
    const { id } = await buildNotebook(db, { owner });
    const { evaluator, release } = heldEvaluator(({ title }) =>
      title === "Too heavy" ? { ok: false, reason: "too long" } : truly(buildDocument()),
    );
    release();
    const summaries = createSummaries({ db, evaluator, logger });
    summaries.request(id);
    await summaries.idle();
    expect((await rowOf(id)).summary).not.toBeNull();
    const document = buildDocument({ title: "Too heavy" });
    await saveDraft(db, { notebookId: id, revision: 1, document, actorId: owner.id, at: new Date() });
    summaries.request(id);
    await summaries.idle();
    expect(await rowOf(id)).toMatchObject({ summary: null, summaryRevision: 2 });
    await summaries.close();
  });

  it("of a notebook that is gone are let go", async () => {
    const { evaluator, asked, release } = heldEvaluator(truly);
    release();
    const summaries = createSummaries({ db, evaluator, logger });
    summaries.request("00000000-0000-4000-8000-000000000000");
    await summaries.idle();
    expect(asked).toEqual([]);
    await summaries.close();
  });
});
