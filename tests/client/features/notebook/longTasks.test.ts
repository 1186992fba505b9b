import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import type { NotebookDocument } from "../../../../shared/notebook/document";
import { completeNotebook } from "../../../../shared/notebook/completeNotebook";
import { evaluateNotebook } from "../../../../shared/notebook/evaluateNotebook";
import type { CellEvaluation } from "../../../../shared/notebook/result";
import type { LongTask, TaskAnswer, TaskPart } from "../../../../shared/notebook/tasks";
import {
  createTaskQueue,
  type TaskState,
} from "../../../../src/features/notebook/evaluation/createTaskQueue";
import { createEvaluationService } from "../../../../src/features/notebook/evaluation/evaluationService";
import {
  createTaskPool,
  type RemoteTaskService,
  type TaskPool,
} from "../../../../src/features/notebook/evaluation/taskPool";
import { createTaskService } from "../../../../src/features/notebook/evaluation/taskService";
import { aCell, aNotebook } from "./aNotebook";

function documentOf(text: string, samples = 64): NotebookDocument {
  return aNotebook({
    cells: [
      aCell({ id: "given", kind: "values", name: "given", text }),
      aCell({ id: "sure", kind: "spread", name: "sure", text: `watch = y\nsamples = ${samples}` }),
    ],
  });
}

const document = documentOf("x = 240 ± 30 K\ny = 2 * x");
const [task] = evaluateNotebook(document).tasks;

/** The service of a worker, without a worker. */
function serviceHere(): RemoteTaskService {
  const service = createTaskService();
  return {
    open: async (...call) => service.open(...call),
    run: async (...call) => service.run(...call),
    finish: async (...call) => service.finish(...call),
  };
}

describe("the pool of workers", () => {
  const watch = { onProgress: () => undefined, isStopped: () => false };

  it("answers the same with one worker and with three, and as all at once", async () => {
    const one = await createTaskPool(serviceHere, 1).run(document, task, watch);
    const three = await createTaskPool(serviceHere, 3).run(document, task, watch);
    expect(three!.answer).toEqual(one!.answer);
    const { evaluation } = evaluateNotebook(document, undefined, new Map([[task.key, three!.answer]]));
    expect(evaluation).toEqual(completeNotebook(document));
  });

  it("tells its progress up to the end", async () => {
    const told: number[] = [];
    await createTaskPool(serviceHere, 2).run(document, task, {
      ...watch,
      onProgress: ({ done }) => told.push(done),
    });
    expect(told[0]).toBe(0);
    expect(told.at(-1)).toBe(64);
    expect(told).toEqual(told.toSorted((a, b) => a - b));
  });

  it("answers in part where it is stopped, and not at all where nothing was done", async () => {
    let isStopped = false;
    const pool = createTaskPool(serviceHere, 1);
    const run = await pool.run(document, task, {
      onProgress: ({ done }) => (isStopped = done >= 10),
      isStopped: () => isStopped,
    });
    expect(run!.answer.done).toBeGreaterThanOrEqual(10);
    expect(run!.answer.done).toBeLessThan(64);
    expect(run!.answer.notes[0]).toMatchObject({ level: "caution", code: "partial" });
    expect(await pool.run(document, task, { ...watch, isStopped: () => true })).toBeNull();
  });

  it("goes on from what was done, and answers as if it had never been stopped", async () => {
    let isStopped = false;
    const pool = createTaskPool(serviceHere, 2);
    const begun = await pool.run(document, task, {
      onProgress: ({ done }) => (isStopped = done >= 10),
      isStopped: () => isStopped,
    });
    const told: number[] = [];
    const rest = await pool.run(document, task, {
      ...watch,
      onProgress: ({ done }) => told.push(done),
      begun: begun!.parts,
    });
    expect(told[0]).toBe(begun!.answer.done);
    expect(rest!.parts.slice(0, begun!.parts.length)).toEqual(begun!.parts);
    expect(rest!.answer).toEqual((await pool.run(document, task, watch))!.answer);
  });

  it("goes on after a task that broke", async () => {
    const pool = createTaskPool(serviceHere, 1);
    const broken = pool.run(document, { ...task, key: "another" }, watch);
    await expect(broken).rejects.toThrow("no task for sure");
    expect(await pool.run(document, task, watch)).toMatchObject({ answer: { done: 64 } });
  });
});

