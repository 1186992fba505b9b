import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import { createLatestRunner } from "../../../../src/features/notebook/evaluation/createLatestRunner";

beforeEach(() => vi.useFakeTimers());
afterEach(() => vi.useRealTimers());

/** A runner whose work takes a known time. */
function aRunner(takes: (input: string) => number) {
  const run = vi.fn(
    (input: string) =>
      new Promise<string>((done) => setTimeout(() => done(input.toUpperCase()), takes(input))),
  );
  const results: string[] = [];
  const failures: unknown[] = [];
  const runner = createLatestRunner<string, string>({
    run,
    onResult: (output) => results.push(output),
    onFailure: (error) => failures.push(error),
  });
  return { runner, run, results, failures };
}

describe("createLatestRunner", () => {
  it("runs what comes at once, and of what comes meanwhile only the newest", async () => {
    const { runner, run, results } = aRunner(() => 30);
    ["a", "b", "c", "d"].forEach((input) => runner.offer(input));
    await vi.advanceTimersByTimeAsync(100);
    expect(run.mock.calls.flat()).toEqual(["a", "d"]);
    expect(results).toEqual(["A", "D"]);
  });

  it("waits for a rest once work has been slow", async () => {
    const { runner, run } = aRunner((input) => (input === "slow" ? 300 : 10));
    runner.offer("a");
    await vi.advanceTimersByTimeAsync(10);
    runner.offer("slow");
    await vi.advanceTimersByTimeAsync(300);
    runner.offer("b");
    await vi.advanceTimersByTimeAsync(500);
    runner.offer("c");
    await vi.advanceTimersByTimeAsync(599);
    expect(run).toHaveBeenCalledTimes(2);
    await vi.advanceTimersByTimeAsync(1);
    expect(run.mock.calls.flat()).toEqual(["a", "slow", "c"]);
  });

  it("does not take the first run, which computes everything, for slow", async () => {
    const { runner, run } = aRunner((input) => (input === "first" ? 300 : 10));
    runner.offer("first");
    await vi.advanceTimersByTimeAsync(300);
    runner.offer("b");
    expect(run.mock.calls.flat()).toEqual(["first", "b"]);
  });

  it("goes by the time that the work itself took, where it is known", async () => {
    const run = vi.fn((input: string) => new Promise<string>((done) => setTimeout(() => done(input), 300)));
    const runner = createLatestRunner<string, string>({
      run,
      onResult: () => {},
      onFailure: () => {},
      tookOf: () => 5,
    });
    for (const input of ["a", "b", "c"]) {
      runner.offer(input);
      await vi.advanceTimersByTimeAsync(300);
    }
    expect(run.mock.calls.flat()).toEqual(["a", "b", "c"]);
  });

  it("goes on after a failure", async () => {
    const { runner, run, results, failures } = aRunner(() => 10);
    run.mockImplementationOnce(() => Promise.reject(new Error("broken")));
    runner.offer("a");
    await vi.advanceTimersByTimeAsync(10);
    runner.offer("b");
    await vi.advanceTimersByTimeAsync(10);
    expect(failures).toHaveLength(1);
    expect(results).toEqual(["B"]);
  });

  it("gives nothing once stopped", async () => {
    const { runner, results } = aRunner(() => 10);
    runner.offer("a");
    runner.stop();
    await vi.advanceTimersByTimeAsync(100);
    expect(results).toEqual([]);
  });
});
