import { afterAll, describe, expect, it } from "vitest";
import { createEvaluator } from "../../../server/jobs/evaluator";
import { evaluateDocument } from "../../../server/jobs/evaluateDocument";
import { buildCell, buildDocument } from "../../factories/buildDocument";

const evaluator = createEvaluator({ timeLimit: 60_000 });
afterAll(() => evaluator.close());

describe("evaluation in a thread", () => {
  it("gives to the last bit what an evaluation here gives", async () => {
    const document = buildDocument();
    expect(await evaluator.evaluate(document)).toEqual({ ok: true, outcome: evaluateDocument(document) });
  });

  it("takes an urgent document before those that wait", async () => {
    const order: string[] = [];
    const ask = (title: string, isUrgent: boolean) =>
      evaluator.evaluate(buildDocument({ title }), { isUrgent }).then(() => order.push(title));
    await Promise.all([ask("running", false), ask("waiting", false), ask("urgent", true)]);
    expect(order).toEqual(["running", "urgent", "waiting"]);
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