describe("the queue of tasks", () => {
  beforeEach(() => void vi.useFakeTimers());
  afterEach(() => void vi.useRealTimers());

  function heldPool() {
    const runs: {
      task: LongTask;
      watch: Parameters<TaskPool["run"]>[2];
      end: (done: number) => void;
      break: (error: Error) => void;
    }[] = [];
    const partOf = (from: number, to: number): TaskPart => ({
      key: task.key,
      from,
      to,
      values: [],
      outcomes: [],
    });
    const pool: TaskPool = {
      run: (_, asked, watch) =>
        new Promise((resolve, reject) =>
          runs.push({
            task: asked,
            watch,
            end: (done) => {
              const answer = { key: asked.key, points: asked.points, done } as TaskAnswer;
              resolve(done === 0 ? null : { answer, parts: [partOf(0, done)] });
            },
            break: reject,
          }),
        ),
    };
    return { pool, runs };
  }

  function queueOn(pool: TaskPool) {
    const states: ReadonlyMap<string, TaskState>[] = [];
    const answers: TaskAnswer[] = [];
    const queue = createTaskQueue({
      pool,
      onChange: (next) => states.push(next),
      onAnswer: (answer) => answers.push(answer),
    });
    return { queue, answers, state: () => states.at(-1)!.get("sure") };
  }

  it("begins once writing has rested for 0.6 s", () => {
    const { pool, runs } = heldPool();
    const { queue, state } = queueOn(pool);
    queue.ask(document, { tasks: [task], partial: [] });
    vi.advanceTimersByTime(500);
    queue.ask(document, { tasks: [task], partial: [] });
    vi.advanceTimersByTime(500);
    expect(runs).toHaveLength(0);
    expect(state()).toMatchObject({ status: "waiting", done: 0, points: 64 });
    vi.advanceTimersByTime(100);
    expect(runs).toHaveLength(1);
    expect(state()).toMatchObject({ status: "running" });
  });

  it("lets a task go on that the next text asks for too, and drops one that it does not", () => {
    const { pool, runs } = heldPool();
    const { queue, state } = queueOn(pool);
    queue.ask(document, { tasks: [task], partial: [] });
    vi.advanceTimersByTime(600);
    queue.ask(document, { tasks: [task], partial: [] });
    vi.advanceTimersByTime(600);
    expect(runs).toHaveLength(1);
    expect(runs[0].watch.isStopped()).toBe(false);

    const later = documentOf("x = 250 ± 30 K\ny = 2 * x");
    const [other] = evaluateNotebook(later).tasks;
    queue.ask(later, { tasks: [other], partial: [] });
    expect(runs[0].watch.isStopped()).toBe(true);
    expect(state()).toMatchObject({ status: "waiting", task: other });
    vi.advanceTimersByTime(600);
    expect(runs.map((run) => run.task.key)).toEqual([task.key, other.key]);
  });

  it("shows progress, stops when told to, and hands the partial answer on", async () => {
    const { pool, runs } = heldPool();
    const { queue, answers, state } = queueOn(pool);
    queue.ask(document, { tasks: [task], partial: [] });
    vi.advanceTimersByTime(600);
    runs[0].watch.onProgress({ done: 16, points: 64, secondsLeft: 3 });
    expect(state()).toMatchObject({ done: 16, secondsLeft: 3 });
    state()!.stop();
    expect(state()).toMatchObject({ status: "stopping" });
    expect(runs[0].watch.isStopped()).toBe(true);
    runs[0].end(16);
    await vi.advanceTimersByTimeAsync(0);
    expect(answers).toMatchObject([{ done: 16 }]);
    expect(state()).toMatchObject({ status: "stopped", done: 16, secondsLeft: null });
  });

  it("keeps what was stopped at rest until it is resumed, and then goes on from there", async () => {
    const { pool, runs } = heldPool();
    const { queue, answers, state } = queueOn(pool);
    queue.ask(document, { tasks: [task], partial: [] });
    vi.advanceTimersByTime(600);
    state()!.stop();
    runs[0].end(16);
    await vi.advanceTimersByTimeAsync(0);
    queue.ask(document, { tasks: [], partial: [{ task, done: 16 }] });
    vi.advanceTimersByTime(600);
    expect(runs).toHaveLength(1);
    state()!.resume();
    expect(runs[1].watch.begun).toMatchObject([{ from: 0, to: 16 }]);
    expect(runs[1].watch.isStopped()).toBe(false);
    // The text is evaluated meanwhile, for another cell: the work goes on.
    queue.ask(document, { tasks: [], partial: [{ task, done: 16 }] });
    expect(runs[1].watch.isStopped()).toBe(false);
    runs[1].end(64);
    await vi.advanceTimersByTimeAsync(0);
    expect(answers).toMatchObject([{ done: 16 }, { done: 64 }]);
    queue.ask(document, { tasks: [], partial: [] });
    expect(state()).toBeUndefined();
  });

  it("stops what has not begun without an answer, and begins it when resumed", async () => {
    const { pool, runs } = heldPool();
    const { queue, answers, state } = queueOn(pool);
    queue.ask(document, { tasks: [task], partial: [] });
    state()!.stop();
    vi.advanceTimersByTime(600);
    queue.ask(document, { tasks: [task], partial: [] });
    vi.advanceTimersByTime(600);
    expect(runs).toHaveLength(0);
    expect(state()).toMatchObject({ status: "stopped", done: 0 });
    state()!.resume();
    runs[0].end(64);
    await vi.advanceTimersByTimeAsync(0);
    expect(answers).toMatchObject([{ done: 64 }]);
  });

  it("offers the rest of an answer in part that it finds, which it then begins anew", () => {
    const { pool, runs } = heldPool();
    const { queue, state } = queueOn(pool);
    queue.ask(document, { tasks: [], partial: [{ task, done: 16 }] });
    vi.advanceTimersByTime(600);
    expect(state()).toMatchObject({ status: "stopped", done: 16 });
    state()!.resume();
    expect(runs[0].watch.begun).toEqual([]);
  });

  it("says why a task broke, and tries again when told to", async () => {
    const { pool, runs } = heldPool();
    const { queue, state } = queueOn(pool);
    queue.ask(document, { tasks: [task], partial: [] });
    vi.advanceTimersByTime(600);
    runs[0].break(new Error("The worker went away."));
    await vi.advanceTimersByTimeAsync(0);
    expect(state()).toMatchObject({ status: "failed", failure: "The worker went away." });
    queue.ask(document, { tasks: [task], partial: [] });
    vi.advanceTimersByTime(600);
    expect(runs).toHaveLength(1);
    state()!.resume();
    expect(state()).toMatchObject({ status: "running", failure: null });
    expect(runs).toHaveLength(2);
  });

  it("says nothing more once it is closed", async () => {
    const { pool, runs } = heldPool();
    const { queue, answers } = queueOn(pool);
    queue.ask(document, { tasks: [task], partial: [] });
    vi.advanceTimersByTime(600);
    queue.close();
    expect(runs[0].watch.isStopped()).toBe(true);
    runs[0].end(64);
    await vi.advanceTimersByTimeAsync(0);
    expect(answers).toEqual([]);
  });
});

