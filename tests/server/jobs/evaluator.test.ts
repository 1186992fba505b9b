import { afterAll, describe, expect, it } from "vitest";
import { createEvaluator, type EvaluationAnswer } from "../../../server/jobs/evaluator";
import { evaluateDocument } from "../../../server/jobs/evaluateDocument";
import { buildCell, buildDocument } from "../../factories/buildDocument";

const evaluator = createEvaluator({ timeLimit: 60_000 });
afterAll(() => evaluator.close());

const withSpread = buildDocument({
  cells: [
    buildCell({ id: "a", name: "given", text: "x = 240 ± 30 K\ny = 2 * x" }),
    buildCell({ id: "b", kind: "spread", name: "sure", text: "watch = y\nsamples = 512" }),
  ],
});

function lastCell(answer: EvaluationAnswer) {
  if (!answer.ok) throw new Error(answer.reason);
  return answer.outcome.result.cells.at(-1)!;
}

describe("evaluation in a thread", () => {
  it("gives to the last bit what an evaluation here gives", async () => {
    const document = buildDocument();
    expect(await evaluator.evaluate(document)).toEqual({ ok: true, outcome: evaluateDocument(document) });
  });

  it("does not let what is kept wait for drafts", async () => {
    const order: string[] = [];
    const ask = (title: string, isKept: boolean) =>
      evaluator.evaluate(buildDocument({ title }), { isKept }).then(() => order.push(title));
    await ask("first", true);
    const drafts = Array.from({ length: 20 }, () => ask("draft", false));
    await ask("kept", true);
    expect(order).not.toHaveLength(22);
    await Promise.all(drafts);
  });

  it("computes sweeps and spreads of what is kept, and leaves them out of drafts", async () => {
    const draft = await evaluator.evaluate(withSpread);
    const kept = await evaluator.evaluate(withSpread, { isKept: true });
    expect(lastCell(draft)).toMatchObject({ values: {}, notes: [{ code: "to_be_computed" }] });
    expect(lastCell(kept)).toMatchObject({ status: "fine", values: { "y.median": { unit: "K" } } });
    expect(kept).toEqual({ ok: true, outcome: evaluateDocument(withSpread, Infinity) });
  });

  it("marks as partial what its time did not suffice for", async () => {
    const hasty = createEvaluator({ timeLimit: 60_000, longWork: 0 });
    const answer = await hasty.evaluate(withSpread, { isKept: true });
    expect(lastCell(answer)).toMatchObject({ notes: [{ level: "caution", code: "partial" }] });
    await hasty.close();
  });

  it("ends what takes too long, says so, and answers the next", async () => {
    const hasty = createEvaluator({ timeLimit: 1 });
    const answer = await hasty.evaluate(buildDocument());
    expect(answer).toEqual({ ok: false, reason: "It takes over 0.001 s. Make its cells smaller." });
    await hasty.close();
  });

  it("outlives a document that breaks the thread", async () => {
    const broken = { ...buildDocument(), cells: null } as unknown as ReturnType<typeof buildDocument>;
    const answer = await evaluator.evaluate(broken);
    expect(answer).toMatchObject({ ok: false });
    const next = await evaluator.evaluate(
      buildDocument({ cells: [buildCell({ id: "a", text: "x = 1 km" })] }),
    );
    expect(next).toMatchObject({ ok: true });
  });

  it("answers those who wait when it closes", async () => {
    const closing = createEvaluator();
    const answers = [closing.evaluate(buildDocument()), closing.evaluate(buildDocument())];
    await closing.close();
    expect((await Promise.all(answers)).map(({ ok }) => ok)).toEqual([true, false]);
    expect(await closing.evaluate(buildDocument())).toMatchObject({ ok: false });
  });
});