describe("the evaluation service", () => {
  it("asks for what is to be computed, and has it once it is supplied", async () => {
    const service = createEvaluationService();
    const first = service.evaluate("one", document);
    expect(first.tasks).toEqual([task]);
    const answer = await createTaskPool(serviceHere, 1).run(document, task, {
      onProgress: () => undefined,
      isStopped: () => false,
    });
    service.supply(answer!.answer);
    const second = service.evaluate("one", document);
    expect(second.tasks).toEqual([]);
    expect(second.cells.map((cell) => typeof cell)).toEqual(["object", "object"]);
    expect(service.evaluate("one", document).cells).toEqual(["given", "sure"]);
  });

  it("asks for the rest of an answer in part, and has it once it is supplied", async () => {
    const service = createEvaluationService();
    const here = createTaskService();
    here.open(document, task);
    const part = here.run(0, 40);
    service.supply(here.finish(document, task, [part]));
    expect(service.evaluate("one", document)).toMatchObject({ tasks: [], partial: [{ task, done: 40 }] });
    service.supply(here.finish(document, task, [part, here.run(40, 64)]));
    const whole = service.evaluate("one", document);
    expect(whole.partial).toEqual([]);
    const { result } = whole.cells[1] as CellEvaluation;
    expect(result.values.draws!.value).toBe(64);
    expect(result.notes.map(({ code }) => code)).not.toContain("partial");
  });

  it("finds an answer again when the text goes back to what it was", async () => {
    const service = createEvaluationService();
    const answer = createTaskService().finish(document, task, []);
    service.supply(answer);
    expect(service.evaluate("one", document)).toMatchObject({ tasks: [], partial: [{ task, done: 0 }] });
    expect(service.evaluate("one", documentOf("x = 250 ± 30 K\ny = 2 * x")).tasks).toHaveLength(1);
    expect(service.evaluate("one", document).tasks).toEqual([]);
  });
});
